import type { Doubt, DoubtCode } from "@/lib/core/reading/reading";
import { UNCHECKED_DOUBTS } from "@/lib/core/reading/reading";
import { DOUBT_NAMES } from "./doubt-names";
import type { ReportContent } from "./report-content";

/** All doubts of one kind over the masks of a report. */
export interface DoubtSummary {
  code: DoubtCode;
  name: string;
  /** "up to 9.2 dB", "1.2 dB", or null without a number. */
  size: string | null;
  /** The sentence of the largest. */
  text: string;
  /** Different sentences of this kind. */
  count: number;
}

/** What can move a standing comes before what only blurs it. */
const IMPORTANT_FIRST: readonly DoubtCode[] = [
  "not-covered",
  "overload-suspected",
  "bench-check-drifted",
  "calibration-overdue",
  "rbw-differs",
  "mask-from-memory",
  "polarization-missing",
  "near-field",
  "plane-wave-assumed",
  "distance-restated",
  "step-coarse",
  "ambient-near",
  "ambient-not-taken",
  "ambient-not-comparable",
  "rbw-kind-differs",
  "sweep-time-short",
];

const sizeOf = ({ valueDb }: Doubt) => Math.abs(valueDb ?? 0);

function summarize(code: DoubtCode, doubts: readonly Doubt[]): DoubtSummary | null {
  const own = doubts.filter((doubt) => doubt.code === code);
  const once = [...new Map(own.map((doubt) => [doubt.text, doubt])).values()];
  const [largest] = once.sort((a, b) => sizeOf(b) - sizeOf(a));
  if (!largest) return null;
  const numbered = once.filter(({ valueDb }) => valueDb !== null).length;
  const size = `${numbered > 1 ? "up to " : ""}${sizeOf(largest).toFixed(1)} dB`;
  return {
    code,
    name: DOUBT_NAMES[code],
    size: numbered > 0 ? size : null,
    text: largest.text,
    count: once.length,
  };
}

/** Doubts that weaken a reading and doubts that something could not be checked. */
export function partDoubts<T extends { code: DoubtCode }>(
  doubts: readonly T[],
): { weakening: T[]; unchecked: T[] } {
  return {
    weakening: doubts.filter(({ code }) => !UNCHECKED_DOUBTS.has(code)),
    unchecked: doubts.filter(({ code }) => UNCHECKED_DOUBTS.has(code)),
  };
}

/** The doubts of a report kind by kind, the most important first, in the two groups. */
export function summarizeDoubts(content: Pick<ReportContent, "combined">): {
  weakening: DoubtSummary[];
  unchecked: DoubtSummary[];
} {
  const all = content.combined.flatMap(({ reading }) => reading.doubts);
  const codes = [...new Set(all.map(({ code }) => code))];
  const rank = (code: DoubtCode) => (IMPORTANT_FIRST.indexOf(code) + 1 || 99) - 1;
  return partDoubts(
    codes
      .sort((a, b) => rank(a) - rank(b))
      .map((code) => summarize(code, all))
      .filter((one) => one !== null),
  );
}
