import { describe, expect, it } from "vitest";
import { hzAtShare, shareOfHz } from "@/components/charts/frequency-scale";
import { frequencyTicks, labelFrequency } from "@/components/charts/frequency-ticks";
import { labelLevel, levelRange, levelTicks } from "@/components/charts/level-ticks";
import { EXTENT } from "./fixtures";

describe("a frequency scale", () => {
  it("puts the geometric mean in the middle of a log axis and the mean in that of a linear one", () => {
    const view = { fromHz: 10e6, toHz: 1e9 };
    expect(shareOfHz(view, "log", 100e6)).toBeCloseTo(0.5, 12);
    expect(shareOfHz(view, "linear", 505e6)).toBeCloseTo(0.5, 12);
  });

  it("finds the frequency back from its place", () => {
    for (const scale of ["log", "linear"] as const)
      for (const hz of [30e6, 88.32e6, 1e9])
        expect(hzAtShare(EXTENT, scale, shareOfHz(EXTENT, scale, hz)) / hz).toBeCloseTo(1, 12);
  });

  it("shows six decades when a log axis would have to start at 0 Hz", () => {
    expect(hzAtShare({ fromHz: 0, toHz: 1e9 }, "log", 0)).toBe(1000);
  });
});

describe("frequency ticks", () => {
  const labelled = (ticks: ReturnType<typeof frequencyTicks>) =>
    ticks.flatMap((tick) => (tick.label === null ? [] : [tick.label]));

  it("are 1-2-5 in engineering units on a wide log axis, with the other digits as minor ticks", () => {
    const ticks = frequencyTicks(EXTENT, "log", 1100);
    expect(labelled(ticks)).toEqual(["50 MHz", "100 MHz", "200 MHz", "500 MHz", "1 GHz"]);
    expect(ticks.filter((t) => t.weight === "minor").map((t) => t.hz / 1e6)).toEqual([
      30, 40, 60, 70, 80, 90, 300, 400, 600, 700, 800, 900,
    ]);
  });

  it("keep the decades when there is no room for all labels", () => {
    const wide = frequencyTicks({ fromHz: 9e3, toHz: 6e9 }, "log", 320);
    expect(labelled(wide)).toContain("1 MHz");
    expect(labelled(wide)).not.toContain("2 MHz");
    expect(labelled(wide).length).toBeLessThanOrEqual(5);
  });

  it("become evenly spaced round frequencies in a view too narrow for 1-2-5", () => {
    const ticks = frequencyTicks({ fromHz: 88e6, toHz: 92e6 }, "log", 500);
    expect(ticks.map((t) => t.hz / 1e6)).toEqual([88, 89, 90, 91, 92]);
  });

  it("are evenly spaced on a linear axis", () => {
    const ticks = frequencyTicks({ fromHz: 0, toHz: 1e9 }, "linear", 520);
    expect(ticks.map((t) => t.hz / 1e6)).toEqual([0, 200, 400, 600, 800, 1000]);
  });

  it("do not exist for a view without width", () => {
    expect(frequencyTicks({ fromHz: 1e6, toHz: 1e6 }, "log", 500)).toEqual([]);
    expect(frequencyTicks(EXTENT, "log", 0)).toEqual([]);
  });

  it("carry only the digits they have", () => {
    expect([150e3, 2.5e9, 10, 1e6].map(labelFrequency)).toEqual([
      "150 kHz",
      "2.5 GHz",
      "10 Hz",
      "1 MHz",
    ]);
  });
});

describe("a level axis", () => {
  it("holds every finite level and ignores gaps", () => {
    const range = levelRange([12, null, 47, Number.NaN], { belowDb: 3, aboveDb: 7 }, 10);
    expect(range).toEqual({ fromDb: 5, toDb: 55 });
  });

  it("is never narrower than asked for, so that noise does not look like mountains", () => {
    const { fromDb, toDb } = levelRange([20, 21], { belowDb: 0, aboveDb: 0 }, 40);
    expect(toDb - fromDb).toBeGreaterThanOrEqual(40);
    expect(fromDb).toBeLessThan(20);
    expect(toDb).toBeGreaterThan(21);
  });

  it("exists without any level", () => {
    expect(levelRange([null], { belowDb: 0, aboveDb: 0 }, 40)).toEqual({ fromDb: 0, toDb: 40 });
  });

  it("has round ticks with room between them", () => {
    expect(levelTicks({ fromDb: -15, toDb: 45 }, 200)).toEqual([-10, 0, 10, 20, 30, 40]);
    expect(levelTicks({ fromDb: 0, toDb: 1 }, 150)).toEqual([0, 0.2, 0.4, 0.6, 0.8, 1]);
  });

  it("writes a true minus", () => {
    expect([-10, 0, 0.5].map(labelLevel)).toEqual(["\u221210", "0", "0.5"]);
  });
});
