import { describe, expect, test } from "vitest";
import { combineReadings } from "@/lib/core/reading/combine-readings";
import { decidingPoint } from "@/lib/core/reading/deciding-point";
import { readSweep } from "@/lib/core/reading/read-sweep";
import { makeTrace } from "../support/traces";
import { maskLine, maskOf, segment, SETTINGS } from "./hand-worked/case";

const MASK = maskOf([
  maskLine("peak", [segment(30e6, 40e6, 50)], { name: "Low" }),
  maskLine("peak", [segment(40.1e6, 90e6, 50)], { name: "High" }),
]);

function read(levels: number[]) {
  const axis = { kind: "regular" as const, startHz: 30e6, stepHz: 100e3, count: levels.length };
  const traces = [makeTrace(levels, { axis })];
  return readSweep({ traces, settings: SETTINGS, mask: MASK, guardDb: 3 });
}

/** 30 to 50 MHz: the first line whole, the second in part. */
const levelsOf = (low: number, high: number) =>
  Array.from({ length: 201 }, (_, i) => (i <= 100 ? low : high));

describe("the margin that a reading is known by", () => {
  test("is the lowest, also when another line gives the standing", () => {
    const reading = read(levelsOf(49.7, 36));
    expect(reading.lines.map((l) => l.standing)).toEqual(["inside-guard", "undecided"]);
    expect(reading.standing).toBe("undecided");
    expect(decidingPoint(reading)?.line.name).toBe("Low");
    expect(decidingPoint(reading)?.point.marginDb).toBeCloseTo(0.3, 4);
    const combined = combineReadings(MASK, [reading]);
    expect(combined.standing).toBe("undecided");
    expect(combined.deciding?.worst.marginDb).toBeCloseTo(0.3, 4);
  });

  test("is of a line that is over as soon as one is", () => {
    const reading = read(levelsOf(52, 36));
    expect(decidingPoint(reading)).toMatchObject({ line: { name: "Low", standing: "over" } });
  });
});
