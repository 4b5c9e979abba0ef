import type { SpreadSpectrum } from "../link/link-settings";
import type { FrequencyRange } from "./reading";

/**
 * How far the same line may move from one product to the next with its clock, in parts per
 * million: a plain crystal with its temperature and ageing (common practice, no source).
 */
const CLOCK_PPM = 100;

/** What of a sweep decides how exactly it tells a frequency; null means not stated. */
export interface Resolution {
  rbwHz: number | null;
  /** The coarsest step among its traces. */
  stepHz: number | null;
  /** Spread spectrum of the link while the sweep was taken; null when off or not stated. */
  spread: SpreadSpectrum | null;
}

export interface FollowedFrequency {
  id: string;
  frequencyHz: number;
  /** Symmetric, Hz. */
  toleranceHz: number;
}

/** A suspect of one reading; `number` is its own within that reading. */
export interface FoundFrequency {
  number: number;
  frequencyHz: number;
}

const known = (hz: number | null) => (hz !== null && Number.isFinite(hz) && hz > 0 ? hz : 0);

/** Two RBW, two steps or the clock's ppm, whichever is most, in Hz. */
function sharpnessHz(frequencyHz: number, { rbwHz, stepHz }: Resolution): number {
  return Math.max(2 * known(rbwHz), 2 * known(stepHz), CLOCK_PPM * 1e-6 * frequencyHz);
}

const depthHz = (frequencyHz: number, spread: SpreadSpectrum | null) =>
  spread === null ? 0 : Math.abs(spread.depthPercent / 100) * frequencyHz;

/**
 * How near in Hz a suspect has to be to be taken for one that is followed from here on:
 * max(2·RBW, 2·step, depth·f, ppm·f), to the whole Hz and at least 1 Hz. The whole depth of the spread counts whatever its direction,
 * because the peak may have been seen at either end of the stretch that the line wanders over.
 */
export function recognitionToleranceHz(frequencyHz: number, seenBy: Resolution): number {
  const most = Math.max(sharpnessHz(frequencyHz, seenBy), depthHz(frequencyHz, seenBy.spread));
  return Math.max(1, Math.round(most));
}

/**
 * Where a sweep may show a followed suspect, Hz, both ends included. The stored tolerance holds
 * for the sweep in which it was first seen; a sweep with a wider RBW, a coarser step or a spread
 * spectrum moves a peak further, so the window grows with it: downwards when the clock is spread
 * down, upwards when it is spread up, by half the depth to both sides when it is spread around
 * the centre. It never becomes narrower than the stored tolerance.
 */
export function recognitionWindow(
  followed: Pick<FollowedFrequency, "frequencyHz" | "toleranceHz">,
  seenBy: Resolution,
): FrequencyRange {
  const { frequencyHz, toleranceHz } = followed;
  const { spread } = seenBy;
  const least = Math.max(toleranceHz, sharpnessHz(frequencyHz, seenBy));
  const depth = depthHz(frequencyHz, spread);
  const below = spread?.direction === "up" ? 0 : spread?.direction === "down" ? depth : depth / 2;
  const above = spread?.direction === "down" ? 0 : spread?.direction === "up" ? depth : depth / 2;
  return {
    startHz: frequencyHz - Math.max(least, below),
    stopHz: frequencyHz + Math.max(least, above),
  };
}

/**
 * Which followed suspect each suspect of one reading is. The nearest pair is matched first, then
 * the nearest of what is left, so that nobody is matched twice; at the same distance the lower
 * frequency goes first, so that the order in which either list comes does not matter.
 * Returns the number of the suspect by the id of the followed one; who was not found is left out.
 */
export function recogniseSuspects(
  followed: readonly FollowedFrequency[],
  found: readonly FoundFrequency[],
  seenBy: Resolution,
): Map<string, number> {
  const pairs = followed.flatMap((one) => {
    const { startHz, stopHz } = recognitionWindow(one, seenBy);
    return found
      .filter(({ frequencyHz }) => frequencyHz >= startHz && frequencyHz <= stopHz)
      .map((suspect) => ({
        one,
        suspect,
        distanceHz: Math.abs(suspect.frequencyHz - one.frequencyHz),
      }));
  });
  pairs.sort(
    (a, b) =>
      a.distanceHz - b.distanceHz ||
      a.one.frequencyHz - b.one.frequencyHz ||
      a.suspect.frequencyHz - b.suspect.frequencyHz ||
      a.suspect.number - b.suspect.number ||
      (a.one.id < b.one.id ? -1 : a.one.id > b.one.id ? 1 : 0),
  );
  const matched = new Map<string, number>();
  const taken = new Set<number>();
  for (const { one, suspect } of pairs) {
    if (matched.has(one.id) || taken.has(suspect.number)) continue;
    matched.set(one.id, suspect.number);
    taken.add(suspect.number);
  }
  return matched;
}
