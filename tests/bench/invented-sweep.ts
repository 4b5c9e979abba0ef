import type { FrequencyAxis, Trace } from "@/lib/core/sweep/trace";
import { makeTrace, randomFrom } from "../support/traces";

const START_HZ = 30e6;
const STOP_HZ = 1e9;

/** Peak levels in dBµV: a floor with its noise, and a comb of lines that stand on it. */
export function inventLevels(count: number, seed: number): Float64Array {
  const random = randomFrom(seed);
  const spacing = Math.max(40, Math.round(count / 240));
  return Float64Array.from({ length: count }, (_, i) => {
    const noise = 8 - 3 * Math.log(1e-9 - Math.log(1 - random()));
    const away = Math.abs((i % spacing) - spacing / 2);
    return Math.max(noise, 30 + 12 * Math.sin(i / count) - 6 * away ** 2);
  });
}

/** Two columns as an analyzer writes them; every file of another seed has other bytes. */
export function inventFile(count: number, seed: number): Uint8Array {
  const levels = inventLevels(count, seed);
  const stepHz = (STOP_HZ - START_HZ) / (count - 1);
  const rows = Array.from(levels, (level, i) => {
    return `${(START_HZ + i * stepHz).toFixed(2)},${level.toFixed(3)}`;
  });
  return Buffer.from(`Frequency (Hz),Peak (dBµV)\n${rows.join("\n")}\n`, "utf8");
}

/** Frequencies with all the digits that a double has, evenly spaced or each on its own. */
function awkwardAxis(kind: FrequencyAxis["kind"], count: number): FrequencyAxis {
  const startHz = 1_000_000_000 / 3;
  if (kind === "regular") return { kind, startHz, stepHz: 17_000_000_000 / 3 / count, count };
  const ratio = 18 ** (1 / (count - 1));
  const frequenciesHz = Float64Array.from({ length: count }, (_, i) => startHz * ratio ** i);
  return { kind, frequenciesHz };
}

/** A trace whose frequencies and levels print as long as they can. */
export function inventAwkwardTrace(kind: FrequencyAxis["kind"], count: number): Trace {
  const levels = inventLevels(count, count).map((level) => level - 200.000123);
  return makeTrace(levels, { unit: "dBuV", axis: awkwardAxis(kind, count) });
}
