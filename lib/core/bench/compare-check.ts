import { prominentPeaks } from "../sweep/prominent-peaks";
import { frequencyAt, indexAtOrAfter, medianStepHz, pointCount } from "../sweep/axis";
import type { Trace } from "../sweep/trace";
import type { CheckLine } from "./bench-check";

/**
 * A line of a known source stands this far out of what is around it. Suspects need 6 dB; a comb
 * that is fit for checking a bench stands far higher, and at 10 dB the peaks of noise hardly ever
 * become lines of a reference, which later checks would then miss (own choice, no source).
 */
export const CHECK_PROMINENCE_DB = 10;

/** A sample on the edge of the reach counts as inside, whatever its frequency was rounded to. */
const EDGE = 1 + 1e-9;

/** Levels of the trace, as many as its axis has points. */
function levelsOf(trace: Trace): Float32Array {
  return trace.levelsDb.subarray(0, Math.min(pointCount(trace.axis), trace.levelsDb.length));
}

/**
 * Lines of a known source in a trace after the signal path: local maxima of a prominence of
 * CHECK_PROMINENCE_DB or more, each at least `rbwHz` from a higher one; sample frequencies in Hz
 * ascending, levels in dB of the trace's unit. A maximum on the first or last point, or right
 * beside a gap, is not known to be one and is left out. Empty when nothing stands out.
 */
export function findCheckLines(trace: Trace, rbwHz: number): CheckLine[] {
  const levels = levelsOf(trace);
  const peaks = prominentPeaks(levels, CHECK_PROMINENCE_DB).map(({ index }) => ({
    frequencyHz: frequencyAt(trace.axis, index),
    levelDb: levels[index] ?? Number.NaN,
  }));
  // Cells of one RBW: what lies nearer than that is in the same cell or a neighbour of it.
  const taken = new Map<number, number[]>();
  return peaks
    .sort((a, b) => b.levelDb - a.levelDb || a.frequencyHz - b.frequencyHz)
    .filter(({ frequencyHz }) => {
      const own = Math.floor(frequencyHz / rbwHz);
      const near = [-1, 0, 1].flatMap((d) => taken.get(own + d) ?? []);
      if (near.some((hz) => Math.abs(hz - frequencyHz) < rbwHz)) return false;
      taken.set(own, [...(taken.get(own) ?? []), frequencyHz]);
      return true;
    })
    .sort((a, b) => a.frequencyHz - b.frequencyHz)
    .map((line) => ({ ...line, referenceDb: null, driftDb: null, standsOut: true }));
}

/**
 * How far from a reference line a check may have it: RBW or step in Hz, whichever is larger. The
 * step is the coarser one of both sweeps, since both place a line on their own points.
 */
export function checkToleranceHz(rbwHz: number, ...stepsHz: number[]): number {
  return Math.max(rbwHz, ...stepsHz);
}

/** Median step of a trace in Hz; zero when it has a single point. */
export function checkStepHz(trace: Trace): number {
  const stepHz = medianStepHz(trace.axis);
  return Number.isFinite(stepHz) ? stepHz : 0;
}

/** Highest level in dB from `fromHz` to `toHz`; null where the trace has none. */
function highestDb(trace: Trace, levels: Float32Array, fromHz: number, toHz: number) {
  let highest: number | null = null;
  for (let i = indexAtOrAfter(trace.axis, fromHz); i < levels.length; i += 1) {
    if (frequencyAt(trace.axis, i) > toHz) break;
    const level = levels[i] ?? Number.NaN;
    if (!Number.isNaN(level) && (highest === null || level > highest)) highest = level;
  }
  return highest;
}

export interface CheckComparison {
  /** Every line of the reference that has a level here, and the lines that only the check has. */
  lines: CheckLine[];
  /** Lines of the reference where the check has no level, Hz ascending. */
  missingHz: number[];
  /** Mean over the lines with a drift, in dB; null without one. */
  driftMeanDb: number | null;
  /** The drift of the largest size, with its sign, in dB; null without one. */
  driftWorstDb: number | null;
}

/**
 * A check held against its reference: at each line of the reference the highest level of the
 * check's trace within ± `toleranceHz`, but never past the middle to the reference's next line,
 * which would be taken for this one. Drift is check minus reference in dB. A line where the check
 * has no level (outside its span or outside a factor table) is missing, not zero.
 *
 * `lines` are the check's own lines (`findCheckLines`); trace and reference are in one unit, and
 * of one detector and RBW: the caller has made sure.
 */
export function compareCheck(
  trace: Trace,
  lines: readonly CheckLine[],
  reference: readonly CheckLine[],
  toleranceHz: number,
): CheckComparison {
  const levels = levelsOf(trace);
  const known = [...reference].sort((a, b) => a.frequencyHz - b.frequencyHz);
  const compared: CheckLine[] = [];
  const missingHz: number[] = [];
  const own = new Set<CheckLine>();
  let next = 0;
  known.forEach(({ frequencyHz, levelDb: referenceDb }, i) => {
    const before = known[i - 1]?.frequencyHz ?? Number.NEGATIVE_INFINITY;
    const after = known[i + 1]?.frequencyHz ?? Number.POSITIVE_INFINITY;
    const fromHz = frequencyHz - Math.min(toleranceHz * EDGE, (frequencyHz - before) / 2);
    const toHz = frequencyHz + Math.min(toleranceHz * EDGE, (after - frequencyHz) / 2);
    let standsOut = false;
    while ((lines[next]?.frequencyHz ?? Number.POSITIVE_INFINITY) < fromHz) next += 1;
    for (let k = next; k < lines.length; k += 1) {
      const line = lines[k];
      if (!line || line.frequencyHz > toHz) break;
      own.add(line);
      standsOut = true;
    }
    const levelDb = highestDb(trace, levels, fromHz, toHz);
    if (levelDb === null) missingHz.push(frequencyHz);
    else {
      const driftDb = levelDb - referenceDb;
      compared.push({ frequencyHz, levelDb, referenceDb, driftDb, standsOut });
    }
  });
  const drifts = compared.flatMap(({ driftDb }) => (driftDb === null ? [] : [driftDb]));
  const sum = drifts.reduce((total, drift) => total + drift, 0);
  return {
    lines: [...compared, ...lines.filter((line) => !own.has(line))].sort(
      (a, b) => a.frequencyHz - b.frequencyHz,
    ),
    missingHz,
    driftMeanDb: drifts.length > 0 ? sum / drifts.length : null,
    driftWorstDb: drifts.reduce<number | null>(
      (worst, drift) => (worst === null || Math.abs(drift) > Math.abs(worst) ? drift : worst),
      null,
    ),
  };
}
