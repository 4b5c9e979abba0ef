import type { FrequencyAxis, Trace } from "@/lib/core/sweep/trace";
import { makeTrace, randomFrom } from "../support/traces";

const START_HZ = 30e6;
const STOP_HZ = 1e9;

/** Noise samples that the peak detector sees for each point; fewer make a rougher floor. */
const FAST_SWEEP = 10;

/**
 * Peak levels in dBµV: a comb of lines on a floor of Gaussian noise, whose power is exponential.
 * Every point is drawn on its own as the highest of `samples`, so the floor is rougher than one
 * whose neighbours share a filter: more maxima have to be looked at.
 */
export function inventLevels(count: number, seed: number, samples = FAST_SWEEP): Float64Array {
  const random = randomFrom(seed);
  const spacing = Math.max(40, Math.round(count / 240));
  return Float64Array.from({ length: count }, (_, i) => {
    const power = -Math.log(1 - Math.min(1 - 1e-12, (random() + 1e-9) ** (1 / samples)));
    const noise = 2 + 10 * Math.log10(power);
    const away = Math.abs((i % spacing) - spacing / 2);
    return Math.max(noise, 30 + 12 * Math.sin(i / count) - 6 * away ** 2);
  });
}

interface FileOptions {
  samples?: number;
  /** Frequencies at equal ratios, which are no regular axis and are stored one by one. */
  isListed?: boolean;
}

/** Two columns as an analyzer writes them; every file of another seed has other bytes. */
export function inventFile(count: number, seed: number, options: FileOptions = {}): Uint8Array {
  const levels = inventLevels(count, seed, options.samples);
  const frequencyAt = (share: number) =>
    options.isListed
      ? START_HZ * (STOP_HZ / START_HZ) ** share
      : START_HZ + (STOP_HZ - START_HZ) * share;
  const rows = Array.from(levels, (level, i) => {
    return `${frequencyAt(i / (count - 1)).toFixed(2)},${level.toFixed(3)}`;
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
