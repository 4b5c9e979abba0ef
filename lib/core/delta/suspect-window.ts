import type { SpreadSpectrum } from "../link/link-settings";
import type { FrequencyRange } from "../reading/reading";
import { frequencyAt, indexAtOrAfter, pointCount } from "../sweep/axis";
import type { Trace } from "../sweep/trace";

/** How far a spread line reaches under and over its own frequency, as shares of it. */
function spreadReach(spread: SpreadSpectrum | null): { below: number; above: number } {
  if (!spread) return { below: 0, above: 0 };
  const depth = spread.depthPercent / 100;
  if (spread.direction === "down") return { below: depth, above: 0 };
  if (spread.direction === "up") return { below: 0, above: depth };
  return { below: depth / 2, above: depth / 2 };
}

/**
 * Where a suspect at `frequencyHz` of a sweep with one spread spectrum may be found in a sweep
 * with another. Its line has some frequency f with the suspect in what `own` spreads f over, and
 * may stand anywhere in what `other` spreads f over. Never narrower than ± the largest of
 * 2·RBW, 2·step and the clocks' tolerance, which `leastHz` and `tolerancePpm` say.
 */
export function suspectWindow(
  frequencyHz: number,
  own: SpreadSpectrum | null,
  other: SpreadSpectrum | null,
  leastHz: number,
  tolerancePpm: number,
): FrequencyRange {
  const [mine, theirs] = [spreadReach(own), spreadReach(other)];
  const reachHz = Math.max(leastHz, (tolerancePpm / 1e6) * frequencyHz);
  const spreadFromHz = (frequencyHz * (1 - theirs.below)) / (1 + mine.above);
  const spreadToHz = (frequencyHz * (1 + theirs.above)) / (1 - mine.below);
  return {
    startHz: Math.min(frequencyHz - reachHz, spreadFromHz),
    stopHz: Math.max(frequencyHz + reachHz, spreadToHz),
  };
}

/** Highest sample of a trace in a window, ends included; null when it has none there. */
export function highestIn(
  trace: Trace,
  window: FrequencyRange,
): { levelDb: number; atHz: number } | null {
  const count = Math.min(pointCount(trace.axis), trace.levelsDb.length);
  let found: { levelDb: number; atHz: number } | null = null;
  for (let i = indexAtOrAfter(trace.axis, window.startHz); i < count; i += 1) {
    const atHz = frequencyAt(trace.axis, i);
    if (atHz > window.stopHz) break;
    const levelDb = trace.levelsDb[i] ?? Number.NaN;
    if (!Number.isNaN(levelDb) && (!found || levelDb > found.levelDb)) found = { levelDb, atHz };
  }
  return found;
}
