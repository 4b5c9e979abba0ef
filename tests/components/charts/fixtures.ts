import { readFileSync } from "node:fs";
import type { Mask } from "@/lib/core/mask/mask";
import { maskFromJson } from "@/lib/core/mask/mask-json";
import type { Suspect } from "@/lib/core/reading/reading";
import type { TraceView } from "@/lib/core/sweep/trace-view";
import { makePlane, type ChartPlane } from "@/components/charts/chart-plane";
import type { AxisScaleKind } from "@/components/charts/frequency-scale";

export const EXTENT = { fromHz: 30e6, toHz: 1e9 };
const NO_MARGIN = { top: 0, right: 0, bottom: 0, left: 0 };

export function readMask(key: string): Mask {
  const url = new URL(`../../../masks/${key}.json`, import.meta.url);
  const read = maskFromJson(JSON.parse(readFileSync(url, "utf8")));
  if (!read.ok) throw new Error(`${key} is not a mask`);
  return read.mask;
}

/** 1000 by 100 px without margins: 0 dB at the bottom, 100 dB at the top. */
export function planeOf(view = EXTENT, scale: AxisScaleKind = "log"): ChartPlane {
  const levels = { fromDb: 0, toDb: 100 };
  return makePlane({ view, scale, levels, width: 1000, height: 100, margin: NO_MARGIN });
}

export function traceView(
  hz: number[],
  maxDb: (number | null)[],
  more: Partial<TraceView> = {},
): TraceView {
  return {
    unit: "dBuV/m",
    firstHz: hz[0] ?? 0,
    lastHz: hz.at(-1) ?? 0,
    points: hz.length,
    samplesPerBucket: 1,
    hz,
    maxDb,
    minDb: maxDb,
    ...more,
  };
}

export function suspect(number: number, sampleHz: number, more: Partial<Suspect> = {}): Suspect {
  return {
    number,
    frequencyHz: sampleHz,
    sampleHz,
    levelDb: 35,
    limitDb: 30,
    marginDb: -5,
    prominenceDb: 10,
    lineName: "Quasi-peak",
    basis: "like-for-like",
    traceIndex: 0,
    partIndex: 0,
    ...more,
  };
}

/** Every coordinate of a path, in the order in which it is drawn. */
export function pointsOf(path: string): { x: number; y: number }[] {
  return [...path.matchAll(/(-?[\d.]+),(-?[\d.]+)/g)].map(([, x, y]) => ({
    x: Number(x),
    y: Number(y),
  }));
}
