import { limitAt, lineRanges } from "../mask/limit-at";
import type { MaskLine } from "../mask/mask";
import { frequencyAt, indexAtOrAfter, medianStepHz, pointCount } from "../sweep/axis";
import type { Trace } from "../sweep/trace";
import { basisOf, tightness } from "./basis";
import { coverageOf, coveredRanges, inRanges, mergeRanges } from "./coverage";
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

interface Deciding extends MarginPoint {
  basis: Basis;
}

/** Every sample of a trace under or over the line, in ascending frequency. */
function marginPoints(used: Usable, line: MaskLine): Deciding[] {
  const { axis, levelsDb } = used.trace;
  const count = Math.min(pointCount(axis), levelsDb.length);
  const points: Deciding[] = [];
  for (const range of lineRanges(line)) {
    for (let i = indexAtOrAfter(axis, range.startHz); i < count; i += 1) {
      const frequencyHz = frequencyAt(axis, i);
      if (frequencyHz > range.stopHz) break;
      const levelDb = levelsDb[i] ?? Number.NaN;
      const limitDb = limitAt(line, frequencyHz);
      if (limitDb === null || !Number.isFinite(levelDb)) continue;
      points.push({
        frequencyHz,
        levelDb,
        limitDb,
        marginDb: limitDb - levelDb,
        traceIndex: used.traceIndex,
        basis: used.basis,
      });
    }
  }
  return points;
}

/** Where tighter traces speak, so that a looser bound is not heard. */
function tighterRanges(used: Usable, all: readonly Usable[], rbwHz: number): FrequencyRange[] {
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

/**
 * The highest of bounds that are equally tight at the same frequency: two peak traces may be two
 * polarizations or heights, and the line has to hold in the worse of them.
 */
function highestBounds(bounds: readonly Deciding[]): Deciding[] {
  const byFrequency = new Map<number, Deciding>();
  for (const point of bounds) {
    const known = byFrequency.get(point.frequencyHz);
    if (!known || point.levelDb > known.levelDb) byFrequency.set(point.frequencyHz, point);
  }
  return [...byFrequency.values()].sort((a, b) => a.frequencyHz - b.frequencyHz);
}

/** One point per local maximum over the limit, equal neighbours counted once. */
function overMaxima(bounds: readonly Deciding[]): Deciding[] {
  return bounds.filter((point, i) => {
    if (point.marginDb >= 0) return false;
    const before = bounds[i - 1];
    const after = bounds[i + 1];
    const risesBefore = !before || before.marginDb > point.marginDb;
    return risesBefore && (!after || after.marginDb >= point.marginDb);
  });
}

function worstOf(points: readonly Deciding[]): Deciding | null {
  let worst: Deciding | null = null;
  for (const point of points) if (!worst || point.marginDb < worst.marginDb) worst = point;
  return worst;
}

function standingOf(
  points: readonly Deciding[],
  worst: Deciding | null,
  fraction: number,
  guardDb: number,
): { standing: Standing; explanation: string | null } {
  if (points.some((p) => p.basis === "like-for-like" && p.marginDb < 0))
    return { standing: "over", explanation: null };
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
  const own: Deciding[] = [];
  const boundsByRank = new Map<number, Deciding[]>();
  for (const used of usable) {
    const points = marginPoints(used, line);
    if (used.basis === "like-for-like") {
      for (const point of points) own.push(point);
      continue;
    }
    const silent = tighterRanges(used, usable, rbwHz);
    const kept = boundsByRank.get(used.rank) ?? [];
    for (const point of points) if (!inRanges(silent, point.frequencyHz)) kept.push(point);
    boundsByRank.set(used.rank, kept);
  }
  const bounds = [...boundsByRank.values()].flatMap(highestBounds);
  const points = own.concat(bounds);
  const worst = worstOf(points);
  const coverage = coverageOf(
    lineRanges(line),
    usable.map((used) => used.trace),
  );
  const { standing, explanation } = standingOf(points, worst, coverage.fraction, guardDb);
  const remeasure = overMaxima(bounds).map((point) => ({
    frequencyHz: point.frequencyHz,
    detector: line.detector,
    rbwHz: line.rbwHz,
    lineName: line.name,
    boundDb: point.levelDb,
    limitDb: point.limitDb,
  }));
  const { basis, ...point } = worst ?? { basis: "cannot-decide" as const };
  return {
    reading: {
      lineIndex,
      name: line.name,
      detector: line.detector,
      basis,
      standing,
      worst: worst ? (point as MarginPoint) : null,
      coverage,
      explanation,
    },
    remeasure,
  };
}
