import { describe, expect, test } from "vitest";
import { bandPowerDb, powerSumDb } from "@/lib/core/sweep/band-power";
import { floorOf, floorWindow, runningFloor } from "@/lib/core/sweep/floor";
import { hasNumpy, runPython } from "../support/numpy";
import { makeTrace, randomFrom } from "../support/traces";

function noisy(seed: number, count: number, gaps = false): number[] {
  const random = randomFrom(seed);
  return Array.from({ length: count }, () => {
    const level = Math.fround(20 + 10 * random() + (random() > 0.97 ? 25 : 0));
    return gaps && random() > 0.95 ? Number.NaN : level;
  });
}

/** The definition, point by point, without sliding anything. */
function slowFloor(levels: number[], window: number): number[] {
  const half = window >> 1;
  return levels.map((_, i) => {
    const part = levels.slice(Math.max(0, i - half), i + half + 1).filter((l) => !Number.isNaN(l));
    if (part.length === 0) return Number.NaN;
    const sorted = [...part].sort((a, b) => a - b);
    const rank = (sorted.length - 1) * 0.2;
    const low = sorted[Math.floor(rank)]!;
    const high = sorted[Math.min(Math.floor(rank) + 1, sorted.length - 1)]!;
    return Math.fround(low + (high - low) * (rank % 1));
  });
}

describe("the floor", () => {
  test("is a window of 200 bandwidths and never under 51 points", () => {
    expect(floorWindow(makeTrace(noisy(1, 100)), null)).toBe(51);
    expect(floorWindow(makeTrace(noisy(1, 100)), 1e3)).toBe(51);
    expect(floorWindow(makeTrace(noisy(1, 500)), 120e3)).toBe(401);
    // Wider than twice the trace changes nothing, and an absurd RBW stays harmless.
    expect(floorWindow(makeTrace(noisy(1, 100)), 1e15)).toBe(201);
    expect(floorOf(makeTrace(noisy(1, 100)), 1e15)).not.toBeNull();
  });

  test("equals the percentile of each window taken afresh, with and without gaps", () => {
    for (const gaps of [false, true]) {
      const levels = noisy(gaps ? 7 : 8, 700, gaps);
      const fast = runningFloor(Float32Array.from(levels), 101);
      const slow = slowFloor(levels, 101);
      fast.forEach((level, i) => expect(level).toBeCloseTo(slow[i]!, 5));
    }
  });

  test("does not see lines that stand on it, and follows it when it comes up", () => {
    const levels = noisy(3, 2000);
    const floor = floorOf(makeTrace(levels), 120e3)!;
    const withLines = levels.map((level, i) => (i % 20 === 0 ? level + 40 : level));
    expect(Math.abs(floorOf(makeTrace(withLines), 120e3)! - floor)).toBeLessThan(1);
    const raised = levels.map((level) => level + 12);
    expect(floorOf(makeTrace(raised), 120e3)!).toBeCloseTo(floor + 12, 4);
  });

  test("is unknown without a level", () => {
    expect(floorOf(makeTrace([Number.NaN, Number.NaN]), 120e3)).toBeNull();
  });
});

describe("band power", () => {
  test("of one line in a Gaussian filter's own width is the line", () => {
    // A Gaussian response of 3 dB width B sums to its peak times 1.0645 B (closed form).
    const rbwHz = 120e3;
    const levels = Array.from(
      { length: 401 },
      (_, i) => 60 - 12.04 * (((i - 200) * 3e3) / rbwHz) ** 2,
    );
    const trace = makeTrace(levels, {
      axis: { kind: "regular", startHz: 100e6, stepHz: 3e3, count: 401 },
    });
    expect(bandPowerDb(powerSumDb(trace), rbwHz, "3dB")).toBeCloseTo(60, 2);
  });

  test("is the same over a listed axis as over the regular one of equal points", () => {
    const levels = noisy(5, 300);
    const listed = Float64Array.from(levels, (_, i) => 30e6 + i * 60e3);
    const a = powerSumDb(makeTrace(levels))!;
    const b = powerSumDb(makeTrace(levels, { axis: { kind: "listed", frequenciesHz: listed } }))!;
    expect(b).toBeCloseTo(a, 6);
  });

  test("is not told without the filter that it depends on", () => {
    const sum = powerSumDb(makeTrace(noisy(2, 100)));
    expect(sum).not.toBeNull();
    expect(bandPowerDb(sum, null, "3dB")).toBeNull();
    expect(bandPowerDb(sum, 120e3, null)).toBeNull();
  });
});

describe("against numpy and scipy, which are Debian packages", () => {
  const generated = Array.from({ length: 40 }, (_, i) => noisy(100 + i, 900));

  test.skipIf(!hasNumpy)("floor and band power of 40 sweeps agree within 1e-4 dB", () => {
    const outside = runPython<{ floor: number; power: number }[]>(
      `import json, sys, numpy as np
out = []
for levels in json.load(sys.stdin):
    a = np.array(levels, dtype=float)
    h = 401 // 2
    f = [np.percentile(a[max(0, i - h):i + h + 1], 20) for i in range(len(a))]
    out.append({"floor": float(np.median(f)), "power": float(10*np.log10(np.sum(10**(a/10)) * 60e3))})
print(json.dumps(out))`,
      generated,
    );
    generated.forEach((levels, i) => {
      const trace = makeTrace(levels);
      // The running floor is kept as float32, which is good to 4e-6 dB here.
      expect(floorOf(trace, 120e3)!).toBeCloseTo(outside[i]!.floor, 4);
      expect(powerSumDb(trace)!).toBeCloseTo(outside[i]!.power, 6);
    });
  });
});
