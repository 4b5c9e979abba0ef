import type { LinePiece } from "../mask/compile-line";
import { highestPieceLimit, lowestPieceLimit, pieceLimitAt } from "../mask/compile-line";
import { frequencyAt } from "../sweep/axis";
import { BLOCK, GROUP } from "../sweep/level-index";
import type { HeldTrace } from "./held-trace";

/** The lowest margin found so far; `sample` is −1 before the first. */
export interface Lowest {
  sample: number;
  marginDb: number;
  limitDb: number;
}

export const nothingFound = (): Lowest => ({
  sample: -1,
  marginDb: Number.POSITIVE_INFINITY,
  limitDb: Number.NaN,
});

/** Room for the rounding of a bound; far below what a level can show. */
const SLACK_DB = 1e-9;
const GROUP_SAMPLES = BLOCK * GROUP;

/** Keeps a sample when its margin is lower, or as low at a lower frequency. */
export function keepLowest(
  lowest: Lowest,
  sample: number,
  marginDb: number,
  limitDb: number,
): void {
  if (marginDb < lowest.marginDb || (marginDb === lowest.marginDb && sample < lowest.sample)) {
    lowest.sample = sample;
    lowest.marginDb = marginDb;
    lowest.limitDb = limitDb;
  }
}

/** Level in dB of the mask's unit of one sample; NaN where there is none. */
export function heldLevelDb(held: HeldTrace, i: number): number {
  const level = held.trace.levelsDb[i] ?? Number.NaN;
  return Number.isFinite(level) ? level + held.offsetDb : Number.NaN;
}

/** Below every limit of these samples, less what an offset adds to their levels. */
function limitFloorDb(held: HeldTrace, piece: LinePiece, from: number, to: number): number {
  const { axis } = held.trace;
  const limitDb = lowestPieceLimit(piece, frequencyAt(axis, from), frequencyAt(axis, to - 1));
  return limitDb - held.offsetDb - SLACK_DB;
}

/** Highest of some levels; −Infinity when none is a number. */
function highestOf(levelsDb: Float32Array, from: number, to: number): number {
  let high = Number.NEGATIVE_INFINITY;
  for (let i = from; i < to; i += 1) {
    const level = levelsDb[i] as number;
    if (level > high && level !== Number.POSITIVE_INFINITY) high = level;
  }
  return high;
}

function lookAtSamples(
  held: HeldTrace,
  piece: LinePiece,
  from: number,
  to: number,
  lowest: Lowest,
): void {
  const { axis, levelsDb } = held.trace;
  const floorDb = limitFloorDb(held, piece, from, to);
  // The highest of them has at most this margin, so that the first need not be worked out one by one.
  const most = highestPieceLimit(piece, frequencyAt(axis, from), frequencyAt(axis, to - 1));
  const sureDb = most - held.offsetDb + SLACK_DB - highestOf(levelsDb, from, to);
  let leastDb = floorDb - Math.min(lowest.marginDb, sureDb);
  for (let i = from; i < to; i += 1) {
    // Not a number, or too low to come nearer to any of these limits.
    if (!((levelsDb[i] as number) >= leastDb)) continue;
    const levelDb = heldLevelDb(held, i);
    if (Number.isNaN(levelDb)) continue;
    const limitDb = pieceLimitAt(piece, frequencyAt(axis, i));
    keepLowest(lowest, i, limitDb - levelDb, limitDb);
    leastDb = floorDb - Math.min(lowest.marginDb, sureDb);
  }
}

interface Stretch {
  from: number;
  to: number;
  /** No margin of these samples lies below. */
  boundDb: number;
}

/** Samples cut where stretches of `size` begin, each with what its highest level can come to. */
function cut(
  held: HeldTrace,
  piece: LinePiece,
  { from, to }: Pick<Stretch, "from" | "to">,
  size: number,
  highDb: Float32Array,
): Stretch[] {
  const stretches: Stretch[] = [];
  for (let i = from; i < to;) {
    const k = (i / size) | 0;
    const end = Math.min(to, (k + 1) * size);
    const boundDb = limitFloorDb(held, piece, i, end) - (highDb[k] as number);
    stretches.push({ from: i, to: end, boundDb });
    i = end;
  }
  return stretches;
}

/** The most promising first, since what it finds rules out most of the others. */
function lookInto(
  stretches: readonly Stretch[],
  lowest: Lowest,
  look: (stretch: Stretch) => void,
): void {
  const [one, ...rest] = stretches;
  if (!one) return;
  const first = rest.reduce((a, b) => (b.boundDb < a.boundDb ? b : a), one);
  if (first.boundDb <= lowest.marginDb) look(first);
  for (const stretch of stretches)
    if (stretch !== first && stretch.boundDb <= lowest.marginDb) look(stretch);
}

/**
 * The lowest margin in dB of samples `from` ≤ i < `to`, all of them inside one piece of a line,
 * kept in `lowest`. Looks at a sample only where no bound says that it cannot be lower.
 */
export function findLowest(
  held: HeldTrace,
  piece: LinePiece,
  from: number,
  to: number,
  lowest: Lowest,
): void {
  const { blockHighDb, groupHighDb } = held.levels;
  lookInto(cut(held, piece, { from, to }, GROUP_SAMPLES, groupHighDb), lowest, (group) =>
    lookInto(cut(held, piece, group, BLOCK, blockHighDb), lowest, (block) =>
      lookAtSamples(held, piece, block.from, block.to, lowest),
    ),
  );
}

/** Every sample of a piece whose level lies over the limit. */
export function findOver(
  held: HeldTrace,
  piece: LinePiece,
  from: number,
  to: number,
  visit: (sample: number, limitDb: number) => void,
): void {
  const { axis } = held.trace;
  const { blockHighDb, groupHighDb } = held.levels;
  for (const group of cut(held, piece, { from, to }, GROUP_SAMPLES, groupHighDb)) {
    if (group.boundDb >= 0) continue;
    for (const block of cut(held, piece, group, BLOCK, blockHighDb)) {
      for (let i = block.from; block.boundDb < 0 && i < block.to; i += 1) {
        const limitDb = pieceLimitAt(piece, frequencyAt(axis, i));
        if (limitDb - heldLevelDb(held, i) < 0) visit(i, limitDb);
      }
    }
  }
}
