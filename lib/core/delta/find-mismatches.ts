import { DETECTOR_LABELS } from "../sweep/settings";
import type { Detector } from "../sweep/settings";
import { formatFrequency } from "../units/format";
import { LEVEL_UNIT_LABELS } from "../units/level-units";
import type { ComparedSweep, ComparedTrace } from "./compared-sweep";
import type { Mismatch } from "./delta";

/** The first two traces of one detector; null when the sweeps share none. */
export function sharedTraces(
  before: ComparedSweep,
  after: ComparedSweep,
): { detector: Detector; before: ComparedTrace; after: ComparedTrace } | null {
  for (const earlier of before.traces) {
    const { detector } = earlier;
    if (detector === null) continue;
    const later = after.traces.find((t) => t.detector === detector);
    if (later) return { detector, before: earlier, after: later };
  }
  return null;
}

const detectorsOf = (sweep: ComparedSweep) =>
  sweep.traces.map((t) => (t.detector ? DETECTOR_LABELS[t.detector] : "not stated")).join(", ");

const said = (value: number | null, unit: string) =>
  value === null ? "not stated" : `${value} ${unit}`;

function arrangementMismatches(before: ComparedSweep, after: ComparedSweep): Mismatch[] {
  const found: Mismatch[] = [];
  const [a, b] = [before.settings, after.settings];
  if (before.purpose !== after.purpose)
    found.push({
      field: "purpose",
      text: `One is a ${before.purpose} sweep, the other a ${after.purpose} sweep.`,
    });
  if (before.benchId !== after.benchId)
    found.push({
      field: "bench",
      text: `Measured on different benches: ${before.benchName} and ${after.benchName}.`,
    });
  else if (before.signalPathRevisionId !== after.signalPathRevisionId)
    found.push({
      field: "signal-path",
      text: `The signal path changed: revision ${before.signalPathRevision} before, ${after.signalPathRevision} after.`,
    });
  if (before.corrected !== after.corrected)
    found.push({
      field: "signal-path",
      text: "One file was corrected in the instrument and the other by the signal path.",
    });
  if (a.distanceM !== b.distanceM)
    found.push({
      field: "distance",
      text: `The distance differs: ${said(a.distanceM, "m")} before, ${said(b.distanceM, "m")} after.`,
    });
  if (a.port !== b.port)
    found.push({ field: "port", text: `The port differs: ${a.port} before, ${b.port} after.` });
  if (a.polarization !== b.polarization)
    found.push({
      field: "polarization",
      text: `The polarization differs: ${a.polarization ?? "not stated"} before, ${b.polarization ?? "not stated"} after.`,
    });
  if (a.heightM !== b.heightM || a.azimuthDeg !== b.azimuthDeg)
    found.push({
      field: "position",
      text: `The position differs: height ${said(a.heightM, "m")} and azimuth ${said(a.azimuthDeg, "°")} before, ${said(b.heightM, "m")} and ${said(b.azimuthDeg, "°")} after.`,
    });
  return found;
}

function bandwidthMismatches(before: ComparedSweep, after: ComparedSweep): Mismatch[] {
  const [a, b] = [before.settings, after.settings];
  const shown = (hz: number | null) => (hz === null ? "not stated" : formatFrequency(hz));
  if (a.rbwHz === null || b.rbwHz === null)
    return [
      {
        field: "rbw",
        text: `The resolution bandwidth has to be known on both sides: ${shown(a.rbwHz)} before, ${shown(b.rbwHz)} after.`,
      },
    ];
  if (a.rbwHz !== b.rbwHz)
    return [
      {
        field: "rbw",
        text: `The resolution bandwidth differs: ${shown(a.rbwHz)} before, ${shown(b.rbwHz)} after.`,
      },
    ];
  if (a.rbwKind !== null && b.rbwKind !== null && a.rbwKind !== b.rbwKind)
    return [
      {
        field: "rbw-kind",
        text: `The bandwidth is counted at ${a.rbwKind.replace("dB", " dB")} before and at ${b.rbwKind.replace("dB", " dB")} after.`,
      },
    ];
  return [];
}

/** Every reason why two sweeps may not be compared; empty when they may. */
export function findMismatches(before: ComparedSweep, after: ComparedSweep): Mismatch[] {
  const found = [...arrangementMismatches(before, after), ...bandwidthMismatches(before, after)];
  const shared = sharedTraces(before, after);
  if (!shared) {
    found.push({
      field: "detector",
      text: `No detector is in both: ${detectorsOf(before)} before, ${detectorsOf(after)} after.`,
    });
    return found;
  }
  const [a, b] = [shared.before, shared.after];
  if (a.unit !== b.unit)
    found.push({
      field: "unit",
      text: `The unit differs: ${LEVEL_UNIT_LABELS[a.unit]} before, ${LEVEL_UNIT_LABELS[b.unit]} after.`,
    });
  const tolerance = Math.max(a.stepHz ?? 0, b.stepHz ?? 0) / 2;
  const off = (x: number, y: number) => Math.abs(x - y) > Math.max(tolerance, 1e-9 * x);
  if (off(a.firstHz, b.firstHz) || off(a.lastHz, b.lastHz))
    found.push({
      field: "span",
      text: `The span differs: ${formatFrequency(a.firstHz)} to ${formatFrequency(a.lastHz)} before, ${formatFrequency(b.firstHz)} to ${formatFrequency(b.lastHz)} after.`,
    });
  return found;
}
