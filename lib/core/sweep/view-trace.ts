import type { LevelUnit } from "../units/level-units";
import { firstHz, indexAtOrAfter, lastHz, pointCount } from "./axis";
import { extremesOf, PYRAMID_FACTOR, type PyramidLevel } from "./pyramid";
import type { FrequencyAxis } from "./trace";
import type { TraceView } from "./trace-view";

export interface ViewRequest {
  fromHz: number;
  toHz: number;
  /** At most this many columns come back. */
  columns: number;
  /** Columns of equal width on the axis as it is drawn. */
  scale: "log" | "linear";
}

/** Samples in view, from `start` up to but not including `end`, one more on each side. */
export function samplesInView(
  axis: FrequencyAxis,
  request: Pick<ViewRequest, "fromHz" | "toHz">,
): { start: number; end: number } {
  const count = pointCount(axis);
  const start = Math.max(0, indexAtOrAfter(axis, request.fromHz) - 1);
  let end = indexAtOrAfter(axis, request.toHz);
  if (end < count) end += 1;
  return { start, end: Math.max(start, end) };
}

const MOST_SAMPLES = 65_536;
const MOST_ENTRIES = 8_192;

/** Level of the pyramid that answers a view of so many samples; 0 is the trace itself. */
export function pyramidLevelFor(samples: number): number {
  if (samples <= MOST_SAMPLES) return 0;
  let level = 1;
  while (samples / PYRAMID_FACTOR ** level > MOST_ENTRIES) level += 1;
  return level;
}

const round = (levelDb: number) =>
  Number.isNaN(levelDb) ? null : Math.round(levelDb * 1000) / 1000;

/**
 * The columns of a view. `level` holds the entries from `firstEntry` on, at least over the
 * samples in view; every true maximum in view is the maximum of a column, at its own frequency.
 * `frequencyOf` gives the frequency in Hz of a sample.
 */
export function viewTrace(
  trace: { axis: FrequencyAxis; unit: LevelUnit },
  level: PyramidLevel,
  firstEntry: number,
  request: ViewRequest,
  frequencyOf: (index: number) => number,
): TraceView {
  const { axis, unit } = trace;
  const { start, end } = samplesInView(axis, request);
  const size = level.samplesPerEntry;
  const first = Math.floor(start / size);
  const last = Math.ceil(end / size);
  const view: TraceView = {
    unit,
    firstHz: firstHz(axis),
    lastHz: lastHz(axis),
    points: end - start,
    samplesPerBucket: size,
    hz: [],
    maxDb: [],
    minDb: [],
  };
  const add = (from: number, to: number) => {
    const found = extremesOf(level, from - firstEntry, to - firstEntry);
    view.hz.push(frequencyOf(found.maxAt));
    view.maxDb.push(round(found.maxDb));
    view.minDb.push(round(found.minDb));
    view.samplesPerBucket = Math.max(view.samplesPerBucket, (to - from) * size);
  };
  if (last - first <= request.columns) {
    for (let i = first; i < last; i += 1) add(i, i + 1);
    return view;
  }
  const low = Math.max(frequencyOf(start), Number.MIN_VALUE);
  const high = frequencyOf(end - 1);
  const isLog = request.scale === "log";
  let from = first;
  for (let column = 1; column <= request.columns; column += 1) {
    const share = column / request.columns;
    const edgeHz = isLog ? low * (high / low) ** share : low + (high - low) * share;
    const edge = column === request.columns ? last : Math.ceil(indexAtOrAfter(axis, edgeHz) / size);
    if (edge <= from) continue;
    add(from, Math.min(edge, last));
    from = Math.min(edge, last);
  }
  return view;
}
