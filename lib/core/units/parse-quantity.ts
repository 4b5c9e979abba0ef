/** Factors to the base unit by spelling, largest last; the first spelling of a factor is written. */
type Factors = readonly (readonly [spelling: string, factor: number])[];

export const FREQUENCY_UNITS: Factors = [
  ["Hz", 1],
  ["kHz", 1e3],
  ["MHz", 1e6],
  ["GHz", 1e9],
];
export const BIT_RATE_UNITS: Factors = [
  ["b/s", 1],
  ["kb/s", 1e3],
  ["Mb/s", 1e6],
  ["Gb/s", 1e9],
  ["bit/s", 1],
  ["kbit/s", 1e3],
  ["Mbit/s", 1e6],
  ["Gbit/s", 1e9],
];
export const TIME_UNITS: Factors = [
  ["ps", 1e-12],
  ["ns", 1e-9],
  ["µs", 1e-6],
  ["us", 1e-6],
  ["ms", 1e-3],
  ["s", 1],
];

/**
 * A number with its unit as a person types it ("120 kHz", "3,2 Gb/s"), in the base unit (Hz, b/s
 * or s); null when it is none or names no unit: a bare number is never given a unit silently.
 */
export function parseQuantity(text: string, units: Factors): number | null {
  const match = /^\s*([+−-]?\d+(?:[.,]\d+)?(?:e[+-]?\d+)?)\s*([a-zµμ/]+)\s*$/i.exec(text);
  if (!match) return null;
  const value = Number(match[1]?.replace("−", "-").replace(",", "."));
  const spelling = (match[2] ?? "").replace("μ", "µ");
  const exact = units.find(([name]) => name === spelling);
  const found = exact ?? units.find(([name]) => name.toLowerCase() === spelling.toLowerCase());
  return found && Number.isFinite(value) ? Number((value * found[1]).toPrecision(15)) : null;
}

/** The quantity as it would be typed, in the largest unit that keeps it at one or more. */
export function writeQuantity(value: number, units: Factors): string {
  const written = units.filter(([, f], i) => units.findIndex(([, g]) => g === f) === i);
  const fitting = written.filter(([, factor]) => Math.abs(value) >= factor * (1 - 1e-12));
  const [name, factor] = fitting.at(-1) ?? written[0] ?? ["", 1];
  return `${Number((value / factor).toPrecision(12))} ${name}`;
}
