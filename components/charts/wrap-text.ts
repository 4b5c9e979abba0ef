/** A number and its unit, which belong on one row. */
const QUANTITY = /(\d) (?=(?:[kMG]?Hz|d?B\S*|m)(?![a-z]))/g;

/**
 * Breaks a text at spaces into rows of at most `length` characters; a longer word stays whole, and
 * so does a number with its unit.
 */
export function wrapText(text: string, length: number): string[] {
  const rows: string[] = [];
  for (const word of text
    .replace(QUANTITY, "$1\u00a0")
    .split(/[ \n\t]+/)
    .filter(Boolean)) {
    const last = rows.at(-1);
    if (last !== undefined && last.length + 1 + word.length <= length)
      rows[rows.length - 1] = `${last} ${word}`;
    else rows.push(word);
  }
  return rows;
}
