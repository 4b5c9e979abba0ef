import { LEVEL_UNITS, LINEAR_UNITS, type FileUnit } from "./level-units";

/** Lower-case spelling with every micro sign as u; µ is U+00B5, μ is U+03BC. */
function plain(text: string): string {
  return text
    .trim()
    .replace(/[\u00b5\u03bc]/g, "u")
    .replace(/[\s_()[\]]/g, "")
    .replace(/per(meter|metre|m)$/i, "/m")
    .toLowerCase();
}

const BY_SPELLING = new Map<string, FileUnit>(
  [...LEVEL_UNITS, ...LINEAR_UNITS].map((unit) => [unit.toLowerCase(), unit]),
);

/**
 * Unit named by a file or typed by a person, null when it is not known. Only milliwatt and
 * megawatt differ by case alone; a megawatt does not occur here, so case never matters.
 */
export function parseUnit(text: string): FileUnit | null {
  return BY_SPELLING.get(plain(text)) ?? null;
}

const FREQUENCY_FACTORS: Record<string, number> = { hz: 1, khz: 1e3, mhz: 1e6, ghz: 1e9 };

/** Hz per unit named ("MHz" is 1e6), null when the text names no unit of frequency. */
export function parseFrequencyUnit(text: string): number | null {
  return FREQUENCY_FACTORS[plain(text)] ?? null;
}
