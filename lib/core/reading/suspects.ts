import type { CompiledLine } from "../mask/compile-line";
import { lowestPieceLimit } from "../mask/compile-line";
import { limitAt } from "../mask/limit-at";
import { frequencyAt, indexAtOrAfter } from "../sweep/axis";
import { BLOCK, GROUP } from "../sweep/level-index";
import type { PeakPlace, SampleRange } from "../sweep/prominent-peaks";
import { prominentPeaksIn } from "../sweep/prominent-peaks";
import type { Trace } from "../sweep/trace";
import { basisOf } from "./basis";
import type { HeldTrace } from "./held-trace";
import { reachOf } from "./line-reading";
import { heldLevelDb } from "./lowest-margin";
import { speaksFor } from "./position";
import { originOf } from "./prepare-parts";
import type { Basis, Suspect } from "./reading";

/** Room for the rounding of a bound; far below what a level can show. */
const SLACK_DB = 1e-9;

interface SuspectRules {
  prominenceDb: number;
  /** At most so far under the line. */
  marginDb: number;
}

interface HeldLine {
  line: CompiledLine;
  basis: Basis;
}

/** Top in Hz of a parabola in dB through a sample and its neighbours. */
function parabolicHz(trace: Trace, i: number): number {
  const at = frequencyAt(trace.axis, i);
  const [a, b, c] = [trace.levelsDb[i - 1], trace.levelsDb[i], trace.levelsDb[i + 1]];
  const [h1, h2] = [at - frequencyAt(trace.axis, i - 1), frequencyAt(trace.axis, i + 1) - at];
  if (a === undefined || b === undefined || c === undefined) return at;
  const below = (b - a) / h1;
  const above = (c - b) / h2;
  const curvature = (above - below) / (h1 + h2);
  const shift = -(below * h2 + above * h1) / (h1 + h2) / (2 * curvature);
  return Number.isFinite(shift) ? at + Math.max(-h1, Math.min(h2, shift)) : at;
}

function hasSpotNear({ axis, levelsDb }: Trace, hz: number, reachHz: number): boolean {
  for (let i = indexAtOrAfter(axis, hz - reachHz); frequencyAt(axis, i) <= hz + reachHz; i += 1)
    if (Number.isFinite(levelsDb[i])) return true;
  return false;
}

/** Whether the line's own detector was swept at a frequency in Hz, in the same position. */
function isDecided(
  held: readonly HeldTrace[],
  loose: HeldTrace,
  { line }: CompiledLine,
  hz: number,
): boolean {
  return held.some(({ trace, part }) => {
    if (basisOf(trace, line.detector) !== "like-for-like") return false;
    if (!speaksFor(part, loose.part)) return false;
    if (trace.kind === "spots") return hasSpotNear(trace, hz, reachOf(loose));
    const i = indexAtOrAfter(trace.axis, hz);
    const near = (k: number) => !Number.isNaN(trace.levelsDb[k] ?? Number.NaN);
    return frequencyAt(trace.axis, i) === hz ? near(i) : i > 0 && near(i - 1) && near(i);
  });
}

/** No limit of these lines between two frequencies in Hz lies below; +Infinity without a limit. */
function lowestLimit(lines: readonly HeldLine[], fromHz: number, toHz: number): number {
  let lowest = Number.POSITIVE_INFINITY;
  for (const { line } of lines) {
    for (const piece of line.pieces) {
      // A little wider than the piece, for samples taken to lie on its edges.
      if (piece.stopHz * (1 + 1e-9) < fromHz || piece.startHz * (1 - 1e-9) > toHz) continue;
      const from = Math.min(piece.stopHz, Math.max(piece.startHz, fromHz));
      const to = Math.max(piece.startHz, Math.min(piece.stopHz, toHz));
      lowest = Math.min(lowest, lowestPieceLimit(piece, from, to));
    }
  }
  return lowest;
}

/**
 * Blocks of samples that may hold a level at most `marginDb` under one of the lines, each with the
 * least level that can.
 */
function nearRanges(held: HeldTrace, lines: readonly HeldLine[], marginDb: number): SampleRange[] {
  const { axis } = held.trace;
  const { blockHighDb, groupHighDb } = held.levels;
  const ranges: SampleRange[] = [];
  const leastDb = (from: number, to: number) =>
    lowestLimit(lines, frequencyAt(axis, from), frequencyAt(axis, to - 1)) -
    held.offsetDb -
    marginDb -
    SLACK_DB;
  const size = BLOCK * GROUP;
  for (let i = held.from; i < held.to;) {
    const group = (i / size) | 0;
    const groupEnd = Math.min(held.to, (group + 1) * size);
    const groupLeast = leastDb(i, groupEnd);
    const isNear = (groupHighDb[group] as number) >= groupLeast;
    for (let k = i; isNear && k < groupEnd;) {
      const block = (k / BLOCK) | 0;
      const end = Math.min(groupEnd, (block + 1) * BLOCK);
      const high = blockHighDb[block] as number;
      // What is too low for the whole group is so for each of its blocks.
      const least = high >= groupLeast ? leastDb(k, end) : Number.POSITIVE_INFINITY;
      if (high >= least) ranges.push({ from: k, to: end, leastDb: least });
      k = end;
    }
    i = groupEnd;
  }
  return ranges;
}

