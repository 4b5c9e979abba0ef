import { readFileSync } from "node:fs";
import { join } from "node:path";
import { maskFromJson } from "@/lib/core/mask/mask-json";
import type { Mask } from "@/lib/core/mask/mask";
import type { Trace } from "@/lib/core/sweep/trace";
import type { SnapshotTrace } from "@/lib/reports/report-content";

export function shippedMask(key: string): Mask {
  const path = join(process.cwd(), "masks", `${key}.json`);
  const read = maskFromJson(JSON.parse(readFileSync(path, "utf8")));
  if (!read.ok) throw new Error(`${key} is no mask.`);
  return read.mask;
}

const START_HZ = 30e6;
const STEP_HZ = 50e3;
const COUNT = 19_401;
export const RBW_HZ = 120e3;

/** Lines every `spacingHz` on a rising floor; repeats exactly, with a small even ripple. */
export function inventedTrace(name: string, peakDb: number, spacingHz = 24.2e6): Trace {
  const levelsDb = new Float32Array(COUNT);
  for (let i = 0; i < COUNT; i += 1) {
    const hz = START_HZ + i * STEP_HZ;
    const off = hz - Math.round(hz / spacingHz) * spacingHz;
    const order = Math.round(hz / spacingHz);
    const height = peakDb - 9 + 9 * Math.sin(order * 1.7) - 3 * Math.log2(1 + order / 12);
    const floor =
      13 + 6 * Math.log10(hz / START_HZ) + 1.6 * Math.sin(i * 12.9898) * Math.sin(i * 0.37);
    const line = height - (off / RBW_HZ) ** 2 * 12;
    levelsDb[i] = Math.max(floor, line);
  }
  const axis = { kind: "regular" as const, startHz: START_HZ, stepHz: STEP_HZ, count: COUNT };
  return { name, kind: "scan", detector: "peak", hold: "max-hold", unit: "dBuV/m", axis, levelsDb };
}

/** A regular trace as a snapshot keeps it, in buckets that keep each maximum. */
export function snapshotTrace(trace: Trace, samplesPerBucket = 16): SnapshotTrace {
  const { levelsDb } = trace;
  const hz: number[] = [];
  const maxDb: (number | null)[] = [];
  const minDb: (number | null)[] = [];
  for (let from = 0; from < levelsDb.length; from += samplesPerBucket) {
    const bucket = levelsDb.slice(from, from + samplesPerBucket);
    const finite = [...bucket].filter(Number.isFinite);
    const highest = Math.max(...finite);
    const at = from + Math.max(0, bucket.indexOf(highest));
    hz.push(START_HZ + at * STEP_HZ);
    maxDb.push(finite.length > 0 ? highest : null);
    minDb.push(finite.length > 0 ? Math.min(...finite) : null);
  }
  const finite = levelsDb.filter(Number.isFinite);
  const top = finite.reduce((a, b) => Math.max(a, b), Number.NEGATIVE_INFINITY);
  const lastHz = START_HZ + (levelsDb.length - 1) * STEP_HZ;
  return {
    name: trace.name,
    kind: trace.kind,
    detector: trace.detector,
    hold: trace.hold,
    unit: trace.unit,
    points: levelsDb.length,
    firstHz: START_HZ,
    lastHz,
    stepHz: STEP_HZ,
    maxDb: finite.length > 0 ? top : null,
    maxAtHz: finite.length > 0 ? START_HZ + levelsDb.indexOf(top) * STEP_HZ : null,
    view: {
      unit: trace.unit,
      firstHz: START_HZ,
      lastHz,
      points: levelsDb.length,
      samplesPerBucket,
      hz,
      maxDb,
      minDb,
    },
  };
}
