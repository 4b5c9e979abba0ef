import type { MaskSegment } from "@/lib/core/mask/mask";
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
