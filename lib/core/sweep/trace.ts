import type { LevelUnit } from "../units/level-units";
import type { Detector, Hold, TraceKind } from "./settings";

/** Frequencies of a trace in Hz, ascending, without repeats. */
export type FrequencyAxis =
  | { kind: "regular"; startHz: number; stepHz: number; count: number }
  | { kind: "listed"; frequenciesHz: Float64Array };

/**
 * One curve of a sweep. `levelsDb[i]` belongs to frequency i of the axis, in dB of `unit`.
 * NaN marks a point that is not covered (outside a factor table, or missing in the file).
 */
export interface Trace {
  name: string;
  kind: TraceKind;
  /** null: not stated and not answered; such a trace decides nothing. */
  detector: Detector | null;
  hold: Hold;
  unit: LevelUnit;
  axis: FrequencyAxis;
  levelsDb: Float32Array;
}
