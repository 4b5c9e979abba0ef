import { EDGE_TOLERANCE, limitAt, lineRanges } from "../mask/limit-at";
import type { MaskLine } from "../mask/mask";
import { frequencyAt, indexAtOrAfter, pointCount } from "../sweep/axis";
import type { Trace } from "../sweep/trace";
import type { MarginPoint } from "./reading";

/**
 * Samples held against one line, in ascending frequency: frequencies in Hz, levels and limits in
 * dB. Held column by column, since a sweep has more points than a program should make objects.
 */
export interface MarginPoints {
  frequenciesHz: Float64Array;
  levelsDb: Float32Array;
  limitsDb: Float64Array;
  traceIndexes: Uint32Array;
}

function makePoints(room: number): MarginPoints {
  return {
    frequenciesHz: new Float64Array(room),
    levelsDb: new Float32Array(room),
    limitsDb: new Float64Array(room),
    traceIndexes: new Uint32Array(room),
  };
}

function firstPoints(points: MarginPoints, count: number): MarginPoints {
  return {
    frequenciesHz: points.frequenciesHz.subarray(0, count),
    levelsDb: points.levelsDb.subarray(0, count),
    limitsDb: points.limitsDb.subarray(0, count),
    traceIndexes: points.traceIndexes.subarray(0, count),
  };
}

function copyPoint(from: MarginPoints, i: number, to: MarginPoints, k: number): void {
  to.frequenciesHz[k] = from.frequenciesHz[i] ?? Number.NaN;
  to.levelsDb[k] = from.levelsDb[i] ?? Number.NaN;
  to.limitsDb[k] = from.limitsDb[i] ?? Number.NaN;
  to.traceIndexes[k] = from.traceIndexes[i] ?? 0;
}

/** Limit minus level in dB; NaN outside the points. */
export function marginAt(points: MarginPoints, i: number): number {
  return (points.limitsDb[i] ?? Number.NaN) - (points.levelsDb[i] ?? Number.NaN);
}

/** Every sample of a trace under or over the line for which `isHeard` says yes. */
export function holdAgainst(
  trace: Trace,
  traceIndex: number,
  line: MaskLine,
  isHeard: (frequencyHz: number) => boolean,
): MarginPoints {
  const { axis, levelsDb } = trace;
  const count = Math.min(pointCount(axis), levelsDb.length);
  const ranges = lineRanges(line).map((range) => {
    const stopHz = range.stopHz * (1 + EDGE_TOLERANCE);
    return {
      from: indexAtOrAfter(axis, range.startHz * (1 - EDGE_TOLERANCE)),
      stopHz,
      // One more than what lies below the end, for a sample right at it.
      to: Math.min(count, indexAtOrAfter(axis, stopHz) + 1),
    };
  });
  const points = makePoints(ranges.reduce((sum, r) => sum + Math.max(0, r.to - r.from), 0));
  let found = 0;
  for (const { from, to, stopHz } of ranges) {
    for (let i = from; i < to; i += 1) {
      const frequencyHz = frequencyAt(axis, i);
      if (frequencyHz > stopHz) break;
      const levelDb = levelsDb[i] ?? Number.NaN;
      if (!Number.isFinite(levelDb)) continue;
      const limitDb = limitAt(line, frequencyHz);
      if (limitDb === null || !isHeard(frequencyHz)) continue;
      points.frequenciesHz[found] = frequencyHz;
      points.levelsDb[found] = levelDb;
      points.limitsDb[found] = limitDb;
      points.traceIndexes[found] = traceIndex;
      found += 1;
    }
  }
  return firstPoints(points, found);
}

/** Both in ascending frequency; where they meet, the higher level, and the first when equal. */
export function mergeHighest(first: MarginPoints, second: MarginPoints): MarginPoints {
  const [a, b] = [first.frequenciesHz, second.frequenciesHz];
  const merged = makePoints(a.length + b.length);
  let [i, k, count] = [0, 0, 0];
  for (; i < a.length || k < b.length; count += 1) {
    const hzA = a[i] ?? Number.POSITIVE_INFINITY;
    const hzB = b[k] ?? Number.POSITIVE_INFINITY;
    const isSecond =
      hzB < hzA ||
      (hzB === hzA && (second.levelsDb[k] ?? Number.NaN) > (first.levelsDb[i] ?? Number.NaN));
    if (isSecond) copyPoint(second, k, merged, count);
    else copyPoint(first, i, merged, count);
    if (hzA <= hzB) i += 1;
    if (hzB <= hzA) k += 1;
  }
  return firstPoints(merged, count);
}

/** The points of all, one after the other. */
export function joinPoints(parts: readonly MarginPoints[]): MarginPoints {
  const [only] = parts;
  if (parts.length === 1 && only) return only;
  const joined = makePoints(parts.reduce((sum, part) => sum + part.levelsDb.length, 0));
  let at = 0;
  for (const part of parts) {
    joined.frequenciesHz.set(part.frequenciesHz, at);
    joined.levelsDb.set(part.levelsDb, at);
    joined.limitsDb.set(part.limitsDb, at);
    joined.traceIndexes.set(part.traceIndexes, at);
    at += part.levelsDb.length;
  }
  return joined;
}

/** The first of the points with the lowest margin; null when there are none. */
export function lowestPoint(points: MarginPoints): MarginPoint | null {
  let lowest = -1;
  let lowestDb = Number.POSITIVE_INFINITY;
  for (let i = 0; i < points.levelsDb.length; i += 1) {
    const marginDb = marginAt(points, i);
    if (lowest >= 0 && !(marginDb < lowestDb)) continue;
    lowest = i;
    lowestDb = marginDb;
  }
  if (lowest < 0) return null;
  return {
    frequencyHz: points.frequenciesHz[lowest] ?? Number.NaN,
    levelDb: points.levelsDb[lowest] ?? Number.NaN,
    limitDb: points.limitsDb[lowest] ?? Number.NaN,
    marginDb: lowestDb,
    traceIndex: points.traceIndexes[lowest] ?? 0,
    partIndex: 0,
  };
}

/** Places of the local maxima over the limit, equal neighbours counted once. */
export function overMaxima(points: MarginPoints): number[] {
  const maxima: number[] = [];
  const count = points.levelsDb.length;
  for (let i = 0; i < count; i += 1) {
    const marginDb = marginAt(points, i);
    if (!(marginDb < 0)) continue;
    const risesBefore = i === 0 || marginAt(points, i - 1) > marginDb;
    if (risesBefore && (i + 1 === count || marginAt(points, i + 1) >= marginDb)) maxima.push(i);
  }
  return maxima;
}
