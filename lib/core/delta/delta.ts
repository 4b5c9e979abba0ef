import type { FrequencyRange, Standing } from "../reading/reading";
import type { Detector } from "../sweep/settings";

/** What two sweeps may differ in so that they are not comparable. */
export const MISMATCH_FIELDS = [
  "bench",
  "signal-path",
  "distance",
  "rbw",
  "rbw-kind",
  "detector",
  "unit",
  "span",
  "purpose",
  "polarization",
  "conductor",
  "position",
  "port",
] as const;
export type MismatchField = (typeof MISMATCH_FIELDS)[number];

/** Why two sweeps may not be compared. `text` is a whole sentence with both values. */
export interface Mismatch {
  field: MismatchField;
  text: string;
}

/** An engineer's written reason for comparing all the same. Only `fields` are accepted by it. */
export interface Acceptance {
  id: string;
  fields: MismatchField[];
  reason: string;
  /** Name of the member who accepted. */
  by: string;
  /** ISO time. */
  at: string;
}

/** A change in dB, after minus before, with what the repeats say about it. */
export interface MeasuredChange {
  changeDb: number | null;
  /**
   * Half of the 95 % interval from the repeats, dB; null when a side was swept only once: then
   * nothing is known, and nothing is assumed.
   */
  uncertaintyDb: number | null;
  /** How many sweeps of each side have the value. */
  repeats: { before: number; after: number };
  /** Whether the change is no larger than its uncertainty; null when that is not known. */
  isWithinRepeatability: boolean | null;
}

/**
 * A margin before and after; of repeats, that of the power mean. A positive `changeDb` means more
 * room under the mask.
 */
interface MarginPair extends MeasuredChange {
  beforeDb: number | null;
  afterDb: number | null;
  /** Why there is no change although both have a margin; a whole sentence. */
  note: string | null;
}

/** A band of a mask line: a stretch between two frequencies where the limit changes. */
export interface BandChange extends MarginPair, FrequencyRange {}

export interface MarginChange extends MarginPair {
  maskRevisionId: string;
  maskTitle: string;
  lineName: string;
  beforeStanding: Standing;
  afterStanding: Standing;
  /** Ascending; empty for readings that were made without bands. */
  bands: BandChange[];
}

/** The traces of one detector on both sides. */
export interface DetectorChange {
  detector: Detector;
  /** Highest level. */
  peak: MeasuredChange;
  floor: MeasuredChange;
  bandPower: MeasuredChange;
  /** Band power of a peak trace is a comparative sum, not power. */
  bandPowerIsPower: boolean;
}

/** A suspect of either side, looked for in one window of both. */
export interface SuspectChange extends MeasuredChange {
  detector: Detector;
  /** Where it was a suspect. */
  frequencyHz: number;
  window: FrequencyRange;
  /** Highest level in the window; of repeats the power mean. Null: no level in the window. */
  beforeDb: number | null;
  afterDb: number | null;
  beforeAtHz: number | null;
  afterAtHz: number | null;
}

export interface SuspectChanges {
  /** Suspects on both sides. */
  followed: SuspectChange[];
  /** No suspect in the window before. */
  fresh: SuspectChange[];
  /** No suspect in the window after. */
  gone: SuspectChange[];
}

export interface DeltaChanges {
  /** Detector of the traces that the sentence, peak, floor and band power were taken from. */
  detector: Detector;
  margins: MarginChange[];
  /** The same as `levels[0].peak.changeDb`, and so on. */
  peakDb: number | null;
  floorDb: number | null;
  bandPowerDb: number | null;
  bandPowerIsPower: boolean;
  /** One entry for each detector that both sides have, that of `detector` first. */
  levels: DetectorChange[];
  suspects: SuspectChanges;
  /** What happened, in words. */
  sentence: string;
  /** A whole sentence: how often each side was swept, and whether a ± is known. */
  repeatability: string;
}

/** What changed between two sides, each one sweep or several repeats; dB, after minus before. */
export interface SweepDelta {
  /** Name of the newest sweep of each side. */
  beforeName: string;
  afterName: string;
  /** All that forbids the delta, listed even when an engineer accepted it. */
  mismatches: Mismatch[];
  /** Set only while every mismatch is among its fields; `changes` is then given. */
  accepted: Acceptance | null;
  /** Differences that weaken the delta without forbidding it (attenuation, VBW, sweep time …). */
  doubts: string[];
  /** null when there are mismatches that nobody accepted. */
  changes: DeltaChanges | null;
}

/** A delta with the sweeps of its two sides: one, or repeats by the time of their import. */
export interface SidedDelta extends SweepDelta {
  beforeIds: string[];
  afterIds: string[];
}
