import { delimitedRows, type DelimitedRow } from "@/lib/core/mask/delimited-rows";
import type { Mask } from "@/lib/core/mask/mask";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import { parseFrequencyUnit } from "@/lib/core/units/parse-unit";
import { detectDecimal } from "./detect-decimal";
import { isMaskHead, readMaskHead, type MaskColumn } from "./mask-csv-columns";
import {
  maskUnitOf,
  readMaskFields,
  type MaskCsvAnswers,
  type MaskCsvProblem,
} from "./mask-csv-fields";
import { splitCell } from "./mask-csv-numbers";
import { readMaskRows } from "./mask-csv-rows";

export type { MaskCsvAnswers, MaskCsvProblem } from "./mask-csv-fields";

export type MaskFromCsv =
  | {
      ok: true;
      /** Not validated yet: `validateMask` says what keeps it from being used. */
      mask: Mask;
      /** Line of the text that a path of the mask ("lines.0.segments.2.stopHz") came from. */
      lineOf: (path: string) => number | null;
    }
  | { ok: false; problems: MaskCsvProblem[] };

/** The rows under the delimiter that gives the table a head; semicolon and tab before the comma. */
function splitText(text: string): DelimitedRow[] {
  const stated = /^\uFEFF?"?sep=(.)"?\s*(?:\r|\n)/i.exec(text)?.[1];
  const tries = stated === undefined ? ["\t", ";", ","] : [stated];
  const read = tries.map((delimiter) => delimitedRows(text, delimiter));
  const fits = read.find((rows) => rows.some(({ cells }) => isMaskHead(cells)));
  const rows = fits ?? read.at(-1) ?? [];
  return rows.filter(({ cells }) => !/^sep=/i.test(cells.join("")));
}

const NEEDED: { column: MaskColumn; head: string }[] = [
  { column: "detector", head: "detector" },
  { column: "levelStart", head: "level start (dBµV/m)" },
];

/**
 * A mask from CSV in the layout of `maskToCsv`, also as a spreadsheet saves it: with semicolons,
 * tabs or decimal commas, fewer columns, units in the cells. Every problem is named with its line;
 * what the file leaves open is asked for, never assumed.
 */
export function maskFromCsv(text: string, answers: MaskCsvAnswers = {}): MaskFromCsv {
  const rows = splitText(text);
  const headAt = rows.findIndex(({ cells }) => isMaskHead(cells));
  const head = rows[headAt];
  if (!head)
    return {
      ok: false,
      problems: [
        {
          line: null,
          field: "text",
          text: "No line is the head of a segment table: it must name the columns start and stop.",
        },
      ],
    };
  const fields = readMaskFields(rows.slice(0, headAt));
  const columns = readMaskHead(head.cells);
  const data = rows.slice(headAt + 1).filter(({ cells }) => cells.some((cell) => cell !== ""));
  const problems = [...fields.problems];
  const atHead = (what: string, field: MaskCsvProblem["field"] = "text") =>
    problems.push({ line: head.line, field, text: what });
  const missing = (field: keyof MaskCsvAnswers, what: string) =>
    problems.push({ line: null, field, text: what });

  for (const name of columns.unknown) atHead(`"${name}" is no column of a mask.`);
  for (const name of columns.doubled) atHead(`two columns are named ${name}.`);
  for (const { column, head: written } of NEEDED)
    if (columns.at[column] === undefined) atHead(`the column "${written}" is missing.`);

  const cellsOf = (column: MaskColumn) => {
    const place = columns.at[column];
    return place === undefined ? [] : data.map(({ cells }) => (cells[place] ?? "").trim());
  };
  const isBare = (cell: string) => cell !== "" && splitCell(cell).unit === "";
  const answered = parseFrequencyUnit(answers.frequencyUnit ?? "");
  const unitHz = {
    start: columns.unitHz.start ?? answered,
    stop: columns.unitHz.stop ?? answered,
    rbw: columns.unitHz.rbw ?? null,
  };
  if (
    ["start" as const, "stop" as const].some((c) => unitHz[c] === null && cellsOf(c).some(isBare))
  )
    missing(
      "frequencyUnit",
      "The frequencies have no unit: name it in the head, as start (MHz), or choose it.",
    );
  if (unitHz.rbw === null && cellsOf("rbw").some(isBare))
    atHead("the bandwidths have no unit: name it in the head, as rbw (kHz).");

  const stated = columns.levelUnits[0];
  const headUnit = stated === undefined ? null : maskUnitOf(stated);
  if (columns.levelUnits.length > 1) atHead("the level columns name two units.");
  else if (stated !== undefined && headUnit === null)
    atHead(`limits are stated in dB, as dBµV/m, not in ${stated}: restate the levels.`);
  else if (headUnit !== null && fields.unit !== null && headUnit !== fields.unit)
    atHead(
      `the levels are in ${LEVEL_UNIT_LABELS[headUnit]}, and line ${fields.lineOf.get("unit")} says ${LEVEL_UNIT_LABELS[fields.unit]}.`,
    );
  const unit = headUnit ?? fields.unit ?? answers.unit ?? null;
  const title = fields.title.trim() === "" ? (answers.title ?? "") : fields.title;
  const port = fields.port ?? answers.port ?? null;
  const provenance = fields.provenance ?? answers.provenance ?? null;
  if (unit === null)
    missing(
      "unit",
      "The levels have no unit: name it in the head, as level (dBµV/m), or choose it.",
    );
  if (title.trim() === "") missing("title", "The mask has no title: give it one.");
  if (port === null)
    missing("port", "The file does not say what the limit is for: choose the port.");
  if (provenance === null)
    missing("provenance", "The file does not say where its numbers come from: choose it.");

  const numeric: MaskColumn[] = ["rbw", "start", "stop", "levelStart", "levelStop"];
  const { decimal, isOpen } = detectDecimal(
    numeric.map((column) => cellsOf(column).map((cell) => splitCell(cell).number)),
  );
  if (isOpen)
    atHead(
      "it cannot be told whether the commas are decimal commas or group thousands: write the numbers with a decimal point.",
    );
  if (data.length === 0) atHead("no segments follow the head.");
  const read = readMaskRows(data, columns.at, { unitHz, decimal, unit });
  problems.push(...read.problems);
  if (problems.length > 0 || unit === null || port === null || provenance === null)
    return { ok: false, problems: problems.sort((a, b) => (a.line ?? 0) - (b.line ?? 0)) };

  const { key, distanceM, document, clause, edition, note } = fields;
  return {
    ok: true,
    mask: {
      format: "neap-mask",
      version: 1,
      key,
      title,
      port,
      unit,
      distanceM,
      document,
      clause,
      edition,
      provenance,
      note,
      lines: read.lines.map(({ line }) => line),
    },
    lineOf: (path) => {
      const [, line, segment] = /^lines\.(\d+)(?:\.segments\.(\d+))?/.exec(path) ?? [];
      if (line === undefined)
        return fields.lineOf.get(path.replace("distanceM", "distance")) ?? null;
      return read.lines[Number(line)]?.textLines[Number(segment ?? 0)] ?? null;
    },
  };
}
