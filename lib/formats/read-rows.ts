import { isGap, parseNumber, type DecimalMark } from "./parse-number";
import { LARGEST_VALUE, parseSimpleNumber, type NumberCursor } from "./parse-simple-number";
import { quote, Refusal } from "./refusal";
import { splitRow, trimCells, WHITESPACE } from "./split-row";
import { isComment, lineEnd, nextLine } from "./text-lines";

export interface TableShape {
  delimiter: string;
  decimal: DecimalMark;
  /** Per column: a number, a text that is skipped, or a unit that must stay the same. */
  columns: ({ kind: "number" } | { kind: "text" } | { kind: "unit"; text: string })[];
  /** -1: none, the rows stand at equal steps. */
  frequencyColumn: number;
}

export interface TableRows {
  /** Values of the number columns as printed; null for the others. NaN is a gap. */
  values: (Float64Array | null)[];
  rows: number;
  firstLine: number;
  lastLine: number;
  /** Where the text goes on after the table. */
  endPosition: number;
  /** Rows after which the line number is ahead of the row: [row, line]. */
  jumps: [number, number][];
  /** What is wrong inside the table; it counts only if the table is the one that is read. */
  problem: Refusal | null;
}

/** Line number of a row. */
export function lineOfRow(table: Pick<TableRows, "firstLine" | "jumps">, row: number): number {
  const jump = table.jumps.findLast(([from]) => from <= row);
  return jump === undefined ? table.firstLine + row : jump[1] + (row - jump[0]);
}

/** Cells of a line that has the table's shape; null when it has another. */
export function shapedCells(line: string, shape: TableShape): string[] | null {
  const cells = splitRow(line, shape.delimiter);
  const count = shape.columns.length;
  const filled = trimCells(cells).length;
  return filled <= count && cells.length >= count && filled > 0 ? cells.slice(0, count) : null;
}

/** What is wrong with the cells of a row; null when nothing is. */
export function cellProblem(cells: string[], shape: TableShape, line: number): Refusal | null {
  for (const [i, column] of shape.columns.entries()) {
    const cell = cells[i] ?? "";
    if (column.kind === "unit" && cell !== column.text)
      return new Refusal(
        `Line ${line}: the unit changes from ${quote(column.text)} to ${quote(cell)} within the table. Export the trace in one unit.`,
        line,
      );
    if (column.kind !== "number") continue;
    const value = parseNumber(cell, shape.decimal);
    const isFrequency = i === shape.frequencyColumn;
    const what = isFrequency ? "frequency" : "level";
    if (value !== null && Math.abs(value) <= LARGEST_VALUE) continue;
    if (value === null && isGap(cell) && !isFrequency) continue;
    const reads = cell === "" ? "is empty" : `reads ${quote(cell)}`;
    return new Refusal(
      `Line ${line}, column ${i + 1}: the ${what} ${reads}, which is no ${value === null ? "number" : `${what} that can be meant`}. Correct it in the file or export it again.`,
      line,
    );
  }
  return null;
}

function cellValues(cells: string[], shape: TableShape): number[] {
  return shape.columns.map((column, i) =>
    column.kind === "number" ? (parseNumber(cells[i] ?? "", shape.decimal) ?? NaN) : NaN,
  );
}

/** Reads one row of plain numbers without making strings; false leaves it to the careful way. */
function readPlainRow(cursor: NumberCursor, shape: TableShape, row: Float64Array): boolean {
  const { text } = cursor;
  const spaced = shape.delimiter === WHITESPACE;
  const delimiter = spaced ? 32 : shape.delimiter.charCodeAt(0);
  const mark = shape.decimal.charCodeAt(0);
  const last = shape.columns.length - 1;
  for (let i = 0; i <= last; i += 1) {
    const column = shape.columns[i];
    let code = text.charCodeAt(cursor.at);
    while (code === 32 || (spaced && code === 9)) code = text.charCodeAt((cursor.at += 1));
    if (column?.kind === "number") {
      if (!parseSimpleNumber(cursor, mark)) return false;
      row[i] = cursor.value;
    } else {
      const from = cursor.at;
      while (code === code && code !== delimiter && code !== 10 && code !== 13) {
        if (code === 34 || (spaced && code === 9)) return false;
        code = text.charCodeAt((cursor.at += 1));
      }
      if (column?.kind === "unit" && text.slice(from, cursor.at).trim() !== column.text)
        return false;
    }
    code = text.charCodeAt(cursor.at);
    while (code === 32 || (spaced && code === 9)) code = text.charCodeAt((cursor.at += 1));
    if (i < last && !spaced) {
      if (code !== delimiter) return false;
      cursor.at += 1;
    } else if (i === last && !spaced) {
      while (code === delimiter || code === 32) code = text.charCodeAt((cursor.at += 1));
    }
  }
  const code = text.charCodeAt(cursor.at);
  return code === 10 || code === 13 || code !== code;
}

