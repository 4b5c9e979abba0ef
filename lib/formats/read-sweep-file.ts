import type { FrequencyAxis, Trace } from "@/lib/core/sweep/trace";
import { parseUnit } from "@/lib/core/units/parse-unit";
import { chooseTables, type ChosenTable } from "./choose-tables";
import { decodeText } from "./decode-text";
import { findTables } from "./find-tables";
import { looksLikeSpots } from "./frequency-axis";
import { describeTrace } from "./describe-trace";
import { headerValue } from "./state-of-trace";
import { readHeader, type HeaderFacts } from "./read-header";
import { readSettings } from "./read-settings";
import { readTableAxis } from "./read-table-axis";
import { readTableTraces, type OpenTrace } from "./read-table-traces";
import { quote, Refusal } from "./refusal";
import type { SweepFileAnswers, SweepFilePreview, SweepFileQuestion } from "./sweep-file";

export interface SweepFileReading {
  preview: SweepFilePreview;
  /** Whole only when the preview's outcome is "ready". */
  traces: Trace[];
}

function emptyPreview(): SweepFilePreview {
  return {
    outcome: "refused",
    reason: null,
    line: null,
    questions: [],
    encoding: "unknown",
    delimiter: ",",
    decimal: ".",
    traces: [],
    leftOut: [],
    rbwHz: null,
    vbwHz: null,
    settings: {},
    warnings: [],
  };
}

/** Facts of a table's own lines stand before those of the tables above it. */
function mergeFacts(above: HeaderFacts, own: HeaderFacts): HeaderFacts {
  return new Map([...above, ...own]);
}

/** Questions about a trace become one about the file when every trace raises the same. */
function joinQuestions(questions: SweepFileQuestion[], traceCount: number): SweepFileQuestion[] {
  const units = questions.filter((question) => question.field === "unit");
  const first = units[0];
  const isSame =
    traceCount > 1 &&
    units.length === traceCount &&
    units.every(({ guess }) => guess === first?.guess);
  if (!first || !isSame) return questions;
  return [
    { ...first, traceIndex: null },
    ...questions.filter((question) => question.field !== "unit"),
  ];
}

/** Reads header, axis and traces of every chosen table into the preview. */
function readTables(
  chosen: ChosenTable[],
  preview: SweepFilePreview,
  answers: SweepFileAnswers,
): Trace[] {
  const open: OpenTrace[] = [];
  let facts: HeaderFacts = new Map();
  let axis: FrequencyAxis | null = null;
  let referenceUnit: string | null = null;
  for (const [place, { table, header, footer }] of chosen.entries()) {
    const own = readHeader(header, table.shape.delimiter);
    facts = mergeFacts(readHeader(footer, table.shape.delimiter), mergeFacts(facts, own));
    const tableAxis = readTableAxis(table, facts, answers);
    axis ??= tableAxis.axis;
    if (place === 0) preview.questions.push(...tableAxis.questions);
    preview.warnings.push(...tableAxis.warnings);
    const read = readSettings({
      facts,
      decimal: table.shape.decimal,
      headerUnitHz: tableAxis.headerUnitHz,
    });
    if (place === 0) {
      preview.settings = read.settings;
      referenceUnit = read.referenceUnit;
      preview.warnings.push(...read.warnings);
    } else if ((read.settings.rbwHz ?? null) !== (preview.settings.rbwHz ?? null)) {
      preview.warnings.push(
        `The tables of this file state different resolution bandwidths; RBW was left open.`,
      );
      delete preview.settings.rbwHz;
    }
    const declared = Number(headerValue(facts, "points", 0, 1) ?? NaN);
    if (declared > 0 && declared !== table.rows.rows)
      preview.warnings.push(
        `The header declares ${declared} points, the table has ${table.rows.rows}.`,
      );
    const traces = readTableTraces({
      table,
      header,
      facts,
      answers,
      axis: tableAxis,
      referenceUnit: read.referenceUnit,
      columnOffset: place * table.columns.length,
    });
    open.push(...traces.open);
    preview.leftOut.push(...traces.leftOut);
    preview.warnings.push(...traces.warnings);
  }
  if (open.length === 0)
    throw new Refusal(
      preview.leftOut.length > 0
        ? `No trace is left: ${preview.leftOut.map(({ name, why }) => `${quote(name)} was left out because ${why}`).join("; ")}. Switch a trace on and export it again.`
        : "The table has no column of levels. Export the trace with its levels.",
    );
  checkReference(preview, open, referenceUnit);
  const isSpots = axis !== null && looksLikeSpots(axis);
  if (isSpots && answers.kind === undefined)
    preview.questions.push({
      field: "kind",
      traceIndex: null,
      guess: "spots",
      why: "The frequencies are few and follow no step, as single-frequency readings do.",
    });
  const kind = answers.kind ?? "scan";
  const unstatedHold = open.filter(({ isHoldStated }) => !isHoldStated);
  if (unstatedHold.length > 0)
    preview.warnings.push(
      `The file does not say whether ${unstatedHold.map(({ trace }) => quote(trace.name)).join(", ")} was held; it is read as not held.`,
    );
  return open.map((entry, index) => {
    const trace: Trace = { ...entry.trace, kind };
    preview.traces.push(describeTrace(trace, index, entry.column, entry.isUnitOpen));
    preview.questions.push(
      ...entry.questions.map((question) => ({ ...question, traceIndex: index })),
    );
    return trace;
  });
}

/** A reference level counts in the unit of the traces; in another it would mislead. */
function checkReference(preview: SweepFilePreview, open: OpenTrace[], unit: string | null): void {
  const level = preview.settings.referenceLevelDb;
  const first = open[0];
  const traceUnit = first && !first.isUnitOpen ? first.trace.unit : undefined;
  if (level === undefined || level === null || unit === null || traceUnit === undefined) return;
  if (parseUnit(unit) !== traceUnit) {
    preview.warnings.push(
      `The reference level ${level} ${unit} is not in the unit of the trace and was left open.`,
    );
    delete preview.settings.referenceLevelDb;
  }
}

/** Reads a file once for preview and import alike, so that the two cannot differ. Never throws. */
export function readSweepFile(bytes: Uint8Array, answers: SweepFileAnswers): SweepFileReading {
  const preview = emptyPreview();
  try {
    const decoded = decodeText(bytes);
    preview.encoding = decoded.encoding;
    preview.warnings.push(...decoded.warnings);
    const { chosen, warnings } = chooseTables(findTables(decoded.text, answers.decimal));
    preview.warnings.push(...warnings);
    const shape = chosen[0]?.table.shape;
    if (shape) {
      preview.delimiter = shape.delimiter;
      preview.decimal = shape.decimal;
    }
    if (chosen.some(({ table }) => table.isDecimalOpen))
      preview.questions.push({
        field: "decimal",
        traceIndex: null,
        guess: preview.decimal,
        why: "The marks in the numbers could be decimal marks or group thousands.",
      });
    const traces = readTables(chosen, preview, answers);
    preview.questions = joinQuestions(preview.questions, traces.length);
    preview.rbwHz = preview.settings.rbwHz ?? null;
    preview.vbwHz = preview.settings.vbwHz ?? null;
    preview.outcome = preview.questions.length > 0 ? "ask" : "ready";
    return { preview, traces };
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
    return {
      preview: { ...preview, outcome: "refused", reason: error.reason, line: error.line },
      traces: [],
    };
  }
}
