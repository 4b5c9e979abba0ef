import type { Mask } from "@/lib/core/mask/mask";
import type { DoubtCode } from "@/lib/core/reading/reading";
import type { LevelUnit } from "@/lib/core/units/level-units";
import { maskLine, maskOf, scan, segment, type HandWorkedCase } from "./case";
import { LOW_BAND } from "./masks";

const SPAN = [30e6, 32e6, 50e3] as const;
/** 30 to 32 MHz at a mains port, in a unit of the caller's choice. */
const conducted = (limitDb: number, unit: LevelUnit): Mask =>
  maskOf([maskLine("quasi-peak", [segment(30e6, 32e6, limitDb)])], {
    port: "mains",
    unit,
    distanceM: null,
  });
const field = (limitDb: number, unit: LevelUnit): Mask => ({
  ...maskOf([maskLine("quasi-peak", [segment(30e6, 32e6, limitDb)])]),
  unit,
});

/** [name, mask, trace's unit, level, impedance, margin, doubts] */
type Restated = [string, Mask, LevelUnit, number, number | null, number, DoubtCode[]];
const RESTATED: Restated[] = [
  // dBµV = dBm + 106.9897 at 50 Ω: 36.9897; 56 − 36.9897
  ["dBm at 50 Ω in dBµV", conducted(56, "dBuV"), "dBm", -70, 50, 19.0103, []],
  // dBµV = dBm + 108.7506 at 75 Ω: 38.7506; 56 − 38.7506
  ["dBm at 75 Ω in dBµV", conducted(56, "dBuV"), "dBm", -70, 75, 17.2494, []],
  // 40 − 106.9897 = −66.9897 dBm; −50 + 66.9897
  ["dBµV at 50 Ω in dBm", conducted(-50, "dBm"), "dBuV", 40, 50, 16.9897, []],
  ["dBmV in dBµV needs no impedance", conducted(56, "dBuV"), "dBmV", -20, null, 16, []],
  ["dBV in dBµV needs no impedance", conducted(56, "dBuV"), "dBV", -80, null, 16, []],
  ["dBW in dBm needs no impedance", conducted(-50, "dBm"), "dBW", -100, null, 20, []],
  // 20·log10(376.7303) = 51.5206: −20 dBµA/m is 31.5206 dBµV/m in a plane wave; 40 − 31.5206
  [
    "dBµA/m in dBµV/m holds in a plane wave only",
    field(40, "dBuV/m"),
    "dBuA/m",
    -20,
    null,
    8.4794,
    ["plane-wave-assumed"],
  ],
  // dBpT = dBµA/m + 20·log10(0.4π) = + 1.9842: 10 dBpT is 8.0158 dBµA/m; both are magnetic.
  ["dBpT in dBµA/m is the same field", field(20, "dBuA/m"), "dBpT", 10, null, 11.9842, []],
];

const restatedCases = RESTATED.map(
  ([name, mask, unit, levelDb, impedanceOhm, marginDb, doubts]): HandWorkedCase => ({
    name,
    mask,
    impedanceOhm,
    settings: mask.port === "mains" ? { port: "mains", distanceM: null, polarization: null } : {},
    traces: [scan(SPAN, levelDb - 30, [[31e6, levelDb]], { unit })],
    expected: {
      standing: "clear",
      lines: [{ standing: "clear", basis: "like-for-like", worst: [marginDb, 31e6], coverage: 1 }],
      doubts,
    },
  }),
);

const MAINS = { port: "mains", distanceM: null, polarization: null } as const;
const one = (unit: LevelUnit) => [scan(SPAN, 10, [], { unit })];

