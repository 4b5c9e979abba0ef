import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Mask } from "@/lib/core/mask/mask";
import { combineReadings, reachesMask } from "@/lib/core/reading/combine-readings";
import { decidingPoint } from "@/lib/core/reading/deciding-point";
import type { SweepOutline } from "@/lib/core/reading/must-read-together";
import { mustReadTogether } from "@/lib/core/reading/must-read-together";
import { readTogether } from "@/lib/core/reading/read-together";
import type { SweepPart } from "@/lib/core/reading/sweep-part";
import { firstHz, lastHz } from "@/lib/core/sweep/axis";
import type { Detector } from "@/lib/core/sweep/settings";
import type { Trace } from "@/lib/core/sweep/trace";
import { maskLine, maskOf, scan, segment, SETTINGS, spots } from "./hand-worked/case";

const STEP = 50e3;
const at = (i: number) => 30e6 + i * STEP;

const outlineOf = ({ settings, traces }: SweepPart): SweepOutline => ({
  settings,
  traces: traces.map(({ kind, detector, hold, axis }) => ({
    kind,
    detector,
    hold,
    firstHz: firstHz(axis),
    lastHz: lastHz(axis),
    stepHz: axis.kind === "regular" ? axis.stepHz : null,
  })),
});

const needsLevels = (mask: Mask, parts: readonly SweepPart[]) =>
  mustReadTogether(mask, parts.map(outlineOf));

/** What a build is known by, from the sweeps' own readings. */
function fromReadings(mask: Mask, parts: readonly SweepPart[]) {
  const { standing, lines, deciding, coverage } = combineReadings(
    mask,
    parts.map((part) => ({
      ...readTogether([part], mask),
      polarization: part.settings.polarization,
      scans: outlineOf(part).traces.filter(({ kind }) => kind === "scan"),
    })),
  );
  return {
    standing,
    coverage: coverage.toFixed(9),
    margin: deciding?.worst.marginDb ?? null,
    frequency: deciding?.worst.frequencyHz ?? null,
    line: deciding?.name ?? null,
    lines: lines.map((line) => [
      line.standing,
      line.worst?.marginDb ?? null,
      line.worst?.frequencyHz ?? null,
      line.coverage.toFixed(9),
    ]),
  };
}

/** The same from all their levels. */
function fromLevels(mask: Mask, parts: readonly SweepPart[]) {
  const reading = readTogether(parts, mask);
  const deciding = decidingPoint(reading);
  return {
    standing: reading.standing,
    coverage: reading.coverage.fraction.toFixed(9),
    margin: deciding?.point.marginDb ?? null,
    frequency: deciding?.point.frequencyHz ?? null,
    line: deciding?.line.name ?? null,
    lines: reading.lines.map((line) => [
      line.standing,
      line.worst?.marginDb ?? null,
      line.worst?.frequencyHz ?? null,
      line.coverage.fraction.toFixed(9),
    ]),
  };
}

const detector = fc.constantFrom<Detector[]>("peak", "quasi-peak", "rms-average", "average");

/** One or two lines over 30 to 34 MHz, some with a stretch without a limit in the middle. */
const anyMask = fc
  .array(fc.tuple(detector, fc.boolean(), fc.integer({ min: 280, max: 360 })), {
    minLength: 1,
    maxLength: 2,
  })
  .map((lines) =>
    maskOf(
      lines.map(([own, isSplit, eighths], i) =>
        maskLine(
          own,
          isSplit
            ? [segment(30e6, 31.5e6, eighths / 8), segment(32.5e6, 34e6, eighths / 8 + 3)]
            : [segment(30e6, 34e6, eighths / 8)],
          { name: `Line ${i + 1}` },
        ),
      ),
    ),
  );

