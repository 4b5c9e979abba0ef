import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Mask, MaskSegment } from "../../lib/core/mask/mask";
import { readSweep } from "../../lib/core/reading/read-sweep";
import type { MeasurementSettings } from "../../lib/core/sweep/settings";
import type { FrequencyAxis, Trace } from "../../lib/core/sweep/trace";
import { randomFrom } from "../support/traces";
import { readByHand } from "./margins-by-hand";
import { makeMarginCase } from "./margins-cases";

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

function read(
  segments: MaskSegment[],
  levels: number[],
  guardDb = 0,
  axis: FrequencyAxis = { kind: "regular", startHz: 1e5, stepHz: 4e4, count: levels.length },
) {
  const line = { name: "l", detector: "peak" as const, rbwHz: null, rbwKind: null, segments };
  const mask = {
    port: "mains",
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
    axis,
    levelsDb: Float32Array.from(levels),
  };
  return readSweep({ traces: [trace], settings, mask, guardDb }).lines[0];
}

it("agrees with margins worked out by hand on 1,000 random pairs of sweep and mask", () => {
  const random = randomFrom(2026);
  const seen = { none: 0, own: 0, bound: 0, over: 0, boundOver: 0, restated: 0, ownBesideBound: 0 };
  for (let i = 0; i < 1000; i += 1) {
    const input = makeMarginCase(random);
    const reading = readSweep(input);
    expect(reading.notComparable, `pair ${i}`).toBeNull();
    const byHand = readByHand(input);
    byHand.forEach((expected, k) => {
      const at = `pair ${i}, line ${k + 1}`;
      const found = reading.lines[k];
      if (!expected) {
        expect(found?.worst, at).toBeNull();
        expect(found?.standing, at).toBe("undecided");
        seen.none += 1;
        return;
      }
      expect(Math.abs((found?.worst?.marginDb ?? NaN) - expected.marginDb), at).toBeLessThan(1e-6);
      expect(found?.worst?.frequencyHz, at).toBe(expected.frequencyHz);
      expect(found?.basis, at).toBe(expected.basis);
      expect(found?.standing === "over", at).toBe(expected.isOver);
      const isBound = expected.basis === "upper-bound";
      if (isBound && expected.marginDb < 0) expect(found?.standing, at).toBe("undecided");
      seen[isBound ? "bound" : "own"] += 1;
      if (expected.isOver) seen.over += 1;
      if (isBound && expected.marginDb < 0) seen.boundOver += 1;
      if (input.traces[0]?.unit !== input.mask.unit) seen.restated += 1;
      if (!isBound && input.traces.some((t) => t.detector !== found?.detector))
        seen.ownBesideBound += 1;
    });
  }
  // Every kind of pair was among them, not once or twice.
  for (const [kind, count] of Object.entries(seen)) expect(count, kind).toBeGreaterThan(100);
});

describe("samples on an edge of the mask", () => {
  const flat = (startHz: number, stopHz: number, db: number) => ({
    startHz,
    stopHz,
    startDb: db,
    stopDb: db,
    interpolation: "log" as const,
  });
  function readRegular(segments: MaskSegment[], startHz: number, stepHz: number, levels: number[]) {
    return read(segments, levels, 0, { kind: "regular", startHz, stepHz, count: levels.length });
  }

  it("take the lower limit, even where start + i·step comes out a hair above the edge", () => {
    // 30 MHz to 1 GHz in 1650 points: point 340 is 230 MHz, worked out as 230.00000000000003 MHz.
    const stepHz = 970e6 / 1649;
    const index = Math.round(200e6 / stepHz);
    const levels = Array.from({ length: 1650 }, (_, i) => (i === index ? 38 : -200));
    const segments = [flat(30e6, 230e6, 30), flat(230e6, 1e9, 37)];
    expect(30e6 + index * stepHz).toBeGreaterThan(230e6);
    expect(readRegular(segments, 30e6, stepHz, levels)?.worst).toMatchObject({
      limitDb: 30,
      marginDb: -8,
    });
  });

  it("are held against the mask at its first and last frequency, however many points there are", () => {
    let [above, below] = [0, 0];
    for (let count = 101; count < 700; count += 1) {
      const stepHz = 970e6 / (count - 1);
      const lastHz = 30e6 + (count - 1) * stepHz;
      if (lastHz > 1e9) above += 1;
      if (lastHz < 1e9) below += 1;
      const levels = Array.from({ length: count }, (_, i) => (i === count - 1 ? 50 : -200));
      const atEnd = readRegular([flat(30e6, 1e9, 40)], 30e6, stepHz, levels);
      expect(atEnd?.worst?.marginDb, `end, ${count} points`).toBe(-10);
      const atStart = readRegular([flat(1e9, 6e9, 40)], 30e6, stepHz, levels);
      expect(atStart?.worst?.marginDb, `start, ${count} points`).toBe(-10);
    }
    expect(above).toBeGreaterThan(0);
    expect(below).toBeGreaterThan(0);
  });

  it("have no limit 1 Hz outside", () => {
    const segments = [flat(30e6, 1e9, 40)];
    expect(readRegular(segments, 30e6 - 1, 970e6 + 2, [90, 90])?.worst).toBeNull();
    expect(readRegular(segments, 30e6, 970e6, [30, 31])?.worst?.marginDb).toBe(9);
  });
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
