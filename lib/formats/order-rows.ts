import { lineOfRow, type TableRows } from "./read-rows";
import { Refusal } from "./refusal";

export interface RowOrder {
  /** Rows by ascending frequency; null when they stand so already. */
  rows: Uint32Array | null;
  warnings: string[];
}

function sameLevels(table: TableRows, levelColumns: number[], a: number, b: number): boolean {
  return levelColumns.every((column) =>
    Object.is(table.values[column]?.[a], table.values[column]?.[b]),
  );
}

/**
 * Brings rows into ascending order. A table that falls throughout is turned round and exact repeats
 * are dropped, both with a warning; anything else is refused with its line.
 */
export function orderRows(
  table: TableRows,
  frequencyColumn: number,
  levelColumns: number[],
): RowOrder {
  const values = table.values[frequencyColumn] ?? new Float64Array(0);
  const count = values.length;
  let turn = 1;
  while (turn < count && values[turn] === values[turn - 1]) turn += 1;
  const isFalling = turn < count && (values[turn] ?? NaN) < (values[turn - 1] ?? NaN);
  const sign = isFalling ? -1 : 1;
  const repeats: number[] = [];
  for (let i = 0; i < count; i += 1) {
    const value = values[i] ?? NaN;
    if (value < 0)
      throw new Refusal(
        `Line ${lineOfRow(table, i)}: the frequency ${value} is negative. Export the sweep over true frequencies.`,
        lineOfRow(table, i),
      );
    if (i === 0) continue;
    const previous = values[i - 1] ?? NaN;
    const step = sign * (value - previous);
    if (step > 0) continue;
    const line = lineOfRow(table, i);
    if (step < 0)
      throw new Refusal(
        `Line ${line}: the frequency ${value} comes after ${previous}, so the order changes within the table. Export one sweep with frequencies in one direction.`,
        line,
      );
    if (!sameLevels(table, levelColumns, i, i - 1))
      throw new Refusal(
        `Line ${line}: the frequency ${value} is repeated with another level than in line ${lineOfRow(table, i - 1)}. Keep one of the two rows, or export the traces separately.`,
        line,
      );
    repeats.push(i);
  }
  const warnings: string[] = [];
  if (isFalling) warnings.push("The frequencies descend; the rows were turned round.");
  const first = repeats[0];
  if (first !== undefined)
    warnings.push(
      repeats.length === 1
        ? `Line ${lineOfRow(table, first)} repeats the row before it and was dropped.`
        : `${repeats.length} rows repeat the row before them and were dropped, the first in line ${lineOfRow(table, first)}.`,
    );
  if (!isFalling && first === undefined) return { rows: null, warnings };
  const dropped = new Set(repeats);
  const kept = Uint32Array.from(values.keys()).filter((row) => !dropped.has(row));
  return { rows: isFalling ? kept.reverse() : kept, warnings };
}
