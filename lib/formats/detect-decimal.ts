import type { DecimalMark } from "./parse-number";

export interface DecimalGuess {
  decimal: DecimalMark;
  /** Every mark could as well group thousands ("30,000"): a factor of 1000 hangs on it. */
  isOpen: boolean;
}

/** Decimal mark of columns of numbers, column by column. */
export function detectDecimal(columns: string[][]): DecimalGuess {
  let sureComma = 0;
  let sureDot = 0;
  let openDot = 0;
  const openComma: { cell: string; column: number }[] = [];
  columns.forEach((cells, column) => {
    for (const cell of cells) {
      const commas = cell.split(",").length - 1;
      const dots = cell.split(".").length - 1;
      if (commas > 0 && dots > 0) {
        if (cell.lastIndexOf(",") > cell.lastIndexOf(".")) sureComma += 1;
        else sureDot += 1;
      } else if (commas > 1) sureDot += 1;
      else if (dots > 1) sureComma += 1;
      else if (commas === 1) {
        if (/^[+\u2212-]?[1-9]\d{0,2},\d{3}$/.test(cell)) openComma.push({ cell, column });
        else sureComma += 1;
      } else if (dots === 1) {
        if (/^[+\u2212-]?[1-9]\d{0,2}\.\d{3}$/.test(cell)) openDot += 1;
        else sureDot += 1;
      }
    }
  });
  if (sureComma > sureDot) return { decimal: ",", isOpen: false };
  if (sureDot > 0) return { decimal: ".", isOpen: false };
  if (openComma.length === 0) return { decimal: ".", isOpen: false };
  // A level in dB never reaches thousands, so a comma in two columns is a decimal comma.
  const inSeveral = new Set(openComma.map((entry) => entry.column)).size > 1;
  return { decimal: ",", isOpen: openDot > 0 || !inSeveral };
}
