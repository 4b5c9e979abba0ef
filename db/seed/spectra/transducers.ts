import type { SignalPath, Transducer } from "@/lib/core/bench/signal-path";

type GainPoint = readonly [frequencyMhz: number, gainDbi: number];

/** Realistic gains (common practice, no source); the antennas themselves are invented. */
const BICONICAL_LOG_GAIN: readonly GainPoint[] = [
  [30, -18],
  [40, -11],
  [50, -7],
  [60, -4],
  [70, -1.5],
  [80, 0],
  [90, -0.4],
  [100, -1],
  [120, 0.6],
  [150, 2.2],
  [175, 4.2],
  [200, 5.5],
  [250, 5.2],
  [300, 5.6],
  [400, 6.1],
  [500, 6.3],
  [600, 6.5],
  [700, 6.3],
  [800, 6.4],
  [900, 6.2],
  [1000, 6],
];
const HORN_GAIN: readonly GainPoint[] = [
  [1000, 6.5],
  [1250, 7.1],
  [1500, 7.7],
  [2000, 8.5],
  [2500, 9],
  [3000, 9.3],
  [3500, 9.7],
  [4000, 10],
  [4500, 10.1],
  [5000, 10.4],
  [5500, 10.7],
  [6000, 10.8],
];

/** To a hundredth of a dB, as a calibration sheet has it. */
function round2(value: number): number {
  return Math.round(value * 100) / 100;
}

/** AF = 20·log10 f(MHz) − G(dBi) − 29.77 in 50 Ω (computed; 29.8 in a published handbook). */
function antennaFactors(gain: readonly GainPoint[]): Transducer["factors"] {
  return gain.map(([mhz, dbi]) => ({
    frequencyHz: mhz * 1e6,
    factorDb: round2(20 * Math.log10(mhz) - dbi - 29.77),
  }));
}

/** Loss in dB that grows with √f (skin effect) and a little with f, from its value at 1 GHz. */
function cableFactors(lossAtOneGhzDb: number): Transducer["factors"] {
  return [10, 30, 60, 100, 200, 300, 500, 700, 1000, 1500, 2000, 3000, 4000, 5000, 6000, 6500].map(
    (mhz) => {
      const share = 0.93 * Math.sqrt(mhz / 1000) + 0.07 * (mhz / 1000);
      return { frequencyHz: mhz * 1e6, factorDb: round2(lossAtOneGhzDb * share) };
    },
  );
}

const calibrated = { calibratedOn: "2026-02-10", dueOn: "2027-02-10" };

export const BICONICAL_LOG_ANTENNA: Transducer = {
  name: "Biconical-log antenna, 30 MHz–1 GHz",
  kind: "antenna",
  factors: antennaFactors(BICONICAL_LOG_GAIN),
  ...calibrated,
};

export const HORN_ANTENNA: Transducer = {
  name: "Horn antenna, 1–6 GHz",
  kind: "antenna",
  factors: antennaFactors(HORN_GAIN),
  ...calibrated,
};

export const LONG_CABLE: Transducer = {
  name: "Cable, 8 m, antenna mast to wall",
  kind: "cable",
  factors: cableFactors(1.75),
  calibratedOn: "2026-03-02",
  dueOn: "2027-03-02",
};

/** The same cable with a new connector: 0.18 dB more at 1 GHz than half a year before. */
export const RECALIBRATED_LONG_CABLE: Transducer = {
  ...LONG_CABLE,
  factors: cableFactors(1.93),
  calibratedOn: "2026-09-10",
  dueOn: "2027-09-10",
};

export const SHORT_CABLE: Transducer = {
  name: "Cable, 3 m, low loss",
  kind: "cable",
  factors: cableFactors(0.8),
  calibratedOn: "2025-11-28",
  dueOn: "2026-11-28",
};

/** 10 dB at the input: it tells an overload (levels move) from a signal (they do not). */
export const INPUT_ATTENUATOR: Transducer = {
  name: "Attenuator, 10 dB",
  kind: "attenuator",
  factors: [
    { frequencyHz: 1e6, factorDb: 10.01 },
    { frequencyHz: 1e9, factorDb: 10.04 },
    { frequencyHz: 3e9, factorDb: 10.09 },
    { frequencyHz: 6.5e9, factorDb: 10.18 },
  ],
  calibratedOn: "2026-03-02",
  dueOn: "2028-03-02",
};

export const PREAMPLIFIER: Transducer = {
  name: "Preamplifier, 1–6 GHz",
  kind: "preamplifier",
  factors: [
    [900, 29.2],
    [1500, 29.4],
    [2000, 29.1],
    [3000, 28.3],
    [4000, 27.2],
    [5000, 25.9],
    [6100, 24.3],
  ].map(([mhz, gain]) => ({ frequencyHz: (mhz ?? 0) * 1e6, factorDb: gain ?? 0 })),
  ...calibrated,
};

/** Ordered from the field to the instrument. */
export const PATH_BELOW_1_GHZ: SignalPath = {
  version: 1,
  impedanceOhm: 50,
  transducers: [BICONICAL_LOG_ANTENNA, LONG_CABLE],
};

export const RECALIBRATED_PATH_BELOW_1_GHZ: SignalPath = {
  version: 1,
  impedanceOhm: 50,
  transducers: [BICONICAL_LOG_ANTENNA, RECALIBRATED_LONG_CABLE],
};

export const PATH_ABOVE_1_GHZ: SignalPath = {
  version: 1,
  impedanceOhm: 50,
  transducers: [HORN_ANTENNA, PREAMPLIFIER, SHORT_CABLE],
};
