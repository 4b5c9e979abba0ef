import { beforeAll, describe, expect, test } from "vitest";
import { applySignalPath } from "@/lib/core/bench/apply-signal-path";
import type { Transducer } from "@/lib/core/bench/signal-path";
import { limitAt } from "@/lib/core/mask/limit-at";
import type { MaskSegment } from "@/lib/core/mask/mask";
import { readSweep } from "@/lib/core/reading/read-sweep";
import { powerSumDb } from "@/lib/core/sweep/band-power";
import { floorOf, floorWindow, runningFloor } from "@/lib/core/sweep/floor";
import { prominentPeaks } from "@/lib/core/sweep/prominent-peaks";
import type { FrequencyAxis, Trace } from "@/lib/core/sweep/trace";
import { hasNumpy, NUMPY_NOTE, runPythonOnFiles } from "../support/numpy";
import { randomFrom } from "../support/traces";
import { maskLine, maskOf, SETTINGS } from "./hand-worked/case";
import { frequenciesOf } from "./reading-changes";
import { SCIPY_SCRIPT } from "./reading-scipy-script";

const RBW_HZ = 1e3;

interface Generated {
  trace: Trace;
  hz: number[];
  segments: MaskSegment[];
  transducers: Transducer[];
}

/** A sweep of noise and lines in dBm, a mask and a signal path, the same ones for a seed. */
function generate(seed: number): Generated {
  const random = randomFrom(seed);
  const whole = (from: number, to: number) => from + Math.floor(random() * (to - from + 1));
  const count = whole(120, 600);
  const startHz = 1000 * whole(150, 500);
  const stepHz = 500 * whole(2, 20);
  let at = startHz;
  const axis: FrequencyAxis =
    seed % 2 === 0
      ? { kind: "regular", startHz, stepHz, count }
      : {
          kind: "listed",
          frequenciesHz: Float64Array.from({ length: count }, () => (at += stepHz * whole(1, 2))),
        };
  // Whole decibels in every third sweep, so that plateaus and equal peaks come up.
  const round = seed % 3 === 0 ? Math.round : (db: number) => db;
  const levelsDb = Float32Array.from({ length: count }, () => {
    if (seed % 4 === 1 && random() < 0.02) return Number.NaN;
    return round(-90 + 12 * random() + (random() > 0.95 ? 40 * random() : 0));
  });
  const segments = Array.from({ length: whole(1, 5) }, (): MaskSegment => {
    const from = 1000 * whole(100, 4000);
    const startDb = -80 + 40 * random();
    return {
      startHz: from,
      stopHz: from + 1000 * whole(5, 2000),
      startDb,
      stopDb: random() < 0.3 ? startDb : -80 + 40 * random(),
      interpolation: random() < 0.6 ? "log" : "linear",
    };
  });
  const transducers = (["lisn", "cable", "preamplifier"] as const).map((kind): Transducer => {
    let hz = 1000 * whole(50, 200);
    const factors = Array.from({ length: whole(2, 12) }, () => {
      hz = Math.round(hz * (1.2 + 2 * random()));
      return { frequencyHz: hz, factorDb: 20 * random() };
    });
    return { name: kind, kind, calibratedOn: null, dueOn: null, factors };
  });
  const trace: Trace = {
    name: "A trace",
    kind: "scan",
    detector: "peak",
    hold: "none",
    unit: "dBm",
    axis,
    levelsDb,
  };
  return { trace, hz: frequenciesOf(axis), segments, transducers };
}

interface Outside {
  limits: (number | null)[];
  margin: number | null;
  path: (number | null)[];
  peaks: [index: number, prominenceDb: number][];
  floor: (number | null)[];
  median: number;
  power: number;
}

/** What a float32 may be off by: half of its last place. */
const halfPlace = (db: number) => 2 ** (Math.floor(Math.log2(Math.abs(db))) - 24) * (1 + 1e-6);

