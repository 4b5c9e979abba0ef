import { describe, expect, test } from "vitest";
import type { CheckLine } from "@/lib/core/bench/bench-check";
import {
  CHECK_PROMINENCE_DB,
  checkStepHz,
  checkToleranceHz,
  compareCheck,
  findCheckLines,
} from "@/lib/core/bench/compare-check";
import { checkCautions } from "@/lib/core/bench/compare-check-cautions";
import type { Trace } from "@/lib/core/sweep/trace";
import { hasNumpy, runPython } from "../support/numpy";
import { makeTrace, randomFrom } from "../support/traces";

const AXIS = { kind: "regular" as const, startHz: 30e6, stepHz: 1e6, count: 101 };

/** 30 to 130 MHz in steps of 1 MHz: a floor, and levels at some frequencies in MHz. */
function sweep(floorDb: number, at: Record<number, number>): Trace {
  const levels = Array.from({ length: AXIS.count }, (_, i) => at[30 + i] ?? floorDb);
  return makeTrace(levels, { axis: AXIS });
}

/** What a trace of these lines is compared as. */
function compare(check: Trace, reference: Trace, rbwHz = 120e3) {
  const toleranceHz = checkToleranceHz(rbwHz, checkStepHz(check), checkStepHz(reference));
  const lines = findCheckLines(reference, rbwHz);
  return compareCheck(check, findCheckLines(check, rbwHz), lines, toleranceHz);
}

const COMB = { 50: 60, 70: 58, 90: 55, 110: 51 };

describe("findCheckLines", () => {
  test("finds the lines of a comb with their levels, ascending, and nothing of the floor", () => {
    expect(findCheckLines(sweep(20, COMB), 120e3)).toEqual(
      [
        [50e6, 60],
        [70e6, 58],
        [90e6, 55],
        [110e6, 51],
      ].map(([frequencyHz, levelDb]) => ({
        frequencyHz,
        levelDb,
        referenceDb: null,
        driftDb: null,
        standsOut: true,
      })),
    );
  });

  test("takes a line at exactly the prominence and leaves one just under it", () => {
    const trace = sweep(20, { 50: 20 + CHECK_PROMINENCE_DB, 70: 20 + CHECK_PROMINENCE_DB - 0.25 });
    expect(findCheckLines(trace, 120e3).map((line) => line.frequencyHz)).toEqual([50e6]);
  });

  test("keeps the higher of two lines that lie nearer than one RBW, and both at one RBW", () => {
    const trace = sweep(20, { 50: 60, 52: 61, 60: 55, 63: 54 });
    const at = (rbwHz: number) => findCheckLines(trace, rbwHz).map((l) => l.frequencyHz / 1e6);
    expect(at(2.5e6)).toEqual([52, 60, 63]);
    expect(at(2e6)).toEqual([50, 52, 60, 63]);
    expect(at(4e6)).toEqual([52, 60]);
  });

  test("takes no line at the end of the sweep or beside a gap: what lies beyond is not known", () => {
    expect(findCheckLines(sweep(20, { 30: 60, 80: Number.NaN, 81: 60, 130: 60 }), 120e3)).toEqual(
      [],
    );
    expect(findCheckLines(sweep(20, {}), 120e3)).toEqual([]);
  });
});

