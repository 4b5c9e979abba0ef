import { parseFrequencyUnit, parseUnit } from "@/lib/core/units/parse-unit";
import type { FileUnit } from "@/lib/core/units/level-units";
import type { DecimalMark } from "./parse-number";
import { parseNumber } from "./parse-number";

/** A number's digits with its decimal point moved by whole places; exact, since no bit is lost. */
function shifted(digits: string, places: number): string {
  const [mantissa = "", exponent = "0"] = digits.toLowerCase().split("e");
  const power = Number(exponent) + places;
  if (power === 0) return mantissa;
  const [whole = "", decimals = ""] = mantissa.replace(/^[+-]/, "").split(".");
  const sign = mantissa.startsWith("-") ? "-" : "";
  if (Math.abs(power) > 15) return `${mantissa}e${power}`;
  const all = `${"0".repeat(16)}${whole}${decimals}${"0".repeat(16)}`;
  const point = 16 + whole.length + power;
  const before = all.slice(0, point).replace(/^0+(?=\d)/, "");
  const after = all.slice(point).replace(/0+$/, "");
  return `${sign}${before}${after === "" ? "" : `.${after}`}`;
}

/** Hz as a number of a larger unit, 1e6 for MHz, every digit kept. */
export function writeHz(hz: number, unitHz: number): string {
  return shifted(String(hz), -Math.round(Math.log10(unitHz)));
}

/** A cell's number in plain digits with its decimal mark as a point; null when it is none. */
function plainDigits(text: string, decimal: DecimalMark): string | null {
  const typed = text.trim().replaceAll("\u2212", "-");
  if (parseNumber(typed, decimal) === null) return null;
  const ungrouped = typed.replace(decimal === "." ? /[,'\u2019\s]/g : /[.'\u2019\s]/g, "");
  return ungrouped.replace(",", ".");
}

/** "230,5 MHz" as its number and its unit; the unit is empty when the cell has none. */
export function splitCell(cell: string): { number: string; unit: string } {
  const found = /^(.*?[\d.,])\s*([a-z\u00b5\u03bc][a-z\u00b5\u03bc/0-9]*)$/i.exec(cell.trim());
  // "1e6" ends in digits and has no unit; "5e" has none either.
  if (!found || /^e\d*$/i.test(found[2] ?? "")) return { number: cell.trim(), unit: "" };
  return { number: found[1] ?? "", unit: found[2] ?? "" };
}

export type CellRead<T> = { ok: true; value: T } | { ok: false; why: string };

/** Hz of a cell, in its own unit or else in that of its column. */
export function readHzCell(
  cell: string,
  unitHz: number | null,
  decimal: DecimalMark,
): CellRead<number> {
  const { number, unit } = splitCell(cell);
  const factor = unit === "" ? unitHz : parseFrequencyUnit(unit);
  const digits = plainDigits(number, decimal);
  if (digits === null) return { ok: false, why: `"${cell}" is no frequency` };
  if (unit !== "" && factor === null)
    return { ok: false, why: `"${unit}" is no unit of frequency` };
  // Whoever asks for the unit has said so at the column already.
  const places = Math.round(Math.log10(factor ?? 1));
  const [mantissa = "", exponent = "0"] = digits.toLowerCase().split("e");
  return { ok: true, value: Number(`${mantissa}e${Number(exponent) + places}`) };
}

/** Level in dB of a cell; a unit in the cell is handed on to be held against the mask's. */
export function readDbCell(
  cell: string,
  decimal: DecimalMark,
): CellRead<{ db: number; unit: FileUnit | null }> {
  const { number, unit } = splitCell(cell);
  const digits = plainDigits(number, decimal);
  if (digits === null) return { ok: false, why: `"${cell}" is no level` };
  const known = unit === "" ? null : parseUnit(unit);
  if (unit !== "" && known === null) return { ok: false, why: `"${unit}" is no unit of level` };
  return { ok: true, value: { db: Number(digits), unit: known } };
}
