import type { SweepPart } from "@/lib/core/reading/sweep-part";
import type { Mask } from "@/lib/core/mask/mask";
import type { MeasurementSettings } from "@/lib/core/sweep/settings";
import type { Trace } from "@/lib/core/sweep/trace";
import { maskLine, maskOf, scan, segment, SETTINGS, spots, type ExpectedLine } from "./case";
import { LOW_BAND } from "./masks";

/** Several sweeps held against one mask of one line as one reading. */
interface TogetherCase {
  name: string;
  mask?: Mask;
  parts: SweepPart[];
  expected: ExpectedLine & {
    /** Which of the sweeps gave the worst margin. */
    partIndex?: number;
    /** What to measure again, and the sweep in whose position. */
    remeasure?: [frequencyHz: number, partIndex: number][];
  };
}

const SPAN = [30e6, 32e6, 50e3] as const;
const HORIZONTAL = { polarization: "horizontal" } as const;
const VERTICAL = { polarization: "vertical" } as const;
const UNSTATED = { polarization: null, heightM: null, azimuthDeg: null } as const;

function part(
  traces: Trace[],
  settings: Partial<MeasurementSettings> = {},
  more: Partial<SweepPart> = {},
): SweepPart {
  return { traces, settings: { ...SETTINGS, ...settings }, guardDb: 0, ...more };
}

/** Limit 40. A peak scan at 20 with one line over the limit at 30.5 MHz. */
const peak = (db: number) => scan(SPAN, 20, [[30.5e6, db]], { detector: "peak" });
const spot = (db: number) => spots([[30.5e6, db]]);

/** A peak scan of 44 in one position and a spot of 38 in another: does the spot speak for it? */
function spotIn(
  name: string,
  loose: Partial<MeasurementSettings>,
  tight: Partial<MeasurementSettings>,
  speaks: boolean,
): TogetherCase {
  return {
    name: `${name}: ${speaks ? "silences the bound" : "leaves the bound as it is"}`,
    parts: [part([peak(44)], loose), part([spot(38)], tight)],
    expected: speaks
      ? { standing: "clear", basis: "like-for-like", worst: [2, 30.5e6], remeasure: [] }
      : {
          standing: "undecided",
          basis: "upper-bound",
          worst: [-4, 30.5e6],
          remeasure: [[30.5e6, 0]],
        },
  };
}

