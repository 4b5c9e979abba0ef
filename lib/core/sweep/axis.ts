import { median } from "../stats/percentile";
import type { FrequencyAxis } from "./trace";

/** Number of points on the axis. */
export function pointCount(axis: FrequencyAxis): number {
  return axis.kind === "regular" ? axis.count : axis.frequenciesHz.length;
}

/** Frequency in Hz of point i; NaN outside the axis. */
export function frequencyAt(axis: FrequencyAxis, i: number): number {
  if (i < 0 || i >= pointCount(axis)) return Number.NaN;
  return axis.kind === "regular"
    ? axis.startHz + i * axis.stepHz
    : (axis.frequenciesHz[i] ?? Number.NaN);
}

/** First frequency in Hz; NaN for an empty axis. */
export function firstHz(axis: FrequencyAxis): number {
  return frequencyAt(axis, 0);
}

/** Last frequency in Hz; NaN for an empty axis. */
export function lastHz(axis: FrequencyAxis): number {
  return frequencyAt(axis, pointCount(axis) - 1);
}

/** Index of the first point at or above a frequency; the count when there is none. */
export function indexAtOrAfter(axis: FrequencyAxis, hz: number): number {
  let low = 0;
  let high = pointCount(axis);
  while (low < high) {
    const middle = (low + high) >> 1;
    if (frequencyAt(axis, middle) < hz) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** Index of the first point above a frequency; the count when there is none. */
export function indexAfter(axis: FrequencyAxis, hz: number): number {
  let i = indexAtOrAfter(axis, hz);
  while (i < pointCount(axis) && frequencyAt(axis, i) <= hz) i += 1;
  return i;
}

/** Median spacing in Hz; NaN with fewer than two points. */
export function medianStepHz(axis: FrequencyAxis): number {
  if (axis.kind === "regular") return axis.count > 1 ? axis.stepHz : Number.NaN;
  const steps = new Float64Array(Math.max(0, axis.frequenciesHz.length - 1));
  for (let i = 0; i < steps.length; i += 1)
    steps[i] = frequencyAt(axis, i + 1) - frequencyAt(axis, i);
  return median(steps);
}

/**
 * Axis from ascending frequencies in Hz. Regular when every one lies on start + i·step within
 * what the file's own rounding (`resolutionHz`) explains and within 1 % of a step.
 */
export function makeAxis(frequenciesHz: Float64Array, resolutionHz = 0): FrequencyAxis {
  const count = frequenciesHz.length;
  const startHz = frequenciesHz[0] ?? Number.NaN;
  const stepHz = ((frequenciesHz[count - 1] ?? Number.NaN) - startHz) / (count - 1);
  if (count < 2 || !(stepHz > 0)) return { kind: "listed", frequenciesHz };
  const regular = frequenciesHz.every((hz, i) => {
    const off = Math.abs(hz - (startHz + i * stepHz));
    return off <= Math.max(resolutionHz / 2, 1e-9 * hz) && off <= stepHz / 100;
  });
  return regular ? { kind: "regular", startHz, stepHz, count } : { kind: "listed", frequenciesHz };
}
