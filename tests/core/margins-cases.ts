import type { Mask, MaskLine, MaskSegment } from "../../lib/core/mask/mask";
import type { ReadSweepInput } from "../../lib/core/reading/read-sweep";
import {
  DETECTORS,
  HOLDS,
  type Detector,
  type MeasurementSettings,
} from "../../lib/core/sweep/settings";
import type { FrequencyAxis, Trace } from "../../lib/core/sweep/trace";
import type { LevelUnit } from "../../lib/core/units/level-units";

type Random = () => number;

const whole = (random: Random, from: number, to: number) =>
  from + Math.floor(random() * (to - from + 1));
const pick = <T>(random: Random, from: readonly T[]): T =>
  from[whole(random, 0, from.length - 1)] as T;

const LIMIT_DETECTORS: Detector[] = ["peak", "quasi-peak", "rms-average", "average"];
const UNITS: [trace: LevelUnit, mask: LevelUnit][] = [
  ["dBuV", "dBuV"],
  ["dBuV/m", "dBuV/m"],
  ["dBm", "dBuV"],
  ["dBmV", "dBuV"],
  ["dBuA/m", "dBuV/m"],
];

/** Whole Hz throughout, so that samples often lie exactly on an edge of the mask. */
function makeRandomAxis(random: Random): FrequencyAxis {
  const startHz = 1000 * whole(random, 100, 400);
  const stepHz = 1000 * whole(random, 1, 20);
  const count = whole(random, 2, 120);
  if (random() < 0.5) return { kind: "regular", startHz, stepHz, count };
  let hz = startHz;
  const frequenciesHz = Float64Array.from({ length: count }, () => {
    // Now and then a spacing so wide that it is a gap.
    hz += stepHz * (random() < 0.06 ? whole(random, 5, 30) : whole(random, 1, 3));
    return hz;
  });
  return { kind: "listed", frequenciesHz };
}

function makeLevels(random: Random, count: number, offsetDb: number): Float32Array {
  let missing = 0;
  return Float32Array.from({ length: count }, () => {
    if (random() < 0.04) missing = whole(random, 1, 8);
    if (missing > 0) {
      missing -= 1;
      return Number.NaN;
    }
    return 60 * random() + offsetDb;
  });
}

/** Segments that touch, overlap, lie apart or lie in one another, in any order. */
function makeSegments(random: Random): MaskSegment[] {
  const segments: MaskSegment[] = [];
  let startHz = 1000 * whole(random, 80, 500);
  for (let i = whole(random, 1, 5); i > 0; i -= 1) {
    const stopHz = startHz + 1000 * whole(random, 5, 600);
    const startDb = 30 + 60 * random();
    segments.push({
      startHz,
      stopHz,
      startDb,
      stopDb: random() < 0.4 ? startDb : 30 + 60 * random(),
      interpolation: random() < 0.6 ? "log" : "linear",
    });
    const next = random();
    if (next < 0.4) startHz = stopHz;
    else if (next < 0.7) startHz = stopHz + 1000 * whole(random, 1, 300);
    else startHz += 1000 * whole(random, 1, 200);
  }
  return random() < 0.3 ? segments.reverse() : segments;
}

function makeTraces(random: Random, unit: LevelUnit, offsetDb: number): Trace[] {
  const shared = makeRandomAxis(random);
  return Array.from({ length: whole(random, 1, 4) }, (_, i) => {
    const axis = random() < 0.5 ? shared : makeRandomAxis(random);
    const count = axis.kind === "regular" ? axis.count : axis.frequenciesHz.length;
    const known = random() < 0.85;
    return {
      name: `Trace ${i + 1}`,
      kind: axis.kind === "listed" && random() < 0.3 ? "spots" : "scan",
      detector: known ? pick(random, LIMIT_DETECTORS) : pick(random, [...DETECTORS, null]),
      hold: random() < 0.75 ? "none" : pick(random, HOLDS),
      unit,
      axis,
      levelsDb: makeLevels(random, count, offsetDb),
    };
  });
}

/** A random sweep and mask; the same ones for the same sequence of random numbers. */
export function makeMarginCase(random: Random): ReadSweepInput {
  const [unit, maskUnit] = pick(random, UNITS);
  const impedanceOhm = pick(random, [50, 75]);
  // Where 0 dB of the trace's unit lies in the mask's, roughly, so that levels reach the limits.
  const roughDb = { dBm: 107, dBmV: 60, "dBuA/m": 51.5 }[unit as string] ?? 0;
  const lines = Array.from({ length: whole(random, 1, 3) }, (_, i): MaskLine => ({
    name: `Line ${i + 1}`,
    detector: pick(random, LIMIT_DETECTORS),
    rbwHz: 9e3,
    rbwKind: "6dB",
    segments: makeSegments(random),
  }));
  const mask: Mask = {
    format: "neap-mask",
    version: 1,
    key: "random",
    title: "Random",
    port: "other",
    unit: maskUnit,
    distanceM: null,
    document: "",
    clause: "",
    edition: "",
    provenance: "team",
    note: "",
    lines,
  };
  const settings: MeasurementSettings = {
    rbwHz: random() < 0.2 ? null : 1000 * whole(random, 1, 30),
    rbwKind: "6dB",
    vbwHz: null,
    sweepTimeS: null,
    attenuationDb: null,
    preamplifier: null,
    referenceLevelDb: null,
    polarization: null,
    heightM: null,
    azimuthDeg: null,
    distanceM: null,
    port: "other",
  };
  // Some sweeps lie low enough to be clear, others far over.
  const offsetDb = whole(random, -30, 30) - roughDb;
  return { traces: makeTraces(random, unit, offsetDb), settings, mask, guardDb: 2, impedanceOhm };
}
