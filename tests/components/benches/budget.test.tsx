import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, test } from "vitest";
import { draftOfLine, emptyLine, textOfLine } from "@/components/benches/budget-line-text";
import { BudgetResult, BudgetTable } from "@/components/benches/budget-table";
import { guardSentence } from "@/components/benches/budget-words";
import { expandedUncertainty } from "@/lib/core/bench/expanded-uncertainty";
import type { BudgetLine } from "@/lib/core/bench/uncertainty-budget";

const LINE: BudgetLine = {
  name: "Antenna",
  value: 7,
  distribution: "normal",
  sensitivity: 1,
  degreesOfFreedom: null,
  observations: null,
};
const resultOf = (...lines: BudgetLine[]) =>
  expandedUncertainty({ version: 1, title: "", lines, reference: null });

describe("a budget line as text", () => {
  test("reads back as the stored line", () => {
    const typeA: BudgetLine = { ...LINE, distribution: "type-a", observations: 5, sensitivity: -2 };
    for (const line of [LINE, typeA]) expect(draftOfLine(textOfLine(0, line))).toEqual(line);
  });

  test("keeps what is empty apart from what is no number", () => {
    expect(draftOfLine(emptyLine(0))).toMatchObject({ value: null, distribution: null });
    expect(draftOfLine(emptyLine(0, { value: "a lot", degreesOfFreedom: "x" }))).toMatchObject({
      value: Number.NaN,
      degreesOfFreedom: Number.NaN,
    });
    expect(draftOfLine(emptyLine(0, { value: "0,5" })).value).toBe(0.5);
  });

  test("does not send observations that another distribution left behind", () => {
    const text = emptyLine(0, { distribution: "normal", observations: "5" });
    expect(draftOfLine(text).observations).toBeNull();
  });
});

describe("where the guard comes from", () => {
  const result = resultOf(LINE);
  test.each([
    ["none", 0, "No guard"],
    ["stated", 2, "stated by the team; the budget below gives U = 7.00 dB"],
    ["expanded", 7, "w = U"],
    ["excess", 0.7, "U = 7.00 dB exceeds U_CISPR = 6.3 dB (CISPR 16-4-2, from memory)"],
    ["excess", 0, "lies within"],
  ] as const)("%s of %d dB", (rule, guardDb, words) => {
    expect(guardSentence(rule, guardDb, result, "oats-sac-30m-1g")).toContain(words);
  });
});

test("the table shows contributions, and few degrees of freedom are pointed out", () => {
  const result = resultOf(LINE, {
    ...LINE,
    name: "Repeats",
    distribution: "type-a",
    observations: 4,
  });
  const table = renderToStaticMarkup(<BudgetTable result={result} />);
  expect(table.match(/3\.50 dB/g)).toHaveLength(4);
  expect(table).toContain("50 % of u²");
  const shown = renderToStaticMarkup(<BudgetResult result={result} reference="far-30m-1g" />);
  expect(shown).toContain("9.90");
  expect(shown).toContain("12.0");
  expect(shown).toContain("5.3 dB");
  expect(shown).toContain("Student");
  const sure = renderToStaticMarkup(<BudgetResult result={resultOf(LINE)} reference={null} />);
  expect(sure).not.toContain("Student");
  expect(sure).toContain("unlimited");
});
