import type { TraceView } from "@/lib/core/sweep/trace-view";
import { areaPath, bandPath, linePath, type ScreenPoint } from "./chart-path";
import type { ChartPlane } from "./chart-plane";

const CROWDED_PER_PX = 1.2;

export interface DrawnTrace {
  /** Top edge: the highest level of every column. */
  edge: string;
  /** Water from the top edge down to the bottom of the chart. */
  water: string;
  /** Between the highest and the lowest level of a column; empty when each column is one sample. */
  swell: string;
}

function pointsOf(
  hz: readonly number[],
  levelsDb: readonly (number | null)[],
  plane: ChartPlane,
): (ScreenPoint | null)[] {
  return hz.map((frequencyHz, i) => {
    const level = levelsDb[i];
    const x = plane.xOf(frequencyHz);
    if (level === null || level === undefined || !Number.isFinite(level) || !Number.isFinite(x))
      return null;
    return { x, y: plane.yOf(level) };
  });
}

/**
 * Where several columns share a pixel, one column with the highest and the lowest of them: a line
 * through all of them would only be a blot. A gap among them parts the line.
 */
function columnsPerPixel(view: TraceView, plane: ChartPlane): TraceView {
  const crowded = view.hz.length / Math.max(1, plane.right - plane.left) > CROWDED_PER_PX;
  if (!crowded) return view;
  const hz: number[] = [];
  const maxDb: (number | null)[] = [];
  const minDb: (number | null)[] = [];
  let pixel = Number.NaN;
  view.hz.forEach((frequencyHz, i) => {
    const here = Math.floor(plane.xOf(frequencyHz));
    const level = view.maxDb[i] ?? null;
    const low = view.minDb[i] ?? level;
    const last = maxDb.length - 1;
    const held = maxDb[last] ?? null;
    if (here !== pixel || level === null || held === null || low === null) {
      if (level === null && last >= 0 && held === null) return;
      hz.push(frequencyHz);
      maxDb.push(level);
      minDb.push(low);
    } else {
      if (level > held) {
        hz[last] = frequencyHz;
        maxDb[last] = level;
      }
      minDb[last] = Math.min(minDb[last] ?? low, low);
    }
    pixel = here;
  });
  return { ...view, hz, maxDb, minDb };
}

/** Paths of one trace in px. Gaps of the trace stay gaps. */
export function drawTrace(whole: TraceView, plane: ChartPlane): DrawnTrace {
  const view = columnsPerPixel(whole, plane);
  const upper = pointsOf(view.hz, view.maxDb, plane);
  return {
    edge: linePath(upper),
    water: areaPath(upper, plane.bottom),
    swell:
      view.samplesPerBucket > 1 || view !== whole
        ? bandPath(upper, pointsOf(view.hz, view.minDb, plane))
        : "",
  };
}
