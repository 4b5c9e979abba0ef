import { describeColumns, type ColumnInfo } from "./describe-columns";
import { detectDecimal } from "./detect-decimal";
import { isGap, isNumeric, type DecimalMark } from "./parse-number";
import { Refusal } from "./refusal";
import { readRows, type TableRows, type TableShape } from "./read-rows";
import { splitRow, trimCells, WHITESPACE } from "./split-row";
import { isComment, lineEnd, nextLine, withoutComment } from "./text-lines";
import { frequencyUnitIn, levelUnitIn } from "./unit-words";

export interface HeaderLine {
  line: number;
  text: string;
}

export interface FoundTable {
  shape: TableShape;
  rows: TableRows;
  columns: ColumnInfo[];
  /** The first rows as text. */
  probe: string[][];
  /** Lines above it, back to the table before. */
  header: HeaderLine[];
  isDecimalOpen: boolean;
  /** How it was understood where that was not plain; shown as warnings. */
  notes: string[];
}

const DELIMITERS = ["\t", ";", "^", "|", ",", WHITESPACE];
const PROBE_ROWS = 200;
/** A file without a table is not searched for ever. */
const MAX_HEADER_LINES = 20_000;
const MAX_TABLES = 2_000;
/** Text that may stand in a row of data: a label, a unit, a date or a time. */
const ROW_TEXT = /^(?:[\p{L}\u00b5<(["']|\d{1,4}[-/.:]\d|[\d.,]+\s*[\p{L}%\u00b0])/u;

type CellKind = "number" | "text" | "empty" | "odd";

function kindOf(cell: string): CellKind {
  if (cell === "") return "empty";
  if (isNumeric(cell) || isGap(cell)) return "number";
  return ROW_TEXT.test(cell) ? "text" : "odd";
}

function sameShape(first: string[], second: string[]): boolean {
  const [a, b] = [trimCells(first), trimCells(second)];
  if (first.length !== second.length && a.length !== b.length) return false;
  const kinds = Array.from({ length: Math.max(a.length, b.length) }, (_, i) => [
    kindOf(a[i] ?? ""),
    kindOf(b[i] ?? ""),
  ]);
  return kinds.every(
    ([x, y]) => x !== "odd" && y !== "odd" && (x === y || x === "empty" || y === "empty"),
  );
}

/** Rows of one shape that share at least two numbers, or are one number each. */
function areRows(first: string[], second: string[]): boolean {
  if (!sameShape(first, second)) return false;
  const [a, b] = [trimCells(first), trimCells(second)];
  const kinds = Array.from({ length: Math.max(a.length, b.length) });
  const numbers = kinds.filter((_, i) => isNumeric(a[i] ?? "") && isNumeric(b[i] ?? "")).length;
  return numbers >= 2 || (numbers === 1 && kinds.length === 1);
}

/** Lines that may follow a first row before the next good one: blanks, notes, a bad row. */
const LOOK_AHEAD = 4;

/** The next few lines that hold numbers. */
function linesAfter(text: string, from: number): string[] {
  const lines: string[] = [];
  for (let at = from, tries = 0; at < text.length && tries < LOOK_AHEAD; tries += 1) {
    const end = lineEnd(text, at);
    const line = text.slice(at, end);
    if (/\d/.test(line) && !isComment(line)) lines.push(line);
    at = nextLine(text, end);
  }
  return lines;
}

/** Delimiter under which two lines are rows of one table; null when none is. */
function rowDelimiter(line: string, next: string, preferred: string | null): string | null {
  const candidates = preferred === null ? DELIMITERS : [preferred, ...DELIMITERS];
  for (const delimiter of candidates) {
    if (delimiter !== WHITESPACE && !line.includes(delimiter)) continue;
    const [first, second] = [splitRow(line, delimiter), splitRow(next, delimiter)];
    // Under a comma, "50 100" is what two columns with decimal commas leave, no number.
    if (delimiter === "," && first.some((cell) => / /.test(cell) && isNumeric(cell))) continue;
    if (trimCells(first).length >= 2 && areRows(first, second)) return delimiter;
  }
  const lone = [line, next].map((text) => [text.trim().replace(/[,;]$/, "")]);
  return areRows(lone[0] ?? [], lone[1] ?? []) ? (line.includes(";") ? ";" : ",") : null;
}

/** The first rows of a table as cells; comments and blank lines are passed over. */
function probeRows(text: string, from: number, delimiter: string): string[][] {
  const rows: string[][] = [];
  let first: string[] | null = null;
  for (let at = from, tries = 0; at < text.length && tries < PROBE_ROWS; tries += 1) {
    const end = lineEnd(text, at);
    const line = text.slice(at, end);
    at = nextLine(text, end);
    if (line.trim() === "" || isComment(line)) continue;
    const cells = splitRow(line, delimiter);
    if (first === null || sameShape(first, cells)) rows.push(cells);
    else if (rows.length >= 3) break;
    first ??= cells;
  }
  return rows;
}

function columnCells(probe: string[][], column: number): string[] {
  return probe.map((cells) => cells[column] ?? "").filter((cell) => cell !== "");
}

/** Columns that hold something, or that the header names though they are empty. */
function columnCount(raw: string[][], header: HeaderLine[], delimiter: string): number {
  const filled = Math.max(1, ...raw.map((cells) => trimCells(cells).length));
  const width = Math.min(...raw.map((cells) => cells.length));
  const isNamed =
    width > filled &&
    header.some(({ text }) => {
      const cells = trimCells(splitRow(withoutComment(text), delimiter));
      const units = cells.filter((cell) => frequencyUnitIn(cell) ?? levelUnitIn(cell));
      return cells.length === width && units.length >= 2 && !cells.some(isNumeric);
    });
  return isNamed ? width : filled;
}

function readTable(
  text: string,
  from: number,
  header: HeaderLine[],
  line: number,
  delimiter: string,
  decimalAnswer: DecimalMark | undefined,
): FoundTable {
  const raw = probeRows(text, from, delimiter);
  const count = columnCount(raw, header, delimiter);
  const probe = raw.map((cells) => cells.slice(0, count));
  const cellsByColumn = Array.from({ length: count }, (_, i) => columnCells(probe, i));
  const isNumberColumn = cellsByColumn.map((cells) => {
    const numbers = cells.filter(isNumeric).length;
    return numbers > 0
      ? 2 * numbers >= cells.filter((cell) => !isGap(cell)).length
      : cells.every(isGap);
  });
  const guess = detectDecimal(cellsByColumn.filter((_, i) => isNumberColumn[i]));
  const decimal = decimalAnswer ?? guess.decimal;
  const description = describeColumns({
    probe,
    isNumberColumn,
    header: header.map((entry) => entry.text),
    delimiter,
    decimal,
  });
  const shape: TableShape = {
    delimiter,
    decimal,
    columns: description.columns.map((column) => {
      if (column.isNumber) return { kind: "number" };
      return column.rowUnit === null ? { kind: "text" } : { kind: "unit", text: column.rowUnit };
    }),
    frequencyColumn: description.frequencyColumn,
  };
  return {
    shape,
    rows: readRows(text, from, line, shape),
    columns: description.columns,
    probe,
    header,
    isDecimalOpen: guess.isOpen && decimalAnswer === undefined,
    notes: description.frequencyDoubt === null ? [] : [description.frequencyDoubt],
  };
}

export interface TextParts {
  tables: FoundTable[];
  /** Lines after the last table. */
  footer: HeaderLine[];
}

/** Finds every table of numbers by its structure; nothing is known about who wrote the file. */
export function findTables(text: string, decimalAnswer?: DecimalMark): TextParts {
  const tables: FoundTable[] = [];
  let header: HeaderLine[] = [];
  let preferred: string | null = null;
  let position = 0;
  let line = 1;
  while (position < text.length && header.length < MAX_HEADER_LINES) {
    const end = lineEnd(text, position);
    const content = text.slice(position, end);
    const following = nextLine(text, end);
    preferred = /^\s*"?sep=(.)"?\s*$/i.exec(content)?.[1] ?? preferred;
    const mayStart = /\d/.test(content) && !isComment(content);
    const delimiter = (mayStart ? linesAfter(text, following) : []).reduce<string | null>(
      (found, next) => found ?? rowDelimiter(content, next, preferred),
      null,
    );
    if (delimiter !== null) {
      const table = readTable(text, position, header, line, delimiter, decimalAnswer);
      if (table.rows.rows > 0) {
        tables.push(table);
        if (tables.length > MAX_TABLES)
          throw new Refusal(
            `The file falls into more than ${MAX_TABLES} small tables, up to line ${line}. Export one sweep per file.`,
            line,
          );
        header = [];
        position = table.rows.endPosition;
        line = table.rows.lastLine + 1;
        continue;
      }
    }
    header.push({ line, text: content });
    position = following;
    line += 1;
  }
  return { tables, footer: header };
}
