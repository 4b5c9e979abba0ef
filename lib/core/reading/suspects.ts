import { limitAt } from "../mask/limit-at";
import type { Mask, MaskLine } from "../mask/mask";
import { frequencyAt, indexAtOrAfter, pointCount } from "../sweep/axis";
import type { Trace } from "../sweep/trace";
import { basisOf } from "./basis";
import type { Suspect } from "./reading";

/** Lowest level between each point and the next higher one on its left; NaN parts the trace. */
function leftBases(levels: Float32Array): Float32Array {
  const bases = new Float32Array(levels.length);
  // The points that no later one has overtopped yet, by falling level.
  const stack = new Uint32Array(levels.length);
  let size = 0;
  for (let i = 0; i < levels.length; i += 1) {
    const level = levels[i] ?? Number.NaN;
    if (Number.isNaN(level)) {
      size = 0;
      continue;
    }
    let base = level;
    for (; size > 0; size -= 1) {
      const top = stack[size - 1] ?? 0;
      if ((levels[top] ?? Number.NaN) > level) break;
      base = Math.min(base, bases[top] ?? base);
    }
    bases[i] = base;
    stack[size] = i;
    size += 1;
  }
  return bases;
}

/** Local maxima (middle of a plateau) with prominence in dB of at least `minimumDb`. */
export function prominentPeaks(
  levels: Float32Array,
  minimumDb: number,
): { index: number; prominenceDb: number }[] {
  const left = leftBases(levels);
  const right = leftBases(levels.slice().reverse()).reverse();
  const peaks: { index: number; prominenceDb: number }[] = [];
  for (let i = 1; i + 1 < levels.length; i += 1) {
    const level = levels[i] ?? Number.NaN;
    if (!((levels[i - 1] ?? Number.NaN) < level)) continue;
    let end = i;
    while (levels[end + 1] === level) end += 1;
    if ((levels[end + 1] ?? Number.NaN) < level) {
      const index = (i + end) >> 1;
      const prominenceDb = level - Math.max(left[index] ?? level, right[index] ?? level);
      if (prominenceDb >= minimumDb) peaks.push({ index, prominenceDb });
    }
    i = end;
  }
  return peaks;
}

/** Top in Hz of a parabola in dB through a sample and its neighbours. */
function parabolicHz(trace: Trace, i: number): number {
  const at = frequencyAt(trace.axis, i);
  const [a, b, c] = [trace.levelsDb[i - 1], trace.levelsDb[i], trace.levelsDb[i + 1]];
  const [h1, h2] = [at - frequencyAt(trace.axis, i - 1), frequencyAt(trace.axis, i + 1) - at];
  if (a === undefined || b === undefined || c === undefined) return at;
  const below = (b - a) / h1;
  const above = (c - b) / h2;
  const curvature = (above - below) / (h1 + h2);
  const shift = -(below * h2 + above * h1) / (h1 + h2) / (2 * curvature);
  return Number.isFinite(shift) ? at + Math.max(-h1, Math.min(h2, shift)) : at;
}

/** Whether a trace of the line's own detector has a level at a frequency in Hz. */
function isDecided(traces: readonly Trace[], line: MaskLine, hz: number): boolean {
  return traces.some((trace) => {
    if (trace.kind === "spots" || basisOf(trace, line.detector) !== "like-for-like") return false;
    const i = indexAtOrAfter(trace.axis, hz);
    const near = (k: number) => !Number.isNaN(trace.levelsDb[k] ?? Number.NaN);
    return frequencyAt(trace.axis, i) === hz ? near(i) : i > 0 && near(i - 1) && near(i);
  });
}

/**
 * Suspects of traces in the mask's unit, lowest margin first: maxima of the wanted prominence,
 * one RBW or more from one with a lower margin (by level alone, a peak trace far under its line
 * would hide the average trace that is over), at most `marginDb` under the line.
 * Where the line's own detector was swept, an upper bound of another one is no suspect.
 */
export function findSuspects(
  traces: readonly Trace[],
  mask: Mask,
  rbwHz: number,
  prominenceDb: number,
  marginDb: number,
): Suspect[] {
  const candidates: (Suspect & { marginDb: number })[] = [];
  traces.forEach((trace, traceIndex) => {
    const lines = mask.lines
      .map((line) => ({ line, basis: basisOf(trace, line.detector) }))
      .filter((l) => l.basis !== "cannot-decide");
    const count = Math.min(pointCount(trace.axis), trace.levelsDb.length);
    if (trace.kind === "spots" || lines.length === 0) return;
    for (const peak of prominentPeaks(trace.levelsDb.subarray(0, count), prominenceDb)) {
      const sampleHz = frequencyAt(trace.axis, peak.index);
      const levelDb = trace.levelsDb[peak.index] ?? Number.NaN;
      let found: (Suspect & { marginDb: number }) | null = null;
      for (const { line, basis } of lines) {
        const limitDb = limitAt(line, sampleHz);
        if (basis === "upper-bound" && isDecided(traces, line, sampleHz)) continue;
        if (limitDb === null || (found && found.marginDb <= limitDb - levelDb)) continue;
        found = {
          number: 0,
          frequencyHz: parabolicHz(trace, peak.index),
          sampleHz,
          levelDb,
          limitDb,
          marginDb: limitDb - levelDb,
          prominenceDb: peak.prominenceDb,
          lineName: line.name,
          basis,
          traceIndex,
          partIndex: 0,
        };
      }
      if (found && found.marginDb <= marginDb) candidates.push(found);
    }
  });
  const taken = new Map<number, number[]>();
  const cell = (hz: number) => (rbwHz > 0 ? Math.floor(hz / rbwHz) : hz);
  const reach = rbwHz > 0 ? [-1, 0, 1] : [0];
  return candidates
    .sort((a, b) => a.marginDb - b.marginDb || b.levelDb - a.levelDb)
    .filter(({ sampleHz }) => {
      const own = cell(sampleHz);
      const near = reach.flatMap((d) => taken.get(own + d) ?? []);
      if (near.some((hz) => hz === sampleHz || Math.abs(hz - sampleHz) < rbwHz)) return false;
      taken.set(own, [...(taken.get(own) ?? []), sampleHz]);
      return true;
    })
    .map((suspect, i) => ({ ...suspect, number: i + 1 }));
}
