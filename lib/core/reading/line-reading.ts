import type { CompiledLine, LinePiece } from "../mask/compile-line";
import { pieceLimitAt } from "../mask/compile-line";
import { EDGE_TOLERANCE, limitAt } from "../mask/limit-at";
import { firstHz, frequencyAt, indexAfter, indexAtOrAfter, lastHz } from "../sweep/axis";
import { basisOf, tightness } from "./basis";
import { coverageOf, coveredShare, inRanges, mergeRanges, spansBands } from "./coverage";
import type { HeldTrace } from "./held-trace";
import type { Lowest } from "./lowest-margin";
import { findLowest, heldLevelDb, keepLowest, nothingFound } from "./lowest-margin";
import { speaksFor } from "./position";
import { originOf } from "./prepare-parts";
import type {
  BandReading,
  Basis,
  Coverage,
  FrequencyRange,
  LineReading,
  MarginPoint,
  Standing,
} from "./reading";

/** A trace that can say something about a line, and where it is not heard. */
export interface UsedTrace {
  held: HeldTrace;
  basis: Basis;
  rank: number;
  /** Where a tighter trace of the same position speaks; ascending. */
  silent: FrequencyRange[];
}

/** Share by which a distance may miss the reach that it means, when worked out from MHz. */
const REACH_TOLERANCE = 1e-9;

/** How far to both sides in Hz a spot speaks for a trace. */
export function reachOf(held: HeldTrace): number {
  const stepHz = Number.isFinite(held.stepHz) ? held.stepHz : 0;
  return Math.max(held.part.settings.rbwHz ?? 0, stepHz) * (1 + REACH_TOLERANCE);
}

/** Where tighter traces of the same position speak, so that a looser bound is not heard. */
function silentRanges(used: Omit<UsedTrace, "silent">, all: readonly Omit<UsedTrace, "silent">[]) {
  const reach = reachOf(used.held);
  return mergeRanges(
    all
      .filter((other) => other.rank > used.rank && speaksFor(other.held.part, used.held.part))
      .flatMap(({ held }) => {
        const { trace, levels } = held;
        // Between points further apart than its bandwidth a scan has seen nothing.
        const isSparse = held.stepHz > (held.part.settings.rbwHz ?? Number.POSITIVE_INFINITY);
        if (trace.kind === "scan" && !isSparse) return held.covered.map((range) => ({ ...range }));
        return Array.from({ length: levels.count }, (_, i) => i)
          .filter((i) => Number.isFinite(trace.levelsDb[i]))
          .map((i) => frequencyAt(trace.axis, i))
          .map((hz) => ({ startHz: hz - reach, stopHz: hz + reach }));
      }),
  );
}

/** The traces whose detector can say something about the line. */
export function useTraces(line: CompiledLine, held: readonly HeldTrace[]): UsedTrace[] {
  const usable = held
    .map((one) => ({
      held: one,
      basis: basisOf(one.trace, line.line.detector),
      rank: tightness(one.trace.detector),
    }))
    .filter((used) => used.basis !== "cannot-decide");
  return usable.map((used) => ({
    ...used,
    silent: used.basis === "upper-bound" ? silentRanges(used, usable) : [],
  }));
}

/** Calls `visit` with each run of samples of a trace inside a piece that is heard, edges left out. */
export function eachHeardRun(
  { held, silent }: UsedTrace,
  piece: LinePiece,
  visit: (from: number, to: number) => void,
): void {
  const { axis } = held.trace;
  const from = indexAfter(axis, piece.startHz * (1 + EDGE_TOLERANCE));
  const to = indexAtOrAfter(axis, piece.stopHz * (1 - EDGE_TOLERANCE));
  let at = Math.max(from, held.from);
  const end = Math.min(to, held.to);
  for (const range of silent) {
    if (at >= end) return;
    if (range.stopHz < piece.startHz) continue;
    if (range.startHz > piece.stopHz) break;
    const stop = Math.min(end, indexAtOrAfter(axis, range.startHz));
    if (stop > at) visit(at, stop);
    at = Math.max(at, indexAfter(axis, range.stopHz));
  }
  if (at < end) visit(at, end);
}

/** Calls `visit` with each heard sample that lies on an edge of the line, and its limit. */
export function eachHeardEdge(
  { held, silent }: UsedTrace,
  line: CompiledLine,
  visit: (sample: number, limitDb: number, edgeHz: number) => void,
): void {
  const { axis } = held.trace;
  for (const edgeHz of line.edgesHz) {
    const lastHz = edgeHz * (1 + EDGE_TOLERANCE);
    for (
      let i = Math.max(held.from, indexAtOrAfter(axis, edgeHz * (1 - EDGE_TOLERANCE)));
      i < held.to && frequencyAt(axis, i) <= lastHz;
      i += 1
    ) {
      const hz = frequencyAt(axis, i);
      const limitDb = limitAt(line.line, hz);
      if (limitDb === null || Number.isNaN(heldLevelDb(held, i)) || inRanges(silent, hz)) continue;
      visit(i, limitDb, edgeHz);
    }
  }
}

/** The piece that gives the limit at an edge; the lower one in frequency when both do. */
function pieceOfEdge(line: CompiledLine, edgeHz: number, limitDb: number): number {
  let nearest = -1;
  let off = Number.POSITIVE_INFINITY;
  line.pieces.forEach((piece, i) => {
    if (piece.stopHz !== edgeHz && piece.startHz !== edgeHz) return;
    const own = Math.abs(pieceLimitAt(piece, edgeHz) - limitDb);
    if (own >= off) return;
    off = own;
    nearest = i;
  });
  return nearest;
}

