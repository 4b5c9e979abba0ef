import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { combineReadings, reachesMask } from "@/lib/core/reading/combine-readings";
import { commonRanges } from "@/lib/core/reading/coverage";
import { readSweep } from "@/lib/core/reading/read-sweep";
import type { Trace } from "@/lib/core/sweep/trace";
import { makeTrace, randomFrom } from "../support/traces";
import { maskLine, maskOf, segment, SETTINGS } from "./hand-worked/case";

/** 47 CFR 15.109(a), class B at 3 m, up to 216 MHz. */
const MASK = maskOf([
  maskLine("quasi-peak", [segment(30e6, 88e6, 40), segment(88e6, 216e6, 43.5)]),
]);

const STEP = 50e3;
const COUNT = 3721;

function read(levels: number[], first = 0, detector: Trace["detector"] = "quasi-peak") {
  const axis = {
    kind: "regular" as const,
    startHz: 30e6 + first * STEP,
    stepHz: STEP,
    count: levels.length,
  };
  const trace = makeTrace(levels, { axis, detector });
  return readSweep({ traces: [trace], settings: SETTINGS, mask: MASK, guardDb: 2 });
}

const levelsOf = (seed: number, highest: number) => {
  const random = randomFrom(seed);
  return Array.from({ length: COUNT }, () => highest - 20 * random());
};

describe("combineReadings", () => {
  test("of a sweep cut in two anywhere is the reading of the whole", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 1e6 }),
        fc.integer({ min: 50, max: COUNT - 50 }),
        fc.integer({ min: 30, max: 50 }),
        (seed, cut, highest) => {
          const levels = levelsOf(seed, highest);
          const whole = read(levels);
          const parts = [read(levels.slice(0, cut)), read(levels.slice(cut), cut)];
          const combined = combineReadings(MASK, parts);
          expect(combined.standing).toBe(whole.standing);
          expect(combined.coverage).toBe(1);
          expect(combined.deciding!.worst.marginDb).toBe(whole.lines[0]!.worst!.marginDb);
          expect(combined.deciding!.worst.frequencyHz).toBe(whole.lines[0]!.worst!.frequencyHz);
        },
      ),
      { numRuns: 60 },
    );
  });

  test("is never better than any of its sweeps where they overlap", () => {
    const rank = ["over", "undecided", "inside-guard", "clear"];
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 1e6 }),
        fc.integer({ min: 30, max: 50 }),
        (seed, top) => {
          const [a, b] = [read(levelsOf(seed, top)), read(levelsOf(seed + 1, 40))];
          const combined = combineReadings(MASK, [a, b]);
          for (const one of [a, b]) {
            expect(rank.indexOf(combined.standing)).toBeLessThanOrEqual(rank.indexOf(one.standing));
            expect(combined.deciding!.worst.marginDb).toBeLessThanOrEqual(
              one.lines[0]!.worst!.marginDb,
            );
          }
        },
      ),
      { numRuns: 40 },
    );
  });

  test("stays undecided where a part was covered by none, and says how much was", () => {
    const levels = levelsOf(5, 30);
    const parts = [read(levels.slice(0, 1000)), read(levels.slice(1500), 1500)];
    const combined = combineReadings(MASK, parts);
    expect(combined.standing).toBe("undecided");
    // Missing: half a step after sample 999 to half a step before sample 1500, on a log axis.
    const gap = Math.log((30e6 + 1499.5 * STEP) / (30e6 + 999.5 * STEP));
    expect(combined.coverage).toBeCloseTo(1 - gap / Math.log(216 / 30), 3);
  });

  test("stays undecided while one sweep's upper bound lies over the line", () => {
    const clear = read(levelsOf(6, 30));
    const bound = read(levelsOf(7, 50), 0, "peak");
    expect(bound.standing).toBe("undecided");
    const combined = combineReadings(MASK, [clear, bound]);
    expect(combined.standing).toBe("undecided");
    expect(combined.deciding!.source).toBe(1);
  });
});

describe("commonRanges", () => {
  test("keeps what lies in every list", () => {
    const a = [
      { startHz: 1, stopHz: 5 },
      { startHz: 8, stopHz: 12 },
    ];
    expect(commonRanges([a, [{ startHz: 4, stopHz: 9 }]])).toEqual([
      { startHz: 4, stopHz: 5 },
      { startHz: 8, stopHz: 9 },
    ]);
    expect(commonRanges([a, []])).toEqual([]);
    expect(commonRanges([])).toEqual([]);
  });
});

describe("reachesMask", () => {
  test("tells a sweep that ends where the mask begins from one that covers it", () => {
    const touching = read([20, 20, 20], -2);
    expect(touching.lines[0]!.worst).not.toBeNull();
    expect(reachesMask(touching)).toBe(false);
    expect(reachesMask(read(levelsOf(8, 30)))).toBe(true);
  });

  test("does not look away from a sweep that is over at the very edge", () => {
    expect(reachesMask(read([20, 20, 60], -2))).toBe(true);
  });
});

describe("combineReadings over benches", () => {
  const held = (marginDb: number, guardDb: number, standing: "over" | "undecided" | "clear") => {
    const reading = read(levelsOf(9, 30));
    const [line] = reading.lines;
    const worst = { ...line!.worst!, marginDb };
    return { ...reading, guardDb, lines: [{ ...line!, worst, standing }] };
  };

  test("is inside guard when one sweep lies inside its own bench's guard, though another is lower", () => {
    const combined = combineReadings(MASK, [held(1, 0, "clear"), held(2, 6, "clear")]);
    expect(combined.standing).toBe("inside-guard");
    expect(combined.deciding!.worst.marginDb).toBe(1);
  });

  test("is over by the margin that makes it so, not by another sweep's upper bound", () => {
    const combined = combineReadings(MASK, [held(-1, 0, "over"), held(-8, 0, "undecided")]);
    expect(combined.standing).toBe("over");
    expect(combined.deciding!.worst.marginDb).toBe(-1);
    expect(combined.deciding!.source).toBe(0);
  });
});
