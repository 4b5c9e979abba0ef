import { DETECTOR_LABELS } from "../sweep/settings";
import { formatFrequency } from "../units/format";
import type { ComparedSweep } from "./compared-sweep";
import type { Mismatch, MismatchField } from "./delta";
import { pairTraces, soundPairs } from "./trace-pairs";

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
  if ((a.conductor ?? null) !== (b.conductor ?? null))
    found.push({
      field: "conductor",
      text: `The conductor differs: ${a.conductor ?? "not stated"} before, ${b.conductor ?? "not stated"} after.`,
    });
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

/**
 * Every reason why two sweeps may not be compared; empty when they may. Traces of a detector that
 * only one side has, or whose unit or span differs, forbid nothing while another pair is sound.
 */
export function findMismatches(before: ComparedSweep, after: ComparedSweep): Mismatch[] {
  const found = [...arrangementMismatches(before, after), ...bandwidthMismatches(before, after)];
  const pairs = pairTraces(before, after);
  if (pairs.length === 0)
    return [
      ...found,
      {
        field: "detector",
        text: `No detector is in both: ${detectorsOf(before)} before, ${detectorsOf(after)} after.`,
      },
    ];
  if (soundPairs(pairs).length > 0) return found;
  // Of several flawed pairs the one that could be accepted tells why.
  const told = pairs.find((pair) => pair.flaws.every(({ field }) => field !== "unit")) ?? pairs[0];
  return [...found, ...(told?.flaws ?? [])];
}

/** Mismatches that no reason makes comparable: the difference would not be a number of anything. */
export const NEVER_ACCEPTED: ReadonlySet<MismatchField> = new Set(["unit", "purpose", "detector"]);
