import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { compareSides } from "@/lib/core/delta/compare-sides";
import type { ComparedSweep } from "@/lib/core/delta/compared-sweep";
import { groupRepeats } from "@/lib/core/delta/repeats";
import { powerMeanDb, powerMeanMarginDb } from "@/lib/core/stats/power-mean";
import { welchHalfWidth } from "@/lib/core/stats/welch";
import { hasNumpy, runPython } from "../support/numpy";
import { NO_LINK, reading, sweep, TRACE } from "./delta-fixtures";

describe("powerMeanDb", () => {
  test("is the mean of powers, not of dB", () => {
    // (10^4 + 10^5) / 2 = 55000 → 47.4036 dB, by hand; the mean of the dB values would be 45.
    expect(powerMeanDb([40, 50])).toBeCloseTo(47.40362689, 8);
    expect(powerMeanMarginDb([10, 0])).toBeCloseTo(2.59637311, 8);
  });

  test("of one value, or of equal ones, is that value to the last digit", () => {
    fc.assert(
      fc.property(fc.double({ min: -300, max: 300, noNaN: true }), fc.nat(4), (level, more) => {
        expect(powerMeanDb(Array.from({ length: more + 1 }, () => level))).toBe(level);
      }),
    );
    expect(powerMeanDb([])).toBeNaN();
  });

  test("lies between the plain mean and the highest, whatever their size", () => {
    const levels = fc.array(fc.double({ min: -5000, max: 5000, noNaN: true }), { minLength: 1 });
    fc.assert(
      fc.property(levels, (values) => {
        const plain = values.reduce((sum, value) => sum + value / values.length, 0);
        expect(powerMeanDb(values)).toBeLessThanOrEqual(Math.max(...values));
        expect(powerMeanDb(values)).toBeGreaterThanOrEqual(plain - 1e-9);
      }),
    );
  });
});

describe("welchHalfWidth", () => {
  test("is k·√(s₁²/n₁ + s₂²/n₂), as by hand", () => {
    // s₁² = 1, s₂² = 4, n = 3 each: √(5/3) = 1.290994; ν = (5/3)²/((1/9)/2 + (16/9)/2) = 50/17
    // = 2.941; Student's two-sided 95 % at 2.941 is 3.2187586 (scipy.stats.t.ppf, C).
    expect(welchHalfWidth([1, 2, 3], [8, 10, 12])).toBeCloseTo(1.2909944 * 3.2187586, 6);
  });

  test("is not known with fewer than two values on a side, and 0 without any scatter", () => {
    expect(welchHalfWidth([1], [2, 3, 4])).toBeNull();
    expect(welchHalfWidth([1, 2], [])).toBeNull();
    expect(welchHalfWidth([1.1, 1.1, 1.1], [2.3, 2.3])).toBe(0);
  });

  test.skipIf(!hasNumpy)("agrees with scipy's ttest_ind(equal_var=False)", () => {
    // Hundredths of a dB: in a scatter near the smallest number scipy's own ν overflows.
    const level = fc.integer({ min: -2000, max: 8000 }).map((hundredths) => hundredths / 100);
    const side = fc.array(level, { minLength: 2, maxLength: 7 });
    const cases = fc
      .sample(fc.tuple(side, side), { numRuns: 200, seed: 7 })
      .filter(([a, b]) => new Set(a).size > 1 && new Set(b).size > 1);
    const widths = runPython<number[]>(
      `
import json, sys
from scipy.stats import ttest_ind
out = []
for a, b in json.load(sys.stdin):
    low, high = ttest_ind(b, a, equal_var=False).confidence_interval(0.95)
    out.append((high - low) / 2)
print(json.dumps(out))`,
      cases,
    );
    expect(widths).toHaveLength(cases.length);
    cases.forEach(([a, b], i) => {
      expect((welchHalfWidth(a, b) ?? 0) / (widths[i] ?? 0)).toBeCloseTo(1, 6);
    });
  });
});

const at = (id: string, maxDb: number, marginDb: number, floorDb = 20): ComparedSweep =>
  sweep({
    id,
    name: id,
    traces: [{ ...TRACE, maxDb, floorDb, powerSumDb: maxDb + 70 }],
    readings: [reading(marginDb)],
  });

