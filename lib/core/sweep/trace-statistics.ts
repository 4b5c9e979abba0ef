import { firstHz, frequencyAt, lastHz, medianStepHz, pointCount } from "./axis";
import { powerSumDb } from "./band-power";
import { floorOf } from "./floor";
import type { Trace } from "./trace";

/** What a trace is known by without reading its levels. Frequencies in Hz, levels in its unit. */
export interface TraceStatistics {
  firstHz: number;
  lastHz: number;
  /** Median spacing; null with fewer than two points. */
  stepHz: number | null;
  /** Points that have a level. */
  covered: number;
  maxDb: number | null;
  maxAtHz: number | null;
  floorDb: number | null;
  powerSumDb: number | null;
}

export function traceStatistics(trace: Trace, rbwHz: number | null): TraceStatistics {
  const count = Math.min(pointCount(trace.axis), trace.levelsDb.length);
  let covered = 0;
  let highest = -1;
  let max = Number.NEGATIVE_INFINITY;
  for (let i = 0; i < count; i += 1) {
    const level = trace.levelsDb[i] ?? Number.NaN;
    if (Number.isNaN(level)) continue;
    covered += 1;
    if (level > max) {
      max = level;
      highest = i;
    }
  }
  const step = medianStepHz(trace.axis);
  return {
    firstHz: firstHz(trace.axis),
    lastHz: lastHz(trace.axis),
    stepHz: Number.isNaN(step) ? null : step,
    covered,
    maxDb: highest < 0 ? null : max,
    maxAtHz: highest < 0 ? null : frequencyAt(trace.axis, highest),
    floorDb: trace.kind === "scan" ? floorOf(trace, rbwHz) : null,
    powerSumDb: trace.kind === "scan" ? powerSumDb(trace) : null,
  };
}
