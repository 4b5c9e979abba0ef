import { describe, expect, test } from "vitest";
import type { Mask } from "@/lib/core/mask/mask";
import { ambientLevelAt } from "@/lib/core/reading/ambient-check";
import type { AmbientSweep } from "@/lib/core/reading/comparable-ambient";
import type { HeldProduct } from "@/lib/core/reading/hold-ambient";
import { holdAmbient } from "@/lib/core/reading/hold-ambient";
import type { LineReading, Suspect } from "@/lib/core/reading/reading";
import { restatementDb } from "@/lib/core/reading/restate-distance";
import { subtractPower } from "@/lib/core/reading/subtract-power";
import type { Trace } from "@/lib/core/sweep/trace";
import { flatMask, SETTINGS } from "../support/sweeps";
import { makeTrace } from "../support/traces";

/** Ten points from 100 MHz, 10 MHz apart, so that the reach is one step. */
const axis = { kind: "regular" as const, startHz: 100e6, stepHz: 10e6, count: 10 };
const FLOOR = 20;

function ambientTrace(peaks: Record<number, number> = {}, part: Partial<Trace> = {}): Trace {
  return makeTrace(
    Array.from({ length: 10 }, (_, i) => peaks[i] ?? FLOOR),
    { axis, ...part },
  );
}

function ambientOf(traces: Trace[], change: Partial<AmbientSweep["settings"]> = {}): AmbientSweep {
  return { traces, settings: { ...SETTINGS, ...change }, impedanceOhm: 50 };
}

function suspect(number: number, sampleHz: number, levelDb: number): Suspect {
  return {
    number,
    frequencyHz: sampleHz,
    sampleHz,
    levelDb,
    limitDb: 50,
    marginDb: 50 - levelDb,
    prominenceDb: 10,
    lineName: "Peak",
    basis: "like-for-like",
    traceIndex: 0,
    partIndex: 0,
  };
}

function lineAt(frequencyHz: number, levelDb: number): LineReading {
  return {
    lineIndex: 0,
    name: "Peak",
    detector: "peak",
    basis: "like-for-like",
    standing: "clear",
    worst: {
      frequencyHz,
      levelDb,
      limitDb: 50,
      marginDb: 50 - levelDb,
      traceIndex: 0,
      partIndex: 0,
    },
    coverage: { fraction: 1, gaps: [] },
    bands: [],
    explanation: null,
  };
}

function productOf(change: Partial<HeldProduct> = {}): HeldProduct {
  return {
    reading: {
      unit: "dBuV/m",
      lines: [lineAt(150e6, 44)],
      suspects: [suspect(1, 150e6, 44), suspect(2, 120e6, 38)],
    },
    traces: [
      {
        detector: "peak",
        unit: "dBuV/m",
        hold: "max-hold",
        firstHz: 100e6,
        lastHz: 190e6,
        stepHz: 10e6,
      },
    ],
    settings: SETTINGS,
    mask: flatMask(50),
    ...change,
  };
}

describe("ambientLevelAt", () => {
  test("takes the highest finite level within the reach, ends included", () => {
    const trace = ambientTrace({ 4: 31, 5: 25, 6: 33 });
    expect(ambientLevelAt(trace, 150e6, 10e6)).toBe(33);
    expect(ambientLevelAt(trace, 150e6, 9.9e6)).toBe(25);
  });

  test("leaves points without a level out and knows nothing where there is none", () => {
    const trace = ambientTrace({ 4: Number.NaN, 5: Number.NaN, 6: 33 });
    expect(ambientLevelAt(trace, 150e6, 10e6)).toBe(33);
    expect(ambientLevelAt(trace, 145e6, 5e6)).toBeNull();
    expect(ambientLevelAt(trace, 300e6, 10e6)).toBeNull();
    expect(ambientLevelAt(trace, 155e6, 2e6)).toBeNull();
  });
});

describe("subtractPower", () => {
  test("takes powers off each other: numbers from the formula by hand", () => {
    // 10^4 − 10^3.7 = 10000 − 5011.872 = 4988.128; 10 log10 of it is 36.9794.
    expect(subtractPower(40, 37)).toBeCloseTo(36.9794, 4);
    // 10^4 − 10^3 = 9000: 39.5424.
    expect(subtractPower(40, 30)).toBeCloseTo(39.5424, 4);
    // 0.1 − 0.01 = 0.09: −10.4576; the same ten decibels apart, fifty lower.
    expect(subtractPower(-10, -20)).toBeCloseTo(-10.4576, 4);
    // 10^-40 is far under what 1 − 10^-x can tell from 1.
    expect(subtractPower(40, -360)).toBe(40);
  });

  test("has no answer where the ambient is as high as the level, or not a number", () => {
    expect(subtractPower(40, 40)).toBeNull();
    expect(subtractPower(40, 41)).toBeNull();
    expect(subtractPower(40, Number.NaN)).toBeNull();
  });
});

