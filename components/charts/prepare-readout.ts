import { limitAt } from "@/lib/core/mask/limit-at";
import type { Mask } from "@/lib/core/mask/mask";
import { basisOf } from "@/lib/core/reading/basis";
import type { TraceView } from "@/lib/core/sweep/trace-view";
import { formatFrequency, formatLevel, formatMargin } from "@/lib/core/units/format";
import { drawableLines } from "./coast-lines";
import type { CoastTrace } from "./coast-trace";
import type { AxisScaleKind, FrequencyView } from "./frequency-scale";
import { shareOfHz } from "./frequency-scale";
import { shownView } from "./prepare-coast";

export interface ReadoutLimit {
  name: string;
  limit: string;
  margin: string;
  over: boolean;
  /** Why the margin does not decide the line; null when it does. */
  caveat: string | null;
}

export interface Readout {
  hz: number;
  levelDb: number;
  frequency: string;
  traces: { name: string; level: string }[];
  limits: ReadoutLimit[];
}

/** Index of the column nearest to a frequency on the axis as drawn; −1 for an empty trace. */
export function nearestColumn(view: TraceView, hz: number, by: (hz: number) => number): number {
  const { hz: columns } = view;
  let low = 0;
  let high = columns.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((columns[middle] ?? Infinity) < hz) low = middle + 1;
    else high = middle;
  }
  const after = columns[low];
  const before = columns[low - 1];
  if (after === undefined) return low - 1;
  if (before === undefined) return low;
  return by(hz) - by(before) <= by(after) - by(hz) ? low - 1 : low;
}

function stepAt(view: TraceView, i: number): number | undefined {
  const here = view.hz[i];
  const beside = view.hz[i + 1] ?? view.hz[i - 1];
  if (here === undefined || beside === undefined) return undefined;
  return Math.abs(beside - here) / Math.max(1, view.samplesPerBucket);
}

/** The trace that the crosshair follows. */
export function leadTrace(traces: readonly CoastTrace[]): CoastTrace | null {
  const drawn = traces.filter((trace) => shownView(trace));
  return drawn.find((trace) => trace.role === "main") ?? drawn[0] ?? null;
}

function limitsAt(mask: Mask, hz: number, levelDb: number, trace: CoastTrace): ReadoutLimit[] {
  return drawableLines(mask).flatMap((line) => {
    const limitDb = limitAt(line, hz);
    if (limitDb === null) return [];
    const { detector, hold } = trace;
    const basis = detector && hold ? basisOf({ detector, hold }, line.detector) : null;
    const caveat =
      basis === "upper-bound"
        ? "upper bound"
        : basis === "cannot-decide"
          ? "other detector, cannot decide"
          : detector === null
            ? "detector not stated"
            : null;
    return [
      {
        name: line.name,
        limit: formatLevel(limitDb, mask.unit),
        margin: formatMargin(limitDb - levelDb),
        over: limitDb < levelDb && basis === "like-for-like",
        caveat,
      },
    ];
  });
}

/**
 * What the crosshair reads at the sample nearest to a frequency: levels of every trace at its own
 * nearest sample, and each mask line there. null where the trace has a gap.
 */
export function readAt(
  traces: readonly CoastTrace[],
  mask: Mask | null,
  hz: number,
  view: FrequencyView,
  scale: AxisScaleKind,
): Readout | null {
  const lead = leadTrace(traces);
  const leadView = lead && shownView(lead);
  if (!lead || !leadView) return null;
  const by = (frequencyHz: number) => shareOfHz(view, scale, frequencyHz);
  const column = nearestColumn(leadView, hz, by);
  const sampleHz = leadView.hz[column];
  const levelDb = leadView.maxDb[column];
  if (sampleHz === undefined || levelDb === null || levelDb === undefined) return null;
  if (sampleHz < view.fromHz || sampleHz > view.toHz) return null;
  const others = traces.flatMap((trace) => {
    const what = shownView(trace);
    if (!what || trace.id === lead.id || what.unit !== leadView.unit) return [];
    const inside = sampleHz >= what.firstHz && sampleHz <= what.lastHz;
    const level = inside ? (what.maxDb[nearestColumn(what, sampleHz, by)] ?? null) : null;
    return [{ name: trace.name, level: formatLevel(level, what.unit) }];
  });
  return {
    hz: sampleHz,
    levelDb,
    frequency: formatFrequency(sampleHz, stepAt(leadView, column)),
    traces: [{ name: lead.name, level: formatLevel(levelDb, leadView.unit) }, ...others],
    limits: mask && mask.unit === leadView.unit ? limitsAt(mask, sampleHz, levelDb, lead) : [],
  };
}

/** Rows to keep free for a readout, so that the chart does not jump when one appears. */
export function readoutRows(
  traces: readonly { name: string }[],
  mask: Mask | null,
  widthPx: number,
): number {
  const names = traces.map((trace) => trace.name.length + 16);
  const limits = (mask?.lines ?? []).slice(0, 3).map((line) => line.name.length + 48);
  const characters = [14, ...names, ...limits].reduce((sum, count) => sum + count, 0);
  return Math.min(5, Math.max(1, Math.ceil((characters * 6.4) / Math.max(200, widthPx))));
}

/** The next sample with a level, to the right (1) or the left (−1), for keys. */
export function stepSample(view: TraceView, fromHz: number, direction: 1 | -1): number | null {
  const start = nearestColumn(view, fromHz, (hz) => hz);
  for (let i = start + direction; i >= 0 && i < view.hz.length; i += direction)
    if (view.maxDb[i] !== null && view.maxDb[i] !== undefined) return view.hz[i] ?? null;
  return null;
}
