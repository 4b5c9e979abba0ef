/** One cell: quoted text is kept as it stands, other text is trimmed. */
export interface DelimitedRow {
  /** Line of the text that the row starts on, from 1. */
  line: number;
  cells: string[];
}

/**
 * Rows of a delimited text after RFC 4180: cells may be quoted, and a quoted one may hold the
 * delimiter, doubled quotes and line ends. Blank lines are left out; a byte order mark is skipped.
 */
export function delimitedRows(text: string, delimiter: string): DelimitedRow[] {
  const rows: DelimitedRow[] = [];
  let at = text.startsWith("\uFEFF") ? 1 : 0;
  let line = 1;
  while (at < text.length) {
    const row: DelimitedRow = { line, cells: [] };
    let isQuotedAnywhere = false;
    for (let isOpen = true; isOpen;) {
      let cell = "";
      while (text.charAt(at) === " ") at += 1;
      const isQuoted = text.charAt(at) === '"';
      if (isQuoted) {
        isQuotedAnywhere = true;
        at += 1;
        for (; at < text.length; at += 1) {
          const char = text.charAt(at);
          if (char === '"') {
            if (text.charAt(at + 1) !== '"') break;
            at += 1;
          } else if (char === "\n" || (char === "\r" && text.charAt(at + 1) !== "\n")) line += 1;
          cell += char;
        }
        at += 1;
      }
      let rest = "";
      for (; at < text.length; at += 1) {
        const char = text.charAt(at);
        if (char === delimiter || char === "\n" || char === "\r") break;
        rest += char;
      }
      row.cells.push(isQuoted ? cell + rest.trimEnd() : rest.trim());
      if (text.charAt(at) === delimiter && at < text.length) at += 1;
      else isOpen = false;
    }
    if (text.charAt(at) === "\r" && text.charAt(at + 1) === "\n") at += 1;
    at += 1;
    line += 1;
    if (isQuotedAnywhere || row.cells.some((cell) => cell !== "")) rows.push(row);
  }
  return rows;
}
