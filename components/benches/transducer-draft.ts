import type { FactorPoint, Transducer, TransducerKind } from "@/lib/core/bench/signal-path";
import { factorSpan } from "./factor-span";

/** What is known of a factor table while it is typed. */
export type TableState =
  | { state: "empty" }
  | { state: "reading" }
  | { state: "read"; factors: FactorPoint[] }
  | { state: "unreadable"; message: string };

/** A transducer as it is typed: everything is text until it is sent. */
export interface TransducerDraft {
  id: number;
  name: string;
  kind: TransducerKind | "";
  calibratedOn: string;
  dueOn: string;
  /** The piece of equipment that this is; empty when none is named. */
  equipmentId: string;
  text: string;
  /** Hz per unit of the frequency column; empty when the table's header names it. */
  unit: string;
  table: TableState;
}

export const FREQUENCY_UNIT_OPTIONS = [
  { value: "", label: "as the header says" },
  { value: "1", label: "Hz" },
  { value: "1000", label: "kHz" },
  { value: "1000000", label: "MHz" },
  { value: "1000000000", label: "GHz" },
] as const;

export function emptyTransducer(id: number): TransducerDraft {
  return {
    id,
    name: "",
    kind: "",
    calibratedOn: "",
    dueOn: "",
    equipmentId: "",
    text: "",
    unit: "",
    table: { state: "empty" },
  };
}

/**
 * The unit a stored table is shown in: MHz as calibrations are written, unless a digit were lost on
 * the way there and back (the reader rounds a product to 15 digits).
 */
function unitOfTable(factors: readonly FactorPoint[]): number {
  const survives = ({ frequencyHz }: FactorPoint) =>
    frequencyHz >= 1e3 && Number(((frequencyHz / 1e6) * 1e6).toPrecision(15)) === frequencyHz;
  return factors.every(survives) ? 1e6 : 1;
}

/** Stored factors as the part of a draft that reads back as the same table. */
export function draftTable(
  factors: FactorPoint[],
): Pick<TransducerDraft, "text" | "unit" | "table"> {
  const unitHz = unitOfTable(factors);
  return {
    text: factors.map((f) => `${f.frequencyHz / unitHz}\t${f.factorDb}`).join("\n"),
    unit: String(unitHz),
    table: { state: "read", factors },
  };
}

/** A stored transducer as a draft. */
export function draftTransducer(id: number, transducer: Transducer): TransducerDraft {
  return {
    id,
    name: transducer.name,
    kind: transducer.kind,
    calibratedOn: transducer.calibratedOn ?? "",
    dueOn: transducer.dueOn ?? "",
    equipmentId: transducer.equipmentId ?? "",
    ...draftTable(transducer.factors),
  };
}

/** Text and unit as the command and the live reading take them. */
export function tableInput({ text, unit }: Pick<TransducerDraft, "text" | "unit">) {
  return { text, frequencyUnitHz: unit === "" ? null : Number(unit) };
}

/** What a draft sends. */
export function transducerInput(draft: TransducerDraft): unknown {
  return {
    name: draft.name,
    kind: draft.kind,
    calibratedOn: draft.calibratedOn || null,
    dueOn: draft.dueOn || null,
    equipmentId: draft.equipmentId || null,
    table: tableInput(draft),
  };
}

/** What can be drawn of the drafts: those whose tables can be read and have two rows or more. */
export function drawableTransducers(drafts: readonly TransducerDraft[]): Transducer[] {
  return drafts.flatMap(({ name, kind, table }, i) =>
    kind !== "" && table.state === "read" && table.factors.length > 1
      ? [
          {
            name: name.trim() || `Transducer ${i + 1}`,
            kind,
            factors: table.factors,
            calibratedOn: null,
            dueOn: null,
          },
        ]
      : [],
  );
}

/** The live count under a table. */
export function tableWords(table: TableState): string {
  switch (table.state) {
    case "empty":
      return "No rows yet.";
    case "reading":
      return "Reading…";
    case "unreadable":
      return "";
    case "read":
      return table.factors.length === 1
        ? "1 row; at least two are needed."
        : `${table.factors.length} rows read, ${factorSpan(table.factors)}.`;
  }
}