describe("compareCheck", () => {
  test("gives each line's drift as check minus reference, their mean and the largest by size", () => {
    const found = compare(sweep(20, { 50: 60.5, 70: 55.5, 90: 55, 110: 52 }), sweep(20, COMB));
    expect(
      found.lines.map((l) => [l.frequencyHz / 1e6, l.levelDb, l.referenceDb, l.driftDb]),
    ).toEqual([
      [50, 60.5, 60, 0.5],
      [70, 55.5, 58, -2.5],
      [90, 55, 55, 0],
      [110, 52, 51, 1],
    ]);
    // (0.5 − 2.5 + 0 + 1) / 4
    expect(found.driftMeanDb).toBeCloseTo(-0.25, 12);
    expect(found.driftWorstDb).toBe(-2.5);
    expect(found.missingHz).toEqual([]);
  });

  test("reads the level from the trace within the tolerance, where a line moved by one step", () => {
    const found = compare(sweep(20, { 51: 59, 70: 58, 90: 55, 110: 51 }), sweep(20, COMB));
    expect(found.lines[0]).toEqual({
      frequencyHz: 50e6,
      levelDb: 59,
      referenceDb: 60,
      driftDb: -1,
      standsOut: true,
    });
    expect(found.lines).toHaveLength(4);
  });

  test("a line that sank into the floor has the floor's level, and says that it does not stand out", () => {
    const found = compare(sweep(20, { 50: 60, 70: 58, 90: 55 }), sweep(20, COMB));
    expect(found.lines[3]).toMatchObject({ levelDb: 20, driftDb: -31, standsOut: false });
    expect(found.driftWorstDb).toBe(-31);
    expect(found.missingHz).toEqual([]);
  });

  test("a line outside the check's span or factor tables is missing, not zero", () => {
    const check = sweep(20, { ...COMB, 109: Number.NaN, 110: Number.NaN, 111: Number.NaN });
    const found = compare(check, sweep(20, COMB));
    expect(found.missingHz).toEqual([110e6]);
    expect(found.lines.map((line) => line.driftDb)).toEqual([0, 0, 0]);
    expect(found.driftMeanDb).toBe(0);
    const short = { ...check, axis: { ...AXIS, count: 31 } };
    expect(compare(short, sweep(20, COMB)).missingHz).toEqual([70e6, 90e6, 110e6]);
  });

  test("knows no drift where nothing overlaps", () => {
    const check = makeTrace([20, 60, 20], { axis: { ...AXIS, startHz: 1e9, count: 3 } });
    expect(compare(check, sweep(20, COMB))).toMatchObject({
      driftMeanDb: null,
      driftWorstDb: null,
      missingHz: [50e6, 70e6, 90e6, 110e6],
    });
  });

  test("lists lines that only the check has, without a drift, and does not count them", () => {
    const found = compare(sweep(20, { ...COMB, 100: 70 }), sweep(20, COMB));
    const news = found.lines.filter((line) => line.driftDb === null);
    expect(news.map((l) => [l.frequencyHz, l.levelDb, l.referenceDb])).toEqual([[100e6, 70, null]]);
    expect(found.driftWorstDb).toBe(0);
  });

  test("does not take the neighbouring line for a line, however wide the tolerance is", () => {
    const pair = sweep(20, { 50: 60, 54: 40 });
    const lines = findCheckLines(pair, 120e3);
    const found = compareCheck(pair, lines, lines, 10e6);
    expect(found.lines.map((line) => line.driftDb)).toEqual([0, 0]);
  });

  test("a whole sweep that reads 1.5 dB low drifts by −1.5 dB at every line", () => {
    const found = compare(
      sweep(18.5, { 50: 58.5, 70: 56.5, 90: 53.5, 110: 49.5 }),
      sweep(20, COMB),
    );
    expect([...new Set(found.lines.map((line) => line.driftDb))]).toEqual([-1.5]);
    expect([found.driftMeanDb, found.driftWorstDb]).toEqual([-1.5, -1.5]);
  });

  test("the tolerance is the RBW or the coarser step of both sweeps", () => {
    expect(checkToleranceHz(120e3, 60e3, 50e3)).toBe(120e3);
    expect(checkToleranceHz(9e3, 60e3, 100e3)).toBe(100e3);
    const single = { kind: "listed" as const, frequenciesHz: Float64Array.from([1e6]) };
    expect(checkStepHz(makeTrace([1], { axis: single }))).toBe(0);
    expect(checkStepHz(makeTrace([1, 2], { axis: { ...AXIS, count: 2 } }))).toBe(1e6);
  });

  test.skipIf(!hasNumpy)("agrees with scipy's peaks and numpy's differences on noisy combs", () => {
    const random = randomFrom(11);
    const noisy = (offsetDb: number) =>
      Float32Array.from({ length: 3001 }, (_, i) => {
        const line = i % 100 === 50 ? 25 + (i % 700) / 100 : 0;
        return 20 + offsetDb + line + 12 * (random() - 0.5);
      });
    const [before, after] = [noisy(0), noisy(1.25)];
    const axis = { kind: "regular" as const, startHz: 30e6, stepHz: 50e3, count: 3001 };
    const rbwHz = 120e3;
    const script = `
import json, sys
import numpy as np
from scipy.signal import find_peaks
given = json.load(sys.stdin)
f = 30e6 + 50e3 * np.arange(3001)
def lines(levels):
    at, _ = find_peaks(levels, prominence=10)
    kept = []
    for i in sorted(at, key=lambda i: -levels[i]):
        if all(abs(f[i] - f[k]) >= given["rbw"] for k in kept):
            kept.append(i)
    return np.array(sorted(kept))
a, b = np.array(given["before"]), np.array(given["after"])
ref = lines(a)
mid = (f[ref][1:] + f[ref][:-1]) / 2
low = np.maximum(f[ref] - given["rbw"] * (1 + 1e-9), np.concatenate(([0], mid)))
high = np.minimum(f[ref] + given["rbw"] * (1 + 1e-9), np.concatenate((mid, [1e12])))
drift = [float(b[(f >= l) & (f <= h)].max() - a[i]) for i, l, h in zip(ref, low, high)]
print(json.dumps({"lines": f[ref].tolist(), "own": f[lines(b)].tolist(), "drift": drift,
  "mean": float(np.mean(drift)), "worst": max(drift, key=abs)}))
`;
    const expected = runPython<{
      lines: number[];
      own: number[];
      drift: number[];
      mean: number;
      worst: number;
    }>(script, { before: [...before], after: [...after], rbw: rbwHz });
    const reference = makeTrace(before, { axis });
    const check = makeTrace(after, { axis });
    const hz = (lines: readonly CheckLine[]) => lines.map((line) => line.frequencyHz);
    const lines = findCheckLines(reference, rbwHz);
    expect(lines.length).toBeGreaterThan(30);
    expect(hz(lines)).toEqual(expected.lines);
    expect(hz(findCheckLines(check, rbwHz))).toEqual(expected.own);
    const found = compare(check, reference, rbwHz);
    const drifts = found.lines.flatMap(({ driftDb }) => (driftDb === null ? [] : [driftDb]));
    expect(drifts).toHaveLength(expected.drift.length);
    drifts.forEach((drift, i) => expect(drift).toBeCloseTo(expected.drift[i] ?? Number.NaN, 10));
    expect(found.driftMeanDb).toBeCloseTo(expected.mean, 10);
    expect(found.driftWorstDb).toBeCloseTo(expected.worst, 10);
  });
});

