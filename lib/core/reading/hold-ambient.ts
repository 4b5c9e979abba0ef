import { limitAt, lineRanges } from "../mask/limit-at";
import type { Mask, MaskLine } from "../mask/mask";
import { frequencyAt, indexAtOrAfter, medianStepHz, pointCount } from "../sweep/axis";
import type { Detector, MeasurementSettings } from "../sweep/settings";
import type { AmbientAtLine, AmbientCheck } from "./ambient-check";
import { ambientLevelAt } from "./ambient-check";
import { basisOf, tightness } from "./basis";
import type { AmbientSweep, ComparableTrace, ProductTrace } from "./comparable-ambient";
import { compareAmbient } from "./comparable-ambient";
import { coveredRanges, inRanges, mergeRanges } from "./coverage";
import type { FrequencyRange, Reading } from "./reading";

/** A reading with what has to be known of the sweep it was made of. */
export interface HeldProduct {
  reading: Pick<Reading, "unit" | "lines" | "suspects">;
  /** By their position, as the reading's trace indexes count them. */
  traces: readonly ProductTrace[];
  settings: MeasurementSettings;
  mask: Mask;
  /**
   * dB that the reading adds at a frequency in Hz to restate the sweep's distance as the mask's.
   * The ambient met the same antenna, so it moves by as much and keeps its place beside the levels.
   */
  distanceDb?: (frequencyHz: number) => number;
}

interface Heard extends ComparableTrace {
  covered: FrequencyRange[];
}

const noDistance = () => 0;

/** Highest ambient level of one detector at a frequency, dB of the reading's unit; null: unknown. */
function levelBeside(
  heard: readonly Heard[],
  detector: Detector | null,
  hz: number,
  { settings, traces, distanceDb = noDistance }: HeldProduct,
): number | null {
  let highest: number | null = null;
  for (const { trace, addDb, covered, detector: own } of heard) {
    // A scan that stops short of the frequency has not seen it, though a sample lies in reach.
    if (own !== detector || (trace.kind === "scan" && !inRanges(covered, hz))) continue;
    const steps = traces.flatMap((t) => (t.detector === detector ? (t.stepHz ?? []) : []));
    if (trace.kind === "scan") steps.push(medianStepHz(trace.axis));
    const reachHz = Math.max(settings.rbwHz ?? 0, ...steps.filter(Number.isFinite));
    const levelDb = ambientLevelAt(trace, hz, reachHz);
    if (levelDb !== null && (highest === null || levelDb + addDb > highest))
      highest = levelDb + addDb;
  }
  return highest === null ? null : highest + distanceDb(hz);
}

/** Where one ambient trace lies nearest to a line, at frequencies that the product's sweep took. */
function nearestOf(
  { trace, detector, addDb }: Heard,
  line: MaskLine,
  silenced: readonly FrequencyRange[],
  { traces, distanceDb = noDistance }: HeldProduct,
): Omit<AmbientAtLine, "lineIndex"> | null {
  const { axis, levelsDb } = trace;
  const count = Math.min(pointCount(axis), levelsDb.length);
  const spans = traces.filter((t) => t.detector === detector);
  let nearest: Omit<AmbientAtLine, "lineIndex"> | null = null;
  for (const range of lineRanges(line)) {
    for (let i = indexAtOrAfter(axis, range.startHz); i < count; i += 1) {
      const frequencyHz = frequencyAt(axis, i);
      if (frequencyHz > range.stopHz) break;
      const ambientDb = (levelsDb[i] ?? Number.NaN) + addDb + distanceDb(frequencyHz);
      const limitDb = limitAt(line, frequencyHz);
      if (limitDb === null || !Number.isFinite(ambientDb)) continue;
      const marginDb = limitDb - ambientDb;
      if (nearest && nearest.marginDb <= marginDb) continue;
      if (!spans.some((t) => t.firstHz <= frequencyHz && frequencyHz <= t.lastHz)) continue;
      if (inRanges(silenced, frequencyHz)) continue;
      nearest = { frequencyHz, ambientDb, marginDb };
    }
  }
  return nearest;
}

/** As with the product's own levels, a looser detector is silent where a tighter one was swept. */
function nearestToLine(
  heard: readonly Heard[],
  line: MaskLine,
  product: HeldProduct,
): Omit<AmbientAtLine, "lineIndex"> | null {
  const speaking = heard
    .filter(({ trace }) => basisOf(trace, line.detector) !== "cannot-decide")
    .sort((a, b) => tightness(b.detector) - tightness(a.detector));
  let nearest: Omit<AmbientAtLine, "lineIndex"> | null = null;
  for (const one of speaking) {
    const tighter = speaking.filter((s) => tightness(s.detector) > tightness(one.detector));
    const silenced = mergeRanges(tighter.flatMap((s) => s.covered));
    const found = nearestOf(one, line, silenced, product);
    if (found && (!nearest || found.marginDb < nearest.marginDb)) nearest = found;
  }
  return nearest;
}

/**
 * One ambient sweep held beside one reading: its level at each suspect and at each line's worst
 * point, by traces of the detector that read them, and its nearest approach to each line. Hz, and
 * dB of the reading's unit. What the ambient does not cover is left out.
 */
export function holdAmbient(ambient: AmbientSweep, product: HeldProduct): AmbientCheck {
  const { reading, traces, settings, mask } = product;
  const compared = compareAmbient(ambient, { traces, settings, unit: reading.unit });
  const check: AmbientCheck = {
    version: 1,
    notComparable: compared.notComparable,
    caveat: compared.caveats.length > 0 ? compared.caveats.join(" ") : null,
    suspects: [],
    lines: [],
    worst: [],
  };
  if (compared.notComparable !== null) return check;
  const heard = compared.traces.map((one) => ({ ...one, covered: coveredRanges(one.trace) }));
  const beside = (traceIndex: number, hz: number) =>
    levelBeside(heard, traces[traceIndex]?.detector ?? null, hz, product);
  for (const { number, sampleHz, traceIndex } of reading.suspects) {
    const ambientDb = beside(traceIndex, sampleHz);
    if (ambientDb !== null) check.suspects.push({ number, ambientDb });
  }
  for (const { lineIndex, worst } of reading.lines) {
    const line = mask.lines[lineIndex];
    const nearest = line ? nearestToLine(heard, line, product) : null;
    if (nearest) check.lines.push({ lineIndex, ...nearest });
    const ambientDb = worst ? beside(worst.traceIndex, worst.frequencyHz) : null;
    if (ambientDb !== null) check.worst.push({ lineIndex, ambientDb });
  }
  return check;
}
