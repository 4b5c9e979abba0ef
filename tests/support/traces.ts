import type { Trace } from "@/lib/core/sweep/trace";

/** Random numbers 0…1 that repeat with their seed (a linear congruential generator). */
export function randomFrom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
}

export function makeTrace(levels: ArrayLike<number>, part: Partial<Trace> = {}): Trace {
  const levelsDb = Float32Array.from(levels);
  return {
    name: "Peak",
    kind: "scan",
    detector: "peak",
    hold: "max-hold",
    unit: "dBuV/m",
    axis: { kind: "regular", startHz: 30e6, stepHz: 60e3, count: levelsDb.length },
    levelsDb,
    ...part,
  };
}
