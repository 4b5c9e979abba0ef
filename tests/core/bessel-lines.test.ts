import FFT from "fft.js";
import { describe, expect, test } from "vitest";
import { readSweep } from "@/lib/core/reading/read-sweep";
import { traceStatistics } from "@/lib/core/sweep/trace-statistics";
import { makeTrace } from "../support/traces";
import { maskLine, maskOf, segment, SETTINGS } from "./hand-worked/case";

const COUNT = 16_384;
const CARRIER_BIN = 4096;
const MODULATION_BIN = 64;
const STEP_HZ = 60e3;
const START_HZ = 30e6;
const RBW_HZ = 120e3;
/** Level of the carrier when it is not modulated. */
const CARRIER_DB = 60;

/**
 * Spectrum of a carrier with sinusoidal frequency modulation of index `beta`, by FFT of its samples:
 * every line lies on a bin, so that no window is needed. Levels below −60 dB are cut off.
 */
function modulated(beta: number) {
  const fft = new FFT(COUNT);
  const signal = Array.from({ length: COUNT }, (_, i) => {
    const turn = (2 * Math.PI * i) / COUNT;
    return Math.cos(CARRIER_BIN * turn + beta * Math.sin(MODULATION_BIN * turn));
  });
  const spectrum = fft.createComplexArray();
  fft.realTransform(spectrum, signal);
  const levels = Array.from({ length: COUNT / 2 }, (_, bin) => {
    const size = (2 * Math.hypot(spectrum[2 * bin] ?? 0, spectrum[2 * bin + 1] ?? 0)) / COUNT;
    return Math.max(CARRIER_DB - 60, CARRIER_DB + 20 * Math.log10(size));
  });
  const axis = {
    kind: "regular" as const,
    startHz: START_HZ,
    stepHz: STEP_HZ,
    count: levels.length,
  };
  return makeTrace(levels, { axis, detector: "rms-average" });
}

const CARRIER_HZ = START_HZ + CARRIER_BIN * STEP_HZ;
const mask = maskOf([maskLine("rms-average", [segment(30e6, 600e6, 55)])]);
const suspectsOf = (beta: number) =>
  readSweep({
    traces: [modulated(beta)],
    settings: { ...SETTINGS, rbwHz: RBW_HZ },
    mask,
    guardDb: 0,
    suspectMarginDb: 40,
  }).suspects;

describe("a carrier with sinusoidal frequency modulation, whose lines are J_n(β)²", () => {
  test("reads over as long as it is not modulated", () => {
    const [first, ...rest] = suspectsOf(0);
    expect(rest).toEqual([]);
    expect(first?.sampleHz).toBe(CARRIER_HZ);
    expect(first?.marginDb).toBeCloseTo(-5, 4);
  });

  // Zeros of J_0: published tables of Bessel functions.
  test.each([2.405, 5.52, 8.654])("has no suspect at the carrier at β = %d", (beta) => {
    const suspects = suspectsOf(beta);
    expect(suspects.length).toBeGreaterThan(4);
    expect(suspects.map((suspect) => suspect.sampleHz)).not.toContain(CARRIER_HZ);
  });

  test.each([1, 2, 3.5, 5, 10])("has one there again at β = %d, beside the nulls", (beta) => {
    const at = suspectsOf(beta).map((suspect) => suspect.sampleHz);
    expect(at).toContain(CARRIER_HZ);
  });

  // Strongest line in dB under the carrier alone: max over n of J_n(β)², published tables.
  test.each([
    [1, -2.32],
    [2, -4.78],
    [5, -8.15],
    [10, -9.96],
  ])("peaks come down at β = %d by %d dB and the power in the band stays", (beta, changeDb) => {
    const before = traceStatistics(modulated(0), RBW_HZ);
    const after = traceStatistics(modulated(beta), RBW_HZ);
    expect((after.maxDb ?? NaN) - (before.maxDb ?? NaN)).toBeCloseTo(changeDb, 2);
    // What is cut off 60 dB down adds some hundredths of a dB on both sides alike.
    expect((after.powerSumDb ?? NaN) - (before.powerSumDb ?? NaN)).toBeCloseTo(0, 1);
  });
});
