import { describe, expect, it } from "vitest";
import { convertLevel, fromLinear, powerRatioDb } from "../../lib/core/units/convert-level";
import { LEVEL_UNITS, type LevelUnit, type LinearUnit } from "../../lib/core/units/level-units";
import { randomFrom } from "../support/traces";

const TERMINAL: LevelUnit[] = ["dBm", "dBW", "dBuV", "dBmV", "dBV", "dBuA"];
const FIELD: LevelUnit[] = ["dBuV/m", "dBuA/m", "dBpT"];
const QUANTITIES: LevelUnit[][] = [TERMINAL, FIELD, ["dB"]];

describe("published offsets", () => {
  // Computed from P = U²/R, I = U/R, the impedance of free space and µ0.
  it.each([
    ["dBm", "dBuV", 50, 106.9897],
    ["dBm", "dBuV", 75, 108.7506],
    ["dBuV", "dBuA", 50, -33.979],
    ["dBuV", "dBuA", 75, -37.501],
    ["dBm", "dBuA", 50, 73.0103],
    ["dBm", "dBW", 50, -30],
    ["dBuV", "dBmV", 50, -60],
    ["dBmV", "dBV", 50, -60],
    ["dBm", "dBmV", 75, 48.7506],
    ["dBuV/m", "dBuA/m", 50, -51.52],
    ["dBuA/m", "dBpT", 50, 1.984],
    ["dBuV/m", "dBpT", 50, -49.536],
  ] as [LevelUnit, LevelUnit, number, number][])(
    "%s to %s at %i Ω adds %f dB, and the way back takes it off",
    (from, to, ohm, db) => {
      for (const level of [-120, 0, 34.98]) {
        expect(Math.abs((convertLevel(level, from, to, ohm) ?? NaN) - level - db)).toBeLessThan(
          0.005,
        );
        expect(Math.abs((convertLevel(level, to, from, ohm) ?? NaN) - level + db)).toBeLessThan(
          0.005,
        );
      }
    },
  );

  it("takes 50 Ω unless another impedance is given", () => {
    expect(convertLevel(0, "dBm", "dBuV")).toBe(convertLevel(0, "dBm", "dBuV", 50));
  });
});

it("agrees with volts, amperes and watts worked out in linear units at any impedance", () => {
  const random = randomFrom(11);
  for (let i = 0; i < 200; i += 1) {
    const ohm = 10 + 590 * random();
    const watts = Math.pow(10, -15 + 15 * random());
    const volts = Math.sqrt(watts * ohm);
    const amperes = volts / ohm;
    const levels: Record<string, number> = {
      dBW: 10 * Math.log10(watts),
      dBm: 10 * Math.log10(watts * 1e3),
      dBV: 20 * Math.log10(volts),
      dBmV: 20 * Math.log10(volts * 1e3),
      dBuV: 20 * Math.log10(volts * 1e6),
      dBuA: 20 * Math.log10(amperes * 1e6),
    };
    for (const from of TERMINAL)
      for (const to of TERMINAL)
        expect(convertLevel(levels[from] ?? NaN, from, to, ohm)).toBeCloseTo(levels[to] ?? NaN, 9);
  }
});

it("agrees with a plane wave worked out in V/m, A/m and T", () => {
  const random = randomFrom(12);
  for (let i = 0; i < 100; i += 1) {
    const electric = Math.pow(10, -7 + 7 * random());
    const magnetic = electric / 376.7303;
    const flux = magnetic * 4e-7 * Math.PI;
    const levels: Record<string, number> = {
      "dBuV/m": 20 * Math.log10(electric * 1e6),
      "dBuA/m": 20 * Math.log10(magnetic * 1e6),
      dBpT: 20 * Math.log10(flux * 1e12),
    };
    for (const from of FIELD)
      for (const to of FIELD)
        expect(convertLevel(levels[from] ?? NaN, from, to)).toBeCloseTo(levels[to] ?? NaN, 5);
  }
});

it("comes back unchanged through every pair, and over every third unit, of one quantity", () => {
  const random = randomFrom(13);
  for (const units of QUANTITIES)
    for (const from of units)
      for (const by of units)
        for (const to of units)
          for (const ohm of [50, 75, 1 + 999 * random()]) {
            const level = -150 + 300 * random();
            const there = convertLevel(level, from, by, ohm) ?? NaN;
            expect(convertLevel(there, by, from, ohm)).toBeCloseTo(level, 9);
            const direct = convertLevel(level, from, to, ohm) ?? NaN;
            expect(convertLevel(there, by, to, ohm)).toBeCloseTo(direct, 9);
          }
});

it("never makes one quantity of another", () => {
  const quantityOf = (unit: LevelUnit) => QUANTITIES.findIndex((units) => units.includes(unit));
  let refused = 0;
  for (const from of LEVEL_UNITS)
    for (const to of LEVEL_UNITS) {
      const isSame = quantityOf(from) === quantityOf(to);
      expect(convertLevel(40, from, to) === null, `${from} to ${to}`).toBe(!isSame);
      if (!isSame) refused += 1;
    }
  // 6 terminal, 3 field and 1 relative unit: 100 pairs less 36 + 9 + 1.
  expect(refused).toBe(54);
});

describe("linear units of a file", () => {
  it.each([
    ["W", 1, "dBm", 30],
    ["W", 0.002, "dBW", -26.99],
    ["mW", 1, "dBm", 0],
    ["mW", 0.2, "dBuV", 100],
    ["V", 1, "dBuV", 120],
    ["V", 0.2236068, "dBm", 0],
    ["mV", 1, "dBuV", 60],
    ["uV", 1000, "dBuV", 60],
    ["uV", 56.1, "dBuV", 34.98],
    // 47 CFR 15.109, read: µV/m as dBµV/m.
    ["uV/m", 100, "dBuV/m", 40],
    ["uV/m", 150, "dBuV/m", 43.52],
    ["uV/m", 500, "dBuV/m", 53.98],
    // A published example, read: 131.5 µV/m is 42.38 dBµV/m.
    ["uV/m", 131.5, "dBuV/m", 42.38],
  ] as [LinearUnit, number, LevelUnit, number][])("%s: %f is %s %f", (unit, value, to, db) => {
    const read = fromLinear(value, unit);
    const level = convertLevel(read.levelDb, read.unit, to, 50) ?? NaN;
    expect(Math.abs(level - db)).toBeLessThan(0.006);
  });

  it("gives the fundamental of a 1 Vpp square wave, 113.07 dBµV rms", () => {
    // Computed: amplitude 4/π · 0.5 V, rms by √2.
    const read = fromLinear((4 / Math.PI) * (0.5 / Math.SQRT2), "V");
    expect(convertLevel(read.levelDb, read.unit, "dBuV")).toBeCloseTo(113.07, 2);
  });

  it("takes zero, a negative value and no number as not covered", () => {
    for (const unit of ["W", "mW", "uV", "mV", "V", "uV/m"] as const)
      for (const value of [0, -1, Number.NaN])
        expect(fromLinear(value, unit).levelDb, `${value} ${unit}`).toBeNaN();
  });

  it("counts powers by 10 log and voltages by 20 log", () => {
    for (const [unit, perDecade] of [
      ["W", 10],
      ["mW", 10],
      ["V", 20],
      ["mV", 20],
      ["uV", 20],
      ["uV/m", 20],
    ] as const)
      expect(fromLinear(10, unit).levelDb - fromLinear(1, unit).levelDb).toBeCloseTo(perDecade, 12);
    expect(powerRatioDb(2)).toBeCloseTo(3.0103, 4);
  });
});
