import { describe, expect, test } from "vitest";
import { frequencyTicks, levelTicks } from "@/lib/reports/chart/axis-ticks";
import {
  coastPath,
  frameOf,
  landPath,
  placeBuoys,
  tracePath,
  waterPath,
  xOf,
  yOf,
  type Frame,
} from "@/lib/reports/chart/coast-geometry";
import { inventedTrace, shippedMask, snapshotTrace } from "../support/report-traces";

const frame: Frame = {
  left: 0,
  right: 300,
  top: 0,
  bottom: 100,
  fromHz: 1e6,
  toHz: 1e9,
  fromDb: 0,
  toDb: 100,
};

describe("scales", () => {
  test("frequency is logarithmic, a decade as wide as any other", () => {
    expect([1e6, 1e7, 1e8, 1e9].map((hz) => xOf(frame, hz))).toEqual(
      [0, 100, 200, 300].map((x) => expect.closeTo(x, 9)),
    );
  });

  test("a higher level stands higher", () => {
    expect([0, 25, 100].map((db) => yOf(frame, db))).toEqual([100, 75, 0]);
  });

  test("the frame holds the highest level and the highest limit", () => {
    const drawn = [{ trace: snapshotTrace(inventedTrace("T", 92)), shiftDb: 0 }];
    const mask = shippedMask("cispr-32-radiated-class-b-3m");
    const made = frameOf(drawn, mask, { left: 0, right: 1, top: 0, bottom: 1 });
    expect(made?.toDb).toBeGreaterThan(drawn[0]?.trace.maxDb ?? 0);
    expect(made?.fromHz).toBe(30e6);
  });

  test("ticks are 1-2-5 in engineering units, and a short span has finer ones", () => {
    expect(frequencyTicks(30e6, 1e9).map((tick) => tick.label)).toEqual([
      "50 MHz",
      "100 MHz",
      "200 MHz",
      "500 MHz",
      "1 GHz",
    ]);
    expect(frequencyTicks(410e6, 430e6).length).toBeGreaterThan(2);
    expect(levelTicks(-20, 10).map((tick) => tick.label)).toEqual(["−20", "−10", "0", "10"]);
  });
});

describe("trace", () => {
  const trace = snapshotTrace(inventedTrace("T", 40));
  const view = { ...trace.view, hz: [2e6, 4e6, 8e6, 1e7, 2e7], maxDb: [10, 20, null, 30, 40] };
  const drawn = { trace: { ...trace, view }, shiftDb: 0 };

  test("a gap lifts the pen and leaves no water", () => {
    expect(tracePath(frame, drawn).match(/M/g)).toHaveLength(2);
    expect(waterPath(frame, drawn).match(/Z/g)).toHaveLength(2);
    const gapX = xOf(frame, 8e6).toFixed(2);
    expect(tracePath(frame, drawn)).not.toContain(gapX);
  });

  test("is restated by its shift", () => {
    const point = (shiftDb: number) => tracePath(frame, { ...drawn, shiftDb }).split(" ")[1];
    expect(point(0)).toBe("90.00");
    expect(point(60)).toBe("30.00");
  });
});

describe("coast", () => {
  const mask = shippedMask("cispr-32-radiated-class-b-3m");
  const [line] = mask.lines;
  if (!line) throw new Error("No line.");

  test("steps where the limit steps", () => {
    const x = xOf(frame, 230e6).toFixed(2);
    expect(coastPath(frame, line)).toContain(`${x} ${yOf(frame, 40).toFixed(2)}`);
    expect(coastPath(frame, line)).toContain(`${x} ${yOf(frame, 47).toFixed(2)}`);
  });

  test("is land up to the top of the frame, once per band", () => {
    expect(landPath(frame, [line]).match(/Z/g)).toHaveLength(1);
    expect(landPath(frame, [])).toBe("");
  });
});

describe("buoys", () => {
  const suspect = {
    number: 1,
    frequencyHz: 1e8,
    sampleHz: 1e8,
    levelDb: 50,
    limitDb: null,
    marginDb: null,
    prominenceDb: 10,
    lineName: null,
    basis: "upper-bound" as const,
    traceIndex: 0,
    partIndex: 0,
  };

  test("at neighbouring peaks do not lie on each other", () => {
    const close = [0, 1, 2, 3, 4].map((i) => ({
      ...suspect,
      number: i + 1,
      frequencyHz: 1e8 + i * 1e5,
    }));
    const placed = placeBuoys(frame, close);
    expect(placed).toHaveLength(5);
    for (const a of placed)
      for (const b of placed)
        if (a !== b) expect(Math.hypot(a.x - b.x, a.y - b.y)).toBeGreaterThanOrEqual(11);
  });

  test("outside the frame are left to the table", () => {
    expect(placeBuoys(frame, [{ ...suspect, frequencyHz: 2e9 }])).toEqual([]);
  });
});