export const togetherCases: TogetherCase[] = [
  {
    name: "both polarizations swept: the higher decides, 40 − 38",
    parts: [part([scan(SPAN, 30, [])], VERTICAL), part([scan(SPAN, 30, [[31e6, 38]])], HORIZONTAL)],
    expected: {
      standing: "clear",
      basis: "like-for-like",
      worst: [2, 31e6],
      coverage: 1,
      partIndex: 1,
    },
  },
  {
    // 31.025–32 MHz was swept vertically only: 1 − ln(32/31.025)/ln(32/30).
    name: "a part swept in one of two polarizations was not covered",
    parts: [
      part([scan(SPAN, 30, [])], VERTICAL),
      part([scan([30e6, 31e6, 50e3], 30, [])], HORIZONTAL),
    ],
    expected: {
      standing: "undecided",
      basis: "like-for-like",
      worst: [10, 30e6],
      coverage: Math.log(31.025 / 30) / Math.log(32 / 30),
    },
  },
  {
    name: "a span split over two sweeps of one position is covered whole",
    parts: [
      part([scan([30e6, 31e6, 50e3], 30, [])]),
      part([scan([31.05e6, 32e6, 50e3], 30, [[31.5e6, 35]])]),
    ],
    expected: {
      standing: "clear",
      basis: "like-for-like",
      worst: [5, 31.5e6],
      coverage: 1,
      partIndex: 1,
    },
  },
  {
    name: "at a mains port there is no polarization to be covered",
    mask: { ...LOW_BAND, port: "mains", distanceM: null },
    parts: [
      part([scan(SPAN, 30, [])], { ...VERTICAL, port: "mains", distanceM: null }),
      part([scan([30e6, 31e6, 50e3], 30, [])], {
        ...HORIZONTAL,
        port: "mains",
        distanceM: null,
      }),
    ],
    expected: { standing: "clear", basis: "like-for-like", worst: [10, 30e6], coverage: 1 },
  },
  spotIn("a spot of the same polarization, height and azimuth", {}, {}, true),
  spotIn("a spot of the other polarization", VERTICAL, HORIZONTAL, false),
  spotIn("a spot that states no polarization", VERTICAL, { polarization: null }, false),
  spotIn("a vertical spot beside an unstated scan", { polarization: null }, VERTICAL, false),
  spotIn("a spot and a scan of two sweeps that both state nothing", UNSTATED, UNSTATED, false),
  spotIn("a spot at 2 m under a scan held over heights", { heightM: null }, { heightM: 2 }, true),
  spotIn("a spot at 2 m under a scan at 1 m", { heightM: 1 }, { heightM: 2 }, false),
  spotIn("a spot of unstated height under a scan at 1 m", { heightM: 1 }, { heightM: null }, false),
  spotIn(
    "a spot at 90° under a scan of all azimuths",
    { azimuthDeg: null },
    { azimuthDeg: 90 },
    true,
  ),
  spotIn("a spot at 90° under a scan at 0°", { azimuthDeg: 0 }, { azimuthDeg: 90 }, false),
  {
    name: "a horizontal spot decides the horizontal bound and leaves the vertical one",
    parts: [part([peak(44)], HORIZONTAL), part([peak(43)], VERTICAL), part([spot(38)], HORIZONTAL)],
    expected: {
      standing: "undecided",
      basis: "upper-bound",
      worst: [-3, 30.5e6],
      partIndex: 1,
      remeasure: [[30.5e6, 1]],
    },
  },
  {
    name: "a bound over the line in both polarizations is to be measured in both",
    parts: [part([peak(44)], HORIZONTAL), part([peak(43)], VERTICAL)],
    expected: {
      standing: "undecided",
      basis: "upper-bound",
      worst: [-4, 30.5e6],
      partIndex: 0,
      remeasure: [
        [30.5e6, 0],
        [30.5e6, 1],
      ],
    },
  },
  {
    name: "spots in both polarizations decide, the higher counts: 40 − 39",
    parts: [
      part([peak(44)], HORIZONTAL),
      part([peak(43)], VERTICAL),
      part([spot(38)], HORIZONTAL),
      part([spot(39)], VERTICAL),
    ],
    expected: {
      standing: "clear",
      basis: "like-for-like",
      worst: [1, 30.5e6],
      coverage: 1,
      partIndex: 3,
      remeasure: [],
    },
  },
  {
    name: "a quasi-peak scan silences a bound of its polarization only where it swept",
    parts: [
      part(
        [
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
        VERTICAL,
      ),
      part([scan([30e6, 31e6, 50e3], 30, [])], VERTICAL),
    ],
    expected: {
      standing: "undecided",
      basis: "upper-bound",
      worst: [-3, 31.5e6],
      coverage: 1,
      remeasure: [[31.5e6, 0]],
    },
  },
  {
    // 7 dB under a guard of 6 and 3 dB under a guard of 2: neither is inside its own.
    name: "each sweep keeps its own bench's guard, clear",
    parts: [
      part([scan(SPAN, 33, [])], VERTICAL, { guardDb: 6 }),
      part([scan(SPAN, 37, [])], HORIZONTAL, { guardDb: 2 }),
    ],
    expected: { standing: "clear", basis: "like-for-like", worst: [3, 30e6], partIndex: 1 },
  },
  {
    // 5 dB lies inside the guard of 6, though the lowest margin of 3 lies outside its own of 2.
    name: "each sweep keeps its own bench's guard, inside",
    parts: [
      part([scan(SPAN, 35, [])], VERTICAL, { guardDb: 6 }),
      part([scan(SPAN, 37, [])], HORIZONTAL, { guardDb: 2 }),
    ],
    expected: { standing: "inside-guard", basis: "like-for-like", worst: [3, 30e6], partIndex: 1 },
  },
  {
    name: "over in one position is over, whatever a bound of another says",
    parts: [part([peak(48)], VERTICAL), part([scan(SPAN, 30, [[31e6, 41]])], HORIZONTAL)],
    expected: {
      standing: "over",
      basis: "like-for-like",
      worst: [-1, 31e6],
      partIndex: 1,
      remeasure: [[30.5e6, 0]],
    },
  },
  {
    // 30 at 10 m is 30 + 10.4576 = 40.4576 at 3 m; the sweep at 3 m itself reads 36.
    name: "only the sweep that asks for it is restated to the mask's distance",
    parts: [
      part([scan(SPAN, 10, [[31e6, 30]])], { distanceM: 10 }, { restateDistance: true }),
      part([scan(SPAN, 36, [])]),
    ],
    expected: { standing: "over", basis: "like-for-like", worst: [-0.4576, 31e6], partIndex: 0 },
  },
  {
    // −70 dBm is 36.9897 dBµV at 50 Ω and 38.7506 at 75 Ω: 56 − 38.7506.
    name: "each sweep is restated through its own instrument's impedance",
    mask: maskOf([maskLine("quasi-peak", [segment(30e6, 32e6, 56)])], {
      port: "mains",
      unit: "dBuV",
      distanceM: null,
    }),
    parts: [50, 75].map((impedanceOhm) =>
      part(
        [scan(SPAN, -70, [], { unit: "dBm" })],
        { port: "mains", distanceM: null, polarization: null },
        { impedanceOhm },
      ),
    ),
    expected: {
      standing: "clear",
      basis: "like-for-like",
      worst: [17.2494, 30e6],
      partIndex: 1,
    },
  },
];
