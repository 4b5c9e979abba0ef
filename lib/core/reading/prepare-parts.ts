import { firstHz, frequencyAt, lastHz, medianStepHz, pointCount } from "../sweep/axis";
import type { LevelIndex } from "../sweep/level-index";
import { indexLevels } from "../sweep/level-index";
import type { FrequencyAxis, Trace } from "../sweep/trace";
import { coveredRanges } from "./coverage";
import type { FrequencyRange } from "./reading";
import type { SweepPart } from "./sweep-part";

/** From sample `from` on, a prepared trace is this trace of this part. */
interface Origin {
  from: number;
  partIndex: number;
  traceIndex: number;
}

/** A trace with all that a reading looks up in it, whatever the mask. */
export interface PreparedTrace {
  trace: Trace;
  part: SweepPart;
  levels: LevelIndex;
  /** Median spacing in Hz; NaN with fewer than two points. */
  stepHz: number;
  covered: FrequencyRange[];
  origins: Origin[];
}

export interface PreparedParts {
  parts: readonly SweepPart[];
  traces: PreparedTrace[];
}

/** Where sample i of a prepared trace came from. */
export function originOf(prepared: Pick<PreparedTrace, "origins">, i: number): Origin {
  const origin = prepared.origins.findLast((o) => o.from <= i);
  return origin ?? { from: 0, partIndex: 0, traceIndex: 0 };
}

interface Loose {
  trace: Trace;
  part: SweepPart;
  origins: Origin[];
}

/** Traces of one key were taken alike, so that one can go on where another ends. */
function likenessOf({ trace, part }: Loose): string | null {
  if (trace.kind === "spots") return null;
  const { sweepTimeS: _time, ...settings } = part.settings;
  return JSON.stringify([
    trace.detector,
    trace.hold,
    trace.unit,
    part.guardDb,
    part.impedanceOhm ?? null,
    part.restateDistance ?? false,
    part.arrangement ?? null,
    Object.entries(settings).sort(([a], [b]) => (a < b ? -1 : 1)),
  ]);
}

function joinAxes(a: FrequencyAxis, b: FrequencyAxis): FrequencyAxis {
  const step = a.kind === "regular" && a.count > 1 ? a.stepHz : null;
  const other = b.kind === "regular" && b.count > 1 ? b.stepHz : null;
  const stepHz = step ?? other;
  if (a.kind === "regular" && b.kind === "regular" && stepHz !== null) {
    const isNext = Math.abs(b.startHz - (a.startHz + a.count * stepHz)) <= stepHz * 1e-6;
    const isSame = Math.abs((other ?? stepHz) - stepHz) <= stepHz * 1e-9;
    if (isNext && isSame)
      return { kind: "regular", startHz: a.startHz, stepHz, count: a.count + b.count };
  }
  const [n, m] = [pointCount(a), pointCount(b)];
  const at = (i: number) => (i < n ? frequencyAt(a, i) : frequencyAt(b, i - n));
  return { kind: "listed", frequenciesHz: Float64Array.from({ length: n + m }, (_, i) => at(i)) };
}

function join(a: Loose, b: Loose): Loose {
  const n = pointCount(a.trace.axis);
  const m = pointCount(b.trace.axis);
  const levelsDb = new Float32Array(n + m);
  levelsDb.set(a.trace.levelsDb.subarray(0, n));
  levelsDb.set(b.trace.levelsDb.subarray(0, m), n);
  const axis = joinAxes(a.trace.axis, b.trace.axis);
  return {
    trace: { ...a.trace, axis, levelsDb },
    part: a.part,
    origins: [...a.origins, ...b.origins.map((o) => ({ ...o, from: o.from + n }))],
  };
}

/** The second begins where the first ends, no further on than two of their steps. */
function goesOn({ trace: a }: Loose, { trace: b }: Loose): boolean {
  const [s, t] = [medianStepHz(a.axis), medianStepHz(b.axis)];
  const step = Number.isFinite(s) ? (Number.isFinite(t) ? Math.min(s, t) : s) : t;
  const gap = firstHz(b.axis) - lastHz(a.axis);
  return gap > 0 && gap <= 2 * step * (1 + 1e-9);
}

/**
 * Scans that were taken alike and go on where another ends become one, so that a sweep reads the
 * same whether its span was split or not: no gap at the seam, and peaks at it are found.
 */
function stitch(loose: readonly Loose[]): Loose[] {
  if (loose.length < 2) return [...loose];
  const alike = new Map<string, Loose[]>();
  const whole: Loose[] = [];
  for (const one of loose) {
    const key = likenessOf(one);
    if (key === null) whole.push(one);
    else alike.set(key, [...(alike.get(key) ?? []), one]);
  }
  for (const group of alike.values()) {
    const rest = [...group].sort((a, b) => firstHz(a.trace.axis) - firstHz(b.trace.axis));
    while (rest.length > 0) {
      let current = rest.shift() as Loose;
      for (let k = 0; k < rest.length;) {
        const next = rest[k] as Loose;
        if (!goesOn(current, next)) {
          k += 1;
          continue;
        }
        current = join(current, next);
        rest.splice(k, 1);
        k = 0;
      }
      whole.push(current);
    }
  }
  const order = ({ origins }: Loose) => [origins[0]?.partIndex ?? 0, origins[0]?.traceIndex ?? 0];
  return whole.sort((a, b) => {
    const [p = 0, t = 0] = order(a);
    const [q = 0, u = 0] = order(b);
    return p - q || t - u;
  });
}

/** Looks at every level of the sweeps once, for any number of masks to be held against. */
export function prepareParts(parts: readonly SweepPart[]): PreparedParts {
  const loose = parts.flatMap((part, partIndex) =>
    part.traces.map((trace, traceIndex): Loose => ({
      trace,
      part,
      origins: [{ from: 0, partIndex, traceIndex }],
    })),
  );
  const traces = stitch(loose).map(({ trace, part, origins }): PreparedTrace => {
    const count = Math.min(pointCount(trace.axis), trace.levelsDb.length);
    const levels = indexLevels(trace.levelsDb, count);
    return {
      trace,
      part,
      levels,
      stepHz: medianStepHz(trace.axis),
      covered: coveredRanges(trace, levels.hasGap),
      origins,
    };
  });
  return { parts, traces };
}

/** The same sweeps, to be restated to the mask's distance or not; nothing is looked at again. */
export function withRestating(
  { parts, traces }: PreparedParts,
  restateDistance: boolean,
): PreparedParts {
  const changed = new Map(parts.map((part) => [part, { ...part, restateDistance }]));
  const changeOf = (part: SweepPart) => changed.get(part) ?? part;
  return {
    parts: parts.map(changeOf),
    traces: traces.map((trace) => ({ ...trace, part: changeOf(trace.part) })),
  };
}
