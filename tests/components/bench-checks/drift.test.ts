import { describe, expect, test } from "vitest";
import type { CheckSummary } from "@/components/bench-checks/check-answer";
import { checkAnswer, daysAgo, isDrifted } from "@/components/bench-checks/check-answer";
import { groupBySource } from "@/components/bench-checks/group-by-source";
import type { DriftPoint } from "@/components/charts/prepare-drift";
import { prepareDrift } from "@/components/charts/prepare-drift";

const point = (measuredOn: string, worst: number | null, change: Partial<DriftPoint> = {}) => ({
  measuredOn,
  driftWorstDb: worst,
  driftMeanDb: worst === null ? null : worst / 2,
  referenceId: "r1",
  href: `/${measuredOn}`,
  ...change,
});

const prepare = (points: DriftPoint[], change: { width?: number; toleranceDb?: number } = {}) =>
  prepareDrift({
    points,
    references: ["2026-06-01"],
    toleranceDb: 2,
    today: "2026-06-11",
    width: 800,
    height: 260,
    ...change,
  });

const pieces = (path: string) => path.split("M").length - 1;

describe("prepareDrift", () => {
  test("places drift on one scale with the band of the tolerance, zero in its middle", () => {
    const drift = prepare([point("2026-06-02", 2), point("2026-06-03", -1)]);
    const { topY, zeroY, bottomY } = drift.band;
    expect(zeroY).toBeCloseTo((topY + bottomY) / 2, 9);
    expect(drift.marks[0]?.y).toBeCloseTo(topY, 9);
    expect(drift.marks[1]?.y).toBeCloseTo(zeroY + (bottomY - zeroY) / 2, 9);
    expect(drift.marks[0]?.x).toBeLessThan(drift.marks[1]?.x ?? 0);
    expect(drift.referenceXs[0]).toBeLessThan(drift.marks[0]?.x ?? 0);
    expect(drift.todayX).toBeGreaterThan(drift.marks[1]?.x ?? 0);
  });

  test("a drift of exactly the tolerance is within it, one beyond it either way is outside", () => {
    const drift = prepare([2, 2.1, -2, -2.1].map((worst, i) => point(`2026-06-0${i + 2}`, worst)));
    expect(drift.marks.map((mark) => mark.drifted)).toEqual([false, true, false, true]);
  });

  test("breaks the lines after more than a week, at a new reference and at a missing drift", () => {
    const week = prepare([point("2026-06-02", 1), point("2026-06-09", 1)]);
    expect([pieces(week.worstPath), pieces(week.meanPath)]).toEqual([1, 1]);
    const longer = prepare([point("2026-06-02", 1), point("2026-06-10", 1)]);
    expect([pieces(longer.worstPath), pieces(longer.meanPath)]).toEqual([2, 2]);
    const other = prepare([point("2026-06-02", 1), point("2026-06-03", 1, { referenceId: "r2" })]);
    expect(pieces(other.worstPath)).toBe(2);
    const gap = prepare([
      point("2026-06-02", 1),
      point("2026-06-03", null),
      point("2026-06-04", 1),
    ]);
    expect(pieces(gap.worstPath)).toBe(2);
    expect(gap.marks).toHaveLength(2);
  });

  test("holds every drift and the whole tolerance in its range", () => {
    const { levels } = prepare([point("2026-06-02", -13)], { toleranceDb: 6 });
    expect(levels.fromDb).toBeLessThanOrEqual(-13.5);
    expect(levels.toDb).toBeGreaterThanOrEqual(6.5);
  });

  test("names the lines beside their ends where there is room, and keeps the names apart", () => {
    const wide = prepare([point("2026-06-02", 0.1)]);
    expect(wide.names.map(({ text }) => text)).toEqual(["largest drift", "mean drift"]);
    const [worst, mean] = wide.names;
    expect(Math.abs((worst?.y ?? 0) - (mean?.y ?? 0))).toBeGreaterThanOrEqual(13.9);
    const narrow = prepare([point("2026-06-02", 0.1)], { width: 360 });
    expect([narrow.names, narrow.compact]).toEqual([[], true]);
  });

  test("tells the drifts in words for those who do not see the chart", () => {
    expect(prepare([point("2026-06-02", -2.5)]).summary).toBe(
      "Drift over dates, tolerance ±2 dB. 2026-06-02 −2.5 dB.",
    );
  });
});