const refusedCases: HandWorkedCase[] = [
  {
    name: "a power is not restated as a voltage while no impedance is stated",
    mask: conducted(56, "dBuV"),
    settings: MAINS,
    impedanceOhm: null,
    traces: one("dBm"),
    expected: { notComparable: /impedance/ },
  },
  {
    name: "a voltage is no field before its signal path",
    mask: LOW_BAND,
    impedanceOhm: 50,
    traces: one("dBuV"),
    expected: { notComparable: /signal path/ },
  },
  {
    name: "a current is no voltage, whatever the instrument's impedance",
    mask: conducted(56, "dBuV"),
    settings: MAINS,
    impedanceOhm: 50,
    traces: one("dBuA"),
    expected: { notComparable: /different quantities/ },
  },
  {
    name: "relative dB is never held against a mask",
    mask: LOW_BAND,
    impedanceOhm: 50,
    traces: one("dB"),
    expected: { notComparable: /dB/ },
  },
  {
    name: "a mains sweep is not held against a radiated mask",
    mask: { ...LOW_BAND, distanceM: null },
    settings: MAINS,
    traces: one("dBuV/m"),
    expected: { notComparable: /port/ },
  },
  {
    name: "a sweep at 10 m is not held against a mask at 3 m",
    mask: LOW_BAND,
    settings: { distanceM: 10 },
    traces: one("dBuV/m"),
    expected: { notComparable: /3 m.*10 m/ },
  },
  {
    name: "a sweep without a distance is not held against a mask at 3 m",
    mask: LOW_BAND,
    settings: { distanceM: null },
    traces: one("dBuV/m"),
    expected: { notComparable: /distance/ },
  },
  {
    name: "without a distance there is nothing to restate from",
    mask: LOW_BAND,
    settings: { distanceM: null },
    restateDistance: true,
    traces: one("dBuV/m"),
    expected: { notComparable: /distance/ },
  },
];

const distanceCases: HandWorkedCase[] = [
  {
    // CISPR 32 class B at 10 m: 30. 20·log10(3/10) = −10.4576 (not −10): 30 − (38 − 10.4576)
    name: "restated from 3 m to 10 m a level falls by 10.4576 dB",
    mask: maskOf([maskLine("quasi-peak", [segment(30e6, 32e6, 30)])], { distanceM: 10 }),
    restateDistance: true,
    traces: [scan(SPAN, 10, [[31e6, 38]])],
    expected: {
      standing: "clear",
      lines: [{ standing: "clear", basis: "like-for-like", worst: [2.4576, 31e6], coverage: 1 }],
      doubts: ["distance-restated"],
      doubtDb: 10.4576,
      doubtText: /10\.46/,
    },
  },
  {
    // 40 − (30 + 10.4576): rounded to 10 dB it would have read 0.
    name: "restated from 10 m to 3 m a level rises by 10.4576 dB",
    mask: LOW_BAND,
    settings: { distanceM: 10 },
    restateDistance: true,
    traces: [scan(SPAN, 10, [[31e6, 30]])],
    expected: {
      standing: "over",
      lines: [{ standing: "over", basis: "like-for-like", worst: [-0.4576, 31e6], coverage: 1 }],
      doubts: ["distance-restated"],
      doubtDb: 10.4576,
    },
  },
  {
    // 47 CFR 15.209: 30 µV/m = 29.5424 at 30 m; 15.31(f), from memory: 40 dB a decade below
    // 30 MHz. 45 − 40·log10(30/10) = 25.9151; 29.5424 − 25.9151
    name: "below 30 MHz a level falls by 40 dB a decade",
    mask: maskOf([maskLine("quasi-peak", [segment(9e6, 11e6, 29.5424)], { rbwHz: 9e3 })], {
      distanceM: 30,
    }),
    settings: { distanceM: 10, rbwHz: 9e3 },
    restateDistance: true,
    traces: [scan([9e6, 11e6, 4e3], 10, [[10e6, 45]])],
    expected: {
      standing: "clear",
      lines: [{ standing: "clear", basis: "like-for-like", worst: [3.6273, 10e6], coverage: 1 }],
      doubts: ["distance-restated"],
    },
  },
  {
    // At 29.95 MHz 40 − (50 − 19.0849) = 9.0849, at 30.05 MHz 40 − (50 − 9.5424) = −0.4576.
    name: "one sweep on both sides of 30 MHz is restated by each frequency's own rule",
    mask: maskOf([maskLine("quasi-peak", [segment(29e6, 31e6, 40)])], { distanceM: 30 }),
    settings: { distanceM: 10 },
    restateDistance: true,
    traces: [
      scan([29e6, 31e6, 50e3], 10, [
        [29.95e6, 50],
        [30.05e6, 50],
      ]),
    ],
    expected: {
      standing: "over",
      lines: [{ standing: "over", basis: "like-for-like", worst: [-0.4576, 30.05e6], coverage: 1 }],
      doubts: ["distance-restated"],
    },
  },
  {
    name: "asked to restate at the mask's own distance nothing is restated or doubted",
    mask: LOW_BAND,
    restateDistance: true,
    traces: [scan(SPAN, 30, [])],
    expected: {
      standing: "clear",
      lines: [{ standing: "clear", basis: "like-for-like", worst: [10, 30e6], coverage: 1 }],
      doubts: [],
    },
  },
];

export const unitCases: HandWorkedCase[] = [...restatedCases, ...refusedCases, ...distanceCases];
