import type { BandwidthKind, Detector } from "./settings";
import { frequencyAt, pointCount } from "./axis";
import type { Trace } from "./trace";

/** Noise bandwidth over bandwidth of a Gaussian filter, computed: √(π/(4 ln 2)) and 1/√2 of it. */
const NOISE_OVER: Record<BandwidthKind, number> = { "3dB": 1.0645, "6dB": 0.753 };

/** Width in Hz that point i stands for: half-way to its neighbours. */
function widthAt(trace: Trace, i: number, count: number): number {
  if (trace.axis.kind === "regular") return trace.axis.stepHz;
  const left = Math.max(0, i - 1);
  const right = Math.min(count - 1, i + 1);
  const span = frequencyAt(trace.axis, right) - frequencyAt(trace.axis, left);
  return right - left > 0 ? span / (right - left) : Number.NaN;
}

/**
 * 10 log10 Σ 10^(L/10)·Δf with Δf in Hz, in dB; gaps do not count. Band power without the
 * filter's noise bandwidth, which cancels between two sweeps of one filter. Null without levels.
 */
export function powerSumDb(trace: Trace): number | null {
  const count = Math.min(pointCount(trace.axis), trace.levelsDb.length);
  if (count < 2) return null;
  let sum = 0;
  for (let i = 0; i < count; i += 1) {
    const level = trace.levelsDb[i] ?? Number.NaN;
    if (!Number.isNaN(level)) sum += Math.exp(level * (Math.LN10 / 10)) * widthAt(trace, i, count);
  }
  return sum > 0 ? 10 * Math.log10(sum) : null;
}

/**
 * Band power in dB of the trace's unit, 10 log10(Σ 10^(L/10)·Δf / B_noise); null when the
 * filter is not stated. Power only for RMS-average traces: see `isPower`.
 */
export function bandPowerDb(
  powerSum: number | null,
  rbwHz: number | null,
  rbwKind: BandwidthKind | null,
): number | null {
  if (powerSum === null || rbwHz === null || rbwKind === null) return null;
  return powerSum - 10 * Math.log10(NOISE_OVER[rbwKind] * rbwHz);
}

/** Whether the band power of a trace of this detector is power, or only a comparative sum. */
export function isPower(detector: Detector | null): boolean {
  return detector === "rms-average";
}
