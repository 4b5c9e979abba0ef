import { describe, expect, test } from "vitest";
import {
  effectiveDegrees,
  expandedUncertainty,
  standardUncertainty,
} from "@/lib/core/bench/expanded-uncertainty";
import { guardOf, U_CISPR_DB } from "@/lib/core/bench/guard";
import type { BudgetLine, UncertaintyBudget } from "@/lib/core/bench/uncertainty-budget";
import { studentQuantile } from "@/lib/core/stats/student";

const line = (change: Partial<BudgetLine> = {}): BudgetLine => ({
  name: "Antenna factor",
  value: 1,
  distribution: "normal",
  sensitivity: 1,
  degreesOfFreedom: null,
  observations: null,
  ...change,
});
const budget = (
  lines: BudgetLine[],
  reference: UncertaintyBudget["reference"] = null,
): UncertaintyBudget => ({ version: 1, title: "Loft", lines, reference });

describe("standard uncertainty", () => {
  // GUM 4.3.3 to 4.3.9 and 4.2.3; U-shaped as the arc sine distribution. Computed.
  test.each([
    [line({ value: 1.2 }), 0.6],
    [line({ value: 1.2, distribution: "rectangular" }), 0.692820323],
    [line({ value: 1.2, distribution: "triangular" }), 0.489897949],
    [line({ value: 1.2, distribution: "u-shaped" }), 0.848528137],
    [line({ value: 1.2, distribution: "type-a", observations: 9 }), 0.4],
  ])("follows from the distribution: $distribution", (given, expected) => {
    expect(standardUncertainty(given)).toBeCloseTo(expected, 9);
  });
});

describe("effective degrees of freedom", () => {
  // GUM example H.1 (from memory, computed): 25 nm (18), 9.7 (25.6), 2.9 (50), 16.6 (2).
  const H1 = [
    { contribution: 25, degreesOfFreedom: 18 },
    { contribution: 9.7, degreesOfFreedom: 25.6 },
    { contribution: 2.9, degreesOfFreedom: 50 },
    { contribution: 16.6, degreesOfFreedom: 2 },
  ];

  test("are 16.7 in GUM example H.1, whose U99 is 93 nm", () => {
    expect(effectiveDegrees(H1)).toBeCloseTo(16.765, 3);
    // The GUM prints it truncated, as G.4.1 asks for degrees of freedom.
    expect(Math.floor(effectiveDegrees(H1) * 10) / 10).toBe(16.7);
    const combined = Math.hypot(...H1.map((p) => p.contribution));
    expect(combined).toBeCloseTo(31.7, 1);
    // H.1.6 truncates to 16 degrees: t99 = 2.92.
    expect(studentQuantile(0.995, 16)).toBeCloseTo(2.92, 2);
    expect(studentQuantile(0.995, 16) * combined).toBeCloseTo(92.5, 0);
  });

  test("do not change with the unit, however large or small it makes the numbers", () => {
    for (const scale of [1e-90, 1e90]) {
      const scaled = H1.map((p) => ({ ...p, contribution: p.contribution * scale }));
      expect(effectiveDegrees(scaled)).toBeCloseTo(effectiveDegrees(H1), 9);
    }
  });

  test("are infinite where no part is limited and where nothing is uncertain", () => {
    expect(effectiveDegrees([{ contribution: 2, degreesOfFreedom: Infinity }])).toBe(Infinity);
    expect(effectiveDegrees([{ contribution: 0, degreesOfFreedom: 3 }])).toBe(Infinity);
    expect(effectiveDegrees([])).toBe(Infinity);
  });
});

describe("a budget", () => {
  test("adds contributions in squares, with sensitivities whatever their sign", () => {
    const result = expandedUncertainty(
      budget([
        line({ value: 6 }),
        line({ value: 2 * Math.sqrt(3), distribution: "rectangular", sensitivity: -2 }),
      ]),
    );
    expect(result.lines.map((l) => l.contributionDb)).toEqual([3, expect.closeTo(4, 12)]);
    expect(result.lines.map((l) => l.share)).toEqual([
      expect.closeTo(9 / 25, 12),
      expect.closeTo(16 / 25, 12),
    ]);
    expect(result.combinedDb).toBeCloseTo(5, 12);
    expect(result.expandedDb).toBeCloseTo(10, 12);
    expect(result.effectiveDegrees).toBe(Infinity);
    expect(result.student).toBeNull();
  });

  test("counts n − 1 degrees for type A, unless others are stated", () => {
    const repeat = line({ value: 2, distribution: "type-a", observations: 4 });
    const own = expandedUncertainty(budget([repeat]));
    expect(own.effectiveDegrees).toBeCloseTo(3, 12);
    // GUM table G.2, 95.45 %, 3 degrees (from memory): 3.31.
    expect(own.student?.coverageFactor).toBeCloseTo(3.31, 2);
    expect(own.student?.expandedDb).toBeCloseTo(3.31, 2);
    expect(own.expandedDb).toBeCloseTo(2, 12);
    const stated = expandedUncertainty(budget([{ ...repeat, degreesOfFreedom: 40 }]));
    expect(stated.effectiveDegrees).toBeCloseTo(40, 12);
    expect(stated.student).toBeNull();
  });

  test("without lines has no uncertainty", () => {
    expect(expandedUncertainty(budget([]))).toMatchObject({ combinedDb: 0, expandedDb: 0 });
  });
});

describe("the guard", () => {
  const six = budget([line({ value: 7 })], "oats-sac-30m-1g");

  test("follows its rule", () => {
    expect(guardOf("none", six, 3)).toBe(0);
    expect(guardOf("stated", six, 3)).toBe(3);
    expect(guardOf("stated", null, 3)).toBe(3);
    expect(guardOf("expanded", six, 3)).toBe(7);
    // 7 − 6.3.
    expect(guardOf("excess", six, 3)).toBe(0.7);
    expect(guardOf("excess", { ...six, reference: "mains-150k-30m" }, 0)).toBe(3.6);
  });

  test("is 0, never below, where U is within U_CISPR", () => {
    expect(guardOf("excess", budget([line({ value: 5 })], "oats-sac-30m-1g"), 9)).toBe(0);
  });

  test("is rounded up when it is computed", () => {
    expect(guardOf("expanded", budget([line({ value: 4.8701 })]), 0)).toBe(4.88);
    expect(guardOf("expanded", budget([line({ value: 4.87 })]), 0)).toBe(4.87);
  });

  test("is unknown where the rule lacks its budget, its lines or its measurement", () => {
    expect(guardOf("expanded", null, 3)).toBeNull();
    expect(guardOf("expanded", budget([]), 3)).toBeNull();
    expect(guardOf("excess", budget([line()]), 3)).toBeNull();
  });

  // CISPR 16-4-2, from memory.
  test("is held against U_CISPR as it is remembered", () => {
    expect(U_CISPR_DB).toEqual({
      "mains-9k-150k": 3.8,
      "mains-150k-30m": 3.4,
      "oats-sac-30m-1g": 6.3,
      "far-30m-1g": 5.3,
      "field-1g-6g": 5.2,
      "field-6g-18g": 5.5,
    });
  });
});
