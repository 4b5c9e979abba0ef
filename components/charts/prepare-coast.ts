import type { Mask } from "@/lib/core/mask/mask";
import { basisOf } from "@/lib/core/reading/basis";
import type { Suspect } from "@/lib/core/reading/reading";
import type { TraceView } from "@/lib/core/sweep/trace-view";
import { formatFrequency, formatMargin } from "@/lib/core/units/format";
import { LEVEL_UNIT_LABELS, type LevelUnit } from "@/lib/core/units/level-units";
import { makePlane, type ChartMargin, type ChartPlane } from "./chart-plane";
import { prepareClocks, type ClockMark, type PreparedClocks } from "./clock-marks";
import type { CoastTrace } from "./coast-trace";
import { drawTrace, type DrawnTrace } from "./draw-trace";
import type { AxisScaleKind, FrequencyView } from "./frequency-scale";
import { frequencyTicks, type FrequencyTick } from "./frequency-ticks";
import { levelRange, levelTicks } from "./level-ticks";
import { placeBuoys, BUOY_RADIUS_PX, type Buoy } from "./place-buoys";
import type { Box } from "./place-names";
import { limitsWithin, prepareCoastline, type Coastline } from "./prepare-coastline";

export interface CoastInput {
  traces: readonly CoastTrace[];
  mask: Mask | null;
  suspects: readonly Suspect[];
  view: FrequencyView;
  extent: FrequencyView;
  scale: AxisScaleKind;
  guardDb: number | null;
  clocks: readonly ClockMark[];
  label: string;
  width: number;
  height: number;
  margin: ChartMargin;
}

export interface PreparedTrace extends DrawnTrace {
  id: string;
  name: string;
  role: CoastTrace["role"];
  dash: string | undefined;
  /** Land above the lines that this trace decides like for like; empty when it decides none. */
  agroundIn: string;
}

export interface PreparedCoast {
  plane: ChartPlane;
  unit: LevelUnit | null;
  frequencyTicks: FrequencyTick[];
  levelTicks: number[];
  coastline: Coastline | null;
  traces: PreparedTrace[];
  buoys: Buoy[];
  clocks: PreparedClocks;
  /** What the chart does not show, and why. */
  notes: string[];
  /** The drawing in one sentence, for those who do not see it. */
  summary: string;
  empty: boolean;
}

const OUTLINE_DASHES = [undefined, "6 3", "2 3", "9 3 2 3"];

/** What there is of a trace to draw: the part in view, or the whole until that has come. */
export function shownView(trace: CoastTrace): TraceView | null {
  return trace.view ?? trace.overview ?? null;
}

const hasLevels = (view: TraceView) => view.maxDb.some((level) => level !== null);

function levelsOf(traces: readonly CoastTrace[], unit: LevelUnit | null): (number | null)[] {
  return traces.flatMap((trace) =>
    [trace.overview, trace.view].flatMap((what) => (what?.unit === unit ? what.maxDb : [])),
  );
}

function summarise(
  input: CoastInput,
  drawn: readonly CoastTrace[],
  buoys: readonly Buoy[],
): string {
  const { label, view, mask } = input;
  const names = drawn.map((trace) => trace.name).join(" and ");
  const range = `${formatFrequency(view.fromHz)} to ${formatFrequency(view.toHz)}`;
  const inView = input.suspects.filter((s) => buoys.some((buoy) => buoy.number === s.number));
  const worst = inView.reduce<Suspect | null>(
    (low, s) =>
      s.marginDb !== null && (!low || s.marginDb < (low.marginDb ?? Infinity)) ? s : low,
    null,
  );
  const count = `${inView.length} ${inView.length === 1 ? "suspect" : "suspects"} in view`;
  const lowest = worst
    ? `, lowest margin ${formatMargin(worst.marginDb)} at ${formatFrequency(worst.sampleHz)}`
    : "";
  const against = mask ? `against ${mask.title}` : "without a mask";
  return names
    ? `${label}: ${names}, ${range}, ${against}; ${count}${lowest}.`
    : `${label}: nothing to draw, ${range}, ${against}.`;
}

