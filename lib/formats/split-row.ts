/** Delimiter of runs of spaces and tabs. */
export const WHITESPACE = "whitespace";

function splitQuoted(line: string, delimiter: string): string[] {
  const cells: string[] = [];
  let cell = "";
  let isQuoted = false;
  for (let i = 0; i < line.length; i += 1) {
    const char = line.charAt(i);
    if (isQuoted) {
      if (char !== '"') cell += char;
      else if (line.charAt(i + 1) === '"') {
        cell += '"';
        i += 1;
      } else isQuoted = false;
    } else if (char === '"' && cell.trim() === "") {
      isQuoted = true;
      cell = "";
    } else if (delimiter === WHITESPACE ? char === " " || char === "\t" : char === delimiter) {
      if (delimiter !== WHITESPACE || cell !== "") cells.push(cell.trim());
      cell = "";
    } else cell += char;
  }
  if (delimiter !== WHITESPACE || cell !== "") cells.push(cell.trim());
  return cells;
}

/** Cells of one line, trimmed; quotes are honoured. Empty cells stay, but for whitespace. */
export function splitRow(line: string, delimiter: string): string[] {
  if (line.includes('"')) return splitQuoted(line, delimiter);
  if (delimiter === WHITESPACE) return line.split(/[ \t]+/).filter((cell) => cell !== "");
  return line.split(delimiter).map((cell) => cell.trim());
}

/** Without the empty cells that a trailing delimiter leaves. */
export function trimCells(cells: string[]): string[] {
  let end = cells.length;
  while (end > 0 && cells[end - 1] === "") end -= 1;
  return cells.slice(0, end);
}
