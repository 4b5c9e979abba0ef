import type { DoubtCode } from "@/lib/core/reading/reading";
import type { Trace } from "@/lib/core/sweep/trace";
import {
  evenly,
  listed,
  maskLine,
  maskOf,
  scan,
  segment,
  spots,
  type HandWorkedCase,
} from "./case";
import { LOW_BAND } from "./masks";

const STEP = 50e3;
/** Log width of 30 to 32 MHz. */
const WHOLE = Math.log(32 / 30);
const span = (fromHz: number, toHz: number, at: [number, number][] = []) =>
  scan([fromHz, toHz, STEP], 30, at);

/** Limit 40, level 30: a margin of 10 dB, first found at `atHz`; `gaps` in MHz. */
function partly(
  name: string,
  traces: Trace[],
  gaps: [fromMhz: number, toMhz: number][],
  atHz = 30e6,
  otherDoubts: DoubtCode[] = [],
): HandWorkedCase {
  const missing = gaps.reduce((sum, [from, to]) => sum + Math.log(to / from), 0);
  const standing = gaps.length > 0 ? "undecided" : "clear";
  return {
    name,
    mask: LOW_BAND,
    traces,
    expected: {
      standing,
      lines: [
        {
          standing,
          basis: "like-for-like",
          worst: [10, atHz],
          coverage: 1 - missing / WHOLE,
        },
      ],
      doubts: [...otherDoubts, ...(gaps.length > 0 ? ["not-covered" as const] : [])],
    },
  };
}

export const coverageCases: HandWorkedCase[] = [
  partly("a sweep of exactly the mask's span is clear", [span(30e6, 32e6)], []),
  // A scan's first and last point reach half a step further: 30.1 − 0.025.
  partly("a sweep that begins late", [span(30.1e6, 32e6)], [[30, 30.075]], 30.1e6),
  partly("a sweep that ends early", [span(30e6, 31.9e6)], [[31.925, 32]]),
  partly(
    "a first point half a step inside still covers the start",
    [span(30.025e6, 32.025e6)],
    [],
    30.025e6,
  ),
  partly(
    "a missing level parts the sweep from neighbour to neighbour",
    [span(30e6, 32e6, [[31e6, NaN]])],
    [[30.95, 31.05]],
  ),
  partly("a missing first level", [span(30e6, 32e6, [[30e6, NaN]])], [[30, 30.05]], 30.05e6),
  partly("a missing last level", [span(30e6, 32e6, [[32e6, NaN]])], [[31.95, 32]]),
  partly(
    "missing levels outside the mask do not count",
    [
      span(29e6, 33e6, [
        [29.9e6, NaN],
        [32.1e6, NaN],
      ]),
    ],
    [],
  ),
  partly(
    "a level missing right behind the last frequency of the mask does not count",
    [span(30e6, 33e6, [[32.05e6, NaN]])],
    [],
  ),
  partly(
    "a spacing of three median steps is a gap",
    [listed([...evenly(30e6, 31e6, STEP, 30), ...evenly(31.15e6, 32e6, STEP, 30)])],
    [[31, 31.15]],
  ),
  partly(
    "a spacing of exactly two median steps is none",
    [listed([...evenly(30e6, 31e6, STEP, 30), ...evenly(31.1e6, 32e6, STEP, 30)])],
    [],
    30e6,
    // 100 kHz is more than half of 120 kHz: no gap, but a line midway may be missed.
    ["step-coarse"],
  ),
  partly(
    "a spacing of two median steps and 1 Hz is one",
    [listed([...evenly(30e6, 31e6, STEP, 30), ...evenly(31.1e6 + 1, 32e6 + 1, STEP, 30)])],
    [[31, 31.100001]],
  ),
  partly(
    "an even coarse part beside an even fine part has no gap",
    [listed([...evenly(30e6, 30.95e6, STEP, 30), ...evenly(31e6, 32e6, 2 * STEP, 30)])],
    [],
    30e6,
    ["step-coarse"],
  ),
  partly(
    "two sweeps whose ends lie one step apart meet half-way",
    [span(30e6, 31e6), span(31.05e6, 32e6)],
    [],
  ),
  partly(
    "two sweeps whose ends lie two steps apart go on as one sweep with that spacing would",
    [span(30e6, 31e6), span(31.1e6, 32e6)],
    [],
    30e6,
    ["step-coarse"],
  ),
  partly(
    "two sweeps whose ends lie three steps apart leave two steps between them",
    [span(30e6, 31e6), span(31.15e6, 32e6)],
    [[31.025, 31.125]],
  ),
  partly(
    "what one trace lacks another may have",
    [span(30e6, 32e6, [[31e6, NaN]]), span(30.5e6, 31.5e6)],
    [],
  ),
  partly(
    "a detector that cannot decide covers nothing",
    [span(30e6, 31e6), scan([30e6, 32e6, STEP], 10, [], { detector: "average" })],
    [[31.025, 32]],
  ),
  partly(
    "spots cover nothing between them",
    [span(30e6, 31e6), spots(evenly(31e6, 32e6, STEP, 30))],
    [[31.025, 32]],
  ),
  {
    name: "a sweep without a single level says nothing",
    mask: LOW_BAND,
    traces: [scan([30e6, 32e6, STEP], NaN, [])],
    expected: {
      standing: "undecided",
      lines: [{ standing: "undecided", basis: "cannot-decide", worst: null, coverage: 0 }],
      doubts: ["not-covered"],
    },
  },
  {
    name: "over on a part is over, however little was covered",
    mask: LOW_BAND,
    traces: [span(30e6, 31e6, [[30.5e6, 41]])],
    expected: {
      standing: "over",
      lines: [
        {
          standing: "over",
          basis: "like-for-like",
          worst: [-1, 30.5e6],
          coverage: Math.log(31.025 / 30) / WHOLE,
        },
      ],
      doubts: ["not-covered"],
    },
  },
  {
    name: "inside guard on a part is undecided",
    mask: LOW_BAND,
    guardDb: 12,
    traces: [span(30e6, 31e6)],
    expected: {
      standing: "undecided",
      lines: [
        {
          standing: "undecided",
          basis: "like-for-like",
          worst: [10, 30e6],
          coverage: Math.log(31.025 / 30) / WHOLE,
        },
      ],
      doubts: ["not-covered"],
    },
  },
  {
    // 30.51–30.53 MHz has no sample of the 50 kHz grid: nothing was measured in that band.
    name: "a band that falls between two points of the sweep was not covered",
    mask: maskOf([
      maskLine("quasi-peak", [segment(30.51e6, 30.53e6, 35), segment(31e6, 32e6, 40)]),
    ]),
    traces: [span(30e6, 32e6)],
    expected: {
      standing: "undecided",
      lines: [
        {
          standing: "undecided",
          basis: "like-for-like",
          worst: [10, 31e6],
          coverage: Math.log(32 / 31) / (Math.log(32 / 31) + Math.log(30.53 / 30.51)),
        },
      ],
      doubts: ["not-covered"],
    },
  },
];
