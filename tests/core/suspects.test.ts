import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { readSweep } from "@/lib/core/reading/read-sweep";
import type { Detector } from "@/lib/core/sweep/settings";
import type { Trace } from "@/lib/core/sweep/trace";
import { makeTrace, randomFrom } from "../support/traces";
import { maskLine, maskOf, segment, SETTINGS } from "./hand-worked/case";

/** CISPR 32 class B above 1 GHz at 3 m, lower band: average 50, peak 70 dBµV/m. */
const MASK = maskOf([
  maskLine("average", [segment(1e9, 6e9, 50)], { name: "Average", rbwHz: 1e6, rbwKind: null }),
  maskLine("peak", [segment(1e9, 6e9, 70)], { name: "Peak", rbwHz: 1e6, rbwKind: null }),
]);

const COUNT = 2001;
const axis = { kind: "regular" as const, startHz: 1e9, stepHz: 500e3, count: COUNT };

function trace(detector: Detector, floorDb: number, lines: Record<number, number>) {
  const levels = Array.from({ length: COUNT }, (_, i) => lines[i] ?? floorDb);
  return makeTrace(levels, { detector, axis });
}

function suspectsOf(traces: Trace[], suspectMarginDb = 20) {
  const settings = { ...SETTINGS, rbwHz: 1e6 };
  return readSweep({ traces, settings, mask: MASK, guardDb: 0, suspectMarginDb }).suspects;
}

describe("the suspects of a reading", () => {
  test("shows the average trace that is over, not the higher peak trace far under its own line", () => {
    const peak = trace("peak", 35, { 1000: 58.3 });
    const average = trace("average", 25, { 1000: 58 });
    const [first, ...rest] = suspectsOf([peak, average]);
    expect(rest).toEqual([]);
    expect(first).toMatchObject({ lineName: "Average", marginDb: -8, basis: "like-for-like" });
    expect(first!.traceIndex).toBe(1);
  });

  test("lets an upper bound be silent where the line's own detector was swept, and only there", () => {
    const peak = trace("peak", 35, { 500: 55, 1500: 60 });
    const average = trace("average", 25, { 500: 40 });
    const gap = Float32Array.from(average.levelsDb, (l, i) => (i > 1400 ? Number.NaN : l));
    const found = suspectsOf([peak, { ...average, levelsDb: gap }]);
    expect(found.map((s) => [s.sampleHz, s.lineName, s.basis, s.marginDb])).toEqual([
      [1.75e9, "Average", "upper-bound", -10],
      [1.25e9, "Average", "like-for-like", 10],
    ]);
  });

  test("have the frequency of a parabola through three points in dB, and the sample's own margin", () => {
    // Three points 37, 40, 39 dB: top at (37 − 39)/(2·(37 − 2·40 + 39)) = +0.25 of a step.
    const average = trace("average", 20, { 999: 37, 1000: 40, 1001: 39 });
    expect(suspectsOf([average])[0]).toMatchObject({
      frequencyHz: 1.5e9 + 0.25 * 500e3,
      sampleHz: 1.5e9,
      levelDb: 40,
      marginDb: 10,
      prominenceDb: 20,
    });
  });

  test("are those within 20 dB of the line, with 6 dB of prominence", () => {
    const average = trace("average", 20, { 400: 30, 800: 29.875, 1200: 25.875, 1600: 31 });
    expect(suspectsOf([average]).map((s) => s.sampleHz)).toEqual([1.8e9, 1.2e9]);
    // 60 dB of room: the one with 5.875 dB of prominence is still none.
    expect(suspectsOf([average], 60).map((s) => s.sampleHz)).toEqual([1.8e9, 1.2e9, 1.4e9]);
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
        const found = suspectsOf([average], 100);
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