/** Whether a row goes on where the table stopped: same direction of frequency. */
function goesOn(table: TableRows, frequencyHz: number, frequencyColumn: number): boolean {
  const column = table.values[frequencyColumn];
  if (!column) return true;
  const last = column[table.rows - 1] ?? NaN;
  const isDescending = table.rows > 1 && last < (column[table.rows - 2] ?? NaN);
  return isDescending ? frequencyHz <= last : frequencyHz >= last;
}

/** The next line that is neither blank nor a comment, as a row of the table's shape. */
function nextRow(text: string, from: number, shape: TableShape): number[] | null {
  for (let at = from, tries = 0; at < text.length && tries < 20; tries += 1) {
    const end = lineEnd(text, at);
    const line = text.slice(at, end);
    at = nextLine(text, end);
    if (line.trim() === "" || isComment(line)) continue;
    const cells = shapedCells(line, shape);
    return cells !== null && cellProblem(cells, shape, 0) === null
      ? cellValues(cells, shape)
      : null;
  }
  return null;
}

/** Reads the table that starts at `from`, which is line `line`, until something else follows. */
export function readRows(text: string, from: number, line: number, shape: TableShape): TableRows {
  // Small tables are many in some files, so room grows with the rows.
  let room = 1024;
  const table: TableRows = {
    values: shape.columns.map((column) =>
      column.kind === "number" ? new Float64Array(room) : null,
    ),
    rows: 0,
    firstLine: line,
    lastLine: line,
    endPosition: from,
    jumps: [],
    problem: null,
  };
  const cursor: NumberCursor = { text, at: from, value: NaN };
  const row = new Float64Array(shape.columns.length);
  let position = from;
  let current = line;
  while (position < text.length) {
    cursor.at = position;
    let end: number;
    if (readPlainRow(cursor, shape, row)) end = cursor.at;
    else {
      end = lineEnd(text, position);
      const content = text.slice(position, end);
      const following = nextLine(text, end);
      const isPause = content.trim() === "" || isComment(content);
      const cells = isPause ? null : shapedCells(content, shape);
      const problem = cells === null ? null : cellProblem(cells, shape, current);
      if (cells !== null && problem === null) row.set(cellValues(cells, shape));
      else {
        const next = nextRow(text, following, shape);
        const isInside =
          next !== null &&
          // Without frequencies nothing tells a row of another shape from the next table's title.
          (isPause || cells !== null || shape.frequencyColumn >= 0) &&
          goesOn(table, next[shape.frequencyColumn] ?? NaN, shape.frequencyColumn);
        if (!isPause)
          table.problem ??= rowProblem(content, cells, problem, isInside, shape, current, table);
        // A bad row inside is passed over, so that the table keeps its length and can be refused.
        if (!isInside) break;
        position = following;
        current += 1;
        table.jumps.push([table.rows, current]);
        continue;
      }
    }
    if (table.rows === room) {
      room *= 2;
      table.values = table.values.map((values) => values && grow(values, room));
    }
    for (let i = 0; i < row.length; i += 1) {
      const values = table.values[i];
      if (values) values[table.rows] = row[i] ?? NaN;
    }
    table.rows += 1;
    table.lastLine = current;
    position = nextLine(text, end);
    table.endPosition = Math.min(position, text.length);
    current += 1;
  }
  table.values = table.values.map((values) => values && values.subarray(0, table.rows));
  return table;
}

function grow(values: Float64Array, room: number): Float64Array {
  const larger = new Float64Array(room);
  larger.set(values);
  return larger;
}

/** A line that breaks the table: trouble when rows go on after it, or when it is nearly a row. */
function rowProblem(
  content: string,
  cells: string[] | null,
  problem: Refusal | null,
  isInside: boolean,
  shape: TableShape,
  line: number,
  table: TableRows,
): Refusal | null {
  const frequency = parseNumber(cells?.[shape.frequencyColumn] ?? "", shape.decimal);
  const isNearlyRow =
    frequency !== null && goesOn(table, frequency, shape.frequencyColumn) && table.rows > 0;
  if (problem !== null && (isInside || isNearlyRow)) return problem;
  if (!isInside || cells !== null) return null;
  return new Refusal(
    `Line ${line} stands inside the table but is no row of ${shape.columns.length} columns: ${quote(content)}. Correct it in the file or export it again.`,
    line,
  );
}
