import type { Detector } from "../sweep/settings";
import type { LevelUnit } from "../units/level-units";

/** One line of a known source (a comb) as a check measured it; Hz, dB of the check's unit. */
export interface CheckLine {
  frequencyHz: number;
  levelDb: number;
  /** Level of the same line in the reference; null in the reference itself or where it has none. */
  referenceDb: number | null;
  /** Check minus reference in dB; null without a counterpart. */
  driftDb: number | null;
}

/** What one bench check found. */
export interface BenchCheckContent {
  version: 1;
  unit: LevelUnit;
  detector: Detector | null;
  rbwHz: number | null;
  lines: CheckLine[];
  /** Lines of the reference that this check did not find, Hz. */
  missingHz: number[];
}
