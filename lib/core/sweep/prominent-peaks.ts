import type { LevelIndex } from "./level-index";
import { BLOCK, GROUP, indexLevels } from "./level-index";

export interface PeakPlace {
  /** The middle of a plateau. */
  index: number;
  prominenceDb: number;
}

/** Samples `from` ≤ i < `to` with a level of at least `leastDb`. */
export interface SampleRange {
  from: number;
  to: number;
  leastDb: number;
}

const GROUP_SAMPLES = BLOCK * GROUP;

/**
 * Lowest level between a sample and the next higher one to its left (`step` −1) or right (+1), the
 * end of the trace or a gap; equal levels do not end the walk. Whole blocks are walked at once.
 */
function baseDb(index: LevelIndex, from: number, step: -1 | 1, peakDb: number): number {
  const { levelsDb } = index;
  const last = step > 0 ? index.count - 1 : 0;
  let base = peakDb;
  let i = from;
  while (i !== last) {
    const next = i + step;
    const isAtStart = step > 0 ? next % BLOCK === 0 : (next + 1) % BLOCK === 0;
    if (isAtStart) {
      const isAtGroup = step > 0 ? next % GROUP_SAMPLES === 0 : (next + 1) % GROUP_SAMPLES === 0;
      const group = (next / GROUP_SAMPLES) | 0;
      if (
        isAtGroup &&
        !index.hasGap &&
        (group + 1) * GROUP_SAMPLES <= index.count &&
        (index.groupHighDb[group] as number) <= peakDb
      ) {
        base = Math.min(base, index.groupLowDb[group] as number);
        i += step * GROUP_SAMPLES;
        continue;
      }
      const block = (next / BLOCK) | 0;
      if (
        index.blockHasGap[block] === 0 &&
        (block + 1) * BLOCK <= index.count &&
        (index.blockHighDb[block] as number) <= peakDb
      ) {
        base = Math.min(base, index.blockLowDb[block] as number);
        i += step * BLOCK;
        continue;
      }
    }
    const level = levelsDb[next] as number;
    if (!(level <= peakDb) || level === Number.NEGATIVE_INFINITY) return base;
    if (level < base) base = level;
    i = next;
  }
  return base;
}

/** Height in dB of a peak over the higher of its two bases; `end` is the last sample of its top. */
function prominenceOf(index: LevelIndex, start: number, end: number): number {
  const known = index.prominencesDb.get(start);
  if (known !== undefined) return known;
  const peakDb = index.levelsDb[start] as number;
  const highestBaseDb = Math.max(baseDb(index, start, -1, peakDb), baseDb(index, end, 1, peakDb));
  index.prominencesDb.set(start, peakDb - highestBaseDb);
  return peakDb - highestBaseDb;
}

/** The first sample from `i` on that reaches `leastDb`; `end` when none before it does. */
function nextHigh(levelsDb: Float32Array, i: number, end: number, leastDb: number): number {
  let at = i;
  while (at < end && !((levelsDb[at] as number) >= leastDb)) at += 1;
  return at;
}

/**
 * Calls `visit` for every local maximum whose top begins in the range, with the first and the last
 * sample of its top. Neither end of the trace is a maximum, nor is a top beside a sample that is
 * not finite.
 */
function eachMaximum(
  { levelsDb, count }: LevelIndex,
  { from, to, leastDb }: SampleRange,
  visit: (start: number, end: number) => void,
): void {
  const stop = Math.min(to, count - 1);
  for (
    let i = nextHigh(levelsDb, Math.max(1, from), stop, leastDb);
    i < stop;
    i = nextHigh(levelsDb, i + 1, stop, leastDb)
  ) {
    const level = levelsDb[i] as number;
    const before = levelsDb[i - 1] as number;
    if (!(before < level) || before === Number.NEGATIVE_INFINITY) continue;
    let end = i;
    while (end + 1 < count && levelsDb[end + 1] === level) end += 1;
    const after = end + 1 < count ? (levelsDb[end + 1] as number) : Number.NaN;
    if (after < level && after !== Number.NEGATIVE_INFINITY && level !== Number.POSITIVE_INFINITY)
      visit(i, end);
    i = end;
  }
}

/**
 * Local maxima of samples `from` ≤ i < `to` for which `isWanted` says yes and whose prominence is
 * at least `minimumDb`: the rule of topographic prominence, by which equal peaks all count.
 */
export function prominentPeaksIn(
  index: LevelIndex,
  range: SampleRange,
  minimumDb: number,
  isWanted: (sample: number) => boolean,
): PeakPlace[] {
  const { levelsDb } = index;
  const peaks: PeakPlace[] = [];
  // A top that begins before the range may have its middle in it.
  let { from } = range;
  while (from > 0 && levelsDb[from - 1] === levelsDb[from]) from -= 1;
  eachMaximum(index, { ...range, from }, (start, end) => {
    const middle = (start + end) >> 1;
    if (middle < range.from || middle >= range.to || !isWanted(middle)) return;
    const prominenceDb = prominenceOf(index, start, end);
    if (prominenceDb >= minimumDb) peaks.push({ index: middle, prominenceDb });
  });
  return peaks;
}

/** All local maxima of some levels in dB with a prominence in dB of at least `minimumDb`. */
export function prominentPeaks(levelsDb: Float32Array, minimumDb: number): PeakPlace[] {
  const index = indexLevels(levelsDb);
  return prominentPeaksIn(
    index,
    { from: 0, to: index.count, leastDb: Number.NEGATIVE_INFINITY },
    minimumDb,
    () => true,
  );
}
