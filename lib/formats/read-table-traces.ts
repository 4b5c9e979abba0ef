import type { Hold } from "@/lib/core/sweep/settings";
import type { Trace } from "@/lib/core/sweep/trace";
import { fromLinear } from "@/lib/core/units/convert-level";
import {
  LINEAR_UNITS,
  type FileUnit,
  type LevelUnit,
  type LinearUnit,
} from "@/lib/core/units/level-units";
import type { FoundTable, HeaderLine } from "./find-tables";
import type { HeaderFacts } from "./read-header";
import type { TableAxis } from "./read-table-axis";
import { findDetector, findHold, findUnit, headerValue } from "./state-of-trace";
import type { LeftOutColumn, SweepFileAnswers, SweepFileQuestion, TraceAnswer } from "./sweep-file";
import { quote } from "./refusal";
import { withoutUnit } from "./unit-words";

/** A trace whose open questions do not have their index yet. */
export interface OpenTrace {
  column: number;
  trace: Omit<Trace, "kind" | "hold"> & { hold: Hold };
  isUnitOpen: boolean;
  isHoldStated: boolean;
  questions: Omit<SweepFileQuestion, "traceIndex">[];
}

interface TracesInput {
  table: FoundTable;
  header: HeaderLine[];
  facts: HeaderFacts;
  answers: SweepFileAnswers;
  axis: TableAxis;
  referenceUnit: string | null;
  columnOffset: number;
}

/** What instruments write for a trace that is off: one far-off constant, zeros, or nothing. */
function whyOff(values: Float64Array): string | null {
  let first = NaN;
  for (const value of values) {
    if (Number.isNaN(value)) continue;
    if (Number.isNaN(first)) first = value;
    else if (value !== first) return null;
  }
  if (Number.isNaN(first)) return "it holds no level";
  if (first === 0) return "all its levels are zero, as of a trace that is off";
  return first < -300 ? `all its levels are ${first}, as of a trace that is off` : null;
}

function isLinear(unit: FileUnit): unit is LinearUnit {
  return LINEAR_UNITS.some((linear) => linear === unit);
}

function toLevels(
  values: Float64Array,
  rows: Uint32Array | null,
  unit: FileUnit | null,
): { unit: LevelUnit | null; levelsDb: Float32Array; lost: number } {
  const levelsDb = new Float32Array(rows?.length ?? values.length);
  let lost = 0;
  const linear = unit !== null && isLinear(unit) ? unit : null;
  for (let i = 0; i < levelsDb.length; i += 1) {
    const value = values[rows?.[i] ?? i] ?? NaN;
    levelsDb[i] = linear === null ? value : fromLinear(value, linear).levelDb;
    if (linear !== null && value <= 0) lost += 1;
  }
  if (unit === null) return { unit: null, levelsDb, lost };
  return { unit: isLinear(unit) ? fromLinear(1, unit).unit : unit, levelsDb, lost };
}

/**
 * Without names, twice as many columns as the header names traces may be levels and phases by
 * turns: every second one stays within half a turn either way and reaches beyond a right angle.
 */
function phaseColumns(table: FoundTable, levels: number[], traceCount: number): number[] {
  const isNamed = levels.some((i) => table.columns[i]?.name !== null);
  if (isNamed || traceCount === 0 || levels.length !== 2 * traceCount) return [];
  const phases = levels.filter((_, place) => place % 2 === 1);
  const arePhases = phases.every((i) => {
    const values = table.rows.values[i] ?? new Float64Array(0);
    return values.every((value) => !(Math.abs(value) > 180)) && highest(values) > 90;
  });
  return arePhases ? phases : [];
}

function countGaps(values: Float64Array): number {
  let gaps = 0;
  for (const value of values) if (Number.isNaN(value)) gaps += 1;
  return gaps;
}

function highest(values: Float64Array): number {
  return values.reduce((most, value) => (value > most ? value : most), -Infinity);
}

function traceName(
  given: string | undefined,
  own: string | null,
  stated: string | null,
  n: number,
) {
  if (given !== undefined && given.trim() !== "") return given.trim();
  if (own !== null && own !== "") return withoutUnit(own);
  if (stated === null || stated.trim() === "") return `Trace ${n}`;
  return /^\d+$/.test(stated.trim()) ? `Trace ${Number(stated)}` : stated.trim();
}

