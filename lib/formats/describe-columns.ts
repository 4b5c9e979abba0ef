import { parseFrequencyUnit, parseUnit } from "@/lib/core/units/parse-unit";
import type { FileUnit } from "@/lib/core/units/level-units";
import { findColumnNames } from "./column-names";
import { parseNumber, type DecimalMark } from "./parse-number";
import { isOtherQuantity } from "./trace-words";
import { frequencyUnitIn, levelUnitIn, otherAxisIn } from "./unit-words";

export interface ColumnInfo {
  isNumber: boolean;
  name: string | null;
  /** Unit that stands in every row of this text column. */
  rowUnit: string | null;
  frequencyUnitHz: number | null;
  levelUnit: FileUnit | null;
  /** Text of the unit row or of the column of units beside it. */
  unitText: string | null;
  /** Why the column holds no levels; null when it may. */
  notLevels: string | null;
}

export interface ColumnInput {
  probe: string[][];
  isNumberColumn: boolean[];
  header: string[];
  delimiter: string;
  decimal: DecimalMark;
}

const FREQUENCY_NAME =
  /freq|fr[e\u00e9]q|frekv|^f$|^f[\s([_/]|\u0447\u0430\u0441\u0442\u043e\u0442/i;

/** A text column of units; a lone "V" may as well be a polarization. */
function isUnitColumn(cells: string[], name: string | null): boolean {
  if (name !== null && !/unit|einheit|^-$/i.test(name) && parseUnit(name) === null) return false;
  return cells.every(
    (cell) =>
      parseFrequencyUnit(cell) !== null ||
      (parseUnit(cell) !== null && (cell.length > 1 || name !== null)),
  );
}

type Order = "rising" | "falling" | "counting" | "other";

/** Counting: whole numbers one apart from 0 or 1, as an index or a point number. */
function orderOf(values: number[]): Order {
  const steps = values.slice(1).map((value, i) => value - (values[i] ?? NaN));
  if (steps.length === 0 || values.some((value) => !(value >= 0))) return "other";
  if (steps.every((step) => step === 1) && (values[0] === 0 || values[0] === 1)) return "counting";
  const rising = steps.filter((step) => step >= 0).length;
  const falling = steps.filter((step) => step <= 0).length;
  const most = 0.8 * steps.length;
  const moves = steps.some((step) => step !== 0);
  if (moves && rising >= most && rising > falling) return "rising";
  return moves && falling >= most ? "falling" : "other";
}

/** A reach of order: every step, not only most. */
function isStrict(values: number[]): boolean {
  const steps = values.slice(1).map((value, i) => value - (values[i] ?? NaN));
  return steps.every((step) => step > 0) || steps.every((step) => step < 0);
}

function chooseFrequency(
  columns: ColumnInfo[],
  values: number[][],
): { column: number; doubt: string | null } {
  const numbers = columns.flatMap((column, i) => (column.isNumber ? [i] : []));
  if (numbers.length < 2) return { column: -1, doubt: null };
  const orders = values.map(orderOf);
  const named = numbers.filter((i) => columns[i]?.frequencyUnitHz !== null);
  const called = numbers.filter((i) => FREQUENCY_NAME.test(columns[i]?.name?.trim() ?? ""));
  const sure = named.find((i) => called.includes(i)) ?? named[0] ?? called[0];
  if (sure !== undefined) return { column: sure, doubt: null };
  const other = numbers.find((i) => otherAxisIn(columns[i]?.name ?? "") !== null);
  if (other !== undefined && orders[other] !== "other") return { column: other, doubt: null };
  const ordered = numbers.filter(
    (i) => (orders[i] === "rising" || orders[i] === "falling") && columns[i]?.levelUnit === null,
  );
  const strict = ordered.filter((i) => isStrict(values[i] ?? []));
  const candidates = strict.length > 0 ? strict : ordered;
  const counting = numbers.find((i) => orders[i] === "counting");
  const first = candidates[0] ?? (numbers.length > 1 ? counting : undefined) ?? -1;
  const doubt =
    candidates.length > 1
      ? `Columns ${candidates.map((i) => i + 1).join(" and ")} both run in one direction; column ${first + 1} is read as the frequency. Name the columns in the file if that is wrong.`
      : null;
  return { column: first, doubt };
}

/** Names, units and the part of every column, from the lines above and from the first rows. */
export function describeColumns(input: ColumnInput): {
  columns: ColumnInfo[];
  frequencyColumn: number;
  frequencyDoubt: string | null;
} {
  const { probe, isNumberColumn, decimal } = input;
  const { names, units } = findColumnNames(input);
  const columns = isNumberColumn.map((isNumber, i): ColumnInfo => {
    const cells = probe.map((row) => row[i] ?? "");
    const name = names[i] ?? null;
    const rowUnit = isNumber || !isUnitColumn(cells, name) ? null : (cells[0] ?? null);
    const unitText = units[i] ?? null;
    return {
      isNumber,
      name,
      rowUnit,
      frequencyUnitHz:
        (unitText === null ? null : parseFrequencyUnit(unitText)) ?? frequencyUnitIn(name ?? ""),
      levelUnit: (unitText === null ? null : parseUnit(unitText)) ?? levelUnitIn(name ?? ""),
      unitText,
      notLevels: null,
    };
  });
  columns.forEach((column, i) => {
    if (column.rowUnit === null) return;
    // A column of units belongs to the number on its left.
    const owner = columns.slice(0, i).findLast((candidate) => candidate.isNumber);
    if (!owner || (owner.unitText !== null && owner.unitText !== column.rowUnit)) return;
    owner.unitText = column.rowUnit;
    owner.frequencyUnitHz = parseFrequencyUnit(column.rowUnit);
    owner.levelUnit = parseUnit(column.rowUnit);
  });
  const values = columns.map((column, i) =>
    column.isNumber ? probe.map((row) => parseNumber(row[i] ?? "", decimal) ?? NaN) : [],
  );
  const { column: frequencyColumn, doubt } = chooseFrequency(columns, values);
  const numbers = columns.filter((column) => column.isNumber).length;
  columns.forEach((column, i) => {
    if (!column.isNumber || i === frequencyColumn || column.levelUnit !== null) return;
    if (column.frequencyUnitHz !== null) column.notLevels = "it holds frequencies";
    else if (orderOf(values[i] ?? []) === "counting" && numbers > 2)
      column.notLevels = "it counts the points";
    else if (isOtherQuantity(column.name ?? "") || otherAxisIn(column.unitText ?? "") !== null)
      column.notLevels = "its name is not that of a level";
    else if (/^(?:deg|degrees?|\u00b0|rad|%|count|counts)$/i.test(column.unitText ?? ""))
      column.notLevels = `its unit is ${column.unitText}`;
  });
  columns.forEach((column, i) => {
    // "Margin (dB)" carries a level's unit and is none all the same.
    if (i !== frequencyColumn && column.isNumber && column.levelUnit !== null)
      if (
        /limit|margin|mask|delta|factor|uncertain|transducer|corr|loss|gain|offset/i.test(
          column.name ?? "",
        )
      )
        column.notLevels = "its name is not that of a level";
  });
  return { columns, frequencyColumn, frequencyDoubt: doubt };
}
