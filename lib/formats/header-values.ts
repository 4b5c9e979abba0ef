import { parseFrequencyUnit, parseUnit } from "@/lib/core/units/parse-unit";
import type { FileUnit } from "@/lib/core/units/level-units";
import { parseNumber, type DecimalMark } from "./parse-number";
import type { HeaderEntry } from "./read-header";

export interface Quantity {
  value: number;
  /** As written; null when the number stands alone. */
  unit: string | null;
}

const SECONDS: Record<string, number> = {
  s: 1,
  sec: 1,
  second: 1,
  seconds: 1,
  ms: 1e-3,
  msec: 1e-3,
  us: 1e-6,
  "\u00b5s": 1e-6,
  "\u03bcs": 1e-6,
  min: 60,
};

const METRES: Record<string, number> = { m: 1, meter: 1, metre: 1, cm: 0.01, mm: 0.001 };

function anyNumber(text: string, decimal: DecimalMark): number | null {
  return parseNumber(text, decimal) ?? parseNumber(text, decimal === "." ? "," : ".");
}

/** The cell beside a number is its unit only if it is one; "AUTO" or the next name is none. */
function isUnit(text: string): boolean {
  return (
    parseFrequencyUnit(text) !== null ||
    parseUnit(text) !== null ||
    text.toLowerCase() in SECONDS ||
    text in METRES
  );
}

/** Number with its unit: in the value ("120 kHz"), in the next cell, or in the name ("RBW (kHz)"). */
export function quantityOf(entry: HeaderEntry, decimal: DecimalMark): Quantity | null {
  const [first = "", second = ""] = entry.values;
  const parts = /^([+\-\u2212]?[\d.,]+(?:[eE][+-]?\d+)?)\s*([^\d\s].*)?$/.exec(first.trim());
  const value = anyNumber(parts?.[1] ?? "", decimal);
  if (value === null || !Number.isFinite(value)) return null;
  const inName = /[[(]\s*([^\])]+)/.exec(entry.name)?.[1] ?? null;
  const beside = isUnit(second.trim()) ? second.trim() : null;
  return { value, unit: parts?.[2]?.trim() ?? inName ?? beside };
}

/** A quantity in Hz; `unitHz` is what stands in for a unit that is not stated. null: unknown. */
export function frequencyHzOf(quantity: Quantity, unitHz: number | null): number | null {
  const factor = quantity.unit === null ? unitHz : parseFrequencyUnit(quantity.unit);
  return factor === null ? null : Number((quantity.value * factor).toPrecision(12));
}

export function secondsOf(quantity: Quantity): number | null {
  const factor = SECONDS[quantity.unit?.toLowerCase() ?? ""];
  return factor === undefined ? null : Number((quantity.value * factor).toPrecision(12));
}

export function metresOf(quantity: Quantity): number | null {
  const factor = METRES[quantity.unit ?? ""];
  return factor === undefined ? null : Number((quantity.value * factor).toPrecision(12));
}

/** Unit named by an entry's value; text after it, as in "dBuV (rms)", is passed over. */
export function unitOf(entry: HeaderEntry): FileUnit | null {
  const first = entry.values.find((value) => value !== "") ?? "";
  return parseUnit(first) ?? parseUnit(first.split(/\s+/)[0] ?? "");
}

export function onOff(text: string): boolean | null {
  const word = text.trim().toLowerCase();
  if (/^(?:on|yes|true|enabled|1|ein)$/.test(word)) return true;
  return /^(?:off|no|false|disabled|0|none|aus)$/.test(word) ? false : null;
}

const MONTHS = ["jan", "feb", "mar", "apr", "may", "jun", "jul", "aug", "sep", "oct", "nov", "dec"];

function isoDate(year: number, month: number, day: number): string | null {
  const date = new Date(Date.UTC(year, month - 1, day));
  if (year < 1970 || date.getUTCMonth() !== month - 1 || date.getUTCDate() !== day) return null;
  return date.toISOString().slice(0, 10);
}

/** Date in a text as yyyy-mm-dd; null when there is none, "open" when day and month may swap. */
export function dateOf(text: string): string | "open" | null {
  const iso = /(\d{4})[-/.](\d{1,2})[-/.](\d{1,2})/.exec(text);
  if (iso) return isoDate(Number(iso[1]), Number(iso[2]), Number(iso[3]));
  const named =
    /(\d{1,2})[.\s-]*([a-z]{3})[a-z]*[\s.,-]*(\d{4})/i.exec(text) ??
    /([a-z]{3})[a-z]*\.?\s+(\d{1,2}),?\s+(\d{4})/i.exec(text);
  if (named) {
    const [, first = "", second = "", year] = named;
    const [day, month] = /\d/.test(first) ? [first, second] : [second, first];
    const index = MONTHS.indexOf(month.toLowerCase());
    return index < 0 ? null : isoDate(Number(year), index + 1, Number(day));
  }
  const dotted = /(\d{1,2})\.(\d{1,2})\.(\d{4})/.exec(text);
  if (dotted) return isoDate(Number(dotted[3]), Number(dotted[2]), Number(dotted[1]));
  const slashed = /(\d{1,2})[/-](\d{1,2})[/-](\d{4})/.exec(text);
  if (!slashed) return null;
  const [a, b, year] = [Number(slashed[1]), Number(slashed[2]), Number(slashed[3])];
  if (a > 12) return isoDate(year, b, a);
  return b > 12 || a === b ? isoDate(year, a, b) : "open";
}
