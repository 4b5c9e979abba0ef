import { describe, expect, test } from "vitest";
import { combineReadings } from "@/lib/core/reading/combine-readings";
import { decidingPoint } from "@/lib/core/reading/deciding-point";
import { readSweep } from "@/lib/core/reading/read-sweep";
import type { Mask, MaskLine } from "@/lib/core/mask/mask";
import type { Detector, Port } from "@/lib/core/sweep/settings";
import type { LevelUnit } from "@/lib/core/units/level-units";
import { makeTrace } from "../support/traces";

const line = (name: string, detector: Detector, startHz: number, stopHz: number): MaskLine => ({
  name,
  detector,
  rbwHz: null,
  rbwKind: null,
  segments: [{ startHz, stopHz, startDb: 50, stopDb: 50, interpolation: "log" }],
});

const maskOf = (part: Partial<Mask>): Mask => ({
  format: "neap-mask",
  version: 1,
  key: "a",
  title: "A mask",
  port: "radiated",
  unit: "dBuV/m",
  distanceM: null,
  document: "",
  clause: "",
  edition: "",
  provenance: "team",
  note: "",
  lines: [line("Low", "peak", 30e6, 40e6), line("High", "peak", 40.1e6, 90e6)],
  ...part,
});

function read(levels: number[], mask: Mask, unit: LevelUnit = "dBuV/m", port: Port = "radiated") {
  const axis = { kind: "regular" as const, startHz: 30e6, stepHz: 100e3, count: levels.length };
  return readSweep({
    traces: [makeTrace(levels, { axis, unit })],
    settings: {
      rbwHz: 120e3,
      rbwKind: null,
      vbwHz: null,
      sweepTimeS: null,
      attenuationDb: null,
      preamplifier: null,
      referenceLevelDb: null,
      polarization: null,
      heightM: null,
      azimuthDeg: null,
      distanceM: null,
      port,
    },
    mask,
    guardDb: 3,
    impedanceOhm: 50,
  });
}

/** 30 to 50 MHz: the first line whole, the second in part. */
const levelsOf = (low: number, high: number) =>
  Array.from({ length: 201 }, (_, i) => (i <= 100 ? low : high));

describe("the margin that a reading is known by", () => {
  test("is the lowest, also when another line gives the standing", () => {
    const mask = maskOf({});
    const reading = read(levelsOf(49.7, 36), mask);
    expect(reading.lines.map((l) => l.standing)).toEqual(["inside-guard", "undecided"]);
    expect(reading.standing).toBe("undecided");
    expect(decidingPoint(reading)?.line.name).toBe("Low");
    expect(decidingPoint(reading)?.point.marginDb).toBeCloseTo(0.3, 4);
    const combined = combineReadings(mask, [reading]);
    expect(combined.standing).toBe("undecided");
    expect(combined.deciding?.worst.marginDb).toBeCloseTo(0.3, 4);
  });

  test("is of a line that is over as soon as one is", () => {
    const reading = read(levelsOf(52, 36), maskOf({}));
    expect(decidingPoint(reading)).toMatchObject({ line: { name: "Low", standing: "over" } });
  });
});

describe("a sweep that a mask is not meant for", () => {
  test("is not held against a mask of another port", () => {
    const { notComparable } = read(levelsOf(20, 20), maskOf({ port: "mains" }));
    expect(notComparable).toContain('for the port "mains"');
  });

  test("of a current is not restated as a voltage through the instrument's impedance", () => {
    const mask = maskOf({ port: "cable", unit: "dBuV" });
    expect(read(levelsOf(20, 20), mask, "dBuA", "cable").notComparable).toContain(
      "different quantities",
    );
  });

  test("of a magnetic field held against an electric limit carries the doubt of the plane wave", () => {
    const reading = read(levelsOf(-20, -20), maskOf({}), "dBuA/m");
    expect(reading.notComparable).toBeNull();
    expect(reading.doubts.map((doubt) => doubt.code)).toContain("plane-wave-assumed");
    const plain = read(levelsOf(20, 20), maskOf({}));
    expect(plain.doubts.map((doubt) => doubt.code)).not.toContain("plane-wave-assumed");
  });
});
