import type { ComparedSweep } from "./compared-sweep";
import { findMismatches } from "./find-mismatches";
import { pairTraces } from "./trace-pairs";

/** What is not stated may differ: two polarizations or two conductors are no repeats. */
function isPlaceStated({ settings }: ComparedSweep): boolean {
  const isField = settings.port === "radiated" || settings.port === "near-field";
  return isField ? settings.polarization !== null : Boolean(settings.conductor?.trim());
}

/**
 * Whether two sweeps of one step are repeats of each other: nothing forbids comparing them, and
 * they have the same traces (detector, kind, hold, unit, span) in the same order.
 */
function isRepeat(a: ComparedSweep, b: ComparedSweep): boolean {
  if (!isPlaceStated(a) || a.traces.length !== b.traces.length || findMismatches(a, b).length > 0)
    return false;
  const pairs = pairTraces(a, b);
  return (
    pairs.length === a.traces.filter((trace) => trace.detector !== null).length &&
    pairs.every(
      (pair) =>
        pair.beforeIndex === pair.afterIndex &&
        pair.before.hold === pair.after.hold &&
        pair.flaws.length === 0,
    )
  );
}

/** Sweeps of one step with those that repeat them, in their order; a group is never empty. */
export function groupRepeats(
  sweeps: readonly ComparedSweep[],
): [ComparedSweep, ...ComparedSweep[]][] {
  const groups: [ComparedSweep, ...ComparedSweep[]][] = [];
  for (const sweep of sweeps) {
    const group = groups.find(([first]) => isRepeat(first, sweep));
    if (group) group.push(sweep);
    else groups.push([sweep]);
  }
  return groups;
}
