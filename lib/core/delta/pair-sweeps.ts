import type { ComparedSweep } from "./compared-sweep";
import { spanOf } from "./compared-sweep";
import { sharedTraces } from "./find-mismatches";

export interface SweepPair {
  before: ComparedSweep;
  after: ComparedSweep;
}

/** Overlap of the spans on a log axis as a share of the wider one, 0…1. */
function overlap(a: ComparedSweep, b: ComparedSweep): number {
  const [x, y] = [spanOf(a), spanOf(b)];
  const width = (from: number, to: number) => Math.max(0, Math.log(to / from));
  const wider = Math.max(width(x.fromHz, x.toHz), width(y.fromHz, y.toHz));
  const common = width(Math.max(x.fromHz, y.fromHz), Math.min(x.toHz, y.toHz));
  return wider > 0 ? common / wider : 0;
}

/** How well two sweeps fit each other: what was measured first, then how. */
function fit(a: ComparedSweep, b: ComparedSweep): number {
  const [s, t] = [a.settings, b.settings];
  const same = [
    s.port === t.port,
    s.polarization === t.polarization,
    s.heightM === t.heightM,
    s.azimuthDeg === t.azimuthDeg,
    sharedTraces(a, b) !== null,
    a.benchId === b.benchId,
  ];
  return same.filter(Boolean).length + overlap(a, b);
}

/**
 * Finds for each sweep of a step its counterpart in an earlier step: same purpose, overlapping
 * span, then the same port, polarization, position, detector and bench. Of equals the later one
 * in the list counts. What still differs is for `compareSweeps` to say.
 */
export function pairSweeps(
  before: readonly ComparedSweep[],
  after: readonly ComparedSweep[],
): SweepPair[] {
  return after.flatMap((sweep) => {
    let best: { fit: number; sweep: ComparedSweep } | null = null;
    for (const candidate of before) {
      if (candidate.purpose !== sweep.purpose || overlap(candidate, sweep) === 0) continue;
      const value = fit(candidate, sweep);
      if (!best || value >= best.fit) best = { fit: value, sweep: candidate };
    }
    return best ? [{ before: best.sweep, after: sweep }] : [];
  });
}
