import { frequencyAt, indexAtOrAfter, pointCount } from "../sweep/axis";
import { median } from "../stats/percentile";
import type { FrequencyAxis, Trace } from "../sweep/trace";
import type { Coverage, FrequencyRange } from "./reading";

const NEIGHBOURS = 10;

/** Twice the median step, with room for frequencies worked out from MHz. */
const GAP_STEPS = 2 * (1 + 1e-9);

/** Median spacing in Hz around the spacing that follows point i. */
function localStepHz(axis: FrequencyAxis, i: number): number {
  if (axis.kind === "regular") return axis.stepHz;
  const from = Math.max(0, i - NEIGHBOURS);
  const to = Math.min(pointCount(axis) - 2, i + NEIGHBOURS);
  const steps: number[] = [];
  for (let k = from; k <= to; k += 1) steps.push(frequencyAt(axis, k + 1) - frequencyAt(axis, k));
  return median(steps);
}

/** Whether the spacing after point i is no gap: at most twice the median of those around it. */
function isJoined(axis: FrequencyAxis, i: number): boolean {
  if (axis.kind === "regular") return true;
  const hz = axis.frequenciesHz;
  const stepAt = (k: number) => (hz[k + 1] ?? Number.NaN) - (hz[k] ?? Number.NaN);
  const gap = stepAt(i);
  const from = Math.max(0, i - NEIGHBOURS);
  const to = Math.min(hz.length - 2, i + NEIGHBOURS);
  // Once more than half of them are wide enough so is their median, without sorting them.
  let missing = Math.floor((to - from + 1) / 2) + 1;
  for (let k = from; k <= to; k += 1) {
    if (GAP_STEPS * stepAt(k) >= gap) missing -= 1;
    if (missing === 0) return true;
  }
  return gap <= GAP_STEPS * localStepHz(axis, i);
}

/** Ranges merged and in ascending order. */
export function mergeRanges(ranges: readonly FrequencyRange[]): FrequencyRange[] {
  const merged: FrequencyRange[] = [];
  for (const range of [...ranges].sort((a, b) => a.startHz - b.startHz)) {
    const last = merged.at(-1);
    if (last && range.startHz <= last.stopHz) last.stopHz = Math.max(last.stopHz, range.stopHz);
    else merged.push({ ...range });
  }
  return merged;
}

/** Whether a frequency lies in ascending, merged ranges (ends included). */
export function inRanges(ranges: readonly FrequencyRange[], hz: number): boolean {
  let low = 0;
  let high = ranges.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((ranges[middle]?.stopHz ?? 0) < hz) low = middle + 1;
    else high = middle;
  }
  const range = ranges[low];
  return range !== undefined && range.startHz <= hz;
}

/**
 * What a scan swept: broken at NaN and at spacings above twice the median step around them;
 * its first and last point reach half a step further. Spots cover nothing.
 */
export function coveredRanges(trace: Trace, mayHaveGaps = true): FrequencyRange[] {
  const { axis, levelsDb } = trace;
  const count = Math.min(pointCount(axis), levelsDb.length);
  if (trace.kind === "spots" || count < 2) return [];
  if (!mayHaveGaps && axis.kind === "regular") {
    const reachHz = axis.stepHz / 2;
    const stopHz = frequencyAt(axis, count - 1) + reachHz;
    return [{ startHz: axis.startHz - reachHz, stopHz }];
  }
  const covered = (i: number) => Number.isFinite(levelsDb[i]);
  const ranges: FrequencyRange[] = [];
  let startHz: number | null = null;
  for (let i = 0; i < count; i += 1) {
    const hz = frequencyAt(axis, i);
    if (!covered(i)) continue;
    if (startHz === null) startHz = i === 0 ? hz - localStepHz(axis, 0) / 2 : hz;
    if (i + 1 < count && covered(i + 1) && isJoined(axis, i)) continue;
    const stopHz = i === count - 1 ? hz + localStepHz(axis, Math.max(0, i - 1)) / 2 : hz;
    if (stopHz > startHz) ranges.push({ startHz, stopHz });
    startHz = null;
  }
  return ranges;
}

