import { DETECTOR_LABELS, HOLD_LABELS } from "../sweep/settings";
import { formatFrequency } from "../units/format";
import type { ComparedSweep } from "./compared-sweep";
import type { TracePair } from "./trace-pairs";

function differs<T>(
  label: string,
  before: T | null,
  after: T | null,
  show: (value: T) => string,
): string[] {
  if (before === after) return [];
  const said = (value: T | null) => (value === null ? "not stated" : show(value));
  return [`${label} differs: ${said(before)} before, ${said(after)} after.`];
}

function traceDoubts(pairs: readonly TracePair[]): string[] {
  return pairs.flatMap(({ detector, before, after }) => {
    const about = pairs.length > 1 ? ` of the ${DETECTOR_LABELS[detector]} trace` : "";
    const doubts = differs(`The hold${about}`, before.hold, after.hold, (v) => HOLD_LABELS[v]);
    const [s, t] = [before.stepHz ?? 0, after.stepHz ?? 0];
    if (before.kind === "scan" && Math.abs(s - t) > 0.01 * Math.max(s, t))
      doubts.push(
        `The frequency step${about} differs: ${formatFrequency(s)} before, ${formatFrequency(t)} after.`,
      );
    return doubts;
  });
}

/** Differences that weaken a delta without forbidding it; whole sentences. */
export function findDeltaDoubts(
  before: ComparedSweep,
  after: ComparedSweep,
  pairs: readonly TracePair[],
): string[] {
  const [a, b] = [before.settings, after.settings];
  const doubts = [
    ...differs("Attenuation", a.attenuationDb, b.attenuationDb, (v) => `${v} dB`),
    ...differs("The video bandwidth", a.vbwHz, b.vbwHz, (v) => formatFrequency(v)),
    ...differs("The sweep time", a.sweepTimeS, b.sweepTimeS, (v) => `${v} s`),
    ...differs("The preamplifier", a.preamplifier, b.preamplifier, (v) => (v ? "on" : "off")),
  ];
  if (a.rbwHz !== null && a.rbwKind !== b.rbwKind && (a.rbwKind === null || b.rbwKind === null))
    doubts.push("Only one side states whether its bandwidth is counted at 3 dB or 6 dB.");
  return [...doubts, ...traceDoubts(pairs)];
}
