import type { SignalPath } from "./signal-path";

/** A calibration of a piece of equipment that was not withdrawn; ISO date. */
export interface KnownCalibration {
  equipmentId: string;
  calibratedOn: string;
}

/** Why a transducer of a path no longer says what is known of its equipment. */
export interface CalibrationGap {
  /** Place in the path, from 0. */
  place: number;
  name: string;
  /** "newer": a later calibration exists. "gone": that of the path is not, or no longer, on record. */
  reason: "newer" | "gone";
  /** The newest calibration on record (ISO); null when there is none. */
  newestOn: string | null;
}

/**
 * Transducers whose equipment has a newer calibration than the path holds, or whose calibration
 * was withdrawn. Those without equipment have no record to be held against.
 */
export function calibrationGaps(
  path: SignalPath,
  known: readonly KnownCalibration[],
): CalibrationGap[] {
  return path.transducers.flatMap((transducer, place): CalibrationGap[] => {
    const { equipmentId, calibratedOn, name } = transducer;
    if (!equipmentId) return [];
    const days = known.filter((c) => c.equipmentId === equipmentId).map((c) => c.calibratedOn);
    const newestOn = days.toSorted().at(-1) ?? null;
    if (newestOn !== null && (calibratedOn === null || newestOn > calibratedOn))
      return [{ place, name, reason: "newer", newestOn }];
    if (calibratedOn !== null && !days.includes(calibratedOn))
      return [{ place, name, reason: "gone", newestOn }];
    return [];
  });
}