describe("compareSides with repeats", () => {
  const before = [at("b1", 50, -1), at("b2", 50.4, -1.4), at("b3", 49.8, -0.8)] as const;
  const after = [at("a1", 40.2, 8.8), at("a2", 40.6, 8.4)] as const;

  test("takes levels and margins by their power mean, with Student's ± of both sides", () => {
    const { changes, beforeName, afterName } = compareSides(before, after);
    const peak = powerMeanDb([40.2, 40.6]) - powerMeanDb([50, 50.4, 49.8]);
    const half = welchHalfWidth([50, 50.4, 49.8], [40.2, 40.6]);
    expect(changes?.levels[0]?.peak).toEqual({
      changeDb: peak,
      uncertaintyDb: half,
      repeats: { before: 3, after: 2 },
      isWithinRepeatability: false,
    });
    expect(changes?.margins[0]).toMatchObject({
      beforeDb: expect.closeTo(-powerMeanDb([1, 1.4, 0.8]), 12),
      changeDb: expect.closeTo(-peak, 12),
      uncertaintyDb: expect.closeTo(half ?? 0, 12),
    });
    expect([beforeName, afterName]).toEqual(["b3 and 2 repeats", "a2 and 1 repeat"]);
    expect(changes?.repeatability).toBe("The ± is 95 % from 3 sweeps before and 2 after.");
    expect(changes?.sentence).toMatch(/^Peaks came down 9\.7 dB ± \d\.\d,/);
  });

  test("says that a change lies within the repeatability instead of claiming it", () => {
    const again = [at("a1", 50.3, -1.3), at("a2", 49.7, -0.7)] as const;
    const { changes } = compareSides(before, again);
    expect(changes?.levels[0]?.peak.isWithinRepeatability).toBe(true);
    expect(changes?.sentence).toMatch(
      /^Peaks did not move beyond repeatability \(± \d\.\d dB\), the floor did not move/,
    );
    expect(changes?.sentence).not.toMatch(/came (up|down)/);
  });

  test("gives no ± and says so when one side was swept once", () => {
    const { changes } = compareSides(before, [at("a1", 40.2, 8.8)]);
    expect(changes?.levels[0]?.peak).toMatchObject({
      uncertaintyDb: null,
      isWithinRepeatability: null,
      repeats: { before: 3, after: 1 },
    });
    expect(changes?.repeatability).toBe(
      "Swept 3 times before and once after, so no repeatability is known.",
    );
    expect(changes?.sentence).not.toContain("±");
  });

  test("turns its sign when the sides are exchanged, and is zero against itself", () => {
    const level = fc.double({ min: -100, max: 100, noNaN: true });
    const sides = fc.array(level, { minLength: 1, maxLength: 4 });
    const make = (values: number[], name: string) => {
      const made = values.map((value, i) => at(`${name}${i}`, value, -value, value / 2));
      return made as [ComparedSweep, ...ComparedSweep[]];
    };
    fc.assert(
      fc.property(sides, sides, (x, y) => {
        const [a, b] = [make(x, "x"), make(y, "y")];
        const there = compareSides(a, b).changes!;
        const back = compareSides(b, a).changes!;
        const own = compareSides(a, a).changes!;
        for (const key of ["peak", "floor", "bandPower"] as const) {
          expect(there.levels[0]![key].changeDb! + back.levels[0]![key].changeDb!).toBe(0);
          expect(there.levels[0]![key].uncertaintyDb ?? 0).toBeCloseTo(
            back.levels[0]![key].uncertaintyDb ?? 0,
            9,
          );
          expect(own.levels[0]![key].changeDb).toBe(0);
        }
        expect(there.margins[0]!.changeDb! + back.margins[0]!.changeDb!).toBe(0);
        expect(own.margins[0]!.changeDb).toBe(0);
      }),
    );
  });

  test("doubts repeats that read the same to the last digit or had other link settings", () => {
    const twin = [at("b1", 50, -1), at("b2", 50, -1)] as const;
    expect(compareSides(twin, after).doubts.join(" ")).toContain("imported twice: b1, b2");
    const other = { ...at("b2", 51, -2), link: { ...NO_LINK, coding: "8b10b" as const } };
    const { doubts } = compareSides([at("b1", 50, -1), other], after);
    expect(doubts.join(" ")).toContain("link settings differ: b1, b2");
  });

  test("takes no margin of repeats that different detectors decided", () => {
    const mixed = [at("b1", 50, -1), { ...at("b2", 50.5, 0), readings: [reading(-1, "average")] }];
    const { changes } = compareSides(mixed as [ComparedSweep, ComparedSweep], after);
    expect(changes?.margins[0]).toMatchObject({ changeDb: null, uncertaintyDb: null });
    expect(changes?.margins[0]?.note).toContain("different detectors");
  });
});

describe("groupRepeats", () => {
  const ids = (sweeps: ComparedSweep[]) =>
    groupRepeats(sweeps).map((group) => group.map((one) => one.id).join(" "));

  test("takes together what differs in nothing that forbids a delta", () => {
    const vertical = { settings: { polarization: "vertical" as const } };
    expect(
      ids([
        sweep({ id: "h1" }),
        sweep({ id: "v1", ...vertical }),
        sweep({ id: "h2", settings: { attenuationDb: 20 } }),
        sweep({ id: "path", signalPathRevisionId: "path-2" }),
        sweep({ id: "v2", ...vertical }),
        sweep({ id: "two", traces: [TRACE, { ...TRACE, detector: "quasi-peak" }] }),
        sweep({ id: "hold", traces: [{ ...TRACE, hold: "none" }] }),
      ]),
    ).toEqual(["h1 h2", "v1 v2", "path", "two", "hold"]);
  });

  test("takes nothing for a repeat while the bandwidth is not known", () => {
    const unknown = { settings: { rbwHz: null } };
    expect(ids([sweep({ id: "1", ...unknown }), sweep({ id: "2", ...unknown })])).toEqual([
      "1",
      "2",
    ]);
  });
});
