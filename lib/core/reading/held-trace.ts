import type { Mask } from "../mask/mask";
import { indexAtOrAfter } from "../sweep/axis";
import type { MeasurementSettings } from "../sweep/settings";
import type { Trace } from "../sweep/trace";
import { convertLevel } from "../units/convert-level";
import { LEVEL_UNIT_LABELS } from "../units/level-units";
import type { PreparedTrace } from "./prepare-parts";
import { restatementDb, RESTATEMENT_EDGE_HZ } from "./restate-distance";
import type { SweepPart } from "./sweep-part";

/** Samples `from` ≤ i < `to` of a trace; each level plus the offset is in the mask's unit. */
export interface HeldTrace extends PreparedTrace {
  from: number;
  to: number;
  offsetDb: number;
}

/** Why a sweep cannot be held against a mask at all, as a sentence; null when it can. */
function refusal(part: SweepPart, mask: Mask): string | null {
  const { settings } = part;
  if (mask.port !== settings.port)
    return `The mask is for the port "${mask.port}" and the sweep was taken at the port "${settings.port}".`;
  if (mask.distanceM === null || settings.distanceM === mask.distanceM) return null;
  if (settings.distanceM === null)
    return `The mask holds at ${mask.distanceM} m and the sweep does not state its distance; levels are never restated silently.`;
  if (part.restateDistance && settings.distanceM > 0) return null;
  return `The mask holds at ${mask.distanceM} m and the sweep was taken at ${settings.distanceM} m; levels are never restated silently.`;
}

/** What turns a level of the trace into the mask's unit, or the sentence that says why none does. */
function unitOffset(trace: Trace, part: SweepPart, mask: Mask): number | string {
  if (trace.unit === mask.unit) return 0;
  const stated = part.impedanceOhm ?? null;
  const add = convertLevel(0, trace.unit, mask.unit, stated ?? 50);
  const units = `${LEVEL_UNIT_LABELS[trace.unit]} and the mask in ${LEVEL_UNIT_LABELS[mask.unit]}`;
  // Volt and ampere follow from each other at the instrument's input, not behind a current probe.
  if (add === null || (trace.unit === "dBuA") !== (mask.unit === "dBuA"))
    return `"${trace.name}" is in ${units}; these are different quantities, so a signal path has to be applied first.`;
  if (stated === null && add !== convertLevel(0, trace.unit, mask.unit, 75))
    return `"${trace.name}" is in ${units}; state the impedance of the instrument to restate one in the other.`;
  return add;
}

/** Whether the mask holds at another distance than the one that the sweep states. */
export function isRestated(settings: MeasurementSettings, mask: Mask): boolean {
  return (
    mask.distanceM !== null && settings.distanceM !== null && settings.distanceM !== mask.distanceM
  );
}

/**
 * The traces as they are held against a mask, or the sentence that says why they cannot be. A
 * sweep that is restated over 30 MHz falls in two, since its levels move by another number there.
 */
export function holdTraces(
  traces: readonly PreparedTrace[],
  mask: Mask,
): { held: HeldTrace[]; refused: string | null } {
  const held: HeldTrace[] = [];
  const refusedParts = new Set<SweepPart>();
  let refused: string | null = null;
  for (const prepared of traces) {
    const { trace, part, levels } = prepared;
    const reason = refusal(part, mask);
    const offset = reason ?? unitOffset(trace, part, mask);
    if (typeof offset === "string") {
      refused ??= offset;
      refusedParts.add(part);
      continue;
    }
    const whole = { ...prepared, from: 0, to: levels.count, offsetDb: offset };
    const { distanceM } = part.settings;
    if (!isRestated(part.settings, mask) || distanceM === null || mask.distanceM === null) {
      held.push(whole);
      continue;
    }
    const add = (hz: number) => offset + restatementDb(distanceM, mask.distanceM ?? distanceM, hz);
    const edge = Math.min(levels.count, indexAtOrAfter(trace.axis, RESTATEMENT_EDGE_HZ));
    if (edge > 0) held.push({ ...whole, to: edge, offsetDb: add(RESTATEMENT_EDGE_HZ / 2) });
    if (edge < levels.count)
      held.push({ ...whole, from: edge, offsetDb: add(RESTATEMENT_EDGE_HZ) });
  }
  // A sweep that cannot be held as a whole says nothing at all.
  return { held: held.filter(({ part }) => !refusedParts.has(part)), refused };
}
