import { describe, expect, test } from "vitest";
import { calibrationGaps } from "@/lib/core/bench/calibration-gap";
import { dueState } from "@/lib/core/bench/due-state";
import type { SignalPath, Transducer } from "@/lib/core/bench/signal-path";

describe("dueState", () => {
  test.each([
    [null, "undated"],
    ["2026-11-30", "overdue"],
    ["2026-12-01", "due-soon"],
    ["2026-12-31", "due-soon"],
    ["2027-01-01", "in-date"],
  ])("a due date of %s is %s on the first of December", (dueOn, state) => {
    expect(dueState(dueOn, "2026-12-01")).toBe(state);
  });
});

describe("calibrationGaps", () => {
  const cable = (change: Partial<Transducer>): Transducer => ({
    name: "Cable",
    kind: "cable",
    factors: [],
    calibratedOn: "2026-03-01",
    dueOn: null,
    ...change,
  });
  const gaps = (change: Partial<Transducer>, ...days: string[]) => {
    const path: SignalPath = { version: 1, impedanceOhm: 50, transducers: [cable(change)] };
    const known = days.map((calibratedOn) => ({ equipmentId: "mine", calibratedOn }));
    return calibrationGaps(path, [...known, { equipmentId: "other", calibratedOn: "2030-01-01" }]);
  };
  const mine = { equipmentId: "mine" };

  test("is silent where the path holds the newest, or names no equipment", () => {
    expect(gaps(mine, "2026-03-01", "2025-03-01")).toEqual([]);
    expect(gaps({}, "2026-10-01")).toEqual([]);
    expect(gaps({ equipmentId: null }, "2026-10-01")).toEqual([]);
    expect(gaps({ ...mine, calibratedOn: null })).toEqual([]);
  });

  test("tells of a newer one, also where the path holds none", () => {
    const newer = { place: 0, name: "Cable", reason: "newer", newestOn: "2026-10-01" };
    expect(gaps(mine, "2026-03-01", "2026-10-01", "2026-05-01")).toEqual([newer]);
    expect(gaps({ ...mine, calibratedOn: null }, "2026-10-01")).toEqual([newer]);
  });

  test("tells of one that is no longer on record", () => {
    expect(gaps(mine, "2025-03-01")).toMatchObject([{ reason: "gone", newestOn: "2025-03-01" }]);
    expect(gaps(mine)).toMatchObject([{ reason: "gone", newestOn: null }]);
  });
});
