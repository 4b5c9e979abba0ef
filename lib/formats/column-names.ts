import { parseFrequencyUnit, parseUnit } from "@/lib/core/units/parse-unit";
import { headerKeyOf } from "./header-keys";
import { isNumeric, type DecimalMark } from "./parse-number";
import { splitRow, trimCells, WHITESPACE } from "./split-row";
import { withoutComment } from "./text-lines";
import { frequencyUnitIn, levelUnitIn, otherAxisIn } from "./unit-words";

export interface ColumnNames {
  names: (string | null)[];
  units: (string | null)[];
}

interface NamesInput {
  probe: string[][];
  header: string[];
  delimiter: string;
  decimal: DecimalMark;
}

const LOOK_BACK = 30;
const LEVEL_NAME =
  /level|ampl|trace|power|field|volt|current|peak|\bpk\b|\bqp\b|\bavg?\b|average|hold|pegel|niveau|mag|signal|spectrum|reading|measured|max|min|rms|spur|ebene|nivel|livello|^y$|\bdb/i;
const FREQUENCY_WORD =
  /freq|fr\u00e9q|frekv|^f$|^f[\s([_/]|^x$|\u0447\u0430\u0441\u0442\u043e\u0442/i;

/** Ways a line of names may be cut into as many cells as the table has columns. */
function cutNames(line: string, delimiter: string, count: number): string[] | null {
  const cuts = [splitRow(line, delimiter)];
  if (delimiter === WHITESPACE && line.length < 4000) {
    cuts.unshift(line.split(/\s{2,}|\t+/).map((cell) => cell.trim()));
    cuts.push([...line.matchAll(/[^\s[(]\S*(?:\s*[[(][^\])]*[\])])?/g)].map((match) => match[0]));
  }
  for (const other of ["\t", ";", ",", "|"]) cuts.push(splitRow(line, other));
  const fits = cuts.find((cells) => cells.length === count);
  if (fits) return fits;
  // Longer by the empty cell of a trailing delimiter, or shorter by trailing columns without one.
  const near = cuts.find((cells) => trimCells(cells).length === count);
  return near ? trimCells(near) : null;
}

function isUnitText(cell: string): boolean {
  return (
    parseUnit(cell) !== null ||
    parseFrequencyUnit(cell) !== null ||
    /^[[(].{1,12}[\])]$/.test(cell) ||
    otherAxisIn(cell) !== null
  );
}

function isUnitRow(cells: string[]): boolean {
  const filled = cells.filter((cell) => cell !== "" && cell !== "-");
  return filled.length > 0 && filled.every(isUnitText);
}

/** A line names columns when a frequency or a level is among them, and no value is. */
function isNameRow(cells: string[]): boolean {
  const filled = cells.filter((cell) => cell !== "");
  if (filled.length === 0 || filled.some(isNumeric)) return false;
  const levels = cells.slice(1);
  const hasAxis = cells.some(
    (cell) =>
      FREQUENCY_WORD.test(cell.trim()) ||
      frequencyUnitIn(cell) !== null ||
      otherAxisIn(cell) !== null,
  );
  const isKeyAndUnit = filled.length === 2 && parseFrequencyUnit(filled[1] ?? "") !== null;
  if (isKeyAndUnit) return false;
  if (hasAxis) return filled.length > 1;
  return cells[0] === "" && levels.filter((cell) => LEVEL_NAME.test(cell)).length > 0;
}

/** A line "Trace Detector,Peak" is a setting, though it has as many cells as the table. */
function isSetting(cells: string[]): boolean {
  const [key = "", value = ""] = cells;
  return (
    cells.length === 2 &&
    (/start|stop|cent(?:er|re)|span|unit|mode|step|offset/i.test(key) ||
      (!LEVEL_NAME.test(value) && levelUnitIn(value) === null && !LEVEL_NAME.test(key)))
  );
}

/** Searches the lines above a table, the nearest first, for names and a row of units. */
export function findColumnNames({ probe, header, delimiter }: NamesInput): ColumnNames {
  const count = probe[0]?.length ?? 0;
  const found: ColumnNames = { names: [], units: [] };
  const lines = header.slice(-LOOK_BACK).reverse();
  for (const line of lines) {
    const plain = withoutComment(line);
    if (plain === "") continue;
    const cells = cutNames(plain, delimiter, count);
    if (cells === null) continue;
    if (found.units.length === 0 && isUnitRow(cells)) {
      found.units = cells.map((cell) => (cell === "" ? null : cell.replace(/^[[(]|[\])]$/g, "")));
      continue;
    }
    if (isNameRow(cells) && !isSetting(cells)) {
      found.names = cells.map((cell) => (cell === "" ? null : cell.replace(/^DATA\s+/, "")));
      break;
    }
    // Right above a row of units stand the names, whatever language they are in.
    if (found.units.length > 0) {
      // Two cells may as well be a setting and its value.
      if (count > 2 && !cells.some(isNumeric) && headerKeyOf(cells[0] ?? "") === null)
        found.names = cells.map((cell) => (cell === "" ? null : cell));
      break;
    }
  }
  return found;
}
