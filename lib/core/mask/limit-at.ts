import type { FrequencyRange } from "../reading/reading";
import type { MaskLine, MaskSegment } from "./mask";

/**
 * Share of a frequency within which it lies on an edge. Frequencies worked out as start + i·step
 * miss the edge that they mean by some parts in 10^16, and just past it the higher limit would
 * apply, or none.
 */
export const EDGE_TOLERANCE = 1e-12;

/** Limit of one segment at a frequency inside it, dB of the mask's unit. */
export function segmentLimitAt(segment: MaskSegment, hz: number): number {
  if (hz === segment.startHz || segment.startDb === segment.stopDb) return segment.startDb;
  if (hz === segment.stopHz) return segment.stopDb;
  const share =
    segment.interpolation === "log"
      ? Math.log(hz / segment.startHz) / Math.log(segment.stopHz / segment.startHz)
      : (hz - segment.startHz) / (segment.stopHz - segment.startHz);
  return segment.startDb + (segment.stopDb - segment.startDb) * share;
}

/**
 * Limit in dB at a frequency in Hz, or null between bands, where there is no limit. Where
 * segments meet or overlap the lower one applies (47 CFR 15.107(a), 15.109(c)).
 */
export function limitAt(line: MaskLine, hz: number): number | null {
  const slackHz = hz * EDGE_TOLERANCE;
  let lowest: number | null = null;
  for (const segment of line.segments) {
    if (hz < segment.startHz - slackHz || hz > segment.stopHz + slackHz) continue;
    const limit = segmentLimitAt(segment, hz);
    if (lowest === null || limit < lowest) lowest = limit;
  }
  return lowest;
}

/** Frequencies the line covers, ascending, touching segments merged. */
export function lineRanges(line: MaskLine): FrequencyRange[] {
  const sorted = [...line.segments].sort((a, b) => a.startHz - b.startHz);
  const ranges: FrequencyRange[] = [];
  for (const { startHz, stopHz } of sorted) {
    const last = ranges.at(-1);
    if (last && startHz <= last.stopHz) last.stopHz = Math.max(last.stopHz, stopHz);
    else ranges.push({ startHz, stopHz });
  }
  return ranges;
}
