import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { frequencyAt } from "@/lib/core/sweep/axis";
import { bottomLevel, buildPyramid } from "@/lib/core/sweep/pyramid";
import { pyramidLevelFor, viewTrace } from "@/lib/core/sweep/view-trace";
import { makeTrace, randomFrom } from "../support/traces";

function view(levels: number[], fromHz: number, toHz: number, columns: number, levelIndex: number) {
  const trace = makeTrace(levels);
  const level = [bottomLevel(trace.levelsDb), ...buildPyramid(trace.levelsDb)][levelIndex]!;
  const at = (i: number) => frequencyAt(trace.axis, i);
  return viewTrace(trace, level, 0, { fromHz, toHz, columns, scale: "log" }, at);
}

const levelsOf = (seed: number, count: number) => {
  const random = randomFrom(seed);
  return Array.from({ length: count }, () => Math.fround(20 + 40 * random()));
};

describe("the min/max pyramid", () => {
  test("keeps every maximum, its place and every minimum on each level", () => {
    const levels = levelsOf(4, 20_000);
    for (const level of buildPyramid(Float32Array.from(levels))) {
      level.maxDb.forEach((max, i) => {
        const part = levels.slice(i * level.samplesPerEntry, (i + 1) * level.samplesPerEntry);
        expect(max).toBe(Math.max(...part));
        expect(level.minDb[i]).toBe(Math.min(...part));
        expect(levels[level.maxAt[i]!]).toBe(max);
      });
    }
  });

  test("ends with a level of at most 512 entries and stays under a fifth of the trace's bytes", () => {
    const pyramid = buildPyramid(new Float32Array(100_000));
    expect(pyramid.at(-1)!.maxDb.length).toBeLessThanOrEqual(512);
    const bytes = pyramid.reduce((sum, level) => sum + level.maxDb.length * 12, 0);
    expect(bytes / 100_000).toBeLessThan(1.5);
  });

  test("is answered from a level that is small whatever the sweep's size", () => {
    expect(pyramidLevelFor(1000)).toBe(0);
    for (const samples of [65_537, 1e6, 1e7, 1e8])
      expect(samples / 16 ** pyramidLevelFor(samples)).toBeLessThanOrEqual(8192);
  });
});

describe("a view of a trace", () => {
  test("holds the highest sample in view at its own frequency, from any level and any cut", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 1e6 }),
        fc.integer({ min: 600, max: 6000 }),
        fc.double({ min: 0, max: 0.9, noNaN: true }),
        fc.double({ min: 0.01, max: 1, noNaN: true }),
        fc.integer({ min: 20, max: 1500 }),
        fc.integer({ min: 0, max: 1 }),
        (seed, count, start, share, columns, levelIndex) => {
          const levels = levelsOf(seed, count);
          const span = (count - 1) * 60e3;
          const fromHz = 30e6 + start * span;
          const toHz = fromHz + share * (1 - start) * span;
          const shown = view(levels, fromHz, toHz, columns, levelIndex);
          let best = -1;
          levels.forEach((level, i) => {
            const hz = 30e6 + i * 60e3;
            if (hz >= fromHz && hz <= toHz && (best < 0 || level > levels[best]!)) best = i;
          });
          if (best < 0) return;
          const rounded = Math.round(levels[best]! * 1000) / 1000;
          const at = shown.hz.indexOf(30e6 + best * 60e3);
          const higher = shown.maxDb.some((level) => level! > rounded);
          // Only a sample just outside the view may be higher and stand in its place.
          expect(at >= 0 ? shown.maxDb[at] === rounded : higher).toBe(true);
          expect(shown.hz.length).toBeLessThanOrEqual(columns + 2);
          for (let i = 1; i < shown.hz.length; i += 1)
            expect(shown.hz[i]!).toBeGreaterThan(shown.hz[i - 1]!);
        },
      ),
      { numRuns: 200 },
    );
  });

  test("shows gaps as gaps", () => {
    const levels = levelsOf(9, 200).map((level, i) => (i > 50 && i < 60 ? Number.NaN : level));
    const shown = view(levels, 30e6, 42e6, 500, 0);
    expect(shown.maxDb.slice(51, 60)).toEqual(Array.from({ length: 9 }, () => null));
    expect(shown.maxDb[50]).not.toBeNull();
  });

  test("gives the samples themselves when there is room for each", () => {
    const shown = view(levelsOf(2, 100), 30e6, 36e6, 500, 0);
    expect(shown.samplesPerBucket).toBe(1);
    expect(shown.points).toBe(100);
    expect(shown.minDb).toEqual(shown.maxDb);
  });
});
