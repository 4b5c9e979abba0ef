import { frequencyAt, pointCount } from "../sweep/axis";
import type { Trace } from "../sweep/trace";
import { convertLevel } from "../units/convert-level";
import type { LevelUnit } from "../units/level-units";
import type { SignalPath, Transducer } from "./signal-path";

/** Factor in dB at a frequency in Hz, linear in log f; null outside the table. */
export function factorAt(transducer: Transducer, hz: number): number | null {
  const points = transducer.factors;
  const after = points.findIndex((p) => p.frequencyHz >= hz);
  const high = points[after];
  if (!high) return null;
  if (high.frequencyHz === hz) return high.factorDb;
  const low = points[after - 1];
  if (!low) return null;
  const share = Math.log(hz / low.frequencyHz) / Math.log(high.frequencyHz / low.frequencyHz);
  return low.factorDb + (high.factorDb - low.factorDb) * share;
}

/** Unit of a level after the path: a field, a current, or still dBµV. */
export function pathOutputUnit(path: SignalPath): LevelUnit {
  const kinds = path.transducers.map((t) => t.kind);
  if (kinds.includes("antenna")) return "dBuV/m";
  if (kinds.includes("magnetic-loop")) return "dBuA/m";
  return kinds.includes("current-probe") ? "dBuA" : "dBuV";
}

/**
 * The trace before the path, or null when the trace is not the level at an instrument's input.
 * V in dBµV at the path's impedance, plus every factor, minus amplifier gain; points outside a
 * factor table become NaN, which is not covered.
 */
export function applySignalPath(trace: Trace, path: SignalPath): Trace | null {
  const add = convertLevel(0, trace.unit, "dBuV", path.impedanceOhm);
  if (add === null) return null;
  const count = Math.min(pointCount(trace.axis), trace.levelsDb.length);
  const levelsDb = new Float32Array(count);
  for (let i = 0; i < count; i += 1) {
    const hz = frequencyAt(trace.axis, i);
    let level = (trace.levelsDb[i] ?? Number.NaN) + add;
    for (const transducer of path.transducers) {
      const factor = factorAt(transducer, hz) ?? Number.NaN;
      level += transducer.kind === "preamplifier" ? -factor : factor;
    }
    levelsDb[i] = level;
  }
  return { ...trace, unit: pathOutputUnit(path), levelsDb };
}
