import { describe, expect, it } from "vitest";
import { prepareTrend, type TrendInput } from "@/components/charts/prepare-trend";
import { dayOf, makeTrendAxis } from "@/components/charts/trend-axis";
import type { TrendPoint, TrendSeries } from "@/components/charts/trend-data";
import { pointsOf } from "./fixtures";

function point(
  buildName: string,
  builtOn: string | null,
  marginDb: number | null,
  standing: TrendPoint["standing"] = "clear",
): TrendPoint {
  return { buildName, builtOn, marginDb, standing };
}

const DATED: TrendSeries = {
  maskTitle: "CISPR 32 class B",
  points: [
    point("B1", "2026-06-01", -4, "over"),
    point("B2", "2026-07-01", null, "undecided"),
    point("B3", "2026-08-01", 5),
  ],
};

function input(more: Partial<TrendInput> = {}): TrendInput {
  return {
    series: [DATED],
    targetDb: 6,
    milestones: [{ name: "Lab", dueOn: "2026-10-01", requiredMarginDb: 9 }],
    today: "2026-08-15",
    width: 1000,
    height: 300,
    ...more,
  };
}

describe("the trend's axis", () => {
  it("is dates when every build has one", () => {
    const axis = makeTrendAxis([DATED], [], "2026-08-15", 800);
    expect(axis.kind).toBe("date");
    expect(axis.at(DATED.points[1]!)).toBe(Date.UTC(2026, 6, 1) / 86_400_000);
    const labels = axis.ticks.map((tick) => tick.label).filter(Boolean);
    expect(labels).toContain("2026-06-08");
    expect(labels.every((label) => new Date(label).getUTCDay() === 1)).toBe(true);
  });

  it("is the order of builds when one has no date, and places each build once", () => {
    const undated = { maskTitle: "FCC", points: [point("B2", null, 1), point("B4", null, 2)] };
    const axis = makeTrendAxis([DATED, undated], [], "2026-08-15", 800);
    expect(axis.kind).toBe("order");
    expect(axis.ticks.map((tick) => tick.label)).toEqual(["B1", "B2", "B3", "B4"]);
    expect(axis.at({ buildName: "B4", builtOn: null })).toBe(3);
  });

  it("labels months when days would not fit", () => {
    const long = {
      maskTitle: "M",
      points: [point("A", "2025-01-10", 1), point("B", "2026-12-10", 2)],
    };
    const labels = makeTrendAxis([long], [], "2026-12-11", 600)
      .ticks.map((tick) => tick.label)
      .filter(Boolean);
    expect(labels).toContain("2026-01");
    expect(labels.length).toBeLessThan(8);
  });

  it("reads ISO dates and times and nothing else", () => {
    expect(dayOf("1970-01-11")).toBe(10);
    expect(dayOf("1970-01-11T23:00:00Z")).toBe(10);
    expect(dayOf("11 January")).toBeNull();
    expect(dayOf(null)).toBeNull();
  });
});

describe("the trend", () => {
  it("shows zero, target, every margin and every required margin", () => {
    const { levels } = prepareTrend(input());
    expect(levels.fromDb).toBeLessThan(-4);
    expect(levels.toDb).toBeGreaterThan(9);
    const deep = prepareTrend(input({ series: [{ ...DATED, points: [DATED.points[2]!] }] }));
    expect(deep.levels.fromDb).toBeLessThan(0);
  });

  it("draws a build without a margin as a mark at the foot and a gap in the line", () => {
    const [line] = prepareTrend(input()).lines;
    expect(line?.path.match(/M/g)).toHaveLength(2);
    expect(pointsOf(line?.path ?? "")).toHaveLength(2);
    expect(line?.marks.map((mark) => mark.standing)).toEqual(["over", "undecided", "clear"]);
    expect(line?.marks[1]?.text).toBe("B2, CISPR 32 class B: no margin, undecided");
    expect(line?.marks[1]?.y).toBeGreaterThan(line?.marks[0]?.y ?? 999);
  });

  it("orders builds in time whatever order they come in", () => {
    const points = [...DATED.points].reverse();
    const [line] = prepareTrend(input({ series: [{ ...DATED, points }] })).lines;
    const xs = line?.marks.map((mark) => mark.x) ?? [];
    expect(xs).toEqual([...xs].sort((a, b) => a - b));
    expect(xs).toHaveLength(3);
  });

  it("places milestones by date with the margin they ask for", () => {
    const { milestones, axis, lines, zeroY, targetY } = prepareTrend(input());
    const [lab] = milestones;
    expect(axis.kind).toBe("date");
    expect(lab?.x).toBeGreaterThan(lines[0]?.marks[2]?.x ?? Infinity);
    expect(lab?.requiredY).toBeLessThan(targetY);
    expect(targetY).toBeLessThan(zeroY);
    expect(lab?.detail).toBe("2026-10-01, +9.0 dB");
  });

  it("says why milestones are missing when builds have no dates", () => {
    const series = [{ ...DATED, points: [point("B1", null, 2)] }];
    const drawn = prepareTrend(input({ series }));
    expect(drawn.milestones).toEqual([]);
    expect(drawn.todayX).toBeNull();
    expect(drawn.notes[0]).toContain("Lab 2026-10-01, +9.0 dB");
  });

  it("puts near milestones into rows of their own", () => {
    const milestones = ["2026-08-20", "2026-08-22", "2026-08-24"].map((dueOn, i) => ({
      name: `Milestone ${i}`,
      dueOn,
      requiredMarginDb: null,
    }));
    const rows = prepareTrend(input({ milestones })).milestones.map((one) => one.row);
    expect(new Set(rows).size).toBe(3);
  });

  it("writes names at line ends apart from each other, or in a list when it is narrow", () => {
    const series = ["One", "Two", "Three"].map((maskTitle) => ({ ...DATED, maskTitle }));
    const wide = prepareTrend(input({ series }));
    const ys = wide.names.map((name) => name.y).sort((a, b) => a - b);
    expect(ys[1]! - ys[0]!).toBeGreaterThan(25);
    expect(ys[2]! - ys[1]!).toBeGreaterThan(25);
    expect(wide.compact).toBe(false);
    expect(prepareTrend(input({ series, width: 360 })).compact).toBe(true);
    expect(new Set(wide.lines.map((line) => JSON.stringify(line.style))).size).toBe(3);
  });

  it("tells itself with every build, margin and standing", () => {
    expect(prepareTrend(input()).summary).toBe(
      "Worst margin over builds, target +6.0 dB. CISPR 32 class B: B1 \u22124.0 dB over, B2 no margin undecided, B3 +5.0 dB clear.",
    );
  });
});
