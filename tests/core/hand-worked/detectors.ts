import type { Detector, Hold } from "@/lib/core/sweep/settings";
import { maskLine, maskOf, scan, segment, type HandWorkedCase } from "./case";
import { LOW_BAND, LOW_BAND_AVERAGE } from "./masks";

/** 30 to 32 MHz in 50 kHz steps, the same span as the mask. */
const SPAN = [30e6, 32e6, 50e3] as const;

/**
 * [line, trace, hold, basis]: each trace reads 30, 10 dB under the limit of 40. Order of detectors
 * PK ≥ QP ≥ RMS-AV ≥ AV, CISPR 16-1-1; whatever stands outside it says nothing.
 */
const PAIRS: [
  Detector,
  Detector | null,
  Hold,
  "like-for-like" | "upper-bound" | "cannot-decide",
][] = [
  ["peak", "peak", "none", "like-for-like"],
  ["peak", "peak", "max-hold", "like-for-like"],
  ["quasi-peak", "quasi-peak", "max-hold", "like-for-like"],
  ["rms-average", "rms-average", "none", "like-for-like"],
  ["average", "average", "none", "like-for-like"],
  ["quasi-peak", "peak", "max-hold", "upper-bound"],
  ["rms-average", "peak", "none", "upper-bound"],
  ["average", "peak", "none", "upper-bound"],
  ["rms-average", "quasi-peak", "none", "upper-bound"],
  ["average", "quasi-peak", "none", "upper-bound"],
  ["average", "rms-average", "none", "upper-bound"],
  ["peak", "quasi-peak", "none", "cannot-decide"],
  ["peak", "rms-average", "none", "cannot-decide"],
  ["peak", "average", "none", "cannot-decide"],
  ["quasi-peak", "rms-average", "none", "cannot-decide"],
  ["quasi-peak", "average", "none", "cannot-decide"],
  ["rms-average", "average", "none", "cannot-decide"],
  ["peak", "sample", "none", "cannot-decide"],
  ["average", "sample", "none", "cannot-decide"],
  ["average", "negative-peak", "none", "cannot-decide"],
  ["quasi-peak", null, "none", "cannot-decide"],
  ["average", null, "max-hold", "cannot-decide"],
  // The lowest of many sweeps is below what is there at times.
  ["peak", "peak", "min-hold", "cannot-decide"],
  ["quasi-peak", "quasi-peak", "min-hold", "cannot-decide"],
  ["average", "peak", "min-hold", "cannot-decide"],
  // The mean of peak sweeps lies under the peak, but over the average.
  ["peak", "peak", "average", "cannot-decide"],
  ["quasi-peak", "quasi-peak", "average", "cannot-decide"],
  ["quasi-peak", "peak", "average", "cannot-decide"],
  ["average", "peak", "average", "upper-bound"],
  ["average", "average", "average", "like-for-like"],
  ["rms-average", "rms-average", "average", "like-for-like"],
];

const pairCases = PAIRS.map(([line, detector, hold, basis]): HandWorkedCase => {
  const says = basis !== "cannot-decide";
  const standing = says ? "clear" : "undecided";
  const coverage = says ? 1 : 0;
  return {
    name: `${line} line, ${detector ?? "unstated"} trace, ${hold}: ${basis}`,
    mask: maskOf([maskLine(line, [segment(30e6, 32e6, 40)])]),
    traces: [scan(SPAN, 30, [], { detector, hold })],
    expected: {
      standing,
      lines: [{ standing, basis, worst: says ? [10, 30e6] : null, coverage }],
      doubts: says ? [] : ["not-covered"],
      remeasureHz: [],
    },
  };
});

