import { LEVEL_UNIT_LABELS, type LevelUnit } from "./level-units";

const MINUS = "\u2212";

/** At least one decimal, and as many more as it takes for a small value not to read as zero. */
function magnitude(value: number): string {
  const size = Math.abs(value);
  for (const digits of [1, 2, 3]) {
    const text = size.toFixed(digits);
    if (size === 0 || Number(text) !== 0) return text;
  }
  return size.toExponential(0);
}

/** Signed dB, "+4.2 dB"; a margin below zero always carries its minus. null reads "no margin". */
export function formatMargin(marginDb: number | null): string {
  if (marginDb === null || Number.isNaN(marginDb)) return "no margin";
  return `${marginDb < 0 ? MINUS : "+"}${magnitude(marginDb)} dB`;
}

/** Signed change in dB; an exact zero reads "0.0 dB". */
export function formatDelta(changeDb: number | null): string {
  if (changeDb === null || Number.isNaN(changeDb)) return "no change known";
  return changeDb === 0 ? "0.0 dB" : formatMargin(changeDb);
}

/** Level with its unit, "43.5 dBµV/m". */
export function formatLevel(levelDb: number | null, unit: LevelUnit): string {
  if (levelDb === null || Number.isNaN(levelDb)) return "no level";
  const text = Math.abs(levelDb).toFixed(1);
  return `${levelDb < 0 && Number(text) !== 0 ? MINUS : ""}${text} ${LEVEL_UNIT_LABELS[unit]}`;
}

const FREQUENCY_SCALES = [
  [1e9, "GHz"],
  [1e6, "MHz"],
  [1e3, "kHz"],
  [1, "Hz"],
] as const;

/** Frequency with four figures, or as many as the step in Hz resolves: "1.500 GHz", "88.32 MHz". */
export function formatFrequency(frequencyHz: number, stepHz?: number): string {
  // What rounds up to a thousand of a unit is written in the next one: 999.96 MHz is 1.000 GHz.
  const size = Math.max(Math.abs(frequencyHz), Math.abs(Number(frequencyHz.toPrecision(4))));
  const rounds = stepHz === undefined || !(stepHz > 0) || stepHz >= size / 1000;
  const [scale, label] =
    FREQUENCY_SCALES.find(([factor]) => (rounds ? size : Math.abs(frequencyHz)) >= factor) ??
    ([1, "Hz"] as const);
  const value = frequencyHz / scale;
  const whole = Math.max(1, Math.floor(Math.log10(Math.max(1, Math.abs(value)))) + 1);
  const byStep =
    stepHz !== undefined && stepHz > 0 ? Math.ceil(Math.log10(scale / stepHz) - 1e-9) : 0;
  const digits = Math.min(9, Math.max(4 - whole, byStep, 0));
  return `${value.toFixed(scale === 1 ? Math.max(0, byStep) : digits)} ${label}`;
}