type Candidate = Suspect & { marginDb: number };

/** The peak held against the line that it comes nearest to; null where none decides it. */
function holdPeak(
  all: readonly HeldTrace[],
  held: HeldTrace,
  lines: readonly HeldLine[],
  peak: PeakPlace,
): Candidate | null {
  const sampleHz = frequencyAt(held.trace.axis, peak.index);
  const levelDb = heldLevelDb(held, peak.index);
  const { partIndex, traceIndex } = originOf(held, peak.index);
  let found: Candidate | null = null;
  for (const { line, basis } of lines) {
    const limitDb = limitAt(line.line, sampleHz);
    if (limitDb === null || (found && found.marginDb <= limitDb - levelDb)) continue;
    if (basis === "upper-bound" && isDecided(all, held, line, sampleHz)) continue;
    found = {
      number: 0,
      frequencyHz: held.trace.kind === "spots" ? sampleHz : parabolicHz(held.trace, peak.index),
      sampleHz,
      levelDb,
      limitDb,
      marginDb: limitDb - levelDb,
      prominenceDb: peak.prominenceDb,
      lineName: line.line.name,
      basis,
      traceIndex,
      partIndex,
    };
  }
  return found;
}

/** Somebody chose to measure there, so every spot near a limit is worth following. */
function spotsNear(held: HeldTrace, isNear: (i: number) => boolean): PeakPlace[] {
  return Array.from({ length: held.to - held.from }, (_, k) => held.from + k)
    .filter((i) => Number.isFinite(held.trace.levelsDb[i]) && isNear(i))
    .map((index) => ({ index, prominenceDb: 0 }));
}

function candidatesOf(
  all: readonly HeldTrace[],
  held: HeldTrace,
  lines: readonly CompiledLine[],
  rules: SuspectRules,
): Candidate[] {
  const own = lines
    .map((line): HeldLine => ({ line, basis: basisOf(held.trace, line.line.detector) }))
    .filter(({ basis }) => basis !== "cannot-decide");
  if (own.length === 0) return [];
  const isNear = (i: number) => {
    const hz = frequencyAt(held.trace.axis, i);
    return own.some(({ line }) => {
      const limitDb = limitAt(line.line, hz);
      return limitDb !== null && limitDb - heldLevelDb(held, i) <= rules.marginDb;
    });
  };
  const peaks =
    held.trace.kind === "spots"
      ? spotsNear(held, isNear)
      : nearRanges(held, own, rules.marginDb).flatMap((range) =>
          prominentPeaksIn(held.levels, range, rules.prominenceDb, isNear),
        );
  return peaks.flatMap((peak) => {
    const found = holdPeak(all, held, own, peak);
    return found && found.marginDb <= rules.marginDb ? [found] : [];
  });
}

/** Keeps those that no other of lower margin lies nearer to than one bandwidth in Hz. */
function thinOut(candidates: readonly Candidate[], rbwHz: number): Candidate[] {
  const taken = new Map<number, number[]>();
  const cell = (hz: number) => (rbwHz > 0 ? Math.floor(hz / rbwHz) : hz);
  const reach = rbwHz > 0 ? [-1, 0, 1] : [0];
  return candidates.filter(({ sampleHz }) => {
    const own = cell(sampleHz);
    const near = reach.flatMap((d) => taken.get(own + d) ?? []);
    if (near.some((hz) => hz === sampleHz || Math.abs(hz - sampleHz) < rbwHz)) return false;
    taken.set(own, [...(taken.get(own) ?? []), sampleHz]);
    return true;
  });
}

/**
 * Suspects of the held traces, lowest margin first: maxima of the wanted prominence, one RBW or
 * more from one with a lower margin (by level alone, a peak trace far under its line would hide
 * the average trace that is over), at most `marginDb` under the line. A spot is one by itself, with
 * a prominence of 0. Where the line's own detector was swept or a spot lies within reach, an upper bound of another one is no suspect. `rbwHz` is the widest of the
 * sweeps', 0 when none is stated.
 */
export function findSuspects(
  held: readonly HeldTrace[],
  lines: readonly CompiledLine[],
  rbwHz: number,
  rules: SuspectRules,
): Suspect[] {
  const candidates = held
    .flatMap((one) => candidatesOf(held, one, lines, rules))
    .sort((a, b) => a.marginDb - b.marginDb || b.levelDb - a.levelDb || a.sampleHz - b.sampleHz);
  return thinOut(candidates, rbwHz).map((suspect, i) => ({ ...suspect, number: i + 1 }));
}
