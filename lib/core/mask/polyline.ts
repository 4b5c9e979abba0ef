import type { MaskLine } from "./mask";
import { limitAt, lineRanges, segmentLimitAt } from "./limit-at";

export interface PolylinePoint {
  hz: number;
  db: number;
}

const DRAWN_POINTS_PER_DECADE = 64;

/**
 * Polylines of a limit inside [fromHz, toHz], one per contiguous band, for a logarithmic axis:
 * exact at every break point, with both sides of a step, and dense enough for pieces that are
 * linear in f or that cross.
 */
export function maskPolyline(line: MaskLine, fromHz: number, toHz: number): PolylinePoint[][] {
  return lineRanges(line).flatMap((range) => {
    const from = Math.max(range.startHz, fromHz);
    const to = Math.min(range.stopHz, toHz);
    if (!(to > from)) return [];
    const stops = new Set([from, to]);
    for (const s of line.segments)
      for (const hz of [s.startHz, s.stopHz]) if (hz > from && hz < to) stops.add(hz);
    const breaks = [...stops].sort((a, b) => a - b);
    const points: PolylinePoint[] = [];
    for (let i = 0; i + 1 < breaks.length; i += 1) {
      const a = breaks[i] ?? from;
      const b = breaks[i + 1] ?? to;
      const inside = line.segments.filter((s) => s.startHz <= a && s.stopHz >= b);
      const at = (hz: number) => Math.min(...inside.map((s) => segmentLimitAt(s, hz)));
      const straight = inside.length === 1 && inside[0]?.interpolation === "log";
      const pieces = straight
        ? 1
        : Math.max(1, Math.ceil(Math.log10(b / a) * DRAWN_POINTS_PER_DECADE));
      points.push({ hz: a, db: at(a) });
      for (let k = 1; k < pieces; k += 1) {
        const hz = a * Math.pow(b / a, k / pieces);
        points.push({ hz, db: limitAt(line, hz) ?? at(hz) });
      }
      points.push({ hz: b, db: at(b) });
    }
    return [points];
  });
}
