import { describe, expect, test } from "vitest";
import type { BudgetDraft, BudgetLineDraft } from "@/lib/core/bench/validate-budget";
import { readBudget, validateBudget } from "@/lib/core/bench/validate-budget";

const LINE: BudgetLineDraft = {
  name: "Receiver",
  value: 1,
  distribution: "normal",
  sensitivity: 1,
  degreesOfFreedom: null,
  observations: null,
};
const draft = (...changes: Partial<BudgetLineDraft>[]): BudgetDraft => ({
  title: "",
  lines: changes.map((change) => ({ ...LINE, ...change })),
  reference: null,
});
const paths = (given: BudgetDraft, rule: Parameters<typeof validateBudget>[1] = "expanded") =>
  validateBudget(given, rule).map((p) => p.path);

describe("validateBudget", () => {
  test("takes a sound budget, and two lines of one name", () => {
    const typeA = { distribution: "type-a", observations: 2, degreesOfFreedom: 1.5 } as const;
    expect(paths(draft({}, {}, typeA, { value: 0 }, { sensitivity: -1 }))).toEqual([]);
  });

  test.each<[string, Partial<BudgetLineDraft>, string]>([
    ["no name", { name: "  " }, "name"],
    ["no value", { value: null }, "value"],
    ["a value that is no number", { value: Number.NaN }, "value"],
    ["an endless value", { value: Infinity }, "value"],
    ["a negative value", { value: -0.1 }, "value"],
    ["a value out of reach", { value: 101 }, "value"],
    ["no distribution", { distribution: null }, "distribution"],
    ["no sensitivity", { sensitivity: null }, "sensitivity"],
    ["a sensitivity of 0", { sensitivity: 0 }, "sensitivity"],
    ["a sensitivity that is no number", { sensitivity: Number.NaN }, "sensitivity"],
    ["a sensitivity out of reach", { sensitivity: -101 }, "sensitivity"],
    ["type A without observations", { distribution: "type-a" }, "observations"],
    ["type A of one", { distribution: "type-a", observations: 1 }, "observations"],
    ["type A of two and a half", { distribution: "type-a", observations: 2.5 }, "observations"],
    ["observations elsewhere", { observations: 5 }, "observations"],
    ["no degrees of freedom", { degreesOfFreedom: 0 }, "degreesOfFreedom"],
    ["degrees that are no number", { degreesOfFreedom: Number.NaN }, "degreesOfFreedom"],
  ])("refuses %s at its field", (_, change, field) => {
    expect(paths(draft({}, change))).toEqual([`lines.1.${field}`]);
    expect(readBudget(draft({}, change)).lines).toHaveLength(1);
  });

  test("names every problem of every line at once", () => {
    expect(paths(draft({ name: "", value: null }, { distribution: null }))).toEqual([
      "lines.0.name",
      "lines.0.value",
      "lines.1.distribution",
    ]);
  });

  test("asks for lines and the measurement only where the guard's rule needs them", () => {
    expect(paths(draft(), "stated")).toEqual([]);
    expect(paths(draft(), "none")).toEqual([]);
    expect(paths(draft(), "expanded")).toEqual(["lines"]);
    expect(paths(draft(), "excess")).toEqual(["lines", "reference"]);
    expect(paths({ ...draft({}), reference: "far-30m-1g" }, "excess")).toEqual([]);
  });
});
