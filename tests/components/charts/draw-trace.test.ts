import { describe, expect, it } from "vitest";
import { areaPath, bandPath, linePath } from "@/components/charts/chart-path";
import { drawTrace } from "@/components/charts/draw-trace";
import { prepareThumb } from "@/components/charts/prepare-thumb";
import { planeOf, pointsOf, traceView } from "./fixtures";

const A = { x: 0, y: 10 };
const B = { x: 5, y: 20 };

describe("paths", () => {
  it("leave gaps open and make a lone point a dot", () => {
    expect(linePath([A, B, null, A])).toBe("M0,10L5,20M0,10h0");
  });

  it("close water down to the edge, piece by piece", () => {
    expect(areaPath([A, null, B], 50)).toBe("M0,50L0,10L0,50ZM5,50L5,20L5,50Z");
  });

  it("close a band only where both of its lines are", () => {
    expect(bandPath([A, B], [null, { x: 5, y: 30 }])).toBe("M5,20L5,30Z");
  });
});

describe("a drawn trace", () => {
  const plane = planeOf();

  it("has a gap where the trace has one", () => {
    const drawn = drawTrace(traceView([100e6, 200e6, 300e6, 400e6], [10, null, 20, 30]), plane);
    expect(drawn.edge.match(/M/g)).toHaveLength(2);
    expect(pointsOf(drawn.edge)).toHaveLength(3);
  });

  it("keeps the highest sample at its own frequency when columns share a pixel", () => {
    const hz = Array.from({ length: 50_000 }, (_, i) => 30e6 * Math.pow(1e9 / 30e6, i / 49_999));
    const levels = hz.map((_, i) => 20 + (i % 7));
    levels[31_415] = 93.25;
    const points = pointsOf(drawTrace(traceView(hz, levels), plane).edge);
    const highest = points.reduce((a, b) => (b.y < a.y ? b : a));
    expect(points.length).toBeLessThanOrEqual(1001);
    expect(highest.y).toBeCloseTo(100 - 93.25, 1);
    expect(highest.x).toBeCloseTo(plane.xOf(hz[31_415] ?? 0), 1);
  });

  it("keeps a gap when columns share a pixel", () => {
    const hz = Array.from({ length: 5000 }, (_, i) => 30e6 * Math.pow(1e9 / 30e6, i / 4999));
    const levels = hz.map((_, i) => (i > 2000 && i < 2500 ? null : 20));
    const xs = pointsOf(drawTrace(traceView(hz, levels), plane).edge).map((point) => point.x);
    expect(xs.filter((x) => x > 401 && x < 499)).toEqual([]);
    expect(drawTrace(traceView(hz, levels), plane).edge.match(/M/g)).toHaveLength(2);
  });

  it("shows the swell between highest and lowest only where a column holds several samples", () => {
    const hz = [100e6, 200e6];
    const single = traceView(hz, [10, 20]);
    expect(drawTrace(single, plane).swell).toBe("");
    const bucketed = traceView(hz, [10, 20], { minDb: [5, 8], samplesPerBucket: 4 });
    expect(pointsOf(drawTrace(bucketed, plane).swell).map((point) => point.y)).toEqual([
      90, 80, 92, 95,
    ]);
  });
});

describe("a thumbnail", () => {
  it("fills its box with the trace's own range", () => {
    const drawn = prepareThumb([10e6, 100e6, 1e9], [0, 20, 10], 103, 23);
    const points = pointsOf(drawn?.edge ?? "");
    expect(points.map((point) => point.x)).toEqual([1.5, 51.5, 101.5]);
    expect(points.map((point) => point.y)).toEqual([21.5, 1.5, 11.5]);
  });

  it("does not blow up a flat trace or one that starts at 0 Hz", () => {
    const points = pointsOf(prepareThumb([0, 1e6], [5, 5], 100, 20)?.edge ?? "");
    expect(points.every(({ x, y }) => Number.isFinite(x) && Number.isFinite(y))).toBe(true);
    expect(points).toHaveLength(2);
  });

  it("does not exist without a level", () => {
    expect(prepareThumb([1e6], [null], 100, 20)).toBeNull();
    expect(prepareThumb([], [], 100, 20)).toBeNull();
  });
});
