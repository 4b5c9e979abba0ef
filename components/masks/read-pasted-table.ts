import { delimitedRows } from "@/lib/core/mask/delimited-rows";
import { INTERPOLATIONS } from "@/lib/core/mask/mask";
import { DETECTOR_LABELS, type Detector } from "@/lib/core/sweep/settings";
import type { LevelUnit } from "@/lib/core/units/level-units";
import type { SegmentDraft } from "./mask-draft";
import { isRange, pastedFrequency, pastedLevel, splitRange } from "./pasted-cells";
import { detectorIn, readPastedColumns } from "./pasted-columns";

export interface PastedLine {
  /** null when the table names none. */
  detector: Detector | null;
  rbw: string;
  name: string;
  rows: Omit<SegmentDraft, "id">[];
}

export type PastedTable =
  | { ok: true; lines: PastedLine[]; unit: LevelUnit | null; unused: string[] }
  | { ok: false; problems: string[] };

interface Row {
  line: number;
  cells: string[];
}

const isNumberLike = (cell: string) => /^[+\u2212-]?[\d.,]/.test(cell) || isRange(cell);

/** A row of a band: two cells or more that start with a number, or a range beside another cell. */
const isBand = ({ cells }: Row) =>
  cells.filter(isNumberLike).length >= 2 || cells.some((cell) => cells.length > 1 && isRange(cell));

function splitRows(text: string): Row[] {
  if (text.includes("\t")) return delimitedRows(text, "\t");
  if (text.includes(";")) return delimitedRows(text, ";");
  // Words of a plain text: "0,15 0,5 66" has no delimiter but its spaces.
  const spaced = text.split(/\r\n|\r|\n/).flatMap((content, i): Row[] => {
    const cells = content.trim().split(/\s+/);
    return content.trim() === "" ? [] : [{ line: i + 1, cells }];
  });
  const isSpaced = spaced.some(
    ({ cells }) => cells.length >= 3 && cells.every((cell) => /^[+\u2212-]?[\d.,]*\d$/.test(cell)),
  );
  return isSpaced ? spaced : delimitedRows(text, ",");
}

/** Heads over several rows are read together, column by column; a lone title is no head. */
function joinHeads(rows: Row[]): string[] {
  const heads: string[] = [];
  for (const { cells } of rows.filter(({ cells: all }) => all.filter(Boolean).length > 1))
    cells.forEach((cell, column) => {
      heads[column] = `${heads[column] ?? ""} ${cell}`.trim();
    });
  return Array.from(heads, (head) => head ?? "");
}

function nameOf(detector: Detector | null): string {
  const label = detector === null ? "" : DETECTOR_LABELS[detector];
  return label.charAt(0).toUpperCase() + label.slice(1);
}

/** Lines of one detector with several bandwidths are told apart by them. */
function withNames(lines: PastedLine[]): PastedLine[] {
  return lines.map((line) => {
    if (line.name !== "") return line;
    const isOne = lines.filter(({ detector }) => detector === line.detector).length === 1;
    const name = nameOf(line.detector);
    return { ...line, name: isOne || line.rbw === "" ? name : `${name}, ${line.rbw}` };
  });
}

/**
 * Bands pasted from a spreadsheet, with gaps and several detectors at once: the ends of the band in
 * two columns or one ("30 - 230"), then a limit, or one column per detector named in the head, or a
 * column that names the detector; a limit that slopes as "66 to 56" or in a column of its own. The
 * head may name units; else frequencies are in `frequencyUnit`. All rows are read or none, and each
 * that is not is named.
 */
export function readPastedTable(text: string, frequencyUnit: string): PastedTable {
  const all = splitRows(text);
  const from = all.findIndex(isBand);
  const first = all[from];
  if (!first)
    return { ok: false, problems: ["No row has the two ends of a band and a limit beside them."] };
  const above = all.slice(0, from);
  const columns = readPastedColumns(joinHeads(above), first.cells);
  const loneUnit = /\b(GHz|MHz|kHz|Hz)\b/i.exec(
    above.map(({ cells }) => cells.join(" ")).join(" "),
  );
  const problems: string[] = [];
  if (columns.range === null && (columns.start === null || columns.stop === null))
    problems.push("The head names no columns for the start and the end of a band.");
  if (columns.levels.length === 0) problems.push("The head names no column with a limit.");
  const units = new Set(columns.levelUnits);
  const lines = new Map<string, PastedLine>();

  for (const { line, cells } of problems.length > 0 ? [] : all.slice(from)) {
    const note = (what: string) => problems.push(`Row ${line}: ${what}`);
    const cell = (column: number | null) => (column === null ? "" : (cells[column] ?? "").trim());
    const ends = columns.range === null ? null : splitRange(cell(columns.range));
    const read = (typed: string, column: number | null) => {
      const named = column === null ? null : columns.unitOf(column);
      const shown = pastedFrequency(typed, named ?? loneUnit?.[1] ?? frequencyUnit);
      if (shown === null) note(`"${typed}" is no frequency.`);
      return shown;
    };
    if (columns.range !== null && ends === null) {
      note(`"${cell(columns.range)}" is no band: write it as 30 - 230.`);
      continue;
    }
    if (columns.unused.length === 0 && cells.length > 5 && columns.levels[0]?.detector === null) {
      if (joinHeads(above).length === 0) {
        note(
          "three to five columns are needed: start, end, limit, limit at the end, interpolation.",
        );
        continue;
      }
    }
    const start = read(ends?.start ?? cell(columns.start), columns.range ?? columns.start);
    const stop = read(ends?.stop ?? cell(columns.stop), columns.range ?? columns.stop);
    const typed = cell(columns.interpolation).toLowerCase() || "log";
    const interpolation = INTERPOLATIONS.find((known) => known === typed);
    if (!interpolation) note(`"${cell(columns.interpolation)}" is neither log nor linear.`);
    const rbwText = cell(columns.rbw);
    const rbwUnit = columns.rbw === null ? null : columns.unitOf(columns.rbw);
    const rbw = rbwText === "" ? "" : pastedFrequency(rbwText, rbwUnit ?? "");
    if (rbw === null) note(`"${rbwText}" is no bandwidth with a unit.`);
    const named = detectorIn(cell(columns.detector));
    if (columns.detector !== null && named === null)
      note(`"${cell(columns.detector)}" is no detector.`);

    for (const column of columns.levels) {
      const level = pastedLevel(cell(column.start));
      const end = pastedLevel(cell(column.stop));
      for (const { why } of [level, end].filter((found) => found.kind === "problem")) note(why);
      if (level.kind === "none" && (columns.levels.length === 1 || end.kind !== "none"))
        note("the limit is missing; leave a band without a limit out.");
      if (level.kind !== "levels" || end.kind === "problem") continue;
      for (const found of [level, end])
        if (found.kind === "levels" && found.unit !== null) units.add(found.unit);
      if (start === null || stop === null || rbw === null || !interpolation) continue;
      const detector = column.detector ?? named;
      const name = cell(columns.line);
      const key = JSON.stringify([name, detector, rbw]);
      const group = lines.get(key) ?? { detector, rbw, name, rows: [] };
      const stopDb = end.kind === "levels" ? end.startDb : level.stopDb;
      group.rows.push({ start, stop, startDb: level.startDb, stopDb, interpolation });
      lines.set(key, group);
    }
  }
  if (units.size > 1) problems.push(`The limits are in ${units.size} units: paste one at a time.`);
  if (problems.length > 0) return { ok: false, problems };
  const [unit = null] = units;
  return { ok: true, lines: withNames([...lines.values()]), unit, unused: columns.unused };
}
