import { SortedWindow } from "../stats/sorted-window";
import { median } from "../stats/percentile";
import { medianStepHz, pointCount } from "./axis";
import type { Trace } from "./trace";

const FLOOR_PERCENT = 20;
const LEAST_POINTS = 51;
const BANDWIDTHS = 200;

/** Points of the floor's window: 200 RBW wide and never under 51 points; always odd. */
export function floorWindow(trace: Trace, rbwHz: number | null): number {
  const points = rbwHz === null ? 0 : Math.ceil((BANDWIDTHS * rbwHz) / medianStepHz(trace.axis));
  // Wider than the whole trace on both sides changes nothing.
  const widest = Math.max(LEAST_POINTS, 2 * pointCount(trace.axis) + 1);
  const wanted = Number.isFinite(points)
    ? Math.min(Math.max(LEAST_POINTS, points), widest)
    : LEAST_POINTS;
  return wanted % 2 === 1 ? wanted : wanted + 1;
}

/**
 * Running 20th percentile of level in dB, one value per point: the floor that lines stand on.
 * The window is centred and cut at the ends; gaps (NaN) do not count.
 */
export function runningFloor(levelsDb: Float32Array, window: number): Float32Array {
  const count = levelsDb.length;
  const half = window >> 1;
  const floor = new Float32Array(count);
  const sorted = new SortedWindow(Math.min(window, count) + 1);
  for (let i = 0; i < Math.min(half, count); i += 1) {
    const level = levelsDb[i] ?? Number.NaN;
    if (!Number.isNaN(level)) sorted.add(level);
  }
  for (let i = 0; i < count; i += 1) {
    const enters = levelsDb[i + half] ?? Number.NaN;
    const leaves = levelsDb[i - half - 1] ?? Number.NaN;
    const isEntering = !Number.isNaN(enters);
    const isLeaving = !Number.isNaN(leaves);
    if (isEntering && isLeaving) sorted.replace(leaves, enters);
    else if (isEntering) sorted.add(enters);
    else if (isLeaving) sorted.remove(leaves);
    floor[i] = sorted.percentile(FLOOR_PERCENT);
  }
  return floor;
}

/** Median in dB of the running floor over the whole trace; null without a single level. */
export function floorOf(trace: Trace, rbwHz: number | null): number | null {
  const levels = trace.levelsDb.subarray(0, pointCount(trace.axis));
  const middle = median(runningFloor(levels, floorWindow(trace, rbwHz)));
  return Number.isNaN(middle) ? null : middle;
}