export const detectorCases: HandWorkedCase[] = [
  ...pairCases,
  {
    name: "an RMS-average trace over an average limit is to be measured again",
    mask: LOW_BAND_AVERAGE,
    traces: [scan(SPAN, 20, [[31e6, 42]], { detector: "rms-average" })],
    expected: {
      standing: "undecided",
      lines: [{ standing: "undecided", basis: "upper-bound", worst: [-2, 31e6], coverage: 1 }],
      remeasureHz: [31e6],
    },
  },
  {
    // Like for like decides: 40 − 33 = 7; the bounds of 50, 46 and 42 dB are not heard.
    name: "the line's own detector silences every bound where it was swept",
    mask: LOW_BAND_AVERAGE,
    traces: (
      [
        ["peak", 50],
        ["quasi-peak", 46],
        ["rms-average", 42],
        ["average", 33],
      ] as const
    ).map(([detector, db]) => scan(SPAN, 20, [[31e6, db]], { detector })),
    expected: {
      standing: "clear",
      lines: [{ standing: "clear", basis: "like-for-like", worst: [7, 31e6], coverage: 1 }],
      remeasureHz: [],
    },
  },
  {
    // 40 − 42 = −2 by RMS-average, the tightest; 46 and 50 are looser bounds of the same thing.
    name: "of several bounds the tightest is heard",
    mask: LOW_BAND_AVERAGE,
    traces: (
      [
        ["rms-average", 42],
        ["peak", 50],
        ["quasi-peak", 46],
      ] as const
    ).map(([detector, db]) => scan(SPAN, 20, [[31e6, db]], { detector })),
    expected: {
      standing: "undecided",
      lines: [{ standing: "undecided", basis: "upper-bound", worst: [-2, 31e6], coverage: 1 }],
      remeasureHz: [31e6],
    },
  },
  {
    // Quasi-peak on 30–31 MHz only: 40 − 30 = 10 there; the peak of 44 at 30.5 is not heard, the
    // 43 at 31.5 is.
    name: "a bound is heard where the line's own detector was not swept",
    mask: LOW_BAND,
    traces: [
      scan([30e6, 31e6, 50e3], 30, []),
      scan(
        SPAN,
        20,
        [
          [30.5e6, 44],
          [31.5e6, 43],
        ],
        { detector: "peak" },
      ),
    ],
    expected: {
      standing: "undecided",
      lines: [{ standing: "undecided", basis: "upper-bound", worst: [-3, 31.5e6], coverage: 1 }],
      remeasureHz: [31.5e6],
    },
  },
  {
    name: "where the line's own trace has no level the bound is heard",
    mask: LOW_BAND,
    traces: [scan(SPAN, 30, [[30.5e6, NaN]]), scan(SPAN, 20, [[30.5e6, 44]], { detector: "peak" })],
    expected: {
      standing: "undecided",
      lines: [{ standing: "undecided", basis: "upper-bound", worst: [-4, 30.5e6], coverage: 1 }],
      remeasureHz: [30.5e6],
    },
  },
  {
    // Two polarizations as two traces: the line has to hold in the worse, 40 − 41 = −1.
    name: "of two traces of the line's own detector the higher counts",
    mask: LOW_BAND,
    traces: [
      scan(SPAN, 20, [[30.5e6, 41]], { name: "Horizontal" }),
      scan(SPAN, 25, [], { name: "Vertical" }),
    ],
    expected: {
      standing: "over",
      lines: [{ standing: "over", basis: "like-for-like", worst: [-1, 30.5e6], coverage: 1 }],
    },
  },
  {
    name: "of two bounds of one detector the higher counts",
    mask: LOW_BAND,
    traces: [
      scan(SPAN, 25, [], { detector: "peak" }),
      scan(SPAN, 20, [[30.5e6, 41]], { detector: "peak" }),
    ],
    expected: {
      standing: "undecided",
      lines: [{ standing: "undecided", basis: "upper-bound", worst: [-1, 30.5e6], coverage: 1 }],
      remeasureHz: [30.5e6],
    },
  },
  {
    // The mask's standing is its worst line: the average line is over, the peak line clear.
    name: "a mask stands where its worst line does",
    mask: maskOf([
      maskLine("peak", [segment(30e6, 32e6, 60)]),
      maskLine("average", [segment(30e6, 32e6, 40)]),
    ]),
    traces: [
      scan(SPAN, 45, [], { detector: "peak" }),
      scan(SPAN, 20, [[31e6, 40.25]], { detector: "average" }),
    ],
    expected: {
      standing: "over",
      lines: [
        { standing: "clear", basis: "like-for-like", worst: [15, 30e6], coverage: 1 },
        { standing: "over", basis: "like-for-like", worst: [-0.25, 31e6], coverage: 1 },
      ],
    },
  },
  {
    // Band ends: 44 at 31 MHz ends the first band, 46 at 31.5 begins the second. Both are maxima.
    name: "a bound over the end of one band and over the start of the next is listed twice",
    mask: maskOf([maskLine("quasi-peak", [segment(30e6, 31e6, 40), segment(31.5e6, 32e6, 40)])]),
    traces: [
      scan(
        SPAN,
        20,
        [
          [31e6, 44],
          [31.5e6, 46],
        ],
        { detector: "peak" },
      ),
    ],
    expected: {
      standing: "undecided",
      lines: [{ standing: "undecided", basis: "upper-bound", worst: [-6, 31.5e6], coverage: 1 }],
      remeasureHz: [31e6, 31.5e6],
    },
  },
  ...([30.5e6, 31.5e6] as const).map((firstHz): HandWorkedCase => ({
    // 40 − 35 = 5 twice: which file came first must not move the frequency that is named.
    name: `of two traces with equal margins the lower frequency is named, ${firstHz / 1e6} MHz first`,
    mask: LOW_BAND,
    traces: [scan(SPAN, 20, [[firstHz, 35]]), scan(SPAN, 20, [[62e6 - firstHz, 35]])],
    expected: {
      standing: "clear",
      lines: [{ standing: "clear", basis: "like-for-like", worst: [5, 30.5e6], coverage: 1 }],
    },
  })),
];