function check(change: Partial<CheckSummary> = {}): CheckSummary {
  return {
    id: "c",
    measuredOn: "2026-06-11",
    source: "Comb",
    isReference: false,
    reference: { id: "r1", measuredOn: "2026-06-01", archived: false },
    driftMeanDb: 0.1,
    driftWorstDb: -1.2,
    lines: 5,
    sunk: 0,
    missing: 0,
    fileName: "comb.csv",
    checkedBy: "Nele",
    archived: false,
    ...change,
  };
}
const REFERENCE = check({
  id: "r1",
  isReference: true,
  reference: null,
  driftWorstDb: null,
  measuredOn: "2026-06-01",
});
const answer = (checks: CheckSummary[]) => checkAnswer(checks, 2, "2026-06-11");

describe("checkAnswer", () => {
  test("trusts a bench whose check of today lies within the tolerance", () => {
    expect(answer([check(), REFERENCE])).toEqual({
      number: "−1.2 dB",
      words: "is the largest drift of today's check of Comb, within the tolerance of ±2 dB.",
      isDoubt: false,
      rest: [],
      checkId: "c",
    });
  });

  test("doubts a drift outside the tolerance, and a day without a check", () => {
    const drifted = answer([check({ driftWorstDb: 2.1 }), REFERENCE]);
    expect(drifted).toMatchObject({ number: "+2.1 dB", isDoubt: true });
    expect(drifted.words).toContain("outside");
    const stale = answer([check({ measuredOn: "2026-06-08" }), REFERENCE]);
    expect(stale).toMatchObject({ isDoubt: true });
    expect(stale.words).toContain("3 days ago");
    expect(stale.rest).toEqual(["The bench has not been checked today."]);
  });

  test("takes the last check of each source that day, and of these the one farthest off", () => {
    const checks = [
      check({ id: "b2", source: "Noise", driftWorstDb: 0.4 }),
      check({ id: "a2", source: "comb", driftWorstDb: -3 }),
      check({ id: "a1", source: "Comb", driftWorstDb: -9 }),
      check({ id: "old", measuredOn: "2026-06-10", source: "Third", driftWorstDb: 20 }),
    ];
    expect(answer(checks).checkId).toBe("a2");
  });

  test("does not count what was archived, and says what speaks against a check", () => {
    const found = answer([
      check({ id: "x", archived: true, driftWorstDb: 9 }),
      check({
        missing: 1,
        sunk: 2,
        reference: { id: "r", measuredOn: "2026-06-01", archived: true },
      }),
    ]);
    expect(found.checkId).toBe("c");
    expect(found.rest).toEqual([
      "1 line of the reference has no level here.",
      "2 lines no longer stand out.",
      "Its reference was archived since.",
    ]);
  });

  test("has no number before the first comparison", () => {
    expect(answer([])).toMatchObject({ number: null, checkId: null });
    expect(answer([REFERENCE]).words).toContain("The reference of Comb stands");
  });

  test("counts days by the calendar", () => {
    expect(daysAgo("2026-06-11", "2026-06-11")).toBe("today");
    expect(daysAgo("2026-06-10", "2026-06-11")).toBe("yesterday");
    expect(daysAgo("2026-02-28", "2026-03-01")).toBe("yesterday");
    expect(isDrifted(null, 2)).toBe(false);
  });
});

describe("groupBySource", () => {
  test("makes one curve of each source, oldest first, with the days of its references", () => {
    const groups = groupBySource(
      [
        check({ id: "3", source: "comb", measuredOn: "2026-06-03" }),
        check({ id: "2", source: "Noise", measuredOn: "2026-06-03" }),
        check({ id: "1", source: "Comb", measuredOn: "2026-06-02" }),
        REFERENCE,
      ],
      "b1",
    );
    expect(groups.map((g) => [g.source, g.points.map((p) => p.href), g.references])).toEqual([
      ["comb", ["/benches/b1/checks/1", "/benches/b1/checks/3"], ["2026-06-01"]],
      ["Noise", ["/benches/b1/checks/2"], []],
    ]);
  });
});
