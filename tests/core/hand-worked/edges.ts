import { evenly, listed, maskLine, maskOf, scan, segment, type HandWorkedCase } from "./case";
import { LOW_BAND, maskAround, TWO_BANDS } from "./masks";

/**
 * [border, limit below, limit above, level at the one frequency that is looked at]. 47 CFR
 * 15.109(a) class B (40.0/43.5/46.0/54.0 dBµV/m) and (c): at a border the lower limit applies.
 * CISPR 32 class B at 10 m: 30 and 37 at 230 MHz. IEC 60945: 54, and 24 from 156 to 165 MHz
 * (from memory), where the lower limit begins at the border.
 */
const BORDERS: [borderHz: number, belowDb: number, aboveDb: number, levelDb: number][] = [
  [88e6, 40, 43.5, 41.5],
  [216e6, 43.5, 46, 45],
  [960e6, 46, 54, 50],
  [230e6, 30, 37, 36],
  [156e6, 54, 24, 30],
  [165e6, 24, 54, 30],
];

/** A scan in 50 kHz steps with one more frequency at the border, or 1 Hz beside it. */
const borderCases = BORDERS.flatMap(([borderHz, belowDb, aboveDb, levelDb]) =>
  [-1, 0, 1].map((besideHz): HandWorkedCase => {
    const hz = borderHz + besideHz;
    const limitDb = besideHz < 0 ? belowDb : besideHz > 0 ? aboveDb : Math.min(belowDb, aboveDb);
    const others = evenly(borderHz - 1e6, borderHz + 1e6, 50e3, -40).filter(([at]) => at !== hz);
    const standing = limitDb < levelDb ? "over" : "clear";
    return {
      name: `${borderHz / 1e6} MHz ${besideHz < 0 ? "−" : "+"} ${Math.abs(besideHz)} Hz is held against ${limitDb}`,
      mask: maskAround(borderHz, belowDb, aboveDb),
      traces: [listed([...others, [hz, levelDb]])],
      expected: {
        standing,
        lines: [{ standing, basis: "like-for-like", worst: [limitDb - levelDb, hz], coverage: 1 }],
        doubts: [],
        remeasureHz: [],
      },
    };
  }),
);

const C25 = { rbwHz: 9e3, distanceM: 1 };
const PEAK = { detector: "peak" as const };
/** Log width of 0.15–0.3 MHz in that of both bands: ln 2 / (ln 2 + ln(1.8/0.53)) = 36.18 %. */
const FIRST_BAND = Math.LN2 / (Math.LN2 + Math.log(1.8 / 0.53));

