import type { Mask } from "../mask/mask";
import type { MeasurementSettings } from "../sweep/settings";
import type { Trace } from "../sweep/trace";
import { convertLevel } from "../units/convert-level";
import { LEVEL_UNIT_LABELS, type LevelUnit } from "../units/level-units";
import { doubtsOf, type ReadingContext } from "./doubts";
import { readLine } from "./line-reading";
import type { Doubt, Reading, Standing } from "./reading";
import { findSuspects } from "./suspects";

/** Counts up whenever the same input may read differently. */
export const ENGINE_VERSION = 3;

export interface ReadSweepInput {
  traces: readonly Trace[];
  settings: MeasurementSettings;
  mask: Mask;
  /** Margin in dB that the team keeps free under the mask. */
  guardDb: number;
  /** Impedance of the instrument; null or left out: not stated, then powers are not restated. */
  impedanceOhm?: number | null;
  suspectProminenceDb?: number;
  suspectMarginDb?: number;
  context?: ReadingContext;
}

const WORST_FIRST: readonly Standing[] = ["over", "undecided", "inside-guard", "clear"];

/** The traces in the mask's unit, or the sentence that says why they cannot be. */
function inMaskUnit(input: ReadSweepInput): Trace[] | string {
  const { mask, settings } = input;
  if (mask.port !== settings.port)
    return `The mask is for the port "${mask.port}" and the sweep was taken at the port "${settings.port}".`;
  if (mask.distanceM !== null && settings.distanceM !== mask.distanceM) {
    const swept =
      settings.distanceM === null
        ? "the sweep does not state its distance"
        : `the sweep was taken at ${settings.distanceM} m`;
    return `The mask holds at ${mask.distanceM} m and ${swept}; levels are never restated silently.`;
  }
  const traces: Trace[] = [];
  for (const trace of input.traces) {
    if (trace.unit === mask.unit) {
      traces.push(trace);
      continue;
    }
    const stated = input.impedanceOhm ?? null;
    const add = convertLevel(0, trace.unit, mask.unit, stated ?? 50);
    const units = `${LEVEL_UNIT_LABELS[trace.unit]} and the mask in ${LEVEL_UNIT_LABELS[mask.unit]}`;
    // Volt and ampere follow from each other at the instrument's input, not behind a current probe.
    if (add === null || (trace.unit === "dBuA") !== (mask.unit === "dBuA"))
      return `"${trace.name}" is in ${units}; these are different quantities, so a signal path has to be applied first.`;
    if (stated === null && add !== convertLevel(0, trace.unit, mask.unit, 75))
      return `"${trace.name}" is in ${units}; state the impedance of the instrument to restate one in the other.`;
    const levelsDb = Float32Array.from(trace.levelsDb, (level) => level + add);
    traces.push({ ...trace, unit: mask.unit, levelsDb });
  }
  return traces;
}

/** A field restated from electric to magnetic or back, which holds in a plane wave only. */
function planeWaveDoubt(traces: readonly Trace[], unit: LevelUnit): Doubt[] {
  if (traces.every((trace) => trace.unit === unit || !trace.unit.match(/\/m$|^dBpT$/))) return [];
  const electric = (of: LevelUnit) => of === "dBuV/m";
  if (traces.every((trace) => electric(trace.unit) === electric(unit))) return [];
  const text =
    "The field was restated between electric and magnetic as in a plane wave (51.5 dB); in the near field the two are not tied like this.";
  return [{ code: "plane-wave-assumed", text, valueDb: null }];
}

/** Holds a sweep against a mask: margins, standing, coverage, suspects and doubts, in dB and Hz. */
export function readSweep(input: ReadSweepInput): Reading {
  const { mask, settings, guardDb } = input;
  const traces = inMaskUnit(input);
  const refused = typeof traces === "string";
  const empty: Reading = {
    engineVersion: ENGINE_VERSION,
    unit: mask.unit,
    guardDb,
    standing: "undecided",
    worstLineIndex: null,
    lines: [],
    coverage: { fraction: 0, gaps: [] },
    suspects: [],
    remeasure: [],
    doubts: [],
    notComparable: refused ? traces : null,
  };
  if (refused || mask.lines.length === 0) return empty;
  const rbwHz = settings.rbwHz ?? 0;
  const read = mask.lines.map((line, i) => readLine(line, i, traces, rbwHz, guardDb));
  const lines = read.map((r) => r.reading);
  const rank = (standing: Standing) => WORST_FIRST.indexOf(standing);
  const margin = (i: number) => lines[i]?.worst?.marginDb ?? Number.POSITIVE_INFINITY;
  const worst = lines.reduce((best, line, i) => {
    const byStanding = rank(line.standing) - rank(lines[best]?.standing ?? "clear");
    return byStanding < 0 || (byStanding === 0 && margin(i) < margin(best)) ? i : best;
  }, 0);
  const coverage = lines.reduce(
    (low, line) => (line.coverage.fraction < low.fraction ? line.coverage : low),
    lines[0]?.coverage ?? empty.coverage,
  );
  const { suspectProminenceDb = 6, suspectMarginDb = 20, context = {} } = input;
  return {
    ...empty,
    standing: lines[worst]?.standing ?? "undecided",
    worstLineIndex: worst,
    lines,
    coverage,
    suspects: findSuspects(traces, mask, rbwHz, suspectProminenceDb, suspectMarginDb),
    remeasure: read.flatMap((r) => r.remeasure),
    doubts: [
      ...doubtsOf(mask, settings, traces, lines, context),
      ...planeWaveDoubt(input.traces, mask.unit),
    ],
  };
}
