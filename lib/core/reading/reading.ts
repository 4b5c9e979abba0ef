import type { Detector } from "../sweep/settings";
import type { LevelUnit } from "../units/level-units";

export const STANDINGS = ["clear", "inside-guard", "over", "undecided"] as const;
export type Standing = (typeof STANDINGS)[number];

export const STANDING_LABELS: Record<Standing, string> = {
  clear: "clear",
  "inside-guard": "inside guard",
  over: "over",
  undecided: "undecided",
};

export const BASES = ["like-for-like", "upper-bound", "cannot-decide"] as const;
export type Basis = (typeof BASES)[number];

export const DOUBT_CODES = [
  "rbw-differs",
  "rbw-unstated",
  "rbw-kind-differs",
  "step-coarse",
  "not-covered",
  "polarization-missing",
  "calibration-overdue",
  "calibration-unchecked",
  "ambient-not-taken",
  "ambient-near",
  "ambient-not-comparable",
  "sweep-time-short",
  "sweep-time-unchecked",
  "distance-restated",
  "near-field",
  "overload-suspected",
  "overload-unchecked",
  "bench-check-drifted",
  "mask-from-memory",
  "plane-wave-assumed",
] as const;
export type DoubtCode = (typeof DOUBT_CODES)[number];

/** Doubts that say that something could not be checked, because the sweep does not state it. */
export const UNCHECKED_DOUBTS: ReadonlySet<DoubtCode> = new Set([
  "rbw-unstated",
  "calibration-unchecked",
  "sweep-time-unchecked",
  "overload-unchecked",
]);

/** Something that weakens a reading. `text` is a whole sentence with its number and the remedy. */
export interface Doubt {
  code: DoubtCode;
  text: string;
  valueDb: number | null;
  /** Which of the sweeps held together have it; left out when all do, or there is only one. */
  partIndexes?: number[];
}

export interface FrequencyRange {
  startHz: number;
  stopHz: number;
}

/** Part of a mask line that was swept; `fraction` (0…1) counts log frequency. */
export interface Coverage {
  fraction: number;
  gaps: FrequencyRange[];
}

export interface MarginPoint {
  frequencyHz: number;
  levelDb: number;
  limitDb: number;
  /** limit minus level, dB; positive lies under the mask. */
  marginDb: number;
  traceIndex: number;
  /** Which of the sweeps held together gave the level; 0 for a sweep held alone. */
  partIndex: number;
}

/** A stretch of a line between two of its frequencies where the limit changes. */
export interface BandReading {
  startHz: number;
  stopHz: number;
  worst: MarginPoint | null;
  basis: Basis;
  /** Share of the band that was swept, 0…1 in log frequency. */
  coverage: number;
}

export interface LineReading {
  lineIndex: number;
  name: string;
  detector: Detector;
  /** How the worst point was decided. */
  basis: Basis;
  standing: Standing;
  worst: MarginPoint | null;
  coverage: Coverage;
  /** Ascending; the line's worst is the worst of them. */
  bands: BandReading[];
  /** Whole sentence when the standing needs explaining, otherwise null. */
  explanation: string | null;
}

export interface Suspect {
  number: number;
  /** Interpolated by a parabola through three points in dB. */
  frequencyHz: number;
  /** The highest sample itself; margin and limit are taken there. */
  sampleHz: number;
  levelDb: number;
  limitDb: number | null;
  marginDb: number | null;
  prominenceDb: number;
  lineName: string | null;
  basis: Basis;
  traceIndex: number;
  partIndex: number;
}

/** What has to be measured again with the line's own detector before it can be decided. */
export interface RemeasurePoint {
  frequencyHz: number;
  detector: Detector;
  rbwHz: number | null;
  lineName: string;
  boundDb: number;
  limitDb: number;
  /** The trace and the sweep whose bound lies over the line: measure in its position. */
  traceIndex: number;
  partIndex: number;
}

/** A sweep held against one mask revision. */
export interface Reading {
  engineVersion: number;
  unit: LevelUnit;
  guardDb: number;
  standing: Standing;
  /** Index into `lines` of the line that gives the standing; null when no line exists. */
  worstLineIndex: number | null;
  lines: LineReading[];
  /** Lowest coverage over the lines. */
  coverage: Coverage;
  suspects: Suspect[];
  remeasure: RemeasurePoint[];
  /** Points left out of `remeasure` because there are too many to measure one by one. */
  remeasureOmitted: number;
  doubts: Doubt[];
  /** Why the sweep cannot be held against this mask at all (unit, distance); else null. */
  notComparable: string | null;
}
