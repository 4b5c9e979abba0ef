import type { FactorPoint } from "@/lib/core/bench/signal-path";
import { parseFrequencyUnit } from "@/lib/core/units/parse-unit";
import { detectDecimal } from "./detect-decimal";
import { isNumeric, parseNumber } from "./parse-number";
import { quote } from "./refusal";
import { splitRow, trimCells, WHITESPACE } from "./split-row";
import { isComment, withoutComment } from "./text-lines";
import { frequencyUnitIn } from "./unit-words";

export interface FactorTableProblem {
  line: number;
  text: string;
}

export type FactorTable =
  { ok: true; factors: FactorPoint[] } | { ok: false; problems: FactorTableProblem[] };

interface Row {
  line: number;
  cells: string[];
}

/** The first delimiter under which most lines have two cells; a tab is what a spreadsheet pastes. */
function chooseDelimiter(lines: string[]): string {
  const data = lines.filter((line) => /^\s*"?[+\-\u2212]?[\d.,]/.test(line));
  const fits = (delimiter: string, isFit: (cells: string[]) => boolean) =>
    2 * data.filter((line) => isFit(trimCells(splitRow(line, delimiter)))).length > data.length;
  const isPair = (cells: string[]) => cells.length === 2;
  const strict = ["\t", ";", ","].find((delimiter) => fits(delimiter, isPair));
  // "30,0 18,2" has two cells under a comma as well, but they are no numbers there.
  const isSpaced = !data.some((line) => /[,;]\s/.test(line));
  if (
    strict === "," &&
    isSpaced &&
    fits(WHITESPACE, (cells) => isPair(cells) && cells.every(isNumeric))
  )
    return WHITESPACE;
  return (
    strict ?? ["\t", ";"].find((delimiter) => fits(delimiter, (c) => c.length > 1)) ?? WHITESPACE
  );
}

/** Hz per unit named anywhere in the lines above the numbers. */
function unitInHeader(header: Row[], delimiter: string): number | null {
  for (const { cells } of header)
    for (const cell of [...cells, ...splitRow(cells.join(" "), delimiter)]) {
      const unitHz = frequencyUnitIn(cell) ?? parseFrequencyUnit(cell.split(/\s+/).at(-1) ?? "");
      if (unitHz !== null) return unitHz;
    }
  return null;
}

/**
 * Reads a transducer's factors, typed, pasted from a spreadsheet or uploaded as CSV: a frequency
 * and a factor in dB per line, with or without a header. The header's unit of frequency counts
 * before `frequencyUnitHz` (Hz per unit). The factors come out ascending in frequency.
 */
export function parseFactorTable(text: string, frequencyUnitHz?: number): FactorTable {
  const problems: FactorTableProblem[] = [];
  const all = text
    .replace(/^\ufeff/, "")
    .split(/\r\n|\r|\n/)
    .map((content, i) => ({ line: i + 1, content }))
    .filter(({ content }) => content.trim() !== "" && !/^"?sep=/i.test(content.trim()));
  const delimiter = chooseDelimiter(all.map(({ content }) => content));
  const rows = all.map(({ line, content }): Row & { isNote: boolean } => {
    const isNote = isComment(content);
    return {
      line,
      isNote,
      cells: trimCells(splitRow(isNote ? withoutComment(content) : content, delimiter)),
    };
  });
  const start = rows.findIndex(({ cells, isNote }) => !isNote && isNumeric(cells[0] ?? ""));
  const header = start < 0 ? rows : rows.slice(0, start);
  const data = start < 0 ? [] : rows.slice(start).filter(({ isNote }) => !isNote);
  const unitHz = unitInHeader(header, delimiter) ?? frequencyUnitHz ?? null;
  if (unitHz === null)
    problems.push({
      line: header.at(-1)?.line ?? 1,
      text: "The table does not say in what unit its frequencies are. Name Hz, kHz, MHz or GHz in a header line, or choose the unit.",
    });
  const { decimal, isOpen } = detectDecimal(
    [0, 1].map((i) => data.map(({ cells }) => cells[i] ?? "")),
  );
  if (isOpen)
    problems.push({
      line: data[0]?.line ?? 1,
      text: "The marks in the numbers could be decimal marks or group thousands. Write them without groups, or with one more or one less decimal.",
    });
  const points: { line: number; printed: string; point: FactorPoint }[] = [];
  for (const { line, cells } of data) {
    const [first = "", second = ""] = cells;
    const [frequency, factorDb] = [parseNumber(first, decimal), parseNumber(second, decimal)];
    if (cells.length !== 2)
      problems.push({
        line,
        text: `Line ${line} has ${cells.length} ${cells.length === 1 ? "value" : "values"}; a frequency and a factor in dB are needed.`,
      });
    else if (frequency === null || !Number.isFinite(frequency) || frequency <= 0)
      problems.push({
        line,
        text: `Line ${line}: the frequency reads ${quote(first)}; a number above zero is needed.`,
      });
    else if (factorDb === null || !Number.isFinite(factorDb))
      problems.push({
        line,
        text: `Line ${line}: the factor reads ${quote(second)}; a number is needed.`,
      });
    else {
      const frequencyHz = Number((frequency * (unitHz ?? 1)).toPrecision(15));
      points.push({ line, printed: first, point: { frequencyHz, factorDb } });
    }
  }
  // Sorting by itself would hide two tables pasted one after the other.
  points.slice(1).forEach((entry, i) => {
    const before = points[i];
    if (before && entry.point.frequencyHz < before.point.frequencyHz)
      problems.push({
        line: entry.line,
        text: `Line ${entry.line}: the frequency ${entry.printed} lies below ${before.printed} in line ${before.line}. Frequencies must rise from row to row: sort the table, or see whether two were pasted together.`,
      });
  });
  points.sort((a, b) => a.point.frequencyHz - b.point.frequencyHz || a.line - b.line);
  points.forEach((entry, i) => {
    const before = points[i - 1];
    if (before?.point.frequencyHz === entry.point.frequencyHz)
      problems.push({
        line: entry.line,
        text: `Line ${entry.line} repeats the frequency ${entry.printed} of line ${before.line}; each may stand once.`,
      });
  });
  if (data.length < 2)
    problems.push({
      line: data[0]?.line ?? 1,
      text: "A factor table needs at least two lines of frequency and factor.",
    });
  problems.sort((a, b) => a.line - b.line);
  return problems.length > 0
    ? { ok: false, problems }
    : { ok: true, factors: points.map(({ point }) => point) };
}
