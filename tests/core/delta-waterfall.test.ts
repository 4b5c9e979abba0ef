import { describe, expect, test } from "vitest";
import { compareSides } from "@/lib/core/delta/compare-sides";
import type { ComparedSweep } from "@/lib/core/delta/compared-sweep";
import type { OrderedStep } from "@/lib/core/delta/ladder-order";
import { baseOfStep, lineOfSteps, misplacedBranch } from "@/lib/core/delta/ladder-order";
import { pairSweeps } from "@/lib/core/delta/pair-sweeps";
import type { WaterfallStep } from "@/lib/core/delta/waterfall";
import { linesOfLadder, waterfallOf } from "@/lib/core/delta/waterfall";
import { reading, sweep } from "./delta-fixtures";

/** Steps by short notes: "0", "1", "2x" (dropped), "3<1" (starts from 1), "3x<1". */
function stepsOf(notes: string[]): OrderedStep[] {
  return notes.map((note) => ({
    id: note[0] ?? "",
    branchOfId: note.split("<")[1] ?? null,
    state: note.includes("x") ? "dropped" : "kept",
  }));
}

const basesOf = (notes: string[]) => {
  const steps = stepsOf(notes);
  return steps.map((_, i) => baseOfStep(steps, i)?.id ?? null);
};

describe("baseOfStep", () => {
  test("is the last kept step before, and step 0 when there is none", () => {
    expect(basesOf(["0", "1", "2", "3"])).toEqual([null, "0", "1", "2"]);
    expect(basesOf(["0", "1x", "2", "3x", "4"])).toEqual([null, "0", "0", "2", "2"]);
  });

  test("is what a step says it starts from, dropped or not", () => {
    expect(basesOf(["0", "1", "2x", "3<1", "4<2"])).toEqual([null, "0", "1", "1", "2"]);
  });

  test("of the step after a kept branch is that branch; after a dropped one it is not", () => {
    expect(basesOf(["0", "1", "2", "3<1", "4"])[4]).toBe("3");
    expect(basesOf(["0", "1", "2", "3x<1", "4"])[4]).toBe("2");
  });

  test("is never a step that does not come before, whatever is stored", () => {
    expect(basesOf(["0", "1<2", "2"])[1]).toBeNull();
    expect(basesOf(["0", "1<1"])[1]).toBeNull();
  });
});

describe("lineOfSteps", () => {
  const lineOf = (notes: string[]) =>
    lineOfSteps(stepsOf(notes))
      .map((step) => step.id)
      .join("");

  test("leads from step 0 to the last kept step over their bases", () => {
    expect(lineOf(["0", "1", "2", "3"])).toBe("0123");
    expect(lineOf(["0", "1", "2x", "3", "4x"])).toBe("013");
    expect(lineOf(["0", "1", "2", "3<1", "4"])).toBe("0134");
    expect(lineOf(["0", "1x", "2x"])).toBe("0");
    expect(lineOf([])).toBe("");
  });
});

test("misplacedBranch names the first step that stands before the one it starts from", () => {
  expect(misplacedBranch(stepsOf(["0", "2<1", "1"]))?.id).toBe("2");
  expect(misplacedBranch(stepsOf(["0", "1", "2<1"]))).toBeNull();
});

/** A step with its sweeps and what they say against their base. */
function arrange(
  given: { note: string; sweeps: ComparedSweep[] }[],
  accepted: Parameters<typeof compareSides>[2] | null = null,
): WaterfallStep[] {
  const order = stepsOf(given.map((one) => one.note));
  return order.map((step, i) => {
    const base = baseOfStep(order, i);
    const before = base ? (given[order.indexOf(base)]?.sweeps ?? []) : [];
    const sweeps = given[i]?.sweeps ?? [];
    const deltas = pairSweeps(before, sweeps).map((pair) => ({
      beforeIds: pair.before.map((one) => one.id),
      afterIds: pair.after.map((one) => one.id),
      ...compareSides(pair.before, pair.after, accepted ?? undefined),
    }));
    return { ...step, position: i, name: `Step ${i}`, sweeps, againstPrevious: deltas };
  });
}

let made = 0;
const at = (
  marginDb: number,
  polarization: "horizontal" | "vertical" = "horizontal",
  more: Parameters<typeof sweep>[0] = {},
) => {
  made += 1;
  return sweep({
    id: `sweep-${made}`,
    readings: [reading(marginDb)],
    ...more,
    settings: { polarization, ...more.settings },
  });
};

const SUBJECT = { maskRevisionId: "mask-1", lineName: "Quasi-peak", band: null };

