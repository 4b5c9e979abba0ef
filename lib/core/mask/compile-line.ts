import type { FrequencyRange } from "../reading/reading";
import { lineRanges, segmentLimitAt } from "./limit-at";
import type { MaskLine, MaskSegment } from "./mask";

/** A stretch between two neighbouring edges of a line, with every segment that spans it. */
export interface LinePiece {
  startHz: number;
  stopHz: number;
  segments: MaskSegment[];
}

/** A mask line cut at every frequency where one of its segments begins or ends. Hz, ascending. */
export interface CompiledLine {
  line: MaskLine;
  edgesHz: number[];
  /** Only stretches that have a limit. */
  pieces: LinePiece[];
  /** What the line covers, touching stretches merged. */
  ranges: FrequencyRange[];
}

export function compileLine(line: MaskLine): CompiledLine {
  const edgesHz = [...new Set(line.segments.flatMap((s) => [s.startHz, s.stopHz]))].sort(
    (a, b) => a - b,
  );
  const pieces: LinePiece[] = [];
  edgesHz.slice(0, -1).forEach((startHz, i) => {
    const stopHz = edgesHz[i + 1] ?? startHz;
    const segments = line.segments.filter((s) => s.startHz <= startHz && s.stopHz >= stopHz);
    if (segments.length > 0) pieces.push({ startHz, stopHz, segments });
  });
  return { line, edgesHz, pieces, ranges: lineRanges(line) };
}

/** Limit in dB inside a piece: the lowest of its segments. */
export function pieceLimitAt(piece: LinePiece, hz: number): number {
  let lowest = Number.POSITIVE_INFINITY;
  for (const segment of piece.segments) {
    const limit = segmentLimitAt(segment, hz);
    if (limit < lowest) lowest = limit;
  }
  return lowest;
}

/**
 * Below every limit in dB of a piece from one frequency to another inside it, or equal to it up to
 * rounding. Each segment only rises or only falls, so it is lowest at one of the two ends.
 */
export function lowestPieceLimit(piece: LinePiece, fromHz: number, toHz: number): number {
  let lowest = Number.POSITIVE_INFINITY;
  for (const segment of piece.segments) {
    const limit = segmentLimitAt(segment, segment.startDb <= segment.stopDb ? fromHz : toHz);
    if (limit < lowest) lowest = limit;
  }
  return lowest;
}

/** Above every limit in dB of a piece between two of its frequencies, or equal up to rounding. */
export function highestPieceLimit(piece: LinePiece, fromHz: number, toHz: number): number {
  let lowest = Number.POSITIVE_INFINITY;
  for (const segment of piece.segments) {
    const highest = segmentLimitAt(segment, segment.startDb <= segment.stopDb ? toHz : fromHz);
    if (highest < lowest) lowest = highest;
  }
  return lowest;
}
