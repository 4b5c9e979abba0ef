import { expect } from "vitest";
import type { MaskSegment } from "@/lib/core/mask/mask";
import type { Reading } from "@/lib/core/reading/reading";
import type { FrequencyAxis, Trace } from "@/lib/core/sweep/trace";

/** The frequencies of an axis, one by one. */
export function frequenciesOf(axis: FrequencyAxis): number[] {
  return axis.kind === "regular"
    ? Array.from({ length: axis.count }, (_, i) => axis.startHz + i * axis.stepHz)
    : [...axis.frequenciesHz];
}

/** The same axis as a file in MHz gives it: a listed one, each frequency multiplied by a million. */
export function inMegahertz(axis: FrequencyAxis): FrequencyAxis {
  if (axis.kind === "listed")
    return { kind: "listed", frequenciesHz: axis.frequenciesHz.map((hz) => (hz / 1e6) * 1e6) };
  const [startMhz, stepMhz] = [axis.startHz / 1e6, axis.stepHz / 1e6];
  const frequenciesHz = Float64Array.from(
    { length: axis.count },
    (_, i) => (startMhz + i * stepMhz) * 1e6,
  );
  return { kind: "listed", frequenciesHz };
}

const median = (values: number[]) => {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = (sorted.length - 1) / 2;
  return ((sorted[Math.floor(middle)] ?? NaN) + (sorted[Math.ceil(middle)] ?? NaN)) / 2;
};

/**
 * A scan cut before point k, both halves on axes of their own; null where the two points do not
 * hang together: a level is missing, or the spacing is above two median steps of either half.
 */
export function cutTrace(trace: Trace, k: number): [Trace, Trace] | null {
  const { axis, levelsDb } = trace;
  const hz = frequenciesOf(axis);
  const steps = hz.slice(1).map((at, i) => at - (hz[i] ?? NaN));
  const spacing = steps[k - 1] ?? NaN;
  if (Number.isNaN(levelsDb[k - 1]) || Number.isNaN(levelsDb[k])) return null;
  const around = median(steps.slice(Math.max(0, k - 11), k + 10));
  const least = Math.min(median(steps.slice(0, k - 1)), median(steps.slice(k)), around);
  if (!(spacing <= 2 * least)) return null;
  const part = (from: number, to: number): Trace => ({
    ...trace,
    axis:
      axis.kind === "regular"
        ? { ...axis, startHz: axis.startHz + from * axis.stepHz, count: to - from }
        : { kind: "listed", frequenciesHz: axis.frequenciesHz.slice(from, to) },
    levelsDb: levelsDb.slice(from, to),
  });
  return [part(0, k), part(k, hz.length)];
}

/** One segment as two that touch at a share of its width, with the limit it has there. */
export function splitSegment(s: MaskSegment, share: number): MaskSegment[] {
  const isLog = s.interpolation === "log";
  const middleHz = isLog
    ? s.startHz * (s.stopHz / s.startHz) ** share
    : s.startHz + (s.stopHz - s.startHz) * share;
  const middleDb = s.startDb + (s.stopDb - s.startDb) * share;
  return [
    { ...s, stopHz: middleHz, stopDb: middleDb },
    { ...s, startHz: middleHz, startDb: middleDb },
  ];
}

/** Everything that must not change when the same thing is said in another way. */
export function sameReading(a: Reading, b: Reading, within: { db: number; share: number }): void {
  const near = (x: number | undefined, y: number | undefined, by: number) =>
    x === y || expect(Math.abs((x ?? NaN) - (y ?? NaN))).toBeLessThanOrEqual(by);
  const nearHz = (x: number | undefined, y: number | undefined) =>
    near(x, y, within.share * (x ?? NaN));
  expect(b.notComparable).toBe(a.notComparable);
  expect(b.standing).toBe(a.standing);
  expect(b.lines).toHaveLength(a.lines.length);
  a.lines.forEach((line, i) => {
    const other = b.lines[i]!;
    expect([other.standing, other.basis]).toEqual([line.standing, line.basis]);
    near(line.worst?.marginDb, other.worst?.marginDb, within.db);
    nearHz(line.worst?.frequencyHz, other.worst?.frequencyHz);
    near(line.coverage.fraction, other.coverage.fraction, 1e-9);
  });
  expect(b.remeasure).toHaveLength(a.remeasure.length);
  a.remeasure.forEach((point, i) => nearHz(point.frequencyHz, b.remeasure[i]?.frequencyHz));
  expect(b.suspects).toHaveLength(a.suspects.length);
  a.suspects.forEach((suspect, i) => {
    near(suspect.marginDb ?? NaN, b.suspects[i]?.marginDb ?? NaN, within.db);
    near(suspect.prominenceDb, b.suspects[i]?.prominenceDb, within.db);
    nearHz(suspect.sampleHz, b.suspects[i]?.sampleHz);
  });
}