/** A scan over some of 30 to 34 MHz or a few spots; levels are unlike each other, so none ties. */
const anySweep = fc
  .record({
    own: detector,
    first: fc.integer({ min: 0, max: 60 }),
    count: fc.integer({ min: 2, max: 81 }),
    whole: fc.boolean(),
    seed: fc.integer({ min: 0, max: 2 ** 30 }),
    highest: fc.integer({ min: 25, max: 45 }),
    isSpots: fc.nat({ max: 3 }).map((n) => n === 0),
    polarization: fc.constantFrom("horizontal" as const, "vertical" as const, null),
    heightM: fc.constantFrom(null, 1, 2),
    guardDb: fc.constantFrom(0, 2, 8),
  })
  .map((made): SweepPart => {
    const [first, count] = made.whole ? [0, 81] : [made.first, made.count];
    const points = Array.from({ length: count }, (_, k): [number, number] => {
      const noise = Math.imul(made.seed + k * 7919, 2654435761) >>> 0;
      return [at(first + k), made.highest - (20 * noise) / 2 ** 32];
    });
    const trace = made.isSpots
      ? spots(
          points.filter((_, k) => k % 9 === made.seed % 9 || k === 0),
          { detector: made.own },
        )
      : scan([at(first), at(first + count - 1), STEP], 0, points, { detector: made.own });
    const { polarization, heightM, guardDb } = made;
    return { traces: [trace], settings: { ...SETTINGS, polarization, heightM }, guardDb };
  });

describe("sweeps that need not be read together", () => {
  test("stand by their own readings exactly as by all their levels", () => {
    let looked = 0;
    fc.assert(
      fc.property(anyMask, fc.array(anySweep, { minLength: 2, maxLength: 4 }), (mask, all) => {
        const parts = all.filter((part) => reachesMask(readTogether([part], mask)));
        fc.pre(parts.length > 1 && !needsLevels(mask, parts));
        looked += 1;
        expect(fromReadings(mask, parts)).toEqual(fromLevels(mask, parts));
      }),
      { numRuns: 400 },
    );
    expect(looked).toBeGreaterThanOrEqual(400);
  });
});

describe("sweeps of which one may silence another's bound", () => {
  const mask = maskOf([maskLine("quasi-peak", [segment(30e6, 34e6, 40)])]);
  const peak: SweepPart = {
    traces: [scan([30e6, 32e6, STEP], 20, [[32e6, 44]], { detector: "peak" })],
    settings: SETTINGS,
    guardDb: 0,
  };
  const beside = (change: Partial<SweepPart["settings"]>, own: Partial<Trace>, hz = 32e6) => ({
    traces: [spots([[hz, 38]], own)],
    settings: { ...SETTINGS, ...change },
    guardDb: 0,
  });

  test("are read together: a spot of the line's own detector in the same position", () => {
    const parts = [peak, beside({}, {})];
    expect(needsLevels(mask, parts)).toBe(true);
    expect(needsLevels(mask, parts.toReversed())).toBe(true);
    // Their own readings would leave 40 − 44 standing; the spot decides 40 − 38.
    expect(fromReadings(mask, parts)).toMatchObject({ standing: "undecided", margin: -4 });
    expect(fromLevels(mask, parts)).toMatchObject({ margin: 2, frequency: 32e6 });
  });

  test("are read together when a spot just past the end of a scan reaches into it", () => {
    const parts = [peak, beside({}, {}, 32.1e6)];
    expect(fromReadings(mask, parts).margin).not.toBe(fromLevels(mask, parts).margin);
    expect(needsLevels(mask, parts)).toBe(true);
    // Beyond the RBW of 120 kHz it says nothing of the scan's last level.
    expect(needsLevels(mask, [peak, beside({}, {}, 32.2e6)])).toBe(false);
  });

  test.each([
    ["another polarization", beside({ polarization: "horizontal" }, {})],
    ["another height", beside({ heightM: 2 }, {})],
    ["another port", beside({ port: "cable" }, {})],
    ["the bound's own detector", beside({}, { detector: "peak" })],
    ["a detector that cannot decide", beside({}, { detector: "average" })],
    ["min hold", beside({}, { hold: "min-hold" })],
    ["another part of the mask", beside({}, {}, 33.5e6)],
  ])("are not for %s", (_, other) => {
    expect(needsLevels(mask, [peak, other])).toBe(false);
  });

  test("are not for a sweep that silences only its own bound", () => {
    const own = [...peak.traces, ...beside({}, {}).traces];
    expect(needsLevels(mask, [{ ...peak, traces: own }])).toBe(false);
  });
});