export const edgeCases: HandWorkedCase[] = [
  ...borderCases,
  {
    // 0.53 MHz: 40 − 20 = 20; the lower band has 46 − 20 = 26; at 0.4 MHz there is no limit.
    name: "90 dB between two bands is held against nothing",
    mask: TWO_BANDS,
    settings: C25,
    traces: [scan([0.15e6, 1.8e6, 2.5e3], 20, [[0.4e6, 90]], PEAK)],
    expected: {
      standing: "clear",
      lines: [{ standing: "clear", basis: "like-for-like", worst: [20, 0.53e6], coverage: 1 }],
      doubts: [],
      remeasureHz: [],
    },
  },
  {
    name: "a sweep of nothing but the gap between the bands is never clear",
    mask: TWO_BANDS,
    settings: C25,
    traces: [scan([0.31e6, 0.52e6, 2.5e3], 20, [], PEAK)],
    expected: {
      standing: "undecided",
      lines: [{ standing: "undecided", basis: "cannot-decide", worst: null, coverage: 0 }],
      doubts: ["not-covered"],
      remeasureHz: [],
    },
  },
  {
    // 46 − 20 = 26; the gap above the band adds nothing to what was covered.
    name: "one of two bands swept, and the gap with it, is clear on 36 %",
    mask: TWO_BANDS,
    settings: C25,
    traces: [scan([0.15e6, 0.5e6, 2.5e3], 20, [], PEAK)],
    expected: {
      standing: "undecided",
      lines: [
        {
          standing: "undecided",
          basis: "like-for-like",
          worst: [26, 0.15e6],
          coverage: FIRST_BAND,
        },
      ],
      doubts: ["not-covered"],
    },
  },
  ...(
    [
      // The last frequency of the band is in it: 46 − 47 = −1.
      [0.3e6, 47, "over", [-1, 0.3e6]],
      // 1 Hz further there is no limit; what is left is 40 − 20 = 20 at 0.53 MHz.
      [0.3e6 + 1, 90, "clear", [20, 0.53e6]],
      [0.53e6 - 1, 90, "clear", [20, 0.53e6]],
      [0.53e6, 41, "over", [-1, 0.53e6]],
      [1.8e6, 40.5, "over", [-0.5, 1.8e6]],
      [0.15e6, 46.5, "over", [-0.5, 0.15e6]],
    ] as const
  ).map(([hz, levelDb, standing, worst]): HandWorkedCase => {
    const others = evenly(0.15e6, 1.8e6, 2.5e3, 20).filter(([at]) => at !== hz);
    return {
      name: `${levelDb} dB at ${hz} Hz, an end of a band or 1 Hz outside it, is ${standing}`,
      mask: TWO_BANDS,
      settings: C25,
      traces: [listed([...others, [hz, levelDb]], PEAK)],
      expected: {
        standing,
        lines: [{ standing, basis: "like-for-like", worst: [...worst], coverage: 1 }],
        doubts: [],
      },
    };
  }),
  {
    // 30.5–31 MHz lies in both segments: 35 applies. 35 − 34 = 1 at 31 MHz; 1 Hz on 40 − 34 = 6.
    name: "of overlapping segments the lower applies, its last frequency included",
    mask: maskOf([maskLine("quasi-peak", [segment(30e6, 32e6, 40), segment(30.5e6, 31e6, 35)])]),
    traces: [listed([...evenly(30e6, 32e6, 50e3, 20).filter(([hz]) => hz !== 31e6), [31e6, 34]])],
    expected: {
      standing: "clear",
      lines: [{ standing: "clear", basis: "like-for-like", worst: [1, 31e6], coverage: 1 }],
    },
  },
  {
    name: "1 Hz above the overlap the upper segment alone applies",
    mask: maskOf([maskLine("quasi-peak", [segment(30e6, 32e6, 40), segment(30.5e6, 31e6, 35)])]),
    traces: [listed([...evenly(30e6, 32e6, 50e3, 20), [31e6 + 1, 34]])],
    expected: {
      standing: "clear",
      lines: [{ standing: "clear", basis: "like-for-like", worst: [6, 31e6 + 1], coverage: 1 }],
    },
  },
  {
    name: "a single point under the limit has a margin and covers nothing",
    mask: LOW_BAND,
    traces: [listed([[31e6, 36.5]])],
    expected: {
      standing: "undecided",
      lines: [{ standing: "undecided", basis: "like-for-like", worst: [3.5, 31e6], coverage: 0 }],
      doubts: ["not-covered"],
    },
  },
  {
    name: "a single point over the limit is over",
    mask: LOW_BAND,
    traces: [listed([[31e6, 46.5]])],
    expected: {
      standing: "over",
      lines: [{ standing: "over", basis: "like-for-like", worst: [-6.5, 31e6], coverage: 0 }],
      doubts: ["not-covered"],
    },
  },
  {
    name: "a mask without lines says nothing",
    mask: maskOf([]),
    traces: [scan([30e6, 32e6, 50e3], 20, [])],
    expected: { standing: "undecided", lines: [] },
  },
  {
    name: "a line without segments says nothing",
    mask: maskOf([maskLine("quasi-peak", [])]),
    traces: [scan([30e6, 32e6, 50e3], 20, [])],
    expected: {
      standing: "undecided",
      lines: [{ standing: "undecided", basis: "cannot-decide", worst: null, coverage: 0 }],
    },
  },
  {
    name: "a sweep without traces says nothing",
    mask: LOW_BAND,
    traces: [],
    expected: {
      standing: "undecided",
      lines: [{ standing: "undecided", basis: "cannot-decide", worst: null, coverage: 0 }],
      doubts: ["not-covered"],
    },
  },
];
