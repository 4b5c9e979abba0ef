/** Samples per entry of the first level; each further level is as much coarser again. */
export const PYRAMID_FACTOR = 16;
const SMALLEST = 512;

/**
 * One level of a min/max pyramid over levels in dB. Entry i stands for samples
 * i·samplesPerEntry … of the trace; `maxAt` is the index of its highest sample. Gaps do not
 * count; an entry that is all gap has NaN.
 */
export interface PyramidLevel {
  samplesPerEntry: number;
  minDb: Float32Array;
  maxDb: Float32Array;
  maxAt: Uint32Array;
}

/** The trace itself as the level below the first: one sample per entry. */
export function bottomLevel(levelsDb: Float32Array, firstIndex = 0): PyramidLevel {
  const maxAt = new Uint32Array(levelsDb.length);
  for (let i = 0; i < maxAt.length; i += 1) maxAt[i] = firstIndex + i;
  return { samplesPerEntry: 1, minDb: levelsDb, maxDb: levelsDb, maxAt };
}

/** Entries `from` up to but not including `to`, taken together; NaN when all are gaps. */
export function extremesOf(
  level: PyramidLevel,
  from: number,
  to: number,
): { minDb: number; maxDb: number; maxAt: number } {
  const { minDb, maxDb, maxAt } = level;
  let min = Number.NaN;
  let max = Number.NaN;
  let at = maxAt[from] ?? 0;
  for (let i = from; i < to; i += 1) {
    const high = maxDb[i] ?? Number.NaN;
    const low = minDb[i] ?? Number.NaN;
    // Written so that a NaN on either side takes the other one.
    if (!(max >= high) && !Number.isNaN(high)) {
      max = high;
      at = maxAt[i] ?? at;
    }
    if (!(min <= low) && !Number.isNaN(low)) min = low;
  }
  return { minDb: min, maxDb: max, maxAt: at };
}

function coarser(level: PyramidLevel): PyramidLevel {
  const count = Math.ceil(level.maxDb.length / PYRAMID_FACTOR);
  const next: PyramidLevel = {
    samplesPerEntry: level.samplesPerEntry * PYRAMID_FACTOR,
    minDb: new Float32Array(count),
    maxDb: new Float32Array(count),
    maxAt: new Uint32Array(count),
  };
  for (let i = 0; i < count; i += 1) {
    const from = i * PYRAMID_FACTOR;
    const to = Math.min(from + PYRAMID_FACTOR, level.maxDb.length);
    const found = extremesOf(level, from, to);
    next.minDb[i] = found.minDb;
    next.maxDb[i] = found.maxDb;
    next.maxAt[i] = found.maxAt;
  }
  return next;
}

/** All levels above the trace, finest first, until one has no more than 512 entries. */
export function buildPyramid(levelsDb: Float32Array): PyramidLevel[] {
  const levels: PyramidLevel[] = [];
  let level = bottomLevel(levelsDb);
  while (level.maxDb.length > SMALLEST) {
    level = coarser(level);
    levels.push(level);
  }
  return levels;
}
