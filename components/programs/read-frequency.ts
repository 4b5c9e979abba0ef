import { parseFrequencyUnit } from "@/lib/core/units/parse-unit";

/**
 * A frequency in Hz as people type it, "27 MHz" or "148,5 MHz"; NaN when the text is none. The unit
 * is never guessed: a bare "27" is not a frequency.
 */
export function readFrequency(text: string): number {
  const typed = /^\s*(\d+(?:[.,]\d+)?)\s*([a-z]+)\s*$/i.exec(text);
  const factor = typed?.[2] ? parseFrequencyUnit(typed[2]) : null;
  if (!typed?.[1] || factor === null) return Number.NaN;
  // The decimal point is moved in the text: a multiplication would leave 26.9997 MHz not whole.
  return Number(`${typed[1].replace(",", ".")}e${Math.round(Math.log10(factor))}`);
}

/** A frequency as it is put into a field: every digit kept, so that reading it gives it back. */
export function writeFrequency(frequencyHz: number): string {
  const units = [
    { label: "GHz", factor: 1e9 },
    { label: "MHz", factor: 1e6 },
    { label: "kHz", factor: 1e3 },
  ];
  for (const { label, factor } of units) {
    const text = `${frequencyHz / factor} ${label}`;
    if (frequencyHz >= factor && readFrequency(text) === frequencyHz) return text;
  }
  return `${frequencyHz} Hz`;
}
