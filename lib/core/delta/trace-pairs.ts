import type { Detector } from "../sweep/settings";
import { DETECTORS, HOLDS, TRACE_KINDS } from "../sweep/settings";
import { formatFrequency } from "../units/format";
import { LEVEL_UNIT_LABELS } from "../units/level-units";
import type { ComparedSweep, ComparedTrace } from "./compared-sweep";
import type { Mismatch, MismatchField } from "./delta";

/** Two traces of one detector and kind, by their places in their sweeps. */
export interface TracePair {
  detector: Detector;
  beforeIndex: number;
  afterIndex: number;
  before: ComparedTrace;
  after: ComparedTrace;
  /** What keeps these two from being compared: their unit, their span. */
  flaws: Mismatch[];
}

function flawsOf(a: ComparedTrace, b: ComparedTrace, rbwHz: number): Mismatch[] {
  const found: Mismatch[] = [];
  if (a.unit !== b.unit)
    found.push({
      field: "unit",
      text: `The unit differs: ${LEVEL_UNIT_LABELS[a.unit]} before, ${LEVEL_UNIT_LABELS[b.unit]} after.`,
    });
  // Between spots there is no step: their ends are the same when they lie in one bandwidth.
  const reach = a.kind === "spots" ? rbwHz : Math.max(a.stepHz ?? 0, b.stepHz ?? 0) / 2;
  const off = (x: number, y: number) => Math.abs(x - y) > Math.max(reach, 1e-9 * Math.max(x, y));
  if (off(a.firstHz, b.firstHz) || off(a.lastHz, b.lastHz))
    found.push({
      field: "span",
      text: `The span differs: ${formatFrequency(a.firstHz)} to ${formatFrequency(a.lastHz)} before, ${formatFrequency(b.firstHz)} to ${formatFrequency(b.lastHz)} after.`,
    });
  return found;
}

interface Placed {
  index: number;
  trace: ComparedTrace;
}

/** Traces with their equals, those of one hold first and then what is left, in their order. */
function match(before: Placed[], after: Placed[]): [Placed, Placed][] {
  const pairs: [Placed, Placed][] = [];
  for (const hold of HOLDS) {
    const [a, b] = [before, after].map((side) => side.filter((p) => p.trace.hold === hold));
    a?.forEach((placed, i) => {
      const other = b?.[i];
      if (other) pairs.push([placed, other]);
    });
  }
  const left = (side: Placed[], k: 0 | 1) => side.filter((p) => !pairs.some((x) => x[k] === p));
  const rest = left(after, 1);
  left(before, 0).forEach((placed, i) => {
    const other = rest[i];
    if (other) pairs.push([placed, other]);
  });
  return pairs;
}

/**
 * Every trace of one sweep with the one of the same detector and kind in the other: scans before
 * spots, then by detector. The same pairs come out when the two sweeps are exchanged.
 */
export function pairTraces(before: ComparedSweep, after: ComparedSweep): TracePair[] {
  const rbwHz = Math.max(before.settings.rbwHz ?? 0, after.settings.rbwHz ?? 0);
  return TRACE_KINDS.flatMap((kind) =>
    DETECTORS.flatMap((detector) => {
      const own = (sweep: ComparedSweep) =>
        sweep.traces
          .map((trace, index) => ({ trace, index }))
          .filter(({ trace }) => trace.kind === kind && trace.detector === detector);
      return match(own(before), own(after)).map(([a, b]) => ({
        detector,
        beforeIndex: a.index,
        afterIndex: b.index,
        before: a.trace,
        after: b.trace,
        flaws: flawsOf(a.trace, b.trace, rbwHz),
      }));
    }),
  );
}

/** Pairs without a flaw, or with none that was not accepted. */
export function soundPairs(
  pairs: readonly TracePair[],
  accepted: readonly MismatchField[] = [],
): TracePair[] {
  return pairs.filter((pair) => pair.flaws.every(({ field }) => accepted.includes(field)));
}
