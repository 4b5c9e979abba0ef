import { maskLine, maskOf, scan, segment, type ExpectedLine, type HandWorkedCase } from "./case";
import { LOW_BAND } from "./masks";

/** Limit 40, level 30 on the whole of 30 to 32 MHz: clear by 10 dB whatever is doubted. */
const LINE: ExpectedLine = {
  standing: "clear",
  basis: "like-for-like",
  worst: [10, 30e6],
  coverage: 1,
};
const SPAN = [30e6, 32e6, 50e3] as const;
const TRACE = scan(SPAN, 30, []);

type Doubted = Omit<HandWorkedCase, "mask" | "traces" | "expected"> &
  Partial<Pick<HandWorkedCase, "mask" | "traces">> &
  Pick<
    Exclude<HandWorkedCase["expected"], { notComparable: RegExp }>,
    "doubts" | "doubtDb" | "doubtText"
  >;

const ROWS: Doubted[] = [
  { name: "the line's own bandwidth, step under half of it", doubts: [] },
  {
    // 10·log10(120/9) = 11.2494, twice that for impulses = 22.4988 dB.
    name: "9 kHz under a line of 120 kHz could read 11.2 or 22.5 dB higher",
    settings: { rbwHz: 9e3 },
    traces: [scan([30e6, 32e6, 4e3], 30, [])],
    doubts: ["rbw-differs"],
    doubtDb: 22.4988,
    doubtText: /11\.2 dB.*22\.5 dB higher/,
  },
  {
    // 10·log10(120/1000) = −9.2082, twice that −18.4164 dB.
    name: "1 MHz under a line of 120 kHz could read 9.2 or 18.4 dB lower",
    settings: { rbwHz: 1e6 },
    doubts: ["rbw-differs"],
    doubtDb: 18.4164,
    doubtText: /9\.2 dB.*18\.4 dB lower/,
  },
  {
    // Gaussian filter: B6 = √2·B3, 10·log10 √2 = 1.5051 dB of noise.
    name: "120 kHz counted at 3 dB under a line that counts at 6 dB",
    settings: { rbwKind: "3dB" },
    doubts: ["rbw-kind-differs"],
    doubtDb: 1.5051,
    doubtText: /1\.5 dB/,
  },
  {
    name: "120 kHz without saying how it is counted",
    settings: { rbwKind: null },
    doubts: ["rbw-kind-differs"],
    doubtText: /does not state/,
  },
  { name: "no bandwidth stated", settings: { rbwHz: null }, doubts: ["rbw-unstated"] },
  {
    name: "a line that asks for no bandwidth doubts none",
    mask: maskOf([
      maskLine("quasi-peak", [segment(30e6, 32e6, 40)], { rbwHz: null, rbwKind: null }),
    ]),
    settings: { rbwHz: 100e3 },
    doubts: [],
  },
  {
    // Gaussian, 6 dB: 6.02·(100/120)² = 4.1806 dB midway between points.
    name: "a step of 100 kHz at 120 kHz (6 dB) may miss 4.2 dB",
    traces: [scan([30e6, 32e6, 100e3], 30, [])],
    doubts: ["step-coarse"],
    doubtDb: 4.1806,
    doubtText: /4\.2 dB low/,
  },
  {
    // Gaussian, 3 dB: 3.01·(100/120)² = 2.0903 dB; the line counts at 3 dB too.
    name: "a step of 100 kHz at 120 kHz (3 dB) may miss 2.1 dB",
    mask: maskOf([maskLine("quasi-peak", [segment(30e6, 32e6, 40)], { rbwKind: "3dB" })]),
    settings: { rbwKind: "3dB" },
    traces: [scan([30e6, 32e6, 100e3], 30, [])],
    doubts: ["step-coarse"],
    doubtDb: 2.0903,
    doubtText: /2\.1 dB low/,
  },
  {
    name: "a step of exactly half the bandwidth is fine enough",
    settings: { rbwHz: 100e3 },
    mask: maskOf([maskLine("quasi-peak", [segment(30e6, 32e6, 40)], { rbwHz: 100e3 })]),
    doubts: [],
  },
  {
    name: "a step of 1 Hz more than half the bandwidth is not",
    settings: { rbwHz: 99_998 },
    mask: maskOf([maskLine("quasi-peak", [segment(30e6, 32e6, 40)], { rbwHz: 99_998 })]),
    doubts: ["step-coarse"],
    // 6.02·(50000/99998)²
    doubtDb: 1.5051,
  },
  {
    // CISPR 16-2 minimum scan, peak: 1 ms per MHz in bands C and D, so 2 ms (from memory).
    name: "1 ms for 2 MHz is too fast",
    settings: { sweepTimeS: 0.001 },
    doubts: ["sweep-time-short"],
  },
  { name: "3 ms for 2 MHz is not", settings: { sweepTimeS: 0.003 }, doubts: [] },
  {
    name: "a mask from memory stays marked",
    mask: { ...LOW_BAND, provenance: "from memory" },
    doubts: ["mask-from-memory"],
  },
];

export const circumstanceCases: HandWorkedCase[] = ROWS.map(
  ({ doubts, doubtDb, doubtText, ...row }) => ({
    mask: LOW_BAND,
    traces: [TRACE],
    ...row,
    expected: {
      standing: "clear",
      lines: [LINE],
      ...(doubts === undefined ? {} : { doubts }),
      ...(doubtDb === undefined ? {} : { doubtDb }),
      ...(doubtText === undefined ? {} : { doubtText }),
      remeasureHz: [],
    },
  }),
);
