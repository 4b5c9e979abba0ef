import { describe, expect, test } from "vitest";
import {
  answersForOthers,
  answerWords,
  asksAlike,
  withAnswer,
} from "@/components/sweeps/file-answers";

const TRACES = [
  { column: 1, name: "Trace 1" },
  { column: 2, name: "Trace 2" },
];

describe("answers about a file", () => {
  test("say in words what they will be read as, trace by trace", () => {
    const one = withAnswer({}, "frequencyUnit", null, "1000000");
    const two = withAnswer(withAnswer(one, "unit", 1, "dBuV/m"), "detector", 1, "quasi-peak");
    expect(answerWords(two, TRACES)).toBe("frequencies in MHz; Trace 1 in dBµV/m, quasi-peak");
    expect(answerWords({}, TRACES)).toBe("");
  });

  test("a later answer replaces the earlier one of the same trace and keeps its other answers", () => {
    const first = withAnswer(withAnswer({}, "unit", 1, "dBuV"), "detector", 1, "peak");
    expect(withAnswer(first, "unit", 1, "dBm").traces).toEqual([
      { column: 1, unit: "dBm", detector: "peak" },
    ]);
  });

  test("speak for other files only when every trace was answered alike", () => {
    const alike = withAnswer(withAnswer({}, "unit", 1, "dBuV"), "unit", 2, "dBuV");
    expect(answersForOthers({ ...alike, decimal: "," })).toEqual({ unit: "dBuV", decimal: "," });
    expect(answersForOthers(withAnswer(alike, "unit", 2, "dBm"))).toBeNull();
  });

  test("do not serve a file that looks different, though it leaves the same open", () => {
    const hz = [
      { field: "frequencyUnit", guess: "1" },
      { field: "detector", guess: null },
    ] as const;
    expect(asksAlike(hz, [...hz].reverse())).toBe(true);
    expect(asksAlike(hz, [{ field: "frequencyUnit", guess: "1000000" }, hz[1]])).toBe(false);
    expect(asksAlike(hz, [hz[0]])).toBe(false);
  });
});
