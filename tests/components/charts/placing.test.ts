import { describe, expect, it } from "vitest";
import { prepareClocks } from "@/components/charts/clock-marks";
import { buoyAt, placeBuoys, suspectStanding } from "@/components/charts/place-buoys";
import { overlaps, placeNames } from "@/components/charts/place-names";
import { spreadApart } from "@/components/charts/spread-apart";
import { wrapText } from "@/components/charts/wrap-text";
import { planeOf, suspect } from "./fixtures";

const PLOT = { left: 0, right: 500, top: 0, bottom: 200 };
const flat = (y: number, from = 0, to = 500) => [
  { x: from, y },
  { x: to, y },
];

describe("names on lines", () => {
  it("lie along their line", () => {
    const slope = [
      { x: 0, y: 150 },
      { x: 500, y: 50 },
    ];
    const { placed } = placeNames([{ name: "Peak", pieces: [slope] }], PLOT);
    expect(placed[0]?.angleDeg).toBeCloseTo((Math.atan2(-100, 500) * 180) / Math.PI, 1);
  });

  it("do not lie on each other, though the lines are close", () => {
    const { placed, unplaced } = placeNames(
      [
        { name: "Quasi-peak", pieces: [flat(100)] },
        { name: "Average", pieces: [flat(130)] },
      ],
      PLOT,
    );
    expect(unplaced).toEqual([]);
    const [one, other] = placed;
    expect(Math.abs((one?.y ?? 0) - (other?.y ?? 0))).toBeGreaterThan(13);
  });

  it("are handed back rather than written where they could be taken for another line's", () => {
    const crowd = [90, 96, 102, 108].map((y, i) => ({ name: `Line ${i}`, pieces: [flat(y)] }));
    const { placed, unplaced } = placeNames(crowd, PLOT);
    expect(unplaced).toContain("Line 1");
    expect(placed.length + unplaced.length).toBe(4);
  });

  it("do not cross a step of their line", () => {
    const steps = [0, 1, 2, 3, 4].flatMap((i) => [
      { x: i * 100, y: 150 - i * 20 },
      { x: i * 100 + 100, y: 150 - i * 20 },
    ]);
    const { placed } = placeNames([{ name: "Quasi-peak of many steps", pieces: [steps] }], PLOT);
    expect(placed.map((name) => name.angleDeg)).toEqual([0]);
  });

  it("keep off the water when they can", () => {
    const leftHalf = (box: { left: number }) => box.left < 400;
    const { placed } = placeNames([{ name: "Peak", pieces: [flat(100)] }], PLOT, [], leftHalf);
    expect(placed[0]?.x).toBeGreaterThan(400);
  });
});

describe("buoys", () => {
  const plane = planeOf({ fromHz: 100e6, toHz: 200e6 });

  it("stand over suspects in view and not over others", () => {
    const buoys = placeBuoys([suspect(1, 150e6), suspect(2, 300e6)], plane, null);
    expect(buoys.map((buoy) => buoy.number)).toEqual([1]);
    expect(buoys[0]?.peakX).toBeCloseTo(plane.xOf(150e6), 6);
    expect(buoys[0]?.peakY).toBeCloseTo(plane.yOf(35), 6);
  });

  it("make room for each other, the lowest margin first", () => {
    const near = [1, 2, 3].map((n) => suspect(n, 150e6 + n * 1e4));
    const floats = placeBuoys(near, plane, null).map((buoy) => buoy.float);
    expect(floats[0]).not.toBeNull();
    const boxes = floats.flatMap((at) =>
      at ? [{ left: at.x - 8, right: at.x + 8, top: at.y - 8, bottom: at.y + 8 }] : [],
    );
    boxes.forEach((box, i) =>
      boxes.slice(i + 1).forEach((other) => expect(overlaps(box, other)).toBe(false)),
    );
  });

  it("give up their float rather than lie on another", () => {
    const many = Array.from({ length: 60 }, (_, i) => suspect(i + 1, 150e6 + i));
    const buoys = placeBuoys(many, plane, null);
    expect(buoys).toHaveLength(60);
    expect(buoys.filter((buoy) => buoy.float === null).length).toBeGreaterThan(30);
  });

  it("are found by the pointer at their float and at their peak", () => {
    const buoys = placeBuoys([suspect(7, 150e6)], plane, null);
    const [{ float, peakX, peakY } = { float: null, peakX: 0, peakY: 0 }] = buoys;
    expect(buoyAt(buoys, float?.x ?? -99, float?.y ?? -99)?.number).toBe(7);
    expect(buoyAt(buoys, peakX, peakY)?.number).toBe(7);
    expect(buoyAt(buoys, peakX + 60, peakY)).toBeNull();
  });

  it("say over only where the line's own detector measured it", () => {
    const basis = (b: "like-for-like" | "upper-bound" | "cannot-decide") => b;
    expect(suspectStanding({ marginDb: -1, basis: basis("like-for-like") }, 3)).toBe("over");
    expect(suspectStanding({ marginDb: -1, basis: basis("upper-bound") }, 3)).toBe("undecided");
    expect(suspectStanding({ marginDb: 1, basis: basis("upper-bound") }, 3)).toBe("inside-guard");
    expect(suspectStanding({ marginDb: 3, basis: basis("like-for-like") }, 3)).toBe("clear");
    expect(suspectStanding({ marginDb: 9, basis: basis("cannot-decide") }, 3)).toBe("undecided");
    expect(suspectStanding({ marginDb: null, basis: basis("like-for-like") }, 3)).toBe("undecided");
  });
});

describe("clock marks", () => {
  it("tick every harmonic in view and label those that have room", () => {
    const plane = planeOf({ fromHz: 100e6, toHz: 1e9 }, "linear");
    const clocks = Array.from({ length: 200 }, (_, i) => ({
      hz: (i + 1) * 10e6,
      label: `${i + 1} × 10 MHz`,
    }));
    const marks = prepareClocks(clocks, plane);
    expect(pointsCount(marks.path)).toBe(91);
    expect(marks.labels.length).toBeGreaterThan(5);
    expect(marks.labels.length).toBeLessThan(20);
  });
});

const pointsCount = (path: string) => path.match(/M/g)?.length ?? 0;

describe("blocks that would overlap", () => {
  it("are moved apart in their order and kept inside", () => {
    const places = spreadApart(
      [
        { at: 52, size: 20 },
        { at: 50, size: 20 },
        { at: 95, size: 20 },
      ],
      0,
      100,
    );
    const [upper, lower, last] = [places[1] ?? 0, places[0] ?? 0, places[2] ?? 0];
    expect(lower - upper).toBeGreaterThanOrEqual(20);
    expect(last - lower).toBeGreaterThanOrEqual(20);
    expect(last).toBeLessThanOrEqual(90);
  });

  it("stay where they are when there is room", () => {
    const blocks = [20, 60].map((at) => ({ at, size: 10 }));
    expect(spreadApart(blocks, 0, 100)).toEqual([20, 60]);
  });
});

describe("wrapped text", () => {
  it("breaks at spaces and leaves a long word whole", () => {
    expect(wrapText("CISPR 32 radiated class B", 10)).toEqual(["CISPR 32", "radiated", "class B"]);
    expect(wrapText("Electromagnetic", 5)).toEqual(["Electromagnetic"]);
    expect(wrapText("", 5)).toEqual([]);
  });
});
