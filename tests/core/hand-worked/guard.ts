import type { Standing } from "@/lib/core/reading/reading";
import { maskLine, maskOf, scan, segment, type HandWorkedCase } from "./case";

/**
 * [limit, level, guard, margin, standing]. Guard band w: at or under limit − w is clear
 * (ILAC-G8:09/2019, binary rule with guard band); over begins above the limit, not at it.
 */
const ROWS: [limitDb: number, levelDb: number, guardDb: number, marginDb: number, Standing][] = [
  [40, 34, 6, 6, "clear"],
  [40, 34.125, 6, 5.875, "inside-guard"],
  // 34.1 is kept as the float32 34.09999847.
  [40, 34.1, 6, 5.9, "inside-guard"],
  [40, 33.9, 6, 6.1, "clear"],
  [40, 40, 6, 0, "inside-guard"],
  [40, 40, 0, 0, "clear"],
  [40, 40.1, 0, -0.1, "over"],
  [40, 40.125, 6, -0.125, "over"],
  // The smallest step of a float32 above 40 is 2^-18 = 0.0000038 dB, and it is over.
  [40, 40 + 2 ** -18, 0, -(2 ** -18), "over"],
  // A limit of −0 dB minus a level of 0 dB is −0, which is not below zero.
  [-0, 0, 0, 0, "clear"],
  [-0, 0, 1, 0, "inside-guard"],
  [-60, -66, 6, 6, "clear"],
];

export const guardCases: HandWorkedCase[] = ROWS.map(
  ([limitDb, levelDb, guardDb, marginDb, standing]) => ({
    name: `limit ${limitDb}, level ${levelDb}, guard ${guardDb}: ${standing}`,
    mask: maskOf([maskLine("quasi-peak", [segment(30e6, 32e6, limitDb)])]),
    guardDb,
    traces: [scan([30e6, 32e6, 50e3], levelDb - 20, [[31e6, levelDb]])],
    expected: {
      standing,
      lines: [{ standing, basis: "like-for-like", worst: [marginDb, 31e6], coverage: 1 }],
      doubts: [],
      remeasureHz: [],
    },
  }),
);

guardCases.push(
  {
    name: "a bound inside the guard is inside guard, since the true level can only be lower",
    mask: maskOf([maskLine("quasi-peak", [segment(30e6, 32e6, 40)])]),
    guardDb: 6,
    traces: [scan([30e6, 32e6, 50e3], 20, [[31e6, 35]], { detector: "peak" })],
    expected: {
      standing: "inside-guard",
      lines: [{ standing: "inside-guard", basis: "upper-bound", worst: [5, 31e6], coverage: 1 }],
      remeasureHz: [],
    },
  },
  {
    name: "a bound exactly on the limit is not over it",
    mask: maskOf([maskLine("quasi-peak", [segment(30e6, 32e6, 40)])]),
    traces: [scan([30e6, 32e6, 50e3], 20, [[31e6, 40]], { detector: "peak" })],
    expected: {
      standing: "clear",
      lines: [{ standing: "clear", basis: "upper-bound", worst: [0, 31e6], coverage: 1 }],
      remeasureHz: [],
    },
  },
);
