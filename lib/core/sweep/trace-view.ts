import type { LevelUnit } from "../units/level-units";

/**
 * What a chart draws of a trace: one column per bucket of samples in view, ascending in
 * frequency. `hz[i]` is the true frequency of the highest sample of bucket i, so no maximum is
 * lost or moved; null levels are gaps. With `samplesPerBucket` 1 every sample is there itself.
 */
export interface TraceView {
  unit: LevelUnit;
  /** Whole extent of the trace in Hz, whatever part is in view. */
  firstHz: number;
  lastHz: number;
  /** Samples of the trace that lie in view. */
  points: number;
  samplesPerBucket: number;
  hz: number[];
  maxDb: (number | null)[];
  minDb: (number | null)[];
}