describe("checkCautions", () => {
  const alike = {
    hold: "none" as const,
    rbwHz: 120e3,
    stepHz: 50e3,
    corrected: false,
    pathRevision: 2,
  };

  test("says nothing of a check that was taken like its reference", () => {
    expect(checkCautions(alike, alike)).toEqual([]);
    expect(checkCautions({ ...alike, stepHz: 60e3 }, alike)).toEqual([]);
  });

  test("names another signal path, another hold, and who applied the factors", () => {
    const told = checkCautions({ ...alike, pathRevision: 3, hold: "max-hold" }, alike);
    expect(told).toHaveLength(2);
    expect(told[0]).toContain("Revision 3");
    expect(told[1]).toContain("max hold, the reference with no hold");
    const corrected = checkCautions({ ...alike, corrected: true, pathRevision: 3 }, alike);
    expect(corrected).toHaveLength(1);
    expect(corrected[0]).toContain("Here the instrument applied the factors");
  });

  test("puts a number on a coarse step: 6.02·(step/RBW)² dB, 1.5 dB at half of the RBW", () => {
    const [told, ...rest] = checkCautions({ ...alike, stepHz: 120e3 }, alike);
    expect(rest).toEqual([]);
    expect(told).toContain("6.0 dB low");
    // 6.02 · (90/120)² = 3.386
    expect(checkCautions(alike, { ...alike, stepHz: 90e3 })[0]).toContain("reference, 90.00 kHz");
    expect(checkCautions(alike, { ...alike, stepHz: 90e3 })[0]).toContain("3.4 dB low");
  });
});
