import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Mask } from "@/lib/core/mask/mask";
import { readSweep } from "@/lib/core/reading/read-sweep";
import { readTogether } from "@/lib/core/reading/read-together";
import type { Reading, Standing } from "@/lib/core/reading/reading";
import type { SweepPart } from "@/lib/core/reading/sweep-part";
import type { FrequencyAxis, Trace } from "@/lib/core/sweep/trace";
import { listed, maskLine, maskOf, scan, segment, SETTINGS } from "./hand-worked/case";
import { anyCase } from "./margins-arbitraries";
import { isInPosition, readByHand, type LineByHand } from "./margins-by-hand";

const firstHz = (axis: FrequencyAxis) =>
  axis.kind === "regular" ? axis.startHz : axis.frequenciesHz[0]!;
const lastHz = (axis: FrequencyAxis) =>
  axis.kind === "regular"
    ? axis.startHz + (axis.count - 1) * axis.stepHz
    : axis.frequenciesHz.at(-1)!;

/** Whether one scan goes on where another ends, which counts as one sweep and is tested apart. */
function touches(traces: readonly Trace[]): boolean {
  return traces.some((a) =>
    traces.some((b) => {
      const gap = firstHz(b.axis) - lastHz(a.axis);
      return a !== b && gap > 0 && gap <= 120e3;
    }),
  );
}

function standingByHand({ worst, isOver, isInside, coverage }: LineByHand): Standing {
  if (isOver) return "over";
  if (!worst || worst.marginDb < 0 || coverage < 1 - 1e-12) return "undecided";
  return isInside ? "inside-guard" : "clear";
}

const seen = { none: 0, own: 0, bound: 0, over: 0, boundOver: 0, clear: 0, partly: 0, inside: 0 };

function compare(reading: Reading, parts: SweepPart[], mask: Mask): void {
  expect(reading.notComparable).toBeNull();
  readByHand(parts, mask).forEach((expected, k) => {
    const found = reading.lines[k]!;
    const { worst } = expected;
    expect(found.standing).toBe(standingByHand(expected));
    expect(found.coverage.fraction).toBeCloseTo(expected.coverage, 9);
    expect(found.basis).toBe(worst?.basis ?? "cannot-decide");
    if (!worst) expect(found.worst).toBeNull();
    else {
      expect(Math.abs(found.worst!.marginDb - worst.marginDb)).toBeLessThan(1e-6);
      expect(found.worst!.frequencyHz).toBe(worst.frequencyHz);
    }
    // A spot at the points listed, in their positions, would speak for every bound over the line.
    const listedHz = reading.remeasure.filter((r) => r.lineName === found.name);
    for (const point of listedHz)
      expect(expected.boundsOver.map((b) => b.hz)).toContain(point.frequencyHz);
    if (reading.remeasureOmitted === 0)
      for (const { hz, reachHz, part } of expected.boundsOver) {
        const near = listedHz.filter((r) => Math.abs(r.frequencyHz - hz) <= reachHz);
        expect(near.some((r) => isInPosition(parts[r.partIndex]!, part))).toBe(true);
      }
    seen[worst ? (worst.basis === "like-for-like" ? "own" : "bound") : "none"] += 1;
    if (expected.isOver) seen.over += 1;
    if (expected.boundsOver.length > 0) seen.boundOver += 1;
    if (found.standing === "clear") seen.clear += 1;
    if (found.standing === "inside-guard") seen.inside += 1;
    if (expected.coverage > 0 && expected.coverage < 1) seen.partly += 1;
  });
}

