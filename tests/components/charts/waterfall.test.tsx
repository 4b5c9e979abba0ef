import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, it } from "vitest";
import { marginNow, prepareWaterfall, writeChange } from "@/components/charts/prepare-waterfall";
import { Waterfall } from "@/components/ladders/waterfall";
import type { WaterfallBar } from "@/lib/core/delta/waterfall";

const bar = (position: number, part: Partial<WaterfallBar>): WaterfallBar => ({
  stepId: `s${position}`,
  position,
  name: `Step ${position}`,
  place: "line",
  basePosition: position - 1,
  fromDb: null,
  toDb: null,
  change: null,
  gap: null,
  isAccepted: false,
  ...part,
});

const change = (changeDb: number, uncertaintyDb: number | null = null) => ({
  changeDb,
  uncertaintyDb,
  repeats: { before: 1, after: 1 },
  isWithinRepeatability: uncertaintyDb === null ? null : Math.abs(changeDb) <= uncertaintyDb,
});

const BARS = [
  bar(0, { place: "start", basePosition: null, toDb: -5 }),
  bar(1, { fromDb: -5, toDb: 3, change: change(8, 1.2) }),
  bar(2, { place: "beside", fromDb: 3, toDb: 1, change: change(-2) }),
  bar(3, { basePosition: 1, fromDb: 3, toDb: 6, gap: "not comparable" }),
];

const prepare = (bars: WaterfallBar[], width = 600) =>
  prepareWaterfall({ bars, guardDb: 2, targetDb: 4, width, height: 260 });

describe("prepareWaterfall", () => {
  it("draws the margin at the start, every change from its base, and the margin now", () => {
    const { columns, zeroY } = prepare(BARS);
    expect(columns.map((column) => column.kind)).toEqual(["margin", "up", "down", "gap", "margin"]);
    const [start, up, dropped, , now] = columns;
    // Step 0 hangs under zero; a bar starts where the one that it is held against ends.
    expect(start?.top).toBeCloseTo(zeroY, 6);
    expect(up?.bottom).toBeCloseTo(start?.bottom ?? 0, 6);
    expect(dropped?.top).toBeCloseTo(up?.top ?? 0, 6);
    expect(dropped?.isBeside).toBe(true);
    expect(now?.bottom).toBeCloseTo(zeroY, 6);
    const perDb = ((start?.bottom ?? 0) - (start?.top ?? 0)) / 5;
    expect(((up?.bottom ?? 0) - (up?.top ?? 0)) / perDb).toBeCloseTo(8, 6);
    expect(((now?.bottom ?? 0) - (now?.top ?? 0)) / perDb).toBeCloseTo(6, 6);
  });

  it("puts whiskers only where a ± is known, as long as it is", () => {
    const { columns, zeroY } = prepare(BARS);
    expect(columns.map((column) => column.whisker !== null)).toEqual([
      false,
      true,
      false,
      false,
      false,
    ]);
    const whisker = columns[1]?.whisker;
    const perDb = ((columns[0]?.bottom ?? 0) - zeroY) / 5;
    expect(((whisker?.bottom ?? 0) - (whisker?.top ?? 0)) / perDb).toBeCloseTo(2.4, 6);
  });

  it("stays inside the drawing, one column beside the other, at any width", () => {
    for (const width of [240, 390, 1200]) {
      const { columns, margin } = prepare(BARS, width);
      columns.forEach((column, i) => {
        const next = columns[i + 1];
        expect(column.x).toBeGreaterThanOrEqual(margin.left);
        expect(column.x + column.width).toBeLessThanOrEqual(next?.x ?? width - margin.right);
        expect(Math.min(column.top, column.whisker?.top ?? column.top)).toBeGreaterThanOrEqual(0);
        expect(column.bottom).toBeLessThanOrEqual(260 - margin.bottom + 1e-6);
      });
    }
  });

  it("tells the whole in words", () => {
    expect(prepare(BARS).summary).toBe(
      "What each step bought, in margin. step 0 Step 0: \u22125.0 dB; step 1 Step 1: +8.0 dB ± 1.2; step 2 Step 2: \u22122.0 dB, not in the product; step 3 Step 3: not comparable. Now +6.0 dB.",
    );
    expect(writeChange(bar(1, { change: change(0.4, 1.2) }))).toBe(
      "+0.4 dB ± 1.2, within repeatability",
    );
  });

  it("survives steps without any margin", () => {
    const empty = [bar(0, { place: "start", gap: "no sweep" }), bar(1, { gap: "no sweep" })];
    expect(marginNow(empty)).toBeNull();
    expect(prepare(empty).columns.map((column) => column.kind)).toEqual(["gap", "gap"]);
    for (const column of prepare(empty).columns)
      expect(Number.isFinite(column.top + column.bottom + column.textY)).toBe(true);
  });
});

describe("the waterfall of a ladder", () => {
  it("writes base, change with ±, gaps and what is from memory", () => {
    const html = renderToStaticMarkup(
      <Waterfall
        targetDb={4}
        lines={[
          {
            key: "a",
            title: "Quasi-peak line of A mask",
            isFromMemory: true,
            guardDb: 2,
            parts: [{ key: "whole", title: "Whole line", bars: BARS }],
          },
        ]}
      />,
    );
    expect(html).toContain("+8.0 dB ± 1.2");
    expect(html).toContain("against step 1, not in the product");
    expect(html).toContain("not comparable");
    expect(html).toContain("from memory, not confirmed");
  });
});
