import { parseFrequencyUnit } from "@/lib/core/units/parse-unit";
import type { FileUnit } from "@/lib/core/units/level-units";
import { frequencyUnitIn, levelUnitIn } from "./unit-words";

/** Columns of the segment table, by the words that a header may use for them. */
const WORDS = {
  line: /^(?:line|limit line|name)$/,
  detector: /^detector$/,
  rbw: /^(?:rbw|resolution bandwidth|bandwidth)$/,
  rbwKind: /^(?:rbw kind|bandwidth kind|kind)$/,
  start: /^(?:start|from|start frequency|frequency start|f start)$/,
  stop: /^(?:stop|end|to|stop frequency|end frequency|frequency stop|f stop)$/,
  levelStart: /^(?:level start|start level|level|limit|limit start|limit at start)$/,
  levelStop: /^(?:level stop|stop level|level end|end level|limit stop|limit end|limit at end)$/,
  interpolation: /^(?:interpolation|between)$/,
} as const;

export type MaskColumn = keyof typeof WORDS;

export interface MaskColumns {
  /** Place of each column that the header names. */
  at: Partial<Record<MaskColumn, number>>;
  /** Hz per unit of a frequency column, null when its head names none. */
  unitHz: Partial<Record<MaskColumn, number | null>>;
  /** Units of level that the heads name, each once. */
  levelUnits: FileUnit[];
  /** Heads that are no column of a mask, as they are written. */
  unknown: string[];
  /** Columns that two heads name. */
  doubled: MaskColumn[];
}

const isColumn = (word: string): word is MaskColumn => word in WORDS;

function columnOf(head: string): MaskColumn | null {
  const word = head
    .replace(/[[(].*$/, "")
    .replace(/[_\s]+/g, " ")
    .trim()
    .toLowerCase();
  const found = Object.entries(WORDS).find(([, words]) => words.test(word))?.[0];
  return found !== undefined && isColumn(found) ? found : null;
}

/** Whether a row is the head of the segment table: it names both ends of the bands. */
export function isMaskHead(cells: readonly string[]): boolean {
  const columns = cells.map(columnOf);
  return columns.includes("start") && columns.includes("stop");
}

/** The columns that a head names, with the units in their brackets. */
export function readMaskHead(cells: readonly string[]): MaskColumns {
  const read: MaskColumns = { at: {}, unitHz: {}, levelUnits: [], unknown: [], doubled: [] };
  cells.forEach((head, place) => {
    if (head.trim() === "") return;
    const column = columnOf(head);
    if (column === null) return void read.unknown.push(head);
    if (read.at[column] !== undefined) return void read.doubled.push(column);
    read.at[column] = place;
    const bracketed = /[[(]\s*([^\])]+?)\s*[\])]/.exec(head)?.[1] ?? "";
    if (column === "start" || column === "stop" || column === "rbw")
      read.unitHz[column] = parseFrequencyUnit(bracketed) ?? frequencyUnitIn(head);
    const level = column === "levelStart" || column === "levelStop" ? levelUnitIn(head) : null;
    if (level !== null && !read.levelUnits.includes(level)) read.levelUnits.push(level);
  });
  return read;
}