describe("against loops over every sample and segment (measurement.md §4)", () => {
  test("one sweep: margin, frequency, basis, standing, coverage and what to measure again", () => {
    fc.assert(
      fc.property(anyCase(), (input) => {
        fc.pre(!touches(input.traces));
        compare(readSweep(input), [input], input.mask);
      }),
      { numRuns: 500, seed: 2026 },
    );
    // Every kind of line was among them, and not just once or twice.
    for (const [kind, count] of Object.entries(seen)) expect(count, kind).toBeGreaterThan(2);
  });

  test("several sweeps in positions of their own, each with its own guard and bandwidth", () => {
    const position = fc.record({
      polarization: fc.constantFrom("horizontal" as const, "vertical" as const),
      heightM: fc.constantFrom(null, 1, 2),
      azimuthDeg: fc.constantFrom(null, 0, 90),
      guardDb: fc.constantFrom(0, 2, 6),
    });
    fc.assert(
      fc.property(
        anyCase({ isOneUnit: true }),
        fc.array(position, { minLength: 3, maxLength: 3 }),
        fc.boolean(),
        (input, positions, isRadiated) => {
          fc.pre(!touches(input.traces));
          const port = isRadiated ? ("radiated" as const) : ("mains" as const);
          const parts = input.traces.map((trace, i): SweepPart => {
            const { guardDb, polarization, ...place } = positions[i]!;
            const settings = { ...input.settings, ...place, port };
            return {
              traces: [trace],
              guardDb,
              settings: { ...settings, polarization: isRadiated ? polarization : null },
            };
          });
          const mask = { ...input.mask, port };
          compare(readTogether(parts, mask), parts, mask);
        },
      ),
      { numRuns: 400, seed: 2027 },
    );
  });

  test("sweeps of some ten thousand points, where a fast reading leaves most of them out", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 8000, max: 13_000 }),
        fc.array(fc.tuple(fc.nat({ max: 7999 }), fc.integer({ min: 0, max: 400 })), {
          minLength: 1,
          maxLength: 12,
        }),
        fc.array(fc.nat({ max: 7999 }), { maxLength: 3 }),
        (count, spikes, missing) => {
          const levels = Float32Array.from({ length: count }, (_, i) => 10 + ((i * 7919) % 64) / 8);
          for (const [i, eighths] of spikes) levels[i] = 20 + eighths / 8;
          for (const i of missing) levels[i] = Number.NaN;
          const axis = { kind: "regular" as const, startHz: 150e3, stepHz: 2e3, count };
          const trace = { ...scan([0, 1, 1], 0, []), axis, levelsDb: levels };
          const segments = [
            segment(150e3, 500e3, 66, 56),
            segment(500e3, 5e6, 56),
            segment(5e6, 15e6, 40, 60),
          ];
          const mask = maskOf([maskLine("quasi-peak", segments), maskLine("average", segments)]);
          const part = { traces: [trace], settings: SETTINGS, guardDb: 2 };
          compare(readTogether([part], mask), [part], mask);
        },
      ),
      { numRuns: 4, seed: 2028 },
    );
  });
});

describe("samples on an edge of the mask", () => {
  const read = (trace: Trace, mask: Mask) =>
    readSweep({ traces: [trace], settings: SETTINGS, mask, guardDb: 0 }).lines[0]?.worst;
  /** Regular axis whose frequencies are worked out as start + i·step. */
  const regular = (startHz: number, stepHz: number, levels: number[]): Trace => ({
    ...listed(levels.map((db, i) => [i, db])),
    axis: { kind: "regular", startHz, stepHz, count: levels.length },
  });

  test("take the lower limit, even where start + i·step comes out a hair above the edge", () => {
    // 30 MHz to 1 GHz in 1650 points: point 340 is 230 MHz, worked out as 230.00000000000003 MHz.
    const stepHz = 970e6 / 1649;
    const index = Math.round(200e6 / stepHz);
    const levels = Array.from({ length: 1650 }, (_, i) => (i === index ? 38 : -200));
    const segments = [segment(30e6, 230e6, 30), segment(230e6, 1e9, 37)];
    expect(30e6 + index * stepHz).toBeGreaterThan(230e6);
    expect(
      read(regular(30e6, stepHz, levels), maskOf([maskLine("quasi-peak", segments)])),
    ).toMatchObject({ limitDb: 30, marginDb: -8 });
  });

  test("are held against its first and last frequency, however many points there are", () => {
    let [above, below] = [0, 0];
    for (let count = 101; count < 700; count += 1) {
      const stepHz = 970e6 / (count - 1);
      const last = 30e6 + (count - 1) * stepHz;
      if (last > 1e9) above += 1;
      if (last < 1e9) below += 1;
      const levels = Array.from({ length: count }, (_, i) => (i === count - 1 ? 50 : -200));
      const trace = regular(30e6, stepHz, levels);
      const ending = maskOf([maskLine("quasi-peak", [segment(30e6, 1e9, 40)])]);
      const beginning = maskOf([maskLine("quasi-peak", [segment(1e9, 6e9, 40)])]);
      expect(read(trace, ending)?.marginDb, `end, ${count} points`).toBe(-10);
      expect(read(trace, beginning)?.marginDb, `start, ${count} points`).toBe(-10);
    }
    expect(above).toBeGreaterThan(0);
    expect(below).toBeGreaterThan(0);
  });
});
