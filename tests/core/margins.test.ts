import fc from "fast-check";
import { expect, it } from "vitest";
import type { Mask } from "../../lib/core/mask/mask";
import { readSweep } from "../../lib/core/reading/read-sweep";
import type { MeasurementSettings } from "../../lib/core/sweep/settings";
import type { Trace } from "../../lib/core/sweep/trace";

const settings = {
  rbwHz: 9e3,
  rbwKind: "6dB",
  distanceM: null,
  port: "mains",
} as Partial<MeasurementSettings> as MeasurementSettings;

const level = fc.double({ min: -20, max: 120, noNaN: true });
const segment = fc
  .tuple(
    fc.double({ min: 1e5, max: 9e5, noNaN: true }),
    fc.double({ min: 1.1, max: 3, noNaN: true }),
    level,
    level,
  )
  .map(([startHz, ratio, startDb, stopDb]) => ({
    startHz,
    stopHz: startHz * ratio,
    startDb,
    stopDb,
    interpolation: "log" as const,
  }));
const pair = fc.record({
  segments: fc.array(segment, { minLength: 1, maxLength: 4 }),
  levels: fc.array(level, { minLength: 2, maxLength: 60 }),
});

function read(segments: Mask["lines"][number]["segments"], levels: number[], guardDb = 0) {
  const line = { name: "l", detector: "peak" as const, rbwHz: null, rbwKind: null, segments };
  const mask = {
    unit: "dBuV",
    distanceM: null,
    provenance: "team",
    lines: [line],
  } as Partial<Mask> as Mask;
  const trace: Trace = {
    name: "t",
    kind: "scan",
    detector: "peak",
    hold: "none",
    unit: "dBuV",
    axis: { kind: "regular", startHz: 1e5, stepHz: 4e4, count: levels.length },
    levelsDb: Float32Array.from(levels),
  };
  return readSweep({ traces: [trace], settings, mask, guardDb }).lines[0];
}

it("agrees with margins worked out the long way on 1,000 random pairs", () => {
  fc.assert(
    fc.property(pair, ({ segments, levels }) => {
      let expected = Infinity;
      levels.forEach((db, i) => {
        const hz = 1e5 + 4e4 * i;
        const x = Math.log10(hz);
        for (const s of segments) {
          const [a, b] = [Math.log10(s.startHz), Math.log10(s.stopHz)];
          if (hz < s.startHz || hz > s.stopHz) continue;
          const limit = (s.startDb * (b - x) + s.stopDb * (x - a)) / (b - a);
          expected = Math.min(expected, limit - Math.fround(db));
        }
      });
      const worst = read(segments, levels)?.worst;
      if (expected === Infinity) expect(worst).toBeNull();
      else expect(Math.abs((worst?.marginDb ?? NaN) - expected)).toBeLessThan(1e-6);
    }),
    { numRuns: 1000 },
  );
});

it("never gains margin when a mask is tightened", () => {
  fc.assert(
    fc.property(pair, fc.double({ min: 0, max: 30, noNaN: true }), ({ segments, levels }, db) => {
      const tight = segments.map((s) => ({
        ...s,
        startDb: s.startDb - db,
        stopDb: s.stopDb - db,
      }));
      const before = read(segments, levels)?.worst?.marginDb ?? 0;
      const after = read(tight, levels)?.worst?.marginDb ?? 0;
      expect(after).toBeLessThanOrEqual(before + 1e-9);
    }),
  );
});