/** Whether a finite sample of the trace falls into the range. */
function hasSample(trace: Trace, range: FrequencyRange): boolean {
  const count = Math.min(pointCount(trace.axis), trace.levelsDb.length);
  for (let i = indexAtOrAfter(trace.axis, range.startHz); i < count; i += 1) {
    if (frequencyAt(trace.axis, i) > range.stopHz) return false;
    if (Number.isFinite(trace.levelsDb[i])) return true;
  }
  return false;
}

/** What lies in every one of the lists; each is ascending and without overlaps. */
export function commonRanges(lists: readonly FrequencyRange[][]): FrequencyRange[] {
  const [first, ...rest] = lists;
  return rest.reduce<FrequencyRange[]>(
    (common, list) =>
      common.flatMap((a) =>
        list.flatMap((b) => {
          const startHz = Math.max(a.startHz, b.startHz);
          const stopHz = Math.min(a.stopHz, b.stopHz);
          return stopHz > startHz ? [{ startHz, stopHz }] : [];
        }),
      ),
    first ?? [],
  );
}

/** Width in the logarithm of frequency. */
export function logWidth(ranges: readonly FrequencyRange[]): number {
  return ranges.reduce((sum, range) => sum + Math.log(range.stopHz / range.startHz), 0);
}

interface Swept {
  trace: Trace;
  covered: readonly FrequencyRange[];
  /** Polarization of a radiated sweep; null: not stated, or of no meaning. */
  polarization: string | null;
}

/** What the traces swept of one band, in every polarization that any of them states. */
function sweptOf(
  band: FrequencyRange,
  traces: readonly Swept[],
  stated: readonly string[],
): FrequencyRange[] {
  const here = traces.filter(({ trace }) => hasSample(trace, band));
  const rangesOf = (own: readonly Swept[]) => mergeRanges(own.flatMap((t) => t.covered));
  if (stated.length === 0) return rangesOf(here);
  // A trace that does not state its polarization is not held against any of them.
  return commonRanges(
    stated.map((p) => rangesOf(here.filter((t) => t.polarization === p || !t.polarization))),
  );
}

/**
 * Share of the bands (in log frequency) that the traces swept in each of the stated polarizations,
 * and the gaps left.
 */
export function coverageOf(
  bands: readonly FrequencyRange[],
  traces: readonly Swept[],
  stated: readonly string[] = [],
): Coverage {
  const gaps: FrequencyRange[] = [];
  for (const band of bands) {
    let at = band.startHz;
    const gap = (toHz: number) => {
      if (toHz > at) gaps.push({ startHz: at, stopHz: toHz });
    };
    for (const range of sweptOf(band, traces, stated)) {
      if (range.stopHz <= at) continue;
      if (range.startHz >= band.stopHz) break;
      gap(range.startHz);
      at = Math.max(at, range.stopHz);
    }
    gap(band.stopHz);
  }
  return { fraction: coveredShare(bands, gaps), gaps };
}

/** Share of the bands in log frequency that lies in none of the gaps; 1 only without a gap. */
export function coveredShare(
  bands: readonly FrequencyRange[],
  gaps: readonly FrequencyRange[],
): number {
  const whole = logWidth(bands);
  if (!(whole > 0)) return 0;
  const missing = logWidth(commonRanges([[...bands], [...gaps]]));
  return missing === 0 ? 1 : Math.max(0, 1 - missing / whole);
}

/** A sweep that spans less of a line than this only touches its edge. */
const TOUCH = 0.01;

/**
 * Whether a scan from one frequency in Hz to another was meant for these bands: not when it merely
 * touches their edge, as one that ends at 1 GHz touches a line that begins there.
 */
export function spansBands(
  bands: readonly FrequencyRange[],
  firstHz: number,
  lastHz: number,
): boolean {
  const common = commonRanges([[...bands], [{ startHz: firstHz, stopHz: lastHz }]]);
  return logWidth(common) >= TOUCH * logWidth(bands);
}