describe("holdAmbient", () => {
  test("says the level at each suspect and worst point, and the nearest approach to the line", () => {
    const check = holdAmbient(ambientOf([ambientTrace({ 5: 40, 9: 47.5 })]), productOf());
    expect(check).toEqual({
      version: 1,
      notComparable: null,
      caveat: null,
      // 120 MHz has 110 to 130 MHz in reach, all on the floor.
      suspects: [
        { number: 1, ambientDb: 40 },
        { number: 2, ambientDb: 20 },
      ],
      lines: [{ lineIndex: 0, frequencyHz: 190e6, ambientDb: 47.5, marginDb: 2.5 }],
      worst: [{ lineIndex: 0, ambientDb: 40 }],
    });
  });

  test("the reach is the bandwidth where that is wider than the step", () => {
    const fine = { kind: "regular" as const, startHz: 149.9e6, stepHz: 20e3, count: 11 };
    const traces = [{ ...productOf().traces[0]!, stepHz: 20e3 }];
    const at = (levels: number[]) =>
      holdAmbient(ambientOf([makeTrace(levels, { axis: fine })]), productOf({ traces })).suspects;
    // Point 0 lies 100 kHz under 150 MHz and so within ± 120 kHz of it.
    expect(at([41, ...Array<number>(10).fill(20)])).toEqual([{ number: 1, ambientDb: 41 }]);
  });

  test("what the ambient does not cover is left out, also where a sample beyond its end is in reach", () => {
    const short = makeTrace([FLOOR, FLOOR, FLOOR, FLOOR], { axis: { ...axis, count: 4 } });
    // It ends at 130 MHz and stands for half a step more; 150 MHz is out, 120 MHz is in.
    expect(holdAmbient(ambientOf([short]), productOf())).toMatchObject({
      suspects: [{ number: 2, ambientDb: 20 }],
      worst: [],
    });
    const reading = { ...productOf().reading, suspects: [suspect(1, 140e6, 44)] };
    expect(holdAmbient(ambientOf([short]), productOf({ reading })).suspects).toEqual([]);
  });

  test("a louder ambient beyond the product's own span is not held against the line", () => {
    const traces = [{ ...productOf().traces[0]!, lastHz: 170e6 }];
    const check = holdAmbient(ambientOf([ambientTrace({ 9: 60, 7: 30 })]), productOf({ traces }));
    expect(check.lines).toEqual([
      { lineIndex: 0, frequencyHz: 170e6, ambientDb: 30, marginDb: 20 },
    ]);
  });

  test("takes traces of the suspect's own detector alone", () => {
    const traces = [
      ...productOf().traces,
      { ...productOf().traces[0]!, detector: "average" as const },
    ];
    const reading = {
      ...productOf().reading,
      suspects: [suspect(1, 150e6, 44), { ...suspect(2, 150e6, 40), traceIndex: 1 }],
    };
    const ambient = ambientOf([
      ambientTrace({ 5: 45 }),
      ambientTrace({ 5: 33 }, { detector: "average" }),
    ]);
    expect(holdAmbient(ambient, productOf({ traces, reading })).suspects).toEqual([
      { number: 1, ambientDb: 45 },
      { number: 2, ambientDb: 33 },
    ]);
  });

  test("under an average line, the ambient's average silences its peak where it was swept", () => {
    const average = { ...flatMask(50).lines[0]!, detector: "average" as const };
    const mask: Mask = { ...flatMask(50), lines: [average] };
    const traces = [
      ...productOf().traces,
      { ...productOf().traces[0]!, detector: "average" as const },
    ];
    const gap = ambientTrace({ 8: Number.NaN, 9: Number.NaN, 3: 30 }, { detector: "average" });
    const held = (peaks: Record<number, number>) =>
      holdAmbient(ambientOf([ambientTrace(peaks), gap]), productOf({ traces, mask })).lines;
    expect(held({ 5: 48 })).toEqual([
      { lineIndex: 0, frequencyHz: 130e6, ambientDb: 30, marginDb: 20 },
    ]);
    expect(held({ 5: 48, 9: 41 })).toEqual([
      { lineIndex: 0, frequencyHz: 190e6, ambientDb: 41, marginDb: 9 },
    ]);
  });

  test("moves with the reading where the distance was restated: 10 to 3 m is 10.4576 dB up", () => {
    const distanceDb = (hz: number) => restatementDb(10, 3, hz);
    const check = holdAmbient(ambientOf([ambientTrace({ 5: 30 })]), productOf({ distanceDb }));
    expect(check.suspects[0]?.ambientDb).toBeCloseTo(40.4576, 4);
    expect(check.lines[0]?.marginDb).toBeCloseTo(50 - 40.4576, 4);
    expect(check.worst[0]?.ambientDb).toBeCloseTo(40.4576, 4);
  });

  test("restates dBm as dBµV at the instrument's impedance, and never a voltage as a field", () => {
    const reading = { ...productOf().reading, unit: "dBuV" as const };
    const product = productOf({ reading });
    const ambient = ambientOf([ambientTrace({ 5: 30 }, { unit: "dBm" })]);
    // 30 dBm + 106.9897 dB at 50 Ω.
    expect(holdAmbient(ambient, product).suspects[0]?.ambientDb).toBeCloseTo(136.9897, 3);
    expect(holdAmbient({ ...ambient, impedanceOhm: null }, product).notComparable).toContain(
      "dBm, which cannot be restated in dBµV",
    );
    const volts = ambientOf([ambientTrace({}, { unit: "dBuV" })]);
    expect(holdAmbient(volts, productOf()).notComparable).toContain(
      "dBµV, which cannot be restated in dBµV/m",
    );
  });

  test.each([
    ["port", { port: "mains" as const }, 'at the port "mains"'],
    ["bandwidth", { rbwHz: 9e3 }, "bandwidth of 9.000 kHz and the sweep with 120.0 kHz"],
    ["no bandwidth", { rbwHz: null }, "not stated for both"],
    ["bandwidth kind", { rbwKind: "3dB" as const }, "counts at 3 dB and that of the sweep at 6 dB"],
    [
      "polarization",
      { polarization: "horizontal" as const },
      "horizontal polarization and the sweep with vertical",
    ],
    ["distance", { distanceM: 10 }, "stood at 10 m and that of the sweep at 3 m"],
  ])("is not comparable with another %s, and says so", (_name, change, reason) => {
    const check = holdAmbient(ambientOf([ambientTrace({ 5: 40 })], change), productOf());
    expect(check.notComparable).toContain(reason);
    expect([check.suspects, check.lines, check.worst]).toEqual([[], [], []]);
  });

  test("is not comparable without a trace of the sweep's detector, nor by min hold", () => {
    const average = ambientOf([ambientTrace({}, { detector: "average" })]);
    expect(holdAmbient(average, productOf()).notComparable).toContain("no peak trace");
    const quiet = ambientOf([ambientTrace({}, { hold: "min-hold" })]);
    expect(holdAmbient(quiet, productOf()).notComparable).toContain("no peak trace");
  });

  test("an unstated polarization or another hold is a caveat, not the end", () => {
    const unstated = ambientOf([ambientTrace({ 5: 40 })], { polarization: null });
    expect(holdAmbient(unstated, productOf())).toMatchObject({
      notComparable: null,
      caveat: "The ambient sweep states no polarization.",
      suspects: [{ number: 1, ambientDb: 40 }, { number: 2 }],
    });
    const once = ambientTrace({ 5: 49 }, { hold: "none" });
    expect(holdAmbient(ambientOf([once]), productOf()).caveat).toBe(
      "The ambient's peak trace has no hold and the sweep's max hold.",
    );
    // Beside a trace with the sweep's own hold, the other one says nothing.
    const both = holdAmbient(ambientOf([once, ambientTrace({ 5: 40 })]), productOf());
    expect(both.caveat).toBeNull();
    expect(both.suspects[0]?.ambientDb).toBe(40);
  });

  test("a conducted sweep has no polarization to state", () => {
    const settings = { ...SETTINGS, port: "mains" as const, polarization: null };
    const ambient = ambientOf([ambientTrace()], { port: "mains", polarization: null });
    expect(holdAmbient(ambient, productOf({ settings }))).toMatchObject({
      notComparable: null,
      caveat: null,
    });
  });
});