/** Tells whether a box would cover the top edge of a trace; looks up the highest one per pixel. */
function waterTest(views: readonly TraceView[], plane: ChartPlane): (box: Box) => boolean {
  const highest = new Float64Array(Math.ceil(plane.right) + 1).fill(Number.POSITIVE_INFINITY);
  for (const { hz, maxDb } of views)
    hz.forEach((frequencyHz, i) => {
      const level = maxDb[i];
      const x = Math.round(plane.xOf(frequencyHz));
      if (level === null || level === undefined || !(x >= 0 && x < highest.length)) return;
      highest[x] = Math.min(highest[x] ?? Number.POSITIVE_INFINITY, plane.yOf(level));
    });
  return (box) =>
    highest
      .subarray(Math.max(0, Math.floor(box.left)), Math.max(0, Math.ceil(box.right)))
      .some((y) => y < box.bottom);
}

/** Everything the coast chart draws, in px, from what was measured. */
export function prepareCoast(input: CoastInput): PreparedCoast {
  const { traces, view, extent, scale } = input;
  const shown = traces.flatMap((trace) => {
    const what = shownView(trace);
    return what && hasLevels(what) ? [{ trace, what }] : [];
  });
  const lead = shown.find(({ trace }) => trace.role === "main") ?? shown[0] ?? null;
  const unit =
    lead?.what.unit ??
    traces.map((trace) => shownView(trace)?.unit).find(Boolean) ??
    input.mask?.unit ??
    null;
  const drawn = shown.filter(({ what }) => what.unit === unit);
  const mask = input.mask && input.mask.unit === unit ? input.mask : null;
  const notes: string[] = [];
  if (input.mask && !mask && unit)
    notes.push(
      `Mask not drawn: it is in ${LEVEL_UNIT_LABELS[input.mask.unit]}, the trace in ${LEVEL_UNIT_LABELS[unit]}.`,
    );
  if (!input.mask) notes.push("No mask: nothing here says how high is too high.");
  for (const { trace, what } of shown)
    if (what.unit !== unit && unit)
      notes.push(
        `${trace.name} not drawn: it is in ${LEVEL_UNIT_LABELS[what.unit]}, not ${LEVEL_UNIT_LABELS[unit]}.`,
      );
  const limits = mask ? limitsWithin(mask, extent.fromHz, extent.toHz) : [];
  if (mask && mask.lines.length > 0 && limits.length === 0)
    notes.push("The mask has no limit in these frequencies.");
  const levels = levelRange([...levelsOf(traces, unit), ...limits], { belowDb: 3, aboveDb: 7 }, 40);
  const plane = makePlane({ ...input, levels });
  const buoys = placeBuoys(drawn.length > 0 ? input.suspects : [], plane, input.guardDb);
  const obstacles = buoys.flatMap(({ float }) => {
    if (!float) return [];
    const r = BUOY_RADIUS_PX;
    return [{ left: float.x - r, right: float.x + r, top: float.y - r, bottom: float.y + r }];
  });
  const coastline = mask
    ? prepareCoastline(
        mask,
        plane,
        obstacles,
        waterTest(
          drawn.map(({ what }) => what),
          plane,
        ),
      )
    : null;
  if (coastline && coastline.unplaced.length > 0)
    notes.push(`Also drawn: ${coastline.unplaced.join(", ")}.`);
  let outlines = 0;
  return {
    plane,
    unit,
    frequencyTicks: frequencyTicks(view, scale, plane.right - plane.left),
    levelTicks: levelTicks(levels, plane.bottom - plane.top),
    coastline,
    traces: drawn.map(({ trace, what }) => {
      const { detector, hold } = trace;
      const decides = detector && hold && basisOf({ detector, hold }, detector) === "like-for-like";
      const outline = trace.role === "outline" ? outlines++ : 0;
      return {
        ...drawTrace(what, plane),
        ...{ id: trace.id, name: trace.name, role: trace.role },
        dash: OUTLINE_DASHES[outline % OUTLINE_DASHES.length],
        agroundIn:
          coastline && decides && trace.role !== "ambient" ? coastline.landOf(detector) : "",
      };
    }),
    buoys,
    clocks: prepareClocks(input.clocks, plane),
    notes,
    summary: summarise(
      { ...input, mask },
      drawn.map(({ trace }) => trace),
      buoys,
    ),
    empty: drawn.length === 0,
  };
}