describe("waterfallOf", () => {
  test("takes the lowest margin of a step against that of its base, and the bars join", () => {
    const steps = arrange([
      { note: "0", sweeps: [at(-5), at(-2, "vertical")] },
      { note: "1", sweeps: [at(4), at(-1, "vertical")] },
      { note: "2x", sweeps: [at(3), at(-3, "vertical")] },
      { note: "3", sweeps: [at(6), at(5, "vertical")] },
    ]);
    const bars = waterfallOf(steps, SUBJECT);
    expect(bars.map((bar) => [bar.place, bar.fromDb, bar.toDb, bar.change?.changeDb])).toEqual([
      ["start", null, -5, undefined],
      ["line", -5, -1, 4],
      ["beside", -1, -3, -2],
      ["line", -1, 5, 6],
    ]);
    const line = bars.filter((bar) => bar.place === "line");
    const sum = line.reduce((total, bar) => total + (bar.change?.changeDb ?? 0), -5);
    expect(sum).toBe(bars[3]?.toDb);
  });

  test("a gap says why: no sweep, not comparable, not the same sweeps, another detector", () => {
    const steps = arrange([
      { note: "0", sweeps: [at(0)] },
      { note: "1", sweeps: [] },
      { note: "2<0", sweeps: [at(5, "horizontal", { benchId: "other", benchName: "Other" })] },
      { note: "3<0", sweeps: [at(5), at(2, "vertical", { settings: { port: "mains" } })] },
      { note: "4<0", sweeps: [at(5, "horizontal", { readings: [reading(5, "quasi-peak")] })] },
      { note: "5<0", sweeps: [at(5, "horizontal", { readings: [] })] },
      { note: "6<1", sweeps: [at(5)] },
    ]);
    const bars = waterfallOf(steps, SUBJECT);
    expect(bars.map((bar) => [bar.gap, bar.change?.changeDb ?? null])).toEqual([
      [null, null],
      ["no sweep", null],
      ["not comparable", null],
      ["not comparable", null],
      ["other detector", null],
      ["no margin", null],
      ["nothing at step 1", null],
    ]);
    const twice = arrange([
      { note: "0", sweeps: [at(0), at(1, "vertical")] },
      { note: "1", sweeps: [at(5)] },
    ]);
    expect(waterfallOf(twice, SUBJECT)[1]).toMatchObject({
      gap: "not the same sweeps",
      change: null,
    });
  });

  test("repeats give the ± and their power mean", () => {
    const steps = arrange([
      { note: "0", sweeps: [at(0), at(1)] },
      { note: "1", sweeps: [at(10), at(11)] },
    ]);
    const [, bar] = waterfallOf(steps, SUBJECT);
    expect(bar?.fromDb).toBeCloseTo(-10 * Math.log10((1 + 10 ** -0.1) / 2), 12);
    expect(bar?.change?.changeDb).toBeCloseTo(10, 12);
    // √(0.5/2 + 0.5/2) times Student's 4.302653 at ν = 2 (scipy, C).
    expect(bar?.change?.uncertaintyDb).toBeCloseTo(3.042435, 5);
  });

  test("an accepted mismatch gives the change and is marked", () => {
    const acceptance = {
      id: "1",
      fields: ["bench" as const],
      reason: "One chamber, two names.",
      by: "Mara",
      at: "2026-12-01T10:00:00.000Z",
    };
    const steps = arrange(
      [
        { note: "0", sweeps: [at(0)] },
        { note: "1", sweeps: [at(5, "horizontal", { benchId: "other", benchName: "Other" })] },
      ],
      { levels: new Map(), acceptance, tolerancePpm: 0 },
    );
    expect(waterfallOf(steps, SUBJECT)[1]).toMatchObject({
      change: { changeDb: 5 },
      isAccepted: true,
      gap: null,
    });
  });

  test("goes band by band where readings have bands", () => {
    const banded = (low: number, high: number) => {
      const own = reading(Math.min(low, high));
      const [line] = own.lines;
      if (!line) throw new Error("The fixture has a line.");
      const bands = [
        { startHz: 30e6, stopHz: 88e6, marginDb: low, decidedBy: "peak" as const },
        { startHz: 88e6, stopHz: 216e6, marginDb: high, decidedBy: "peak" as const },
      ];
      return at(0, "horizontal", { readings: [{ ...own, lines: [{ ...line, bands }] }] });
    };
    const steps = arrange([
      { note: "0", sweeps: [banded(-5, 3)] },
      { note: "1", sweeps: [banded(6, 1)] },
    ]);
    const [line] = linesOfLadder(steps);
    expect(line?.bands).toEqual([
      { startHz: 30e6, stopHz: 88e6 },
      { startHz: 88e6, stopHz: 216e6 },
    ]);
    const bought = (band: { startHz: number; stopHz: number } | null) =>
      waterfallOf(steps, { ...SUBJECT, band })[1]?.change?.changeDb;
    expect(bought(null)).toBe(6);
    expect(line?.bands.map(bought)).toEqual([11, -2]);
    expect(steps[1]?.againstPrevious[0]?.changes?.margins[0]?.bands).toMatchObject([
      { startHz: 30e6, changeDb: 11 },
      { startHz: 88e6, changeDb: -2 },
    ]);
  });
});