function pointsOf(count: number): string {
  return count === 1 ? "1 point" : `${count} points`;
}

/** Level columns of a table as traces, with what the file leaves open about each. */
export function readTableTraces(input: TracesInput): {
  open: OpenTrace[];
  leftOut: LeftOutColumn[];
  warnings: string[];
} {
  const { table, facts, answers, axis, columnOffset } = input;
  const open: OpenTrace[] = [];
  const leftOut: LeftOutColumn[] = [];
  const warnings: string[] = [];
  const numbers = table.columns.flatMap((column, i) =>
    column.isNumber && i !== table.shape.frequencyColumn ? [i] : [],
  );
  const answerFor = (i: number): TraceAnswer | undefined =>
    answers.traces?.find((answer) => answer.column === i + columnOffset);
  const mayBeLevels = numbers.filter(
    (i) => table.columns[i]?.notLevels === null || answerFor(i)?.use === true,
  );
  const named = facts.get("traceName")?.length ?? 0;
  const phases = phaseColumns(table, mayBeLevels, named).filter((i) => answerFor(i)?.use !== true);
  const levels = mayBeLevels.filter((i) => !phases.includes(i));
  for (const i of numbers) {
    const column = table.columns[i];
    const values = table.rows.values[i];
    if (!column || !values) continue;
    const place = levels.indexOf(i);
    const own = answerFor(i);
    const stated = headerValue(facts, "traceName", Math.max(0, place), levels.length);
    const name = traceName(
      own?.name,
      column.name,
      stated,
      Math.max(0, place) + 1 + (columnOffset / table.columns.length) * levels.length,
    );
    const why =
      own?.use === false
        ? "it was not wanted"
        : place < 0
          ? (column.notLevels ?? "it reads like a phase in degrees")
          : own?.use === true
            ? null
            : whyOff(values);
    if (why !== null) {
      leftOut.push({ column: i + columnOffset, name, why });
      if (own?.use !== false)
        warnings.push(`Column ${i + 1} (${quote(name)}) was left out: ${why}.`);
      continue;
    }
    const questions: OpenTrace["questions"] = [];
    const unit = findUnit({
      column,
      facts,
      header: input.header,
      delimiter: table.shape.delimiter,
      referenceUnit: input.referenceUnit,
      highestLevel: highest(values),
    });
    const fileUnit = own?.unit ?? unit.value ?? answers.unit ?? null;
    if (own?.unit !== undefined && unit.value !== null && own.unit !== unit.value)
      warnings.push(
        `${quote(name)}: the file states ${unit.value}; ${own.unit} was given instead.`,
      );
    if (fileUnit === null) questions.push({ field: "unit", guess: unit.guess, why: unit.why });
    const detector = findDetector(
      column.name ?? name,
      levels.flatMap((other) => table.columns[other]?.name ?? []),
      headerValue(facts, "detector", place, levels.length),
    );
    const given = own?.detector ?? detector.value ?? answers.detector ?? null;
    if (given === null)
      questions.push({ field: "detector", guess: detector.guess, why: detector.why });
    const statedHold = findHold(
      column.name ?? "",
      headerValue(facts, "hold", place, levels.length),
    );
    const hold = own?.hold ?? statedHold ?? answers.hold ?? null;
    const read = toLevels(values, axis.rows, fileUnit);
    const gaps = countGaps(values);
    if (gaps > 0)
      warnings.push(`${quote(name)} has ${pointsOf(gaps)} without a level; they are gaps.`);
    if (read.lost > 0)
      warnings.push(
        `${quote(name)} has ${pointsOf(read.lost)} at or below zero ${fileUnit}, which have no level in dB; they are gaps.`,
      );
    open.push({
      column: i + columnOffset,
      trace: {
        name,
        detector: given,
        hold: hold ?? "none",
        // Until it is answered nothing is stored, so the stand-in never leaves this module's users.
        unit: read.unit ?? "dB",
        axis: axis.axis,
        levelsDb: read.levelsDb,
      },
      isUnitOpen: read.unit === null,
      isHoldStated: hold !== null,
      questions,
    });
  }
  return { open, leftOut, warnings };
}
