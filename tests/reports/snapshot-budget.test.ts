import { describe, expect, test } from "vitest";
import type { BudgetLine, UncertaintyBudget } from "@/lib/core/bench/uncertainty-budget";
import { guardSource } from "@/lib/reports/budget-words";
import { snapshotBudget } from "@/lib/reports/snapshot-budget";

const line = (change: Partial<BudgetLine>): BudgetLine => ({
  name: "Antenna factor",
  value: 2,
  distribution: "normal",
  sensitivity: 1,
  degreesOfFreedom: null,
  observations: null,
  ...change,
});
const budgetOf = (...lines: BudgetLine[]): UncertaintyBudget => ({
  version: 1,
  title: "Loft",
  lines,
  reference: "oats-sac-30m-1g",
});

describe("a budget in a snapshot", () => {
  test("holds contributions, u_c, k and U in dB, worked out by hand", () => {
    // 3/2, 4/√6 and 2·1/√3: u_c = √(2.25 + 2.6667 + 1.3333) = 2.5, U = 5.
    const budget = snapshotBudget(
      budgetOf(
        line({ value: 3 }),
        line({ value: 4, distribution: "triangular" }),
        line({ value: 1, distribution: "rectangular", sensitivity: 2 }),
      ),
      4,
    );
    expect(budget.lines.map((one) => one.contributionDb.toFixed(4))).toEqual([
      "1.5000",
      "1.6330",
      "1.1547",
    ]);
    expect(budget.combinedDb).toBeCloseTo(2.5, 10);
    expect(budget.expandedDb).toBeCloseTo(5, 10);
    expect(budget).toMatchObject({ revision: 4, coverageFactor: 2, student: null });
    // From memory: CISPR 16-4-2, open site, 30 MHz to 1 GHz.
    expect(budget.reference?.uncertaintyDb).toBe(6.3);
  });

  test("is the same after it was stored, with freedom that nothing limits as null", () => {
    const budget = snapshotBudget(budgetOf(line({})), 1);
    expect(budget.effectiveDegrees).toBeNull();
    expect(budget.lines[0]?.degreesOfFreedom).toBeNull();
    expect(JSON.parse(JSON.stringify(budget))).toEqual(budget);
  });

  test("gives Student's factor when there are few degrees of freedom", () => {
    const repeated = line({ value: 3, distribution: "type-a", observations: 4 });
    const budget = snapshotBudget(budgetOf(repeated), 1);
    expect(budget.effectiveDegrees).toBeCloseTo(3, 10);
    // Student, 95.45 %, 3 degrees of freedom: 3.31 (GUM table G.2, from memory).
    expect(budget.student?.coverageFactor).toBeCloseTo(3.31, 2);
  });
});

describe("where a guard comes from", () => {
  const budget = snapshotBudget(budgetOf(line({ value: 7 })), 1);
  test("is told from the recorded numbers", () => {
    expect(budget.expandedDb).toBe(7);
    expect(guardSource(7, budget)).toBe("U of the budget (w = U), rounded up");
    expect(guardSource(0.7, budget)).toBe("U − U_CISPR of the budget, rounded up");
    expect(guardSource(3, budget)).toBe("stated by the team");
    expect(guardSource(0, budget)).toBe("no guard");
    expect(guardSource(3, null)).toBe("stated by the team");
    expect(guardSource(0, null)).toBe("no guard");
  });

  test("leaves open why there is none where U lies within U_CISPR", () => {
    const small = snapshotBudget(budgetOf(line({ value: 5 })), 1);
    expect(guardSource(0, small)).toBe("U lies within U_CISPR, or no guard");
  });
});
