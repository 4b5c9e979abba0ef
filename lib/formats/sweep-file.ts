import type { Detector, Hold, MeasurementSettings, TraceKind } from "@/lib/core/sweep/settings";
import type { FileUnit, LevelUnit } from "@/lib/core/units/level-units";

/**
 * What a person answered about a file. Answers for the whole file fill only what the file leaves
 * open, so that one answer can serve a batch; an answer in `traces` overrides the file.
 */
export interface SweepFileAnswers {
  unit?: FileUnit;
  detector?: Detector;
  frequencyUnitHz?: number;
  hold?: Hold;
  kind?: TraceKind;
  decimal?: "." | ",";
  traces?: TraceAnswer[];
}

export interface TraceAnswer {
  /** `column` of a TracePreview or of a LeftOutColumn. */
  column: number;
  name?: string;
  unit?: FileUnit;
  detector?: Detector;
  hold?: Hold;
  /** false leaves the column out, true takes one in that was left out. */
  use?: boolean;
}

export type QuestionField = "unit" | "detector" | "frequencyUnit" | "decimal" | "kind";

export interface SweepFileQuestion {
  field: QuestionField;
  /** `index` of the trace it is about; null: the whole file. */
  traceIndex: number | null;
  /** Value to offer: a unit, a detector, a kind or a decimal mark; Hz per unit for a frequency. */
  guess: string | null;
  why: string;
}

/** Ascending in frequency, as it would be stored. */
export interface TracePreview {
  index: number;
  column: number;
  name: string;
  kind: TraceKind;
  detector: Detector | null;
  hold: Hold;
  /** null: not stated and not answered. */
  unit: LevelUnit | null;
  points: number;
  /** Hz; in the file's own unit while that is still a question. */
  firstHz: number;
  lastHz: number;
  /** null: the frequencies are not evenly spaced. */
  stepHz: number | null;
  firstLevel: number;
  lastLevel: number;
  maxLevel: number;
  maxAtHz: number;
}

export interface LeftOutColumn {
  column: number;
  name: string;
  why: string;
}

export interface SweepFilePreview {
  outcome: "ready" | "ask" | "refused";
  /** Why it was refused, and what to do; null otherwise. */
  reason: string | null;
  line: number | null;
  questions: SweepFileQuestion[];
  encoding: string;
  /** The character itself, or "whitespace". */
  delimiter: string;
  decimal: "." | ",";
  traces: TracePreview[];
  leftOut: LeftOutColumn[];
  rbwHz: number | null;
  vbwHz: number | null;
  /** Only what the file states. */
  settings: Partial<MeasurementSettings> & { measuredOn?: string | null };
  warnings: string[];
}
