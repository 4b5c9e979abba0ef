import type { MaskSegment } from "./mask";
import { segmentLimitAt } from "./limit-at";

/** Where two segments change places: the frequency and the level that both stand at there. */
export interface Crossing {
  hz: number;
  db: number;
}

/** Limits closer than this are the same: two prints of one slope differ by rounding alone. */
const SAME_DB = 1e-6;

/** Slope of a segment: dB per Hz when it is linear in f, dB per ln(Hz) when it is in log f. */
function slopeOf(s: MaskSegment): number {
  const rise = s.stopDb - s.startDb;
  return s.interpolation === "log"
    ? rise / Math.log(s.stopHz / s.startHz)
    : rise / (s.stopHz - s.startHz);
}

/** Between a straight and a curved piece the gap has one turning point, at slope over slope. */
function turningPoint(a: MaskSegment, b: MaskSegment): number | null {
  if (a.interpolation === b.interpolation) return null;
  const [log, linear] = a.interpolation === "log" ? [a, b] : [b, a];
  const hz = slopeOf(log) / slopeOf(linear);
  return Number.isFinite(hz) ? hz : null;
}

/**
 * Every frequency (Hz) at which two segments of one line cross inside the band they share,
 * ascending. Meeting or parting at an end of that band is no crossing.
 */
export function segmentCrossings(a: MaskSegment, b: MaskSegment): Crossing[] {
  const from = Math.max(a.startHz, b.startHz);
  const to = Math.min(a.stopHz, b.stopHz);
  if (!(to > from)) return [];
  const gap = (hz: number) => segmentLimitAt(a, hz) - segmentLimitAt(b, hz);
  const turn = turningPoint(a, b);
  const stops = turn !== null && turn > from && turn < to ? [from, turn, to] : [from, to];
  // A stop at which both stand at the same level is touched, and only what lies beside it counts.
  const known = stops.filter((hz) => Math.abs(gap(hz)) > SAME_DB);
  return known.flatMap((right, i) => {
    const left = known[i - 1];
    if (left === undefined || gap(left) > 0 === gap(right) > 0) return [];
    let [low, high] = [left, right];
    for (let k = 0; k < 100; k += 1) {
      const middle = Math.sqrt(low * high);
      if (gap(middle) > 0 === gap(left) > 0) low = middle;
      else high = middle;
    }
    return [{ hz: high, db: segmentLimitAt(a, high) }];
  });
}
