import type { Mask } from "../mask/mask";
import { firstHz, lastHz, medianStepHz } from "../sweep/axis";
import type { MeasurementSettings, Port } from "../sweep/settings";
import type { Trace } from "../sweep/trace";
import { formatFrequency } from "../units/format";
import { lineRanges } from "../mask/limit-at";
import type { Doubt, LineReading } from "./reading";

/** What is known about the circumstances of a sweep; left out means not known. */
export interface ReadingContext {
  ambientTaken?: boolean;
  /** Names of transducers whose calibration was overdue on the sweep's date. */
  overdueTransducers?: readonly string[];
}

function bandwidthDoubts(mask: Mask, settings: MeasurementSettings, swept: Trace[]): Doubt[] {
  const { rbwHz, rbwKind } = settings;
  const doubts: Doubt[] = [];
  if (rbwHz === null) {
    const text = "The resolution bandwidth is not stated: state it on the sweep.";
    return [{ code: "rbw-unstated", text, valueDb: null }];
  }
  for (const line of mask.lines) {
    const touched = lineRanges(line).some((r) =>
      swept.some((t) => firstHz(t.axis) <= r.stopHz && lastHz(t.axis) >= r.startHz),
    );
    if (!touched || line.rbwHz === null) continue;
    if (line.rbwHz !== rbwHz) {
      const wide = 10 * Math.log10(line.rbwHz / rbwHz);
      const text = `${line.name} asks for a bandwidth of ${formatFrequency(line.rbwHz)} and the sweep used ${formatFrequency(rbwHz)}: a single line reads the same, broadband noise could read ${Math.abs(wide).toFixed(1)} dB and impulses ${Math.abs(2 * wide).toFixed(1)} dB ${wide > 0 ? "higher" : "lower"}. Measure with the line's bandwidth.`;
      doubts.push({ code: "rbw-differs", text, valueDb: 2 * wide });
    } else if (line.rbwKind !== null && line.rbwKind !== rbwKind) {
      const text = `${line.name} counts its bandwidth at ${line.rbwKind.replace("dB", " dB")} and the sweep ${rbwKind === null ? "does not state how" : `at ${rbwKind.replace("dB", " dB")}`}: for a Gaussian filter the two differ by a factor of 1.41, which is 1.5 dB for broadband noise.`;
      doubts.push({ code: "rbw-kind-differs", text, valueDb: 10 * Math.log10(Math.SQRT2) });
    }
  }
  for (const trace of swept) {
    const step = medianStepHz(trace.axis);
    if (!(step > rbwHz / 2)) continue;
    // A Gaussian filter between two points (C); an unstated kind takes the larger number.
    const loss = (rbwKind === "3dB" ? 3.01 : 6.02) * (step / rbwHz) ** 2;
    const text = `"${trace.name}" has a step of ${formatFrequency(step)}, more than half the bandwidth of ${formatFrequency(rbwHz)}: a line midway between points reads ${loss.toFixed(1)} dB low. Take more points.`;
    doubts.push({ code: "step-coarse", text, valueDb: loss });
  }
  return doubts;
}

/** Shortest scan in s, peak detector: CISPR 16-2, from memory. */
function shortestScanS(fromHz: number, toHz: number): number {
  const bands = [
    { from: 9e3, to: 150e3, perHz: 100e-6 },
    { from: 150e3, to: 30e6, perHz: 100e-9 },
    { from: 30e6, to: 1e9, perHz: 1e-9 },
  ];
  return bands.reduce(
    (sum, b) => sum + Math.max(0, Math.min(b.to, toHz) - Math.max(b.from, fromHz)) * b.perHz,
    0,
  );
}

/** The doubt of a radiated sweep without an ambient sweep of its bench and day; else none. */
export function ambientDoubt(port: Port, ambientTaken: boolean): Doubt[] {
  if (port !== "radiated" || ambientTaken) return [];
  const text =
    "No ambient sweep of this bench and day is here: take one with the product off and import it.";
  return [{ code: "ambient-not-taken", text, valueDb: null }];
}

/** Everything the inputs show that weakens the reading, each with its number and remedy. */
export function doubtsOf(
  mask: Mask,
  settings: MeasurementSettings,
  traces: readonly Trace[],
  lines: readonly LineReading[],
  context: ReadingContext,
): Doubt[] {
  const swept = traces.filter((t) => t.kind === "scan" && t.levelsDb.length > 0);
  const doubts = bandwidthDoubts(mask, settings, swept);
  for (const { name, coverage } of lines) {
    if (coverage.fraction >= 1) continue;
    const shown = coverage.gaps
      .slice(0, 3)
      .map((g) => `${formatFrequency(g.startHz)} to ${formatFrequency(g.stopHz)}`);
    const more = coverage.gaps.length - shown.length;
    const text = `${name} was swept on ${Math.min(99, Math.floor(coverage.fraction * 100))} % of its range; missing: ${shown.join(", ")}${more > 0 ? ` and ${more} more` : ""}. Sweep the rest.`;
    doubts.push({ code: "not-covered", text, valueDb: null });
  }
  if (settings.sweepTimeS !== null && swept.length > 0) {
    const from = Math.min(...swept.map((t) => firstHz(t.axis)));
    const needed = shortestScanS(from, Math.max(...swept.map((t) => lastHz(t.axis))));
    if (settings.sweepTimeS < needed) {
      const text = `The sweep took ${settings.sweepTimeS} s and this span needs ${needed.toPrecision(3)} s or more: sweep slower or hold the maximum over several sweeps.`;
      doubts.push({ code: "sweep-time-short", text, valueDb: null });
    }
  }
  if (context.overdueTransducers && context.overdueTransducers.length > 0) {
    const text = `Calibration was overdue on the date of the sweep: ${context.overdueTransducers.join(", ")}. Have it calibrated and compare.`;
    doubts.push({ code: "calibration-overdue", text, valueDb: null });
  }
  if (context.ambientTaken !== undefined)
    doubts.push(...ambientDoubt(settings.port, context.ambientTaken));
  if (mask.provenance === "from memory") {
    const text =
      "This mask was written down from memory: confirm it against your own copy of the document.";
    doubts.push({ code: "mask-from-memory", text, valueDb: null });
  }
  return doubts;
}
