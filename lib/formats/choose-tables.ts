import type { FoundTable, HeaderLine, TextParts } from "./find-tables";
import { headerKeyOf } from "./header-keys";
import { expandHops } from "./expand-hops";
import { isNumeric } from "./parse-number";
import { cellProblem, shapedCells } from "./read-rows";
import { quote, Refusal } from "./refusal";

/** Tables shorter than this may be settings that happen to line up; they are read as header too. */
const SETTING_ROWS = 200;

export interface ChosenTable {
  table: FoundTable;
  /** All lines above it that may speak of it. */
  header: HeaderLine[];
  /** Lines after the last table; what they state counts where the header is silent. */
  footer: HeaderLine[];
}

function asLines(table: FoundTable): HeaderLine[] {
  if (table.rows.rows > SETTING_ROWS) return [];
  const joint = table.shape.delimiter.length === 1 ? table.shape.delimiter : " ";
  return table.probe
    .slice(0, table.rows.rows)
    .map((cells, i) => ({ line: table.rows.firstLine + i, text: cells.join(joint) }));
}

function refuseWithoutTable({ footer }: TextParts): never {
  const single = footer.find(({ text }) => {
    const cells = text.split(/[;,\t ]+/).filter((cell) => cell !== "");
    return cells.length >= 2 && cells.every(isNumeric);
  });
  if (single)
    throw new Refusal(
      `Line ${single.line} is the only row of numbers; a trace needs at least two points. Export the whole trace.`,
      single.line,
    );
  const bad = footer.find(({ text }) => /^\s*[+-]?\d[\d.]*\s*(?:[kmg]?hz)?\s*[,;\t]/i.test(text));
  const lines = footer.filter(({ text }) => text.trim() !== "").length;
  throw new Refusal(
    bad
      ? `No table of frequency and level was found; line ${bad.line} begins like one but is none: ${quote(bad.text)}. Correct it or export the trace again.`
      : `No table of frequency and level was found: the file holds ${lines} ${lines === 1 ? "line" : "lines"} of header or text and no data. Export the trace's data, not only its settings.`,
    bad?.line ?? null,
  );
}

/** Settings that stand on the same lines as the data, in columns of their own. */
function linesBeside(table: FoundTable): HeaderLine[] {
  const places = table.columns.flatMap((column, i) => (column.isNumber ? [] : [i]));
  if (places.length < 2) return [];
  return table.probe.flatMap((cells, i) => {
    const [name = "", ...values] = places.map((place) => cells[place] ?? "");
    const text = [name, ...values].join(table.shape.delimiter);
    return headerKeyOf(name) === null ? [] : [{ line: table.rows.firstLine + i, text }];
  });
}

/** A row above the table that would belong to it but for one bad cell must not vanish. */
function checkRowsAbove({ table, header }: ChosenTable): void {
  const { shape, rows } = table;
  if (shape.frequencyColumn < 0) return;
  for (const { line, text } of header.slice(-3).reverse()) {
    const cells = text.trim() === "" ? null : shapedCells(text, shape);
    if (cells === null || line < rows.firstLine - 3) return;
    if (!isNumeric(cells[shape.frequencyColumn] ?? "")) return;
    throw (
      cellProblem(cells, shape, line) ??
      new Refusal(
        `Line ${line} seems to belong to the table below it, but differs from its rows: ${quote(text)}. Correct it or export the trace again.`,
        line,
      )
    );
  }
}

/**
 * "30,50,41,25" may be 30.50 and 41.25. Pairs of whole numbers, the second of constant width, are
 * not told from decimal commas unless the header names every column.
 */
function checkCommas({ table }: ChosenTable): void {
  const { columns, probe, shape, rows } = table;
  if (shape.delimiter !== "," || columns.length < 4 || columns.length % 2 !== 0) return;
  if (columns.some(({ name, unitText }) => name !== null || unitText !== null)) return;
  const isPair = columns.every((_, i) => {
    const cells = probe.map((row) => row[i] ?? "");
    if (i % 2 === 0) return cells.every((cell) => /^[+-]?\d+$/.test(cell));
    return cells.every((cell) => /^\d+$/.test(cell) && cell.length === cells[0]?.length);
  });
  if (isPair)
    throw new Refusal(
      `Line ${rows.firstLine}: the comma seems to be both delimiter and decimal mark. Export with another delimiter or with decimal points, or name every column.`,
      rows.firstLine,
    );
}

/** Same columns of levels, and no other names for them. */
function hasSameColumns(table: FoundTable, main: FoundTable): boolean {
  return (
    table.columns.length === main.columns.length &&
    table.columns.every((column, i) => {
      const other = main.columns[i];
      return (
        column.isNumber === other?.isNumber &&
        (column.notLevels === null) === (other.notLevels === null) &&
        (column.name === null || other.name === null || column.name === other.name)
      );
    })
  );
}

/** The longest table, and those that repeat its layout at a like length: further traces. */
export function chooseTables(parts: TextParts): { chosen: ChosenTable[]; warnings: string[] } {
  const tables = parts.tables.map((table) => expandHops(table) ?? table);
  const main = tables.toSorted((a, b) => b.rows.rows - a.rows.rows)[0];
  if (!main) return refuseWithoutTable(parts);
  const chosen: ChosenTable[] = [];
  const warnings: string[] = [];
  let lines: HeaderLine[] = [];
  for (const table of tables) {
    lines = [...lines, ...table.header];
    const isSibling =
      hasSameColumns(table, main) &&
      table.shape.frequencyColumn === main.shape.frequencyColumn &&
      table.shape.delimiter === main.shape.delimiter &&
      2 * table.rows.rows >= main.rows.rows;
    if (table === main || isSibling) {
      chosen.push({ table, header: [...lines, ...linesBeside(table)], footer: [] });
      lines = [];
    } else {
      if (table.rows.rows >= 5)
        warnings.push(
          `The smaller table in lines ${table.rows.firstLine} to ${table.rows.lastLine} was not read as a trace.`,
        );
      lines = [...lines, ...asLines(table)];
    }
  }
  const last = chosen.at(-1);
  if (last) last.footer = [...lines, ...parts.footer];
  for (const entry of chosen) {
    checkCommas(entry);
    checkRowsAbove(entry);
    if (entry.table.rows.problem) throw entry.table.rows.problem;
  }
  if (main.rows.rows < 2)
    throw new Refusal(
      `Line ${main.rows.firstLine} is the only row of the table; a trace needs at least two points.`,
      main.rows.firstLine,
    );
  return { chosen, warnings };
}
