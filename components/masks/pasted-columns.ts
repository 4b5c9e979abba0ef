import type { Detector } from "@/lib/core/sweep/settings";
import type { LevelUnit } from "@/lib/core/units/level-units";
import { isRange, limitUnitOf } from "./pasted-cells";

/** One detector's limit: its column, and where it slopes the column of the limit at the end. */
export interface LevelColumns {
  detector: Detector | null;
  start: number;
  stop: number | null;
}

export interface PastedColumns {
  /** One column of "30 - 230", or two. */
  range: number | null;
  start: number | null;
  stop: number | null;
  /** Unit of frequency of each of these columns; null when its head names none. */
  unitOf: (column: number) => string | null;
  levels: LevelColumns[];
  levelUnits: LevelUnit[];
  detector: number | null;
  rbw: number | null;
  line: number | null;
  interpolation: number | null;
  /** Heads of columns that are not read. */
  unused: string[];
}

const FREQUENCY = /\b(GHz|MHz|kHz|Hz)\b/i;
const AT_END = /\b(stop|end|upper edge)\b/i;

/** The detector that a head or a cell names, "QP" or "Quasi-peak limit". */
export function detectorIn(text: string): Detector | null {
  if (/\bquasi|\bqp\b/i.test(text)) return "quasi-peak";
  if (/\brms\b|rms-?av/i.test(text)) return "rms-average";
  if (/\bav(?:g|erage)?\b|\bmean\b/i.test(text)) return "average";
  if (/\bnegative[ -]peak\b/i.test(text)) return "negative-peak";
  if (/\bpeak\b|\bpk\b/i.test(text)) return "peak";
  return /\bsample\b/i.test(text) ? "sample" : null;
}

/** Columns without a head: the ends of the band, the limit, its end, how it runs between. */
function plainColumns(first: readonly string[]): PastedColumns {
  const isOne = isRange(first[0] ?? "");
  const next = isOne ? 1 : 2;
  const has = (column: number) => (column < first.length ? column : null);
  return {
    range: isOne ? 0 : null,
    start: isOne ? null : 0,
    stop: isOne ? null : 1,
    unitOf: () => null,
    levels: [{ detector: null, start: next, stop: has(next + 1) }],
    levelUnits: [],
    detector: null,
    rbw: null,
    line: null,
    interpolation: has(next + 2),
    unused: [],
  };
}

/** What each column holds, by its head and, where the head is open, by the first row of numbers. */
export function readPastedColumns(
  heads: readonly string[],
  first: readonly string[],
): PastedColumns {
  if (heads.every((head) => head.trim() === "")) return plainColumns(first);
  const units = heads.map((head) => FREQUENCY.exec(head)?.[1] ?? null);
  const read: PastedColumns = {
    ...plainColumns([]),
    range: null,
    start: null,
    stop: null,
    levels: [],
    unitOf: (column) => units[column] ?? null,
  };
  const ends: { detector: Detector | null; column: number }[] = [];
  heads.forEach((head, column) => {
    const word = head.replace(/[[(][^\])]*[\])]/g, " ").trim();
    const levelUnit =
      limitUnitOf(/[[(]\s*([^\])]+?)\s*[\])]/.exec(head)?.[1] ?? "") ??
      limitUnitOf(/\bdB\S+/i.exec(head)?.[0] ?? "");
    if (head.trim() === "") return;
    if (/\brbw\b|bandwidth/i.test(word)) read.rbw ??= column;
    else if (/^detectors?$/i.test(word)) read.detector ??= column;
    else if (/interpolation|^between$/i.test(word)) read.interpolation ??= column;
    else if (/\blevel|\blimit(?! line)/i.test(word) || levelUnit || detectorIn(word)) {
      if (levelUnit && !read.levelUnits.includes(levelUnit)) read.levelUnits.push(levelUnit);
      const detector = detectorIn(word);
      if (AT_END.test(word)) ends.push({ detector, column });
      else read.levels.push({ detector, start: column, stop: null });
    } else if (isRange(first[column] ?? "")) read.range ??= column;
    else if (/^(start|from|f ?min|lower)\b/i.test(word)) read.start ??= column;
    else if (/^(stop|to|end|f ?max|upper)\b/i.test(word)) read.stop ??= column;
    else if (/freq|range|\bband\b|^f$/i.test(word) && /^[\d.,]/.test(first[column] ?? "")) {
      // One head over both ends, as a spreadsheet writes merged cells.
      if (read.start === null) read.start = column;
      else read.stop ??= column;
      if ((heads[column + 1] ?? "x").trim() === "" && read.stop === null) {
        read.stop = column + 1;
        units[column + 1] ??= units[column] ?? null;
      }
    } else if (/^(line|limit line|name)$/i.test(word)) read.line ??= column;
    else read.unused.push(head.trim());
  });
  for (const { detector, column } of ends) {
    const of = read.levels.find((level) => level.detector === detector && level.stop === null);
    if (of) of.stop = column;
    else read.unused.push(heads[column] ?? "");
  }
  return read;
}
