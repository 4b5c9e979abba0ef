import { hzAtShare, shareOfHz, type AxisScaleKind, type FrequencyView } from "./frequency-scale";
import type { LevelRange } from "./level-ticks";

export interface ChartMargin {
  top: number;
  right: number;
  bottom: number;
  left: number;
}

/** Where frequencies and levels stand on the screen, px from the chart's top left corner. */
export interface ChartPlane {
  view: FrequencyView;
  scale: AxisScaleKind;
  levels: LevelRange;
  left: number;
  right: number;
  top: number;
  bottom: number;
  xOf: (hz: number) => number;
  yOf: (db: number) => number;
  hzAt: (x: number) => number;
}

export function makePlane(options: {
  view: FrequencyView;
  scale: AxisScaleKind;
  levels: LevelRange;
  width: number;
  height: number;
  margin: ChartMargin;
}): ChartPlane {
  const { view, scale, levels, width, height, margin } = options;
  const left = margin.left;
  const right = Math.max(left + 1, width - margin.right);
  const top = margin.top;
  const bottom = Math.max(top + 1, height - margin.bottom);
  return {
    ...{ view, scale, levels, left, right, top, bottom },
    xOf: (hz) => left + shareOfHz(view, scale, hz) * (right - left),
    yOf: (db) => bottom - ((db - levels.fromDb) / (levels.toDb - levels.fromDb)) * (bottom - top),
    hzAt: (x) => hzAtShare(view, scale, (x - left) / (right - left)),
  };
}
