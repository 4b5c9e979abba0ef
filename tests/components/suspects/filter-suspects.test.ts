import { describe, expect, test } from "vitest";
import { filterSuspects, joinSuspects } from "@/components/suspects/filter-suspects";
import type { Suspect } from "@/lib/core/reading/reading";

const suspect = (number: number, mhz: number, change: Partial<Suspect> = {}): Suspect => ({
  number,
  frequencyHz: mhz * 1e6,
  sampleHz: mhz * 1e6,
  levelDb: 40,
  limitDb: 44,
  marginDb: 4,
  prominenceDb: 9,
  lineName: "Quasi-peak",
  basis: "upper-bound",
  traceIndex: 0,
  partIndex: 0,
  ...change,
});

const rows = joinSuspects(
  [suspect(1, 148.5), suspect(2, 88.3, { lineName: "Average" }), suspect(3, 44), suspect(4, 1500)],
  [
    { number: 2, ambientDb: 39, isLikelyAmbient: true, withoutAmbientDb: 33.1 },
    { number: 3, ambientDb: 10, isLikelyAmbient: false, withoutAmbientDb: 40 },
  ],
  [
    { number: 1, suspectId: "x", followedNumber: 7, state: "treated", isSame: true },
    { number: 3, suspectId: "x", followedNumber: 7, state: "treated", isSame: false },
  ],
);
const numbers = (text: string, hidesAmbient = false) =>
  filterSuspects(rows, { text, hidesAmbient }, 60e3).map((row) => row.number);

describe("the filter of a table of suspects", () => {
  test("joins by number and never renumbers", () => {
    expect(rows.map((row) => row.ambient?.ambientDb ?? null)).toEqual([null, 39, 10, null]);
    expect(rows.map((row) => row.followed?.followedNumber ?? null)).toEqual([7, null, 7, null]);
    expect(numbers("")).toEqual([1, 2, 3, 4]);
  });

  test("hides likely ambient only when asked", () => {
    expect(numbers("", true)).toEqual([1, 3, 4]);
  });

  test.each([
    ["148", [1]],
    ["average", [2]],
    ["quasi-peak upper", [1, 3, 4]],
    ["likely ambient", [2]],
    ["treated", [1]],
    ["GHz", [4]],
    ["30 to 100 MHz", [2, 3]],
    ["100 MHz - 2 GHz", [1, 4]],
    ["88.3-148.5 MHz", [1, 2]],
    ["nothing like it", []],
  ])("%s finds %j", (text, found) => {
    expect(numbers(text)).toEqual(found);
  });
});
