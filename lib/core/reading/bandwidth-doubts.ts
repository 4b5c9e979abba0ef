import { lineRanges } from "../mask/limit-at";
import type { Mask, MaskLine } from "../mask/mask";
import { firstHz, frequencyAt, lastHz } from "../sweep/axis";
import type { MeasurementSettings } from "../sweep/settings";
import { formatFrequency } from "../units/format";
import { basisOf } from "./basis";
import { inRanges } from "./coverage";
import type { HeldTrace } from "./held-trace";
import type { Doubt, FrequencyRange } from "./reading";

function isTouched(line: MaskLine, scans: readonly HeldTrace[]): boolean {
  return lineRanges(line).some((range) =>
    scans.some(
      ({ trace }) =>
        basisOf(trace, line.detector) !== "cannot-decide" &&
        firstHz(trace.axis) <= range.stopHz &&
        lastHz(trace.axis) >= range.startHz,
    ),
  );
}

/** Doubts of lines that ask for another bandwidth than the sweep's; dB that could be missing. */
export function bandwidthDoubts(
  mask: Mask,
  settings: MeasurementSettings,
  scans: readonly HeldTrace[],
): Doubt[] {
  const { rbwHz, rbwKind } = settings;
  if (rbwHz === null) {
    const text = "The resolution bandwidth is not stated: state it on the sweep.";
    return [{ code: "rbw-unstated", text, valueDb: null }];
  }
  const doubts: Doubt[] = [];
  for (const line of mask.lines) {
    if (line.rbwHz === null || !isTouched(line, scans)) continue;
    if (line.rbwHz !== rbwHz) {
      const wide = 10 * Math.log10(line.rbwHz / rbwHz);
      const text = `${line.name} asks for a bandwidth of ${formatFrequency(line.rbwHz)} and the sweep used ${formatFrequency(rbwHz)}: a single line reads the same, broadband noise could read ${Math.abs(wide).toFixed(1)} dB and impulses ${Math.abs(2 * wide).toFixed(1)} dB ${wide > 0 ? "higher" : "lower"}. Measure with the line's bandwidth.`;
      doubts.push({ code: "rbw-differs", text, valueDb: 2 * wide });
    } else if (line.rbwKind !== null && line.rbwKind !== rbwKind) {
      const text = `${line.name} counts its bandwidth at ${line.rbwKind.replace("dB", " dB")} and the sweep ${rbwKind === null ? "does not state how" : `at ${rbwKind.replace("dB", " dB")}`}: for a Gaussian filter the two differ by a factor of 1.41, which is 1.5 dB for broadband noise.`;
      doubts.push({ code: "rbw-kind-differs", text, valueDb: 10 * Math.log10(Math.SQRT2) });
    }
  }
  return doubts;
}

/** Widest spacing in Hz of neighbouring points inside the mask that is no gap; 0 without one. */
function widestStepHz(held: HeldTrace, maskRanges: readonly FrequencyRange[]): number {
  const { trace, covered, stepHz } = held;
  const { axis } = trace;
  if (axis.kind === "regular")
    return maskRanges.some((r) => firstHz(axis) <= r.stopHz && lastHz(axis) >= r.startHz)
      ? stepHz
      : 0;
  let widest = 0;
  for (const range of covered) {
    for (let i = held.from; i + 1 < held.to; i += 1) {
      const [a, b] = [frequencyAt(axis, i), frequencyAt(axis, i + 1)];
      if (b > range.stopHz) break;
      if (a < range.startHz || b - a <= widest) continue;
      if (inRanges(maskRanges, a) || inRanges(maskRanges, b)) widest = b - a;
    }
  }
  return widest;
}

/**
 * A step above half the bandwidth: a line midway between two points reads low by
 * 6.02·(step/B₆)² dB, or 3.01·(step/B₃)² for a bandwidth counted at 3 dB (Gaussian filter,
 * computed). An unstated kind takes the larger number.
 */
export function stepDoubts(
  mask: Mask,
  { rbwHz, rbwKind }: MeasurementSettings,
  scans: readonly HeldTrace[],
): Doubt[] {
  if (rbwHz === null) return [];
  const doubts: Doubt[] = [];
  for (const held of scans) {
    const ranges = mask.lines
      .filter((line) => basisOf(held.trace, line.detector) !== "cannot-decide")
      .flatMap(lineRanges)
      .sort((a, b) => a.startHz - b.startHz);
    const step = Math.max(0, ...ranges.map((range) => widestStepHz(held, [range])));
    if (!(step > rbwHz / 2)) continue;
    const loss = (rbwKind === "3dB" ? 3.01 : 6.02) * (step / rbwHz) ** 2;
    const upTo = held.trace.axis.kind === "listed" ? "of up to " : "of ";
    const text = `"${held.trace.name}" has a step ${upTo}${formatFrequency(step)}, more than half the bandwidth of ${formatFrequency(rbwHz)}: a line midway between points reads ${loss.toFixed(1)} dB low. Take more points.`;
    doubts.push({ code: "step-coarse", text, valueDb: loss });
  }
  return doubts;
}
