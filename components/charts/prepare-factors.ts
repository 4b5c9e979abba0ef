import type { FactorPoint, Transducer } from "@/lib/core/bench/signal-path";
import { formatFrequency } from "@/lib/core/units/format";
import { makePlane, type ChartMargin, type ChartPlane } from "./chart-plane";
import { frequencyTicks, type FrequencyTick } from "./frequency-ticks";
import { levelRange, levelTicks } from "./level-ticks";
import { lineStyle, type LineStyle } from "./line-styles";
import { placeNames, type PlacedName } from "./place-names";

export interface PreparedFactors {
  plane: ChartPlane;
  frequencyTicks: FrequencyTick[];
  levelTicks: number[];
  lines: { key: string; name: string; points: FactorPoint[]; style: LineStyle }[];
  names: PlacedName[];
  unplaced: string[];
  summary: string;
}

/** Points that can be drawn, ascending; what is still being typed is left out. */
function drawablePoints(transducer: Transducer): FactorPoint[] {
  return transducer.factors
    .filter((p) => Number.isFinite(p.factorDb) && Number.isFinite(p.frequencyHz))
    .filter((p) => p.frequencyHz > 0)
    .sort((a, b) => a.frequencyHz - b.frequencyHz);
}

/** Factor lines in px on a log frequency axis; null when no transducer has a point to draw. */
export function prepareFactors(
  transducers: readonly Transducer[],
  width: number,
  height: number,
  margin: ChartMargin,
): PreparedFactors | null {
  const lines = transducers
    .map((transducer, i) => ({
      key: `factor-${i}`,
      name: transducer.name || `Transducer ${i + 1}`,
      points: drawablePoints(transducer),
      style: lineStyle(i),
    }))
    .filter((line) => line.points.length > 0);
  if (lines.length === 0) return null;
  const ends = lines.flatMap(({ points }) => [points[0], points.at(-1)]);
  const hz = ends.flatMap((point) => (point ? [point.frequencyHz] : []));
  const low = Math.min(...hz);
  const high = Math.max(...hz);
  const view = high > low ? { fromHz: low, toHz: high } : { fromHz: low / 3, toHz: low * 3 };
  const values = lines.flatMap((line) => line.points.map((point) => point.factorDb));
  const levels = levelRange([...values, 0], { belowDb: 2, aboveDb: 3 }, 10);
  const plane = makePlane({ view, scale: "log", levels, width, height, margin });
  const plot = { left: plane.left, right: plane.right, top: plane.top, bottom: plane.bottom };
  const { placed, unplaced } = placeNames(
    lines.map(({ name, points }) => ({
      name,
      pieces: [points.map((p) => ({ x: plane.xOf(p.frequencyHz), y: plane.yOf(p.factorDb) }))],
    })),
    plot,
  );
  const spans = lines.map(({ name, points }) => {
    const from = formatFrequency(points[0]?.frequencyHz ?? low);
    return `${name} from ${from} to ${formatFrequency(points.at(-1)?.frequencyHz ?? high)}`;
  });
  return {
    plane,
    frequencyTicks: frequencyTicks(view, "log", plane.right - plane.left),
    levelTicks: levelTicks(levels, plane.bottom - plane.top),
    lines,
    names: placed,
    unplaced,
    summary: `Factors in dB over frequency: ${spans.join("; ")}.`,
  };
}
