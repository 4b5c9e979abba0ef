import type { Trace } from "@/lib/core/sweep/trace";
import { scan, spots, type HandWorkedCase } from "./case";
import { LOW_BAND, LOW_BAND_AVERAGE } from "./masks";

/** Limit 40; a peak trace at 20 with 44 at 30.5 MHz: a bound 4 dB over the line. */
const PEAK = scan([30e6, 32e6, 50e3], 20, [[30.5e6, 44]], { detector: "peak" });
/** The same with a step of 200 kHz, wider than the RBW of 120 kHz, and 44 at 30.6 MHz. */
const COARSE = scan([30e6, 32e6, 200e3], 20, [[30.6e6, 44]], { detector: "peak" });
/** 6.02·(200/120)² */
const COARSE_DB = 16.7222;

/** A bound over the line that no spot silences. */
function undecided(name: string, traces: Trace[]): HandWorkedCase {
  return {
    name,
    mask: LOW_BAND,
    traces,
    expected: {
      standing: "undecided",
      lines: [{ standing: "undecided", basis: "upper-bound", worst: [-4, 30.5e6], coverage: 1 }],
      doubts: [],
      remeasureHz: [30.5e6],
    },
  };
}

/** Spots that decide: the lowest of their margins, since the bounds left stand 20 dB under. */
function decided(
  name: string,
  traces: Trace[],
  standing: "clear" | "over",
  worst: [number, number],
): HandWorkedCase {
  return {
    name,
    mask: LOW_BAND,
    traces,
    expected: {
      standing,
      lines: [{ standing, basis: "like-for-like", worst, coverage: 1 }],
      doubts: [],
      remeasureHz: [],
    },
  };
}

export const spotCases: HandWorkedCase[] = [
  undecided("a peak trace over a quasi-peak limit is undecided and to be measured again", [PEAK]),
  decided(
    "a quasi-peak spot of 38 at the suspect makes it clear by 2 dB",
    [PEAK, spots([[30.5e6, 38]])],
    "clear",
    [2, 30.5e6],
  ),
  decided(
    "a quasi-peak spot of 41 at the suspect is over by 1 dB",
    [PEAK, spots([[30.5e6, 41]])],
    "over",
    [-1, 30.5e6],
  ),
  // The window of a spot is ± max(RBW 120 kHz, step 50 kHz), ends included.
  decided(
    "a spot exactly one RBW above silences the bound",
    [PEAK, spots([[30.62e6, 30]])],
    "clear",
    [10, 30.62e6],
  ),
  undecided("a spot one RBW and 1 Hz above does not", [PEAK, spots([[30.62e6 + 1, 30]])]),
  decided(
    "a spot exactly one RBW below silences the bound",
    [PEAK, spots([[30.38e6, 30]])],
    "clear",
    [10, 30.38e6],
  ),
  undecided("a spot one RBW and 1 Hz below does not", [PEAK, spots([[30.38e6 - 1, 30]])]),
  {
    name: "with a step wider than the RBW a spot one step away silences the bound",
    mask: LOW_BAND,
    traces: [COARSE, spots([[30.8e6, 30]])],
    expected: {
      standing: "clear",
      lines: [{ standing: "clear", basis: "like-for-like", worst: [10, 30.8e6], coverage: 1 }],
      doubts: ["step-coarse"],
      doubtDb: COARSE_DB,
      remeasureHz: [],
    },
  },
  {
    name: "and one step and 1 Hz away it does not",
    mask: LOW_BAND,
    traces: [COARSE, spots([[30.8e6 + 1, 30]])],
    expected: {
      standing: "undecided",
      lines: [{ standing: "undecided", basis: "upper-bound", worst: [-4, 30.6e6], coverage: 1 }],
      doubts: ["step-coarse"],
      doubtDb: COARSE_DB,
      remeasureHz: [30.6e6],
    },
  },
  {
    // RBW not stated: the window is the step alone, 50 kHz, and 30.55 MHz is its last frequency.
    name: "without a stated RBW the window is one step",
    mask: LOW_BAND,
    settings: { rbwHz: null },
    traces: [PEAK, spots([[30.55e6, 30]])],
    expected: {
      standing: "clear",
      lines: [{ standing: "clear", basis: "like-for-like", worst: [10, 30.55e6], coverage: 1 }],
      doubts: ["rbw-unstated"],
    },
  },
  decided(
    "of two spots in one window the higher counts, over",
    [
      PEAK,
      spots([
        [30.5e6, 36],
        [30.55e6, 41],
      ]),
    ],
    "over",
    [-1, 30.55e6],
  ),
  decided(
    "of two spots in one window the higher counts, clear",
    [
      PEAK,
      spots([
        [30.5e6, 39],
        [30.55e6, 36],
      ]),
    ],
    "clear",
    [1, 30.5e6],
  ),
  decided(
    "of spots of two traces at one frequency the higher counts",
    [PEAK, spots([[30.5e6, 36]]), spots([[30.5e6, 40.5]])],
    "over",
    [-0.5, 30.5e6],
  ),
  undecided("a spot without a level silences nothing", [PEAK, spots([[30.5e6, NaN]])]),
  undecided("a spot held at the minimum decides nothing", [
    PEAK,
    spots([[30.5e6, 38]], { hold: "min-hold" }),
  ]),
  undecided("a spot of the average detector says nothing of a quasi-peak line", [
    PEAK,
    spots([[30.5e6, 25]], { detector: "average" }),
  ]),
  {
    name: "with a spot at one of two suspects the other is still to be measured",
    mask: LOW_BAND,
    traces: [
      scan(
        [30e6, 32e6, 50e3],
        20,
        [
          [30.5e6, 44],
          [31.5e6, 43],
        ],
        { detector: "peak" },
      ),
      spots([[30.5e6, 38]]),
    ],
    expected: {
      standing: "undecided",
      lines: [{ standing: "undecided", basis: "upper-bound", worst: [-3, 31.5e6], coverage: 1 }],
      remeasureHz: [31.5e6],
    },
  },
  {
    // Over by its own detector: the margin is −1, not the bound's −4 elsewhere; that is listed.
    name: "over at a spot is known by the spot, though a bound elsewhere lies lower",
    mask: LOW_BAND,
    traces: [PEAK, spots([[31.5e6, 41]])],
    expected: {
      standing: "over",
      lines: [{ standing: "over", basis: "like-for-like", worst: [-1, 31.5e6], coverage: 1 }],
      remeasureHz: [30.5e6],
    },
  },
  {
    // QP ≥ AV (CISPR 16-1-1): 38 in quasi-peak bounds the average tighter than 44 in peak.
    name: "a quasi-peak spot under an average limit is the tighter bound",
    mask: LOW_BAND_AVERAGE,
    traces: [PEAK, spots([[30.5e6, 38]])],
    expected: {
      standing: "clear",
      lines: [{ standing: "clear", basis: "upper-bound", worst: [2, 30.5e6], coverage: 1 }],
      remeasureHz: [],
    },
  },
  {
    name: "a single spot under the limit covers nothing and is never clear",
    mask: LOW_BAND,
    traces: [spots([[31e6, 30]])],
    expected: {
      standing: "undecided",
      lines: [{ standing: "undecided", basis: "like-for-like", worst: [10, 31e6], coverage: 0 }],
      doubts: ["not-covered"],
    },
  },
];
