import type { ComparedSweep } from "./compared-sweep";
import { spanOf } from "./compared-sweep";
import { groupRepeats } from "./repeats";
import { pairTraces } from "./trace-pairs";

/** One sweep, or several that repeat each other, by the time of their import. */
export type Repeats = readonly [ComparedSweep, ...ComparedSweep[]];

export interface SweepPair {
  before: Repeats;
  after: Repeats;
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
    (s.conductor ?? null) === (t.conductor ?? null),
    s.heightM === t.heightM,
    s.azimuthDeg === t.azimuthDeg,
    pairTraces(a, b).length > 0,
    a.benchId === b.benchId,
  ];
  return same.filter(Boolean).length + overlap(a, b);
}

/**
 * Finds for the sweeps of a step their counterparts in an earlier step, repeats taken together:
 * same purpose, overlapping span, then the same port, polarization, position, detector and bench.
 * Of equals the later one in the list counts. What still differs is for `compareSides` to say.
 */
export function pairSweeps(
  before: readonly ComparedSweep[],
  after: readonly ComparedSweep[],
): SweepPair[] {
  const candidates = groupRepeats(before);
  return groupRepeats(after).flatMap((group) => {
    const [sweep] = group;
    let best: { fit: number; group: Repeats } | null = null;
    for (const candidate of candidates) {
      const [first] = candidate;
      if (first.purpose !== sweep.purpose || overlap(first, sweep) === 0) continue;
      const value = fit(first, sweep);
      if (!best || value >= best.fit) best = { fit: value, group: candidate };
    }
    return best ? [{ before: best.group, after: group }] : [];
  });
}
