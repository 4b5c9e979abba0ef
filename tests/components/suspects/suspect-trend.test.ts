import { describe, expect, test } from "vitest";
import { prepareSuspectTrend } from "@/components/charts/prepare-suspect-trend";
import type { SuspectTrendPoint } from "@/components/charts/suspect-trend-data";

const point = (
  buildName: string,
  marginDb: number | null,
  change: Partial<SuspectTrendPoint> = {},
): SuspectTrendPoint => ({
  buildName,
  kind: "seen",
  marginDb,
  levelDb: marginDb === null ? null : 50 - marginDb,
  standing: marginDb !== null && marginDb < 0 ? "over" : "clear",
  comparableKey: "a",
  href: `/sweeps/${buildName}`,
  ...change,
});
const blank = (buildName: string, kind: "not-seen" | "not-swept") =>
  point(buildName, null, { kind, standing: null, comparableKey: "", href: null });

const prepare = (points: SuspectTrendPoint[], width = 900) =>
  prepareSuspectTrend({ points, unit: "dBuV/m", width, marginHeight: 220, levelHeight: 170 });

const pieces = (path: string) => path.split("M").length - 1;

describe("trend of a suspect", () => {
  test("draws margin and level over builds in their order, better margins higher", () => {
    const { marginPanel, levelPanel, axis, notes } = prepare([point("G1", -3), point("G2", 2)]);
    expect(axis.ticks.map((tick) => tick.label)).toEqual(["G1", "G2"]);
    const [first, second] = marginPanel.marks;
    expect(first!.x).toBeLessThan(second!.x);
    expect(first!.y).toBeGreaterThan(second!.y);
    expect(first!.y).toBeGreaterThan(marginPanel.zeroY);
    expect(second!.y).toBeLessThan(marginPanel.zeroY);
    expect(marginPanel.marks.map((mark) => mark.standing)).toEqual(["over", "clear"]);
    expect(levelPanel.marks[0]!.y).toBeLessThan(levelPanel.marks[1]!.y);
    expect(levelPanel.marks.map((mark) => mark.standing)).toEqual([null, null]);
    expect(pieces(marginPanel.path)).toBe(1);
    expect(notes).toEqual([]);
  });

  test("leaves a gap where nothing was swept and marks what was not seen on the floor", () => {
    const { marginPanel } = prepare([
      point("G1", -3),
      blank("G2", "not-swept"),
      blank("G3", "not-seen"),
      point("G4", 2),
    ]);
    expect(marginPanel.marks).toHaveLength(2);
    expect(pieces(marginPanel.path)).toBe(2);
    expect(marginPanel.notSeen).toHaveLength(1);
    const [mark] = marginPanel.notSeen;
    expect(mark!.word).toBe("not seen");
    expect(mark!.y).toBeGreaterThan(Math.max(...marginPanel.marks.map((one) => one.y)));
    expect(mark!.x).toBeGreaterThan(marginPanel.marks[0]!.x);
    expect(mark!.x).toBeLessThan(marginPanel.marks[1]!.x);
  });

  test("joins nothing across another detector, and says so", () => {
    const { marginPanel, levelPanel, notes } = prepare([
      point("G1", -3),
      point("G2", 2, { comparableKey: "b" }),
      point("G3", 3, { comparableKey: "b" }),
    ]);
    expect(pieces(marginPanel.path)).toBe(2);
    expect(pieces(levelPanel.path)).toBe(2);
    expect(notes).toEqual([expect.stringContaining("The line breaks where")]);
  });

  test("leaves out a level in another unit, and says so", () => {
    const { levelPanel, marginPanel, notes } = prepare([
      point("G1", 1, { levelDb: null, comparableKey: "b" }),
      point("G2", 2),
    ]);
    expect(levelPanel.marks).toHaveLength(1);
    expect(marginPanel.marks).toHaveLength(2);
    expect(notes.some((note) => note.includes("another unit"))).toBe(true);
  });

  test("drops the words on a narrow screen, and tells everything in its summary", () => {
    const points = [
      ...Array.from({ length: 9 }, (_, i) => blank(`G${i}`, "not-seen")),
      blank("G9", "not-swept"),
      point("G10", -1.5),
    ];
    const { marginPanel, summary } = prepare(points, 340);
    expect(marginPanel.notSeen.every((mark) => mark.word === "")).toBe(true);
    expect(summary).toContain("G8 not seen; G9 not swept; G10 \u22121.5 dB, over, 51.5 dBµV/m.");
  });
});
