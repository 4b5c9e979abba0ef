import type { DelimitedRow } from "@/lib/core/mask/delimited-rows";
import { INTERPOLATIONS, type MaskLine } from "@/lib/core/mask/mask";
import {
  BANDWIDTH_KINDS,
  DETECTOR_LABELS,
  DETECTORS,
  type BandwidthKind,
  type Detector,
} from "@/lib/core/sweep/settings";
import { LEVEL_UNIT_LABELS, type LevelUnit } from "@/lib/core/units/level-units";
import type { MaskColumn } from "./mask-csv-columns";
import { unmarked } from "./mask-csv";
import type { MaskCsvProblem } from "./mask-csv-fields";
import { readDbCell, readHzCell } from "./mask-csv-numbers";
import type { DecimalMark } from "./parse-number";

interface RowUnits {
  unitHz: { start: number | null; stop: number | null; rbw: number | null };
  decimal: DecimalMark;
  unit: LevelUnit | null;
}

export interface LineOfRows {
  line: MaskLine;
  /** Line of the text of each segment. */
  textLines: number[];
}

const DETECTOR_WORDS: Record<string, Detector> = {
  pk: "peak",
  qp: "quasi-peak",
  quasipeak: "quasi-peak",
  av: "average",
  avg: "average",
  rms: "rms-average",
};

function detectorOf(cell: string): Detector | null {
  const word = cell.trim().toLowerCase().replace(/\s+/g, "-");
  return DETECTORS.find((known) => known === word) ?? DETECTOR_WORDS[word] ?? null;
}

function kindOf(cell: string): BandwidthKind | null {
  const word = cell.replace(/\s/g, "").toLowerCase();
  return BANDWIDTH_KINDS.find((known) => known.toLowerCase() === word) ?? null;
}

/** The rows of the segment table as lines: rows of one name are one line, in the order they stand. */
export function readMaskRows(
  data: readonly DelimitedRow[],
  at: Partial<Record<MaskColumn, number>>,
  { unitHz, decimal, unit }: RowUnits,
): { lines: LineOfRows[]; problems: MaskCsvProblem[] } {
  const lines = new Map<string, LineOfRows>();
  const problems: MaskCsvProblem[] = [];
  const widest = Math.max(...Object.values(at)) + 1;
  for (const { line: number, cells } of data) {
    const note = (text: string) => problems.push({ line: number, field: "text", text });
    const cell = (column: MaskColumn) => {
      const place = at[column];
      return place === undefined ? "" : (cells[place] ?? "");
    };
    if (cells.slice(widest).some((extra) => extra !== "")) {
      note("there are more cells than columns; a decimal comma needs another delimiter.");
      continue;
    }
    const before = problems.length;
    const hz = (column: "start" | "stop" | "rbw", name: string): number => {
      if (cell(column).trim() === "") note(`the ${name} is missing.`);
      else {
        const read = readHzCell(cell(column), unitHz[column], decimal);
        if (read.ok) return read.value;
        note(`the ${name} cannot be read: ${read.why}.`);
      }
      return Number.NaN;
    };
    const db = (column: "levelStart" | "levelStop", name: string): number => {
      if (cell(column).trim() === "") note(`the ${name} is missing.`);
      else {
        const read = readDbCell(cell(column), decimal);
        if (!read.ok) note(`the ${name} cannot be read: ${read.why}.`);
        else if (read.value.unit !== null && unit !== null && read.value.unit !== unit)
          note(`the ${name} is in ${read.value.unit}, the mask in ${LEVEL_UNIT_LABELS[unit]}.`);
        else return read.value.db;
      }
      return Number.NaN;
    };
    const detector = detectorOf(cell("detector"));
    if (at.detector !== undefined && detector === null) {
      const words = DETECTORS.map((known) => DETECTOR_LABELS[known]).join(", ");
      note(`"${cell("detector")}" is no detector; it is one of ${words}.`);
    }
    const rbwKind = cell("rbwKind").trim() === "" ? null : kindOf(cell("rbwKind"));
    if (rbwKind === null && cell("rbwKind").trim() !== "")
      note(`"${cell("rbwKind")}" is no kind of bandwidth; it is 3dB or 6dB.`);
    const typed = cell("interpolation").trim().toLowerCase();
    const interpolation = INTERPOLATIONS.find((known) => known === (typed || "log"));
    if (interpolation === undefined)
      note(`"${cell("interpolation")}" is no interpolation; it is log or linear.`);
    const rbwHz = cell("rbw").trim() === "" ? null : hz("rbw", "bandwidth");
    const [startHz, stopHz] = [hz("start", "start"), hz("stop", "stop")];
    const startDb = db("levelStart", "level");
    // Without a level at the stop the segment is flat.
    const stopDb = cell("levelStop").trim() === "" ? startDb : db("levelStop", "level at the stop");
    if (problems.length > before || detector === null || interpolation === undefined) continue;

    const named = unmarked(cell("line"));
    const name = named.trim() === "" ? DETECTOR_LABELS[detector] : named;
    const segment = { startHz, stopHz, startDb, stopDb, interpolation };
    const known = lines.get(name);
    if (!known) {
      const line = { name, detector, rbwHz, rbwKind, segments: [segment] };
      lines.set(name, { line, textLines: [number] });
      continue;
    }
    const differs =
      known.line.detector !== detector
        ? "detector"
        : known.line.rbwHz !== rbwHz
          ? "bandwidth"
          : known.line.rbwKind !== rbwKind
            ? "kind of bandwidth"
            : null;
    if (differs !== null)
      note(
        `"${name}" has another ${differs} here than in line ${known.textLines[0]}: give this line its own name.`,
      );
    known.line.segments.push(segment);
    known.textLines.push(number);
  }
  return { lines: [...lines.values()], problems };
}
