import { readNumber } from "@/components/ui/read-number";
import type { BudgetLine, Distribution } from "@/lib/core/bench/uncertainty-budget";
import type { BudgetLineDraft } from "@/lib/core/bench/validate-budget";

/** A line of a budget as it is typed. */
export interface BudgetLineText {
  id: number;
  name: string;
  value: string;
  distribution: Distribution | "";
  sensitivity: string;
  degreesOfFreedom: string;
  observations: string;
}

export function emptyLine(id: number, change: Partial<BudgetLineText> = {}): BudgetLineText {
  return {
    id,
    name: "",
    value: "",
    distribution: "",
    sensitivity: "1",
    degreesOfFreedom: "",
    observations: "",
    ...change,
  };
}

/**
 * What a radiated budget usually has (CISPR 16-4-2, from memory), without values: those are the
 * bench's own and are not assumed.
 */
export const USUAL_LINES: readonly Pick<BudgetLineText, "name" | "distribution">[] = [
  { name: "Antenna factor, calibration", distribution: "normal" },
  { name: "Antenna factor, interpolation", distribution: "rectangular" },
  { name: "Cable loss, calibration", distribution: "normal" },
  { name: "Instrument, sine wave level", distribution: "normal" },
  { name: "Instrument, pulse response", distribution: "rectangular" },
  { name: "Mismatch, antenna to instrument", distribution: "u-shaped" },
  { name: "Site imperfections", distribution: "triangular" },
  { name: "Distance", distribution: "rectangular" },
  { name: "Repeatability", distribution: "type-a" },
];

const show = (value: number | null) => (value === null ? "" : String(value));

/** A stored line as text that reads back as the same line. */
export function textOfLine(id: number, line: BudgetLine): BudgetLineText {
  return {
    id,
    name: line.name,
    value: show(line.value),
    distribution: line.distribution,
    sensitivity: show(line.sensitivity),
    degreesOfFreedom: show(line.degreesOfFreedom),
    observations: show(line.observations),
  };
}

const read = (text: string) => (text.trim() === "" ? null : readNumber(text));

/** The line as the core takes it: null is left empty, NaN is no number. */
export function draftOfLine(text: BudgetLineText): BudgetLineDraft {
  return {
    name: text.name,
    value: read(text.value),
    distribution: text.distribution || null,
    sensitivity: read(text.sensitivity),
    degreesOfFreedom: read(text.degreesOfFreedom),
    observations: text.distribution === "type-a" ? read(text.observations) : null,
  };
}