describe.skipIf(!hasNumpy)(`200 sweeps read by numpy and scipy too${NUMPY_NOTE}`, () => {
  const sweeps = Array.from({ length: 200 }, (_, k) => generate(9000 + k));
  let outside: Outside[] = [];
  const each = (check: (sweep: Generated, read: Outside, at: string) => void) =>
    sweeps.forEach((sweep, k) => check(sweep, outside[k]!, `sweep ${k}`));

  beforeAll(() => {
    const files: Record<string, Float32Array | Float64Array> = {};
    sweeps.forEach(({ trace, hz }, k) => {
      files[`${k}.hz`] = Float64Array.from(hz);
      files[`${k}.db`] = trace.levelsDb;
    });
    const cases = sweeps.map(({ trace, segments, transducers }) => ({
      segments,
      transducers,
      window: floorWindow(trace, RBW_HZ),
    }));
    outside = runPythonOnFiles<Outside[]>(SCIPY_SCRIPT, files, { cases });
  });

  test("numpy.interp over log f or f gives the same limit at every point", () => {
    let compared = 0;
    each(({ hz, segments }, read, at) => {
      const line = maskLine("peak", segments);
      hz.forEach((f, i) => {
        const [own, other] = [limitAt(line, f), read.limits[i]!];
        if (own === null || other === null) return expect(own, `${at}, ${f} Hz`).toBe(other);
        compared += 1;
        if (!(Math.abs(own - other) < 1e-9)) expect(own, `${at}, ${f} Hz`).toBe(other);
      });
    });
    expect(compared).toBeGreaterThan(10_000);
  });

  test("the lowest of limit minus level is the worst margin, within 1e-6 dB", () => {
    each(({ trace, segments }, read, at) => {
      const mask = {
        ...maskOf([maskLine("peak", segments)], { unit: "dBm", distanceM: null }),
        port: "mains" as const,
      };
      const settings = { ...SETTINGS, port: "mains" as const };
      const { worst } = readSweep({ traces: [trace], settings, mask, guardDb: 0 }).lines[0]!;
      if (read.margin === null) return expect(worst, at).toBeNull();
      expect(Math.abs(worst!.marginDb - read.margin), at).toBeLessThan(1e-6);
    });
  });

  test("numpy.interp over log f of three factor tables gives the same levels", () => {
    let [covered, outsideTables] = [0, 0];
    each(({ trace, transducers }, read, at) => {
      const after = applySignalPath(trace, { version: 1, impedanceOhm: 50, transducers })!;
      after.levelsDb.forEach((db, i) => {
        const other = read.path[i]!;
        if (other === null) {
          outsideTables += 1;
          return expect(db, `${at}, point ${i}`).toBeNaN();
        }
        covered += 1;
        // Levels are stored as float32: exact to half of the last place, 2e-6 dB at 32 to 64 dB.
        if (!(Math.abs(db - other) <= halfPlace(other) + 1e-9))
          expect(db, `${at}, point ${i}`).toBe(other);
      });
    });
    expect(covered).toBeGreaterThan(10_000);
    expect(outsideTables).toBeGreaterThan(1000);
  });

  test("scipy.signal.find_peaks finds the same peaks with the same prominence", () => {
    let found = 0;
    each(({ trace }, read, at) => {
      const own = prominentPeaks(trace.levelsDb, 6);
      expect(
        own.map((peak) => peak.index),
        at,
      ).toEqual(read.peaks.map(([index]) => index));
      own.forEach((peak, i) =>
        expect(Math.abs(peak.prominenceDb - read.peaks[i]![1]), at).toBeLessThan(1e-6),
      );
      found += own.length;
    });
    expect(found).toBeGreaterThan(2000);
  });

  test("numpy.percentile of every window gives the same floor", () => {
    each(({ trace }, read, at) => {
      const own = runningFloor(trace.levelsDb, floorWindow(trace, RBW_HZ));
      own.forEach((db, i) => {
        const other = read.floor[i]!;
        if (!(Math.abs(db - other) <= halfPlace(other) + 1e-9))
          expect(db, `${at}, point ${i}`).toBe(other);
      });
      expect(Math.abs(floorOf(trace, RBW_HZ)! - read.median), at).toBeLessThan(
        halfPlace(read.median) + 1e-9,
      );
    });
  });

  test("numpy's sum of 10^(L/10)·Δf is the band power, within 1e-6 dB", () => {
    each(({ trace }, read, at) =>
      expect(Math.abs(powerSumDb(trace)! - read.power), at).toBeLessThan(1e-6),
    );
  });
});

describe("peaks", () => {
  test("are as scipy documents them: the middle of a plateau, each of equals, none at an end", () => {
    const at = (levels: number[]) =>
      prominentPeaks(Float32Array.from(levels), 6).map(({ index, prominenceDb }) => [
        index,
        prominenceDb,
      ]);
    expect(at([0, 10, 10, 10, 0])).toEqual([[2, 10]]);
    expect(at([0, 10, 10, 0])).toEqual([[1, 10]]);
    expect(at([0, 10, 0, 10, 0])).toEqual([
      [1, 10],
      [3, 10],
    ]);
    expect(at([10, 0, 5, 0, 10])).toEqual([]);
    expect(at([10, 10, 0, 0, 10])).toEqual([]);
    expect(at([0, 5, Number.NaN, 9, 0])).toEqual([]);
    // 4 is no base across a gap: 12 stands on 6 to its left and on 3 to its right.
    expect(at([0, 4, Number.NaN, 6, 12, 3])).toEqual([[4, 6]]);
    expect(at([])).toEqual([]);
  });
});