/** Lowest margins of one trace, piece by piece. */
function lowestByPiece(line: CompiledLine, used: UsedTrace): Lowest[] {
  const found = line.pieces.map((piece) => {
    const lowest = nothingFound();
    eachHeardRun(used, piece, (from, to) => findLowest(used.held, piece, from, to, lowest));
    return lowest;
  });
  eachHeardEdge(used, line, (sample, limitDb, edgeHz) => {
    const lowest = found[pieceOfEdge(line, edgeHz, limitDb)];
    if (lowest) keepLowest(lowest, sample, limitDb - heldLevelDb(used.held, sample), limitDb);
  });
  return found;
}

function pointOf(held: HeldTrace, { sample, marginDb, limitDb }: Lowest): MarginPoint | null {
  if (sample < 0) return null;
  const { partIndex, traceIndex } = originOf(held, sample);
  return {
    frequencyHz: frequencyAt(held.trace.axis, sample),
    levelDb: heldLevelDb(held, sample),
    limitDb,
    marginDb,
    traceIndex,
    partIndex,
  };
}

function lower(a: MarginPoint | null, b: MarginPoint | null): MarginPoint | null {
  if (!a || !b) return a ?? b;
  // Of equal margins the lower frequency, so that the order of files does not matter.
  const isLower =
    b.marginDb < a.marginDb || (b.marginDb === a.marginDb && b.frequencyHz < a.frequencyHz);
  return isLower ? b : a;
}

interface Worst {
  own: MarginPoint | null;
  bound: MarginPoint | null;
}

/** What is over by the line's own detector is known by that margin, not by a bound elsewhere. */
function decide({ own, bound }: Worst): { worst: MarginPoint | null; basis: Basis } {
  const isBound = bound !== null && !(own && (own.marginDb < 0 || own.marginDb <= bound.marginDb));
  const worst = isBound ? bound : own;
  return { worst, basis: worst ? (isBound ? "upper-bound" : "like-for-like") : "cannot-decide" };
}

function standingOf(
  { own }: Worst,
  worst: MarginPoint | null,
  fraction: number,
  isInside: boolean,
): { standing: Standing; explanation: string | null } {
  if (own && own.marginDb < 0) return { standing: "over", explanation: null };
  if (!worst)
    return {
      standing: "undecided",
      explanation: "No trace with a detector that can decide this line has a point on it.",
    };
  if (worst.marginDb < 0)
    return {
      standing: "undecided",
      explanation:
        "A looser detector reads over this line: measure these suspects with the line's own detector.",
    };
  if (fraction < 1) {
    // Floored, so that a mask which is not fully covered never reads 100 %.
    const percent = Math.min(99, Math.floor(fraction * 100));
    const text = `${isInside ? "Inside guard" : "Clear"} on ${percent} % of the mask; the rest was not swept.`;
    return { standing: "undecided", explanation: text };
  }
  return { standing: isInside ? "inside-guard" : "clear", explanation: null };
}

const polarizationOf = ({ part: { settings } }: HeldTrace) =>
  settings.port === "radiated" ? settings.polarization : null;

/**
 * What the used traces swept of the line, in every polarization in which it was scanned at all: one
 * that was scanned with a detector that cannot decide the line is a gap, not forgotten.
 */
function coverageOfLine(
  line: CompiledLine,
  used: readonly UsedTrace[],
  all: readonly HeldTrace[],
): Coverage {
  const meant = all.filter(
    ({ trace: { kind, axis } }) =>
      kind === "scan" && spansBands(line.ranges, firstHz(axis), lastHz(axis)),
  );
  const stated = [...new Set(meant.flatMap((held) => polarizationOf(held) ?? []))];
  const swept = used.map(({ held }) => ({
    trace: held.trace,
    covered: held.covered,
    polarization: polarizationOf(held),
  }));
  return coverageOf(line.ranges, swept, stated);
}

/**
 * Holds traces against one line: margins in dB, frequencies in Hz. `boundDb` is the lowest margin
 * of an upper bound, +Infinity without one. `all` are the held traces, whether they can decide the
 * line or not.
 */
export function readLine(
  line: CompiledLine,
  lineIndex: number,
  used: readonly UsedTrace[],
  all: readonly HeldTrace[],
): { reading: LineReading; boundDb: number } {
  const byPiece = line.pieces.map((): Worst => ({ own: null, bound: null }));
  let isInside = false;
  for (const one of used) {
    lowestByPiece(line, one).forEach((lowest, i) => {
      const worst = byPiece[i];
      const point = pointOf(one.held, lowest);
      if (!worst || !point) return;
      if (one.basis === "like-for-like") worst.own = lower(worst.own, point);
      else worst.bound = lower(worst.bound, point);
      // Each bench keeps its own guard.
      if (point.marginDb < one.held.part.guardDb) isInside = true;
    });
  }
  const coverage = coverageOfLine(line, used, all);
  const bands = line.pieces.map(({ startHz, stopHz }, i): BandReading => {
    const decided = decide(byPiece[i] ?? { own: null, bound: null });
    const share = coveredShare([{ startHz, stopHz }], coverage.gaps);
    return { startHz, stopHz, ...decided, coverage: used.length > 0 ? share : 0 };
  });
  const whole = byPiece.reduce<Worst>(
    (all, piece) => ({ own: lower(all.own, piece.own), bound: lower(all.bound, piece.bound) }),
    { own: null, bound: null },
  );
  const { worst, basis } = decide(whole);
  const reading = {
    lineIndex,
    name: line.line.name,
    detector: line.line.detector,
    basis,
    worst,
    coverage,
    bands,
    ...standingOf(whole, worst, coverage.fraction, isInside),
  };
  return { reading, boundDb: whole.bound?.marginDb ?? Number.POSITIVE_INFINITY };
}
