import type { Detector, Hold } from "../sweep/settings";
import type { LevelUnit } from "../units/level-units";

/** One line of a known source (a comb) as a check measured it; Hz, dB of the check's unit. */
export interface CheckLine {
  /** Of the sample; for a line that the reference has too, the reference's. */
  frequencyHz: number;
  levelDb: number;
  /** Level of the same line in the reference; null in the reference itself or where it has none. */
  referenceDb: number | null;
  /** Check minus reference in dB; null without a counterpart. */
  driftDb: number | null;
  /**
   * Whether a line stands out there in this check. Where it does not, the level is that of the
   * floor or of something that hides the line: the drift is then a bound, not a value.
   */
  standsOut: boolean;
}

/** What one bench check found. */
export interface BenchCheckContent {
  version: 1;
  unit: LevelUnit;
  detector: Detector | null;
  hold: Hold;
  rbwHz: number | null;
  /** Median spacing of the sweep. */
  stepHz: number;
  /** The instrument applied the factors itself. */
  corrected: boolean;
  /** Ascending in frequency. */
  lines: CheckLine[];
  /** Lines of the reference where this check has no level at all, Hz, ascending. */
  missingHz: number[];
}
