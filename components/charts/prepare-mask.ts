import type { Mask } from "@/lib/core/mask/mask";
import { formatFrequency, formatLevel } from "@/lib/core/units/format";
import { makePlane, type ChartMargin, type ChartPlane } from "./chart-plane";
import { drawableLines } from "./coast-lines";
import type { FrequencyView } from "./frequency-scale";
import { frequencyTicks, type FrequencyTick } from "./frequency-ticks";
import { levelRange, levelTicks } from "./level-ticks";
import { limitsWithin, prepareCoastline, type Coastline } from "./prepare-coastline";

export interface PreparedMask {
  plane: ChartPlane;
  frequencyTicks: FrequencyTick[];
  levelTicks: number[];
  coastline: Coastline;
  summary: string;
}

/** The frequencies a mask speaks of with a little sea on both sides; null without a segment. */
function maskView(mask: Mask): FrequencyView | null {
  const segments = drawableLines(mask).flatMap((line) => line.segments);
  if (segments.length === 0) return null;
  const from = Math.min(...segments.map((s) => s.startHz));
  const to = Math.max(...segments.map((s) => s.stopHz));
  const air = Math.pow(to / from, 0.03);
  return { fromHz: from / air, toHz: to * air };
}

/** A mask alone in px; null while it has no whole segment. */
export function prepareMask(
  mask: Mask,
  width: number,
  height: number,
  margin: ChartMargin,
): PreparedMask | null {
  const view = maskView(mask);
  if (!view) return null;
  const limits = limitsWithin(mask, view.fromHz, view.toHz);
  const levels = levelRange(limits, { belowDb: 8, aboveDb: 8 }, 30);
  const plane = makePlane({ view, scale: "log", levels, width, height, margin });
  const lines = drawableLines(mask).map((line) => {
    const from = formatFrequency(Math.min(...line.segments.map((s) => s.startHz)));
    const to = formatFrequency(Math.max(...line.segments.map((s) => s.stopHz)));
    const low = Math.min(...line.segments.flatMap((s) => [s.startDb, s.stopDb]));
    const name = line.name || "a line without a name";
    return `${name} from ${from} to ${to}, lowest limit ${formatLevel(low, mask.unit)}`;
  });
  return {
    plane,
    frequencyTicks: frequencyTicks(view, "log", plane.right - plane.left),
    levelTicks: levelTicks(levels, plane.bottom - plane.top),
    coastline: prepareCoastline(mask, plane),
    summary: `Mask ${mask.title || "without a title"}: ${lines.join("; ")}.`,
  };
}
