/** Samples per block and blocks per group: small enough to look through, large enough to skip. */
export const BLOCK = 256;
export const GROUP = 16;

/**
 * Highest and lowest level of every 256 and every 4,096 samples of a trace, in dB, so that a search
 * looks only where something can be found. Samples that are not finite do not count; a block of
 * nothing else has −Infinity as its highest and +Infinity as its lowest level.
 */
export interface LevelIndex {
  levelsDb: Float32Array;
  /** Samples that count: the first so many. */
  count: number;
  blockHighDb: Float32Array;
  blockLowDb: Float32Array;
  groupHighDb: Float32Array;
  groupLowDb: Float32Array;
  /** 1 where a block holds a sample that is not finite. */
  blockHasGap: Uint8Array;
  hasGap: boolean;
  /** Prominences worked out so far, by the first sample of the top; they depend on nothing else. */
  prominencesDb: Map<number, number>;
}

/** Lowest and highest finite level of some samples; +Infinity and −Infinity without any. */
function finiteSpan(levels: Float32Array, from: number, to: number): [low: number, high: number] {
  let low = Number.POSITIVE_INFINITY;
  let high = Number.NEGATIVE_INFINITY;
  for (let i = from; i < to; i += 1) {
    const level = levels[i] as number;
    if (!Number.isFinite(level)) continue;
    if (level > high) high = level;
    if (level < low) low = level;
  }
  return [low, high];
}

/** One look at each of the first `count` levels. */
export function indexLevels(levels: Float32Array, count = levels.length): LevelIndex {
  const blocks = Math.ceil(count / BLOCK);
  const blockHighDb = new Float32Array(blocks);
  const blockLowDb = new Float32Array(blocks);
  const blockHasGap = new Uint8Array(blocks);
  let hasGap = false;
  for (let block = 0; block < blocks; block += 1) {
    const from = block * BLOCK;
    const to = Math.min(count, from + BLOCK);
    let high = levels[from] as number;
    let low = high;
    let isGap = false;
    for (let i = from; i < to; i += 1) {
      const level = levels[i] as number;
      if (level > high) high = level;
      else if (!(level >= low)) {
        if (level < low) low = level;
        else isGap = true;
      }
    }
    // Only then is every sample asked whether it is a number.
    if (isGap || !Number.isFinite(high - low)) {
      hasGap = true;
      blockHasGap[block] = 1;
      [low, high] = finiteSpan(levels, from, to);
    }
    blockHighDb[block] = high;
    blockLowDb[block] = low;
  }
  const groups = Math.ceil(blocks / GROUP);
  const groupHighDb = new Float32Array(groups).fill(Number.NEGATIVE_INFINITY);
  const groupLowDb = new Float32Array(groups).fill(Number.POSITIVE_INFINITY);
  for (let block = 0; block < blocks; block += 1) {
    const group = (block / GROUP) | 0;
    groupHighDb[group] = Math.max(groupHighDb[group] as number, blockHighDb[block] as number);
    groupLowDb[group] = Math.min(groupLowDb[group] as number, blockLowDb[block] as number);
  }
  return {
    levelsDb: levels,
    count,
    blockHighDb,
    blockLowDb,
    groupHighDb,
    groupLowDb,
    blockHasGap,
    hasGap,
    prominencesDb: new Map(),
  };
}
