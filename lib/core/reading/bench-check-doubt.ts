import { formatDelta } from "../units/format";
import type { Doubt } from "./reading";

/** The bench check that stands for a sweep's bench and day; dB. */
export interface DayCheck {
  source: string;
  /** Largest drift against the reference, with its sign. */
  driftWorstDb: number;
  /** What the bench allows, either way. */
  toleranceDb: number;
  /** Lines of the reference where the check found none. */
  missing: number;
}

/** The doubt of a sweep whose bench was off on that day; none without a check or within tolerance. */
export function benchCheckDoubt(check: DayCheck | null): Doubt[] {
  if (!check) return [];
  const { source, driftWorstDb, toleranceDb, missing } = check;
  const parts: string[] = [];
  if (Math.abs(driftWorstDb) > toleranceDb)
    parts.push(
      `read ${formatDelta(driftWorstDb)} off its reference at worst, and the bench allows ${toleranceDb.toFixed(1)} dB`,
    );
  if (missing > 0)
    parts.push(
      missing === 1
        ? "did not find one line of its reference"
        : `did not find ${missing} lines of its reference`,
    );
  if (parts.length === 0) return [];
  const text = `The bench check of the day with "${source}" ${parts.join(" and ")}: find out what moved on the bench, check it again and repeat the sweep.`;
  return [{ code: "bench-check-drifted", text, valueDb: driftWorstDb }];
}
