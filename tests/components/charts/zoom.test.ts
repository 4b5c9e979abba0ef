import { describe, expect, it } from "vitest";
import { shareOfHz } from "@/components/charts/frequency-scale";
import { panBy, selectShares, showsAll, viewForKey, zoomAround } from "@/components/charts/zoom";
import { EXTENT } from "./fixtures";

describe("zooming", () => {
  it.each(["log", "linear"] as const)("keeps the frequency under the pointer, %s", (scale) => {
    const view = zoomAround(EXTENT, EXTENT, scale, 0.5, 0.25);
    const under = scale === "log" ? 30e6 * Math.pow(1e9 / 30e6, 0.25) : 30e6 + 970e6 * 0.25;
    expect(shareOfHz(view, scale, under)).toBeCloseTo(0.25, 9);
    expect(view.toHz).toBeLessThan(EXTENT.toHz);
  });

  it("never leaves the extent, neither outwards nor sideways", () => {
    expect(zoomAround(EXTENT, EXTENT, "log", 3, 0.1)).toEqual(EXTENT);
    const right = panBy({ fromHz: 800e6, toHz: 900e6 }, EXTENT, "linear", 5);
    expect(right.toHz).toBe(1e9);
    expect(right.fromHz / 900e6).toBeCloseTo(1, 9);
  });

  it("keeps its width while moving", () => {
    const moved = panBy({ fromHz: 100e6, toHz: 200e6 }, EXTENT, "log", 0.5);
    expect(moved.toHz / moved.fromHz).toBeCloseTo(2, 9);
    expect(moved.fromHz / (100e6 * Math.SQRT2)).toBeCloseTo(1, 9);
  });

  it("stops before nothing is left", () => {
    let view = EXTENT;
    for (let i = 0; i < 60; i += 1) view = zoomAround(view, EXTENT, "log", 0.5, 0.5);
    expect(view.toHz).toBeGreaterThan(view.fromHz);
  });

  it("takes a drag in either direction", () => {
    const there = selectShares(EXTENT, EXTENT, "log", 0.2, 0.6);
    expect(selectShares(EXTENT, EXTENT, "log", 0.6, 0.2)).toEqual(there);
    expect(shareOfHz(EXTENT, "log", there.fromHz)).toBeCloseTo(0.2, 9);
    expect(shareOfHz(EXTENT, "log", there.toHz)).toBeCloseTo(0.6, 9);
  });

  it("knows when everything is in view", () => {
    expect(showsAll(EXTENT, EXTENT)).toBe(true);
    expect(showsAll({ fromHz: 31e6, toHz: 1e9 }, EXTENT)).toBe(false);
  });
});

describe("keys", () => {
  const part = { fromHz: 100e6, toHz: 200e6 };
  it("zoom in and out about the middle, move, and show all", () => {
    const nearer = viewForKey("+", part, EXTENT, "log");
    expect(nearer && nearer.toHz / nearer.fromHz).toBeCloseTo(Math.SQRT2, 9);
    const wider = viewForKey("-", part, EXTENT, "log");
    expect(wider && wider.toHz / wider.fromHz).toBeCloseTo(4, 9);
    expect(viewForKey("ArrowLeft", part, EXTENT, "log")?.fromHz).toBeLessThan(100e6);
    expect(viewForKey("ArrowRight", part, EXTENT, "log")?.fromHz).toBeGreaterThan(100e6);
    expect(viewForKey("0", part, EXTENT, "log")).toEqual(EXTENT);
  });

  it("that mean nothing to the chart are left to the page", () => {
    expect(viewForKey("k", part, EXTENT, "log")).toBeNull();
    expect(viewForKey("Tab", part, EXTENT, "log")).toBeNull();
  });
});
