import { frequencyAt, indexAtOrAfter, pointCount } from "../sweep/axis";
import type { Trace } from "../sweep/trace";

/** The ambient's level beside one suspect; dB of the reading's unit. */
export interface AmbientAtSuspect {
  /** Number of the suspect in its reading. */
  number: number;
  ambientDb: number;
}

/** Where the ambient comes nearest to one mask line. */
export interface AmbientAtLine {
  lineIndex: number;
  frequencyHz: number;
  ambientDb: number;
  /** limit minus ambient, dB. */
  marginDb: number;
}

/** The ambient's level beside the point that gives a mask line its worst margin. */
export interface AmbientAtWorst {
  lineIndex: number;
  ambientDb: number;
}

/** One ambient sweep held beside one reading. What it does not cover is left out, never 0. */
export interface AmbientCheck {
  version: 1;
  /** Why the ambient sweep cannot be held beside the reading (unit, detector, polarization …). */
  notComparable: string | null;
  /**
   * Whole sentences on what is not known to be the same (polarization not stated …). Such a check
   * counts only where no other one has a level. null: everything is known to be the same.
   */
  caveat: string | null;
  suspects: AmbientAtSuspect[];
  lines: AmbientAtLine[];
  worst: AmbientAtWorst[];
}

/** What the ambient sweeps of the day say together about one suspect; dB of the reading's unit. */
export interface SuspectAmbient {
  number: number;
  ambientDb: number;
  /** The ambient lies within 3 dB of the suspect (common practice, no source). */
  isLikelyAmbient: boolean;
  /** 10 log10(10^(T/10) − 10^(A/10)), an estimate for noise-like signals; null when A ≥ T. */
  withoutAmbientDb: number | null;
}

/**
 * Highest finite level of a trace within ± `reachHz` (max of bandwidth and step) of a frequency,
 * in dB of the trace's unit; null when it has none there, which means not known.
 */
export function ambientLevelAt(trace: Trace, hz: number, reachHz: number): number | null {
  const { axis, levelsDb } = trace;
  const count = Math.min(pointCount(axis), levelsDb.length);
  let highest: number | null = null;
  for (let i = indexAtOrAfter(axis, hz - reachHz); i < count; i += 1) {
    if (frequencyAt(axis, i) > hz + reachHz) break;
    const levelDb = levelsDb[i] ?? Number.NaN;
    if (Number.isFinite(levelDb) && (highest === null || levelDb > highest)) highest = levelDb;
  }
  return highest;
}
