import { describe, expect, it } from "vitest";
import { applySignalPath } from "../../lib/core/bench/apply-signal-path";
import type { SignalPath, Transducer, TransducerKind } from "../../lib/core/bench/signal-path";
import type { Trace } from "../../lib/core/sweep/trace";
import {
  eirpFromField,
  fieldFromEirp,
  fieldRatioDb,
  fromLinear,
} from "../../lib/core/units/convert-level";
import type { LevelUnit } from "../../lib/core/units/level-units";
import { makeTrace } from "../support/traces";

function transducer(kind: TransducerKind, factors: [number, number][]): Transducer {
  return {
    name: kind,
    kind,
    calibratedOn: null,
    dueOn: null,
    factors: factors.map(([mhz, factorDb]) => ({ frequencyHz: mhz * 1e6, factorDb })),
  };
}

function tracesAt(mhz: number[], levels: number[], unit: LevelUnit = "dBuV"): Trace {
  const frequenciesHz = Float64Array.from(mhz, (f) => f * 1e6);
  return makeTrace(levels, { unit, axis: { kind: "listed", frequenciesHz } });
}

function through(trace: Trace, transducers: Transducer[], impedanceOhm = 50): Trace {
  const path: SignalPath = { version: 1, impedanceOhm, transducers };
  const field = applySignalPath(trace, path);
  if (!field) throw new Error("The path refused the trace.");
  return field;
}

/** Antenna factor, 20 log10 f(MHz) − G(dBi) − 29.77 in 50 Ω, computed. */
const factorOf = (mhz: number, gainDbi: number) => 20 * Math.log10(mhz) - gainDbi - 29.77;

describe("published field examples", () => {
  it("34.98 dBµV and 7.4 dB/m are 42.38 dBµV/m, which are 131.5 µV/m", () => {
    // Read: 144.68 MHz, antenna of 6 dB.
    const antenna = transducer("antenna", [
      [100, 7.4],
      [200, 7.4],
    ]);
    const field = through(tracesAt([144.68], [34.98]), [antenna]);
    expect(field.unit).toBe("dBuV/m");
    expect(Math.abs((field.levelsDb[0] ?? NaN) - 42.38)).toBeLessThan(0.001);
    expect(field.levelsDb[0]).toBeCloseTo(fromLinear(131.5, "uV/m").levelDb, 2);
  });

  it("20 dBµV, an antenna of 10.36 dB/m and 6 dB of cable are 36.36 dBµV/m", () => {
    // Read. The factors on both sides are made so that they meet the example between two points.
    const antenna = transducer("antenna", [
      [100, 8.36],
      [400, 12.36],
    ]);
    const cable = transducer("cable", [
      [50, 5],
      [800, 7],
    ]);
    const field = through(tracesAt([200], [20]), [antenna, cable]);
    expect(Math.abs((field.levelsDb[0] ?? NaN) - 36.36)).toBeLessThan(0.001);
  });

  it("adds an attenuator and takes an amplifier's gain off", () => {
    const flat = (db: number): [number, number][] => [
      [30, db],
      [1000, db],
    ];
    const path = [
      transducer("antenna", flat(10.36)),
      transducer("preamplifier", flat(30)),
      transducer("cable", flat(6)),
      transducer("attenuator", flat(10)),
    ];
    expect(through(tracesAt([200], [40]), path).levelsDb[0]).toBeCloseTo(36.36, 4);
    // The same level as a power, in 50 and in 75 Ω (106.9897 and 108.7506 dB, computed).
    for (const [ohm, offset] of [
      [50, 106.9897],
      [75, 108.7506],
    ] as const) {
      const field = through(tracesAt([200], [40 - offset], "dBm"), path, ohm);
      expect(Math.abs((field.levelsDb[0] ?? NaN) - 36.36)).toBeLessThan(0.001);
    }
  });

  // Read, as printed with one decimal; the second figure is E = EIRP + 104.77 − 20 log10 d.
  it.each([
    [85.2, -10, 3],
    [54, -41.2, 3],
    [55, -40.2, 3],
    [43.5, -51.7, 3],
  ])("%f dBµV/m is an EIRP of %f dBm at %i m", (field, eirp, distance) => {
    expect(Math.abs(eirpFromField(field, distance) - eirp)).toBeLessThan(0.05);
    expect(Math.abs(fieldFromEirp(eirp, distance) - field)).toBeLessThan(0.05);
    const exact = eirp + 104.77 - 20 * Math.log10(distance);
    expect(Math.abs(fieldFromEirp(eirp, distance) - exact)).toBeLessThan(0.002);
  });

  it("takes field and EIRP back and forth, 10.46 dB between 3 m and 10 m", () => {
    for (const distance of [1, 3, 10, 30])
      for (const eirp of [-60, -10, 0, 20])
        expect(eirpFromField(fieldFromEirp(eirp, distance), distance)).toBeCloseTo(eirp, 10);
    expect(fieldFromEirp(0, 3) - fieldFromEirp(0, 10)).toBeCloseTo(10.46, 2);
    expect(fieldFromEirp(0, 1)).toBeCloseTo(104.77, 2);
  });
});

describe("antenna factor from gain", () => {
  it("prints 7.4 dB/m for 6 dB of gain at 144.68 MHz, and both forms of it agree", () => {
    expect(factorOf(144.68, 6)).toBeCloseTo(7.4, 1);
    for (const [mhz, gain] of [
      [30, 0],
      [144.68, 6],
      [1000, 8.5],
    ] as const) {
      const wavelength = 299.792458 / mhz;
      const long = fieldRatioDb(9.73 / (wavelength * Math.sqrt(Math.pow(10, gain / 10))));
      expect(Math.abs(long - factorOf(mhz, gain))).toBeLessThan(0.01);
    }
  });

  it("lies on a table of two points at constant gain, since tables are straight in log f", () => {
    const antenna = transducer("antenna", [
      [30, factorOf(30, 2.15)],
      [3000, factorOf(3000, 2.15)],
    ]);
    const mhz = [30, 47.3, 100, 144.68, 433.92, 1575.42, 2999, 3000];
    const field = through(
      tracesAt(
        mhz,
        mhz.map(() => 0),
      ),
      [antenna],
    );
    mhz.forEach((f, i) =>
      expect(Math.abs((field.levelsDb[i] ?? NaN) - factorOf(f, 2.15))).toBeLessThan(1e-4),
    );
  });

  it("is given at the table's ends and never outside", () => {
    const antenna = transducer("antenna", [
      [100, 8],
      [200, 12],
    ]);
    const field = through(tracesAt([99.999, 100, 200, 200.001], [20, 20, 20, 20]), [antenna]);
    expect(Array.from(field.levelsDb)).toEqual([NaN, 28, 32, NaN]);
  });
});
