import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Mask, MaskLine } from "@/lib/core/mask/mask";
import { findSuspects, prominentPeaks } from "@/lib/core/reading/suspects";
import type { Detector } from "@/lib/core/sweep/settings";
import { hasNumpy, runPython } from "../support/numpy";
import { makeTrace, randomFrom } from "../support/traces";

const line = (name: string, detector: Detector, limitDb: number): MaskLine => ({
  name,
  detector,
  rbwHz: 1e6,
  rbwKind: null,
  segments: [
    { startHz: 1e9, stopHz: 6e9, startDb: limitDb, stopDb: limitDb, interpolation: "log" },
  ],
});

/** CISPR 32 class B above 1 GHz at 3 m, lower band: average 50, peak 70 dBµV/m. */
const MASK: Mask = {
  format: "neap-mask",
  version: 1,
  key: "a",
  title: "A mask",
  port: "radiated",
  unit: "dBuV/m",
  distanceM: 3,
  document: "",
  clause: "",
  edition: "",
  provenance: "team",
  note: "",
  lines: [line("Average", "average", 50), line("Peak", "peak", 70)],
};

const COUNT = 2001;
const axis = { kind: "regular" as const, startHz: 1e9, stepHz: 500e3, count: COUNT };

function trace(detector: Detector, floorDb: number, lines: Record<number, number>) {
  const levels = Array.from({ length: COUNT }, (_, i) => lines[i] ?? floorDb);
  return makeTrace(levels, { detector, axis });
}

describe("findSuspects", () => {
  test("shows the average trace that is over, not the higher peak trace far under its own line", () => {
    const peak = trace("peak", 35, { 1000: 58.3 });
    const average = trace("average", 25, { 1000: 58 });
    const [first, ...rest] = findSuspects([peak, average], MASK, 1e6, 6, 20);
    expect(rest).toEqual([]);
    expect(first).toMatchObject({ lineName: "Average", marginDb: -8, basis: "like-for-like" });
    expect(first!.traceIndex).toBe(1);
  });

  test("lets an upper bound be silent where the line's own detector was swept, and only there", () => {
    const peak = trace("peak", 35, { 500: 55, 1500: 60 });
    const average = trace("average", 25, { 500: 40 });
    const gap = Float32Array.from(average.levelsDb, (l, i) => (i > 1400 ? Number.NaN : l));
    const found = findSuspects([peak, { ...average, levelsDb: gap }], MASK, 1e6, 6, 20);
    expect(found.map((s) => [s.sampleHz, s.lineName, s.basis, s.marginDb])).toEqual([
      [1.75e9, "Average", "upper-bound", -10],
      [1.25e9, "Average", "like-for-like", 10],
    ]);
  });

  test("the first suspect is never better than any peak that stands out", () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1e6 }), (seed) => {
        const random = randomFrom(seed);
        const spikes = Object.fromEntries(
          Array.from({ length: 30 }, () => [
            2 + Math.floor(random() * (COUNT - 4)),
            45 + 20 * random(),
          ]),
        );
        const average = trace("average", 25, spikes);
        const found = findSuspects([average], MASK, 1e6, 6, 100);
        const highest = Math.max(...average.levelsDb);
        expect(found[0]!.marginDb).toBeCloseTo(50 - highest, 4);
        found.forEach((suspect, i) => {
          expect(suspect.number).toBe(i + 1);
          if (i > 0) expect(suspect.marginDb!).toBeGreaterThanOrEqual(found[i - 1]!.marginDb!);
          for (const other of found.slice(0, i))
            expect(Math.abs(other.sampleHz - suspect.sampleHz)).toBeGreaterThanOrEqual(1e6);
        });
      }),
      { numRuns: 60 },
    );
  });
});

describe("prominentPeaks against scipy.signal.find_peaks, a Debian package", () => {
  const sweeps = Array.from({ length: 200 }, (_, k) => {
    const random = randomFrom(500 + k);
    // Whole decibels now and then, so that plateaus come up.
    return Array.from({ length: 400 }, () =>
      Math.fround(k % 3 === 0 ? Math.round(30 * random()) : 30 * random()),
    );
  });

  test.skipIf(!hasNumpy)("finds the same peaks with the same prominence in 200 sweeps", () => {
    const outside = runPython<{ peaks: number[]; prominences: number[] }[]>(
      `import json, sys, numpy as np
from scipy.signal import find_peaks
out = []
for levels in json.load(sys.stdin):
    p, q = find_peaks(np.array(levels, dtype=float), prominence=6)
    out.append({"peaks": p.tolist(), "prominences": q["prominences"].tolist()})
print(json.dumps(out))`,
      sweeps,
    );
    sweeps.forEach((levels, k) => {
      const found = prominentPeaks(Float32Array.from(levels), 6);
      expect(found.map((peak) => peak.index)).toEqual(outside[k]!.peaks);
      found.forEach((peak, i) =>
        expect(peak.prominenceDb).toBeCloseTo(outside[k]!.prominences[i]!, 6),
      );
    });
  });
});
