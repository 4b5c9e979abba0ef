import { lineRanges } from "../mask/limit-at";
import type { MaskLine } from "../mask/mask";
import { frequencyAt, medianStepHz, pointCount } from "../sweep/axis";
import type { Trace } from "../sweep/trace";
import { basisOf, tightness } from "./basis";
import { coverageOf, coveredRanges, inRanges, mergeRanges } from "./coverage";
import {
  holdAgainst,
  joinPoints,
  lowestPoint,
  mergeHighest,
  overMaxima,
  type MarginPoints,
} from "./margin-points";
import type {
  Basis,
  FrequencyRange,
  LineReading,
  MarginPoint,
  RemeasurePoint,
  Standing,
} from "./reading";

interface Usable {
  trace: Trace;
  traceIndex: number;
  basis: Basis;
  rank: number;
}

/** Where tighter traces speak, so that a looser bound is not heard. */
function tighterRanges(
  used: Pick<Usable, "trace" | "rank">,
  all: readonly Usable[],
  rbwHz: number,
): FrequencyRange[] {
  const step = medianStepHz(used.trace.axis);
  const reach = Math.max(rbwHz, Number.isFinite(step) ? step : 0);
  return mergeRanges(
    all
      .filter((other) => other.rank > used.rank)
      .flatMap(({ trace }) => {
        if (trace.kind === "scan") return coveredRanges(trace);
        return Array.from({ length: pointCount(trace.axis) }, (_, i) => i)
          .filter((i) => Number.isFinite(trace.levelsDb[i]))
          .map((i) => frequencyAt(trace.axis, i))
          .map((hz) => ({ startHz: hz - reach, stopHz: hz + reach }));
      }),
  );
}

function standingOf(
  worstOwn: MarginPoint | null,
  worst: MarginPoint | null,
  fraction: number,
  guardDb: number,
): { standing: Standing; explanation: string | null } {
  if (worstOwn && worstOwn.marginDb < 0) return { standing: "over", explanation: null };
  if (!worst)
    return {
      standing: "undecided",
      explanation: "No trace with a detector that can decide this line has a point on it.",
    };
  if (worst.marginDb < 0)
    return {
      standing: "undecided",
      explanation:
        "A looser detector reads over this line: measure these suspects with the line's own detector.",
    };
  const inside = worst.marginDb < guardDb;
  if (fraction < 1) {
    // Floored, so that a mask which is not fully covered never reads 100 %.
    const percent = Math.min(99, Math.floor(fraction * 100));
    const text = `${inside ? "Inside guard" : "Clear"} on ${percent} % of the mask; the rest was not swept.`;
    return { standing: "undecided", explanation: text };
  }
  return { standing: inside ? "inside-guard" : "clear", explanation: null };
}

/**
 * Holds traces, already in the mask's unit, against one line. Levels, limits and guard in dB;
 * `rbwHz` is the sweep's, 0 when not stated.
 */
export function readLine(
  line: MaskLine,
  lineIndex: number,
  traces: readonly Trace[],
  rbwHz: number,
  guardDb: number,
): { reading: LineReading; remeasure: RemeasurePoint[] } {
  const usable = traces
    .map((trace, traceIndex): Usable => {
      const basis = basisOf(trace, line.detector);
      return { trace, traceIndex, basis, rank: tightness(trace.detector) };
    })
    .filter((used) => used.basis !== "cannot-decide");
  const own: MarginPoints[] = [];
  const boundsByRank = new Map<number, MarginPoints>();
  for (const { trace, traceIndex, basis, rank } of usable) {
    if (basis === "like-for-like") {
      own.push(holdAgainst(trace, traceIndex, line, () => true));
      continue;
    }
    const silent = tighterRanges({ trace, rank }, usable, rbwHz);
    const isHeard = (hz: number) => !inRanges(silent, hz);
    const points = holdAgainst(trace, traceIndex, line, isHeard);
    const known = boundsByRank.get(rank);
    // The highest of bounds that are equally tight: two peak traces may be two polarizations or
    // heights, and the line has to hold in the worse of them.
    boundsByRank.set(rank, known ? mergeHighest(known, points) : points);
  }
  const bounds = joinPoints([...boundsByRank.values()]);
  const worstOwn = lowestPoint(joinPoints(own));
  const worstBound = lowestPoint(bounds);
  // What is over by the line's own detector is known by that margin, not by a bound elsewhere.
  const isBound =
    worstBound !== null &&
    !(worstOwn && (worstOwn.marginDb < 0 || worstOwn.marginDb <= worstBound.marginDb));
  const worst = isBound ? worstBound : worstOwn;
  const basis: Basis = isBound ? "upper-bound" : "like-for-like";
  const coverage = coverageOf(
    lineRanges(line),
    usable.map((used) => used.trace),
  );
  const { standing, explanation } = standingOf(worstOwn, worst, coverage.fraction, guardDb);
  const remeasure = overMaxima(bounds).map((i) => ({
    frequencyHz: bounds.frequenciesHz[i] ?? Number.NaN,
    detector: line.detector,
    rbwHz: line.rbwHz,
    lineName: line.name,
    boundDb: bounds.levelsDb[i] ?? Number.NaN,
    limitDb: bounds.limitsDb[i] ?? Number.NaN,
    traceIndex: bounds.traceIndexes[i] ?? 0,
    partIndex: 0,
  }));
  return {
    reading: {
      lineIndex,
      name: line.name,
      detector: line.detector,
      basis: worst ? basis : "cannot-decide",
      standing,
      worst,
      coverage,
      bands: [],
      explanation,
    },
    remeasure,
  };
}
