import { scan, spots, type ExpectedLine, type HandWorkedCase } from "./case";
import { CE102, MAINS_B } from "./masks";

const SETTINGS = { port: "mains", distanceM: null, polarization: null, rbwHz: 9e3 } as const;
const SPAN = [0.15e6, 30e6, 2.5e3] as const;
const quasiPeak = (at: [number, number][]) => scan(SPAN, 30, at, { unit: "dBuV" });
const AVERAGE = scan(SPAN, 20, [], { unit: "dBuV", detector: "average" });
/** Average at 20: the lowest average limit, 46, begins at 0.5 MHz: 46 − 20 = 26. */
const AVERAGE_LINE: ExpectedLine = {
  standing: "clear",
  basis: "like-for-like",
  worst: [26, 0.5e6],
  coverage: 1,
};

/**
 * [frequency, level, margin], quasi-peak. Between 0.15 and 0.5 MHz the limit of 47 CFR 15.107(a) falls
 * with the logarithm of frequency: 66 − 10·log10(f/0.15)/log10(0.5/0.15).
 */
const LEVELS: [hz: number, levelDb: number, marginDb: number][] = [
  [0.15e6, 66.125, -0.125],
  // 66 − 10·0.124939/0.522879 = 63.6106
  [0.2e6, 63.5, 0.1106],
  // 66 − 10·0.221849/0.522879 = 61.7572
  [0.25e6, 61.75, 0.0072],
  // 66 − 10·0.301030/0.522879 = 60.2428; linear in f it would be 61.71 and 1.46 dB clear.
  [0.3e6, 60.25, -0.0072],
  // 66 − 10·0.425969/0.522879 = 57.8534
  [0.4e6, 57.75, 0.1034],
  // 56 ends one segment and begins the next.
  [0.5e6, 56.5, -0.5],
  // 56 below and 60 above: the lower applies.
  [5e6, 57, -1],
  [5.0025e6, 57, 3],
  [30e6, 60.5, -0.5],
];

export const mainsCases: HandWorkedCase[] = [
  ...LEVELS.map(([hz, levelDb, marginDb]): HandWorkedCase => {
    const standing = marginDb < 0 ? "over" : "clear";
    return {
      name: `15.107 class B: ${levelDb} dBµV at ${hz / 1e6} MHz has a margin of ${marginDb} dB`,
      mask: MAINS_B,
      settings: SETTINGS,
      traces: [quasiPeak([[hz, levelDb]]), AVERAGE],
      expected: {
        standing,
        lines: [
          { standing, basis: "like-for-like", worst: [marginDb, hz], coverage: 1 },
          AVERAGE_LINE,
        ],
        doubts: [],
        remeasureHz: [],
      },
    };
  }),
  {
    // 0.3 MHz: quasi-peak 60.2428 − 55 = 5.2428; average 50.2428 − 55 = −4.7572 as a bound.
    name: "a quasi-peak trace alone bounds the average line and leaves it undecided",
    mask: MAINS_B,
    settings: SETTINGS,
    traces: [quasiPeak([[0.3e6, 55]])],
    expected: {
      standing: "undecided",
      lines: [
        { standing: "clear", basis: "like-for-like", worst: [5.2428, 0.3e6], coverage: 1 },
        { standing: "undecided", basis: "upper-bound", worst: [-4.7572, 0.3e6], coverage: 1 },
      ],
      doubts: [],
      remeasureHz: [0.3e6],
    },
  },
  {
    // Quasi-peak 50 under the average limit of 50.2428: below the looser detector, so below it.
    name: "a quasi-peak trace under the average line too needs no average trace",
    mask: MAINS_B,
    settings: SETTINGS,
    traces: [quasiPeak([[0.3e6, 50]])],
    expected: {
      standing: "clear",
      lines: [
        { standing: "clear", basis: "like-for-like", worst: [10.2428, 0.3e6], coverage: 1 },
        { standing: "clear", basis: "upper-bound", worst: [0.2428, 0.3e6], coverage: 1 },
      ],
      doubts: [],
      remeasureHz: [],
    },
  },
  {
    // 50.2428 − 45 = 5.2428; the quasi-peak bound on the rest is 46 − 30 = 16 and more.
    name: "an average spot at the suspect decides the average line",
    mask: MAINS_B,
    settings: SETTINGS,
    traces: [quasiPeak([[0.3e6, 55]]), spots([[0.3e6, 45]], { unit: "dBuV", detector: "average" })],
    expected: {
      standing: "clear",
      lines: [
        { standing: "clear", basis: "like-for-like", worst: [5.2428, 0.3e6], coverage: 1 },
        { standing: "clear", basis: "like-for-like", worst: [5.2428, 0.3e6], coverage: 1 },
      ],
      doubts: [],
      remeasureHz: [],
    },
  },
  {
    // 94 − 34·log10(100/10)/log10(500/10) = 94 − 34/1.698970 = 73.9879
    name: "CE102 falls with log f: 74 dBµV at 100 kHz is over by 0.0121 dB",
    mask: CE102,
    settings: { ...SETTINGS, rbwHz: 10e3 },
    traces: [scan([10e3, 10e6, 2.5e3], 30, [[100e3, 74]], { unit: "dBuV", detector: "peak" })],
    expected: {
      standing: "over",
      lines: [{ standing: "over", basis: "like-for-like", worst: [-0.0121, 100e3], coverage: 1 }],
      doubts: ["mask-from-memory"],
    },
  },
];
