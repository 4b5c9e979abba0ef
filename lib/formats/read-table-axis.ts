import { pointCount } from "@/lib/core/sweep/axis";
import type { FrequencyAxis } from "@/lib/core/sweep/trace";
import type { FoundTable } from "./find-tables";
import {
  axisOfColumn,
  axisOfEdges,
  guessUnitHz,
  headerEdges,
  headerUnitHz,
  statedUnitHz,
  tableEnds,
} from "./frequency-axis";
import { frequencyHzOf, quantityOf } from "./header-values";
import { orderRows } from "./order-rows";
import type { HeaderFacts } from "./read-header";
import { quote, Refusal } from "./refusal";
import type { SweepFileAnswers, SweepFileQuestion } from "./sweep-file";
import { otherAxisIn } from "./unit-words";

export interface TableAxis {
  axis: FrequencyAxis;
  /** Rows of the table by ascending frequency; null: as they stand. */
  rows: Uint32Array | null;
  /** Hz per unit of header numbers without one; null when unknown. */
  headerUnitHz: number | null;
  questions: SweepFileQuestion[];
  warnings: string[];
}

const UNIT_QUESTION = {
  field: "frequencyUnit",
  traceIndex: null,
  why: "The file does not state the unit of the frequencies.",
} as const;

function refuseOtherAxis(table: FoundTable): void {
  const across = table.columns.filter(({ name }) => /^\d[\d.,]*\s*[kmg]?hz$/i.test(name ?? ""));
  if (across.length > 1)
    throw new Refusal(
      "The frequencies stand as the names of columns, one sweep per row. Export one row per frequency.",
    );
  const place = Math.max(0, table.shape.frequencyColumn);
  const column = table.columns[place];
  if (!column || column.frequencyUnitHz !== null) return;
  const text = [column.unitText, column.name].find(
    (candidate) => candidate !== null && otherAxisIn(candidate) !== null,
  );
  if (text)
    throw new Refusal(
      `Column ${place + 1} (${quote(text)}) is ${otherAxisIn(text)}, not a frequency. Neap reads levels over frequency in Hz, kHz, MHz or GHz.`,
    );
}

function readEdges(table: FoundTable, facts: HeaderFacts, answers: SweepFileAnswers): TableAxis {
  const edges = headerEdges(facts, table.shape.decimal);
  if (edges === null)
    throw new Refusal(
      `The table that starts in line ${table.rows.firstLine} has no column that runs in one direction as frequencies do, and the header states no start and stop frequency. Export the trace with its frequencies, or one sweep per file.`,
      table.rows.firstLine,
    );
  const declared = (facts.get("points") ?? []).map((entry) => Number(entry.values[0]));
  const count = table.rows.rows;
  if (declared.some((points) => points > 0 && points !== count))
    throw new Refusal(
      `The header declares ${declared[0]} points but ${count} rows follow, so their frequencies cannot be told. Export the trace again.`,
    );
  const stated = statedUnitHz(table, facts);
  const needsUnit = [edges.start, edges.stop].some((edge) => frequencyHzOf(edge, stated) === null);
  const unitHz = stated ?? answers.frequencyUnitHz ?? null;
  const [start, stop] = [edges.start, edges.stop].map((edge) => frequencyHzOf(edge, unitHz ?? 1));
  const isOpen = needsUnit && unitHz === null;
  const guess = guessUnitHz([edges.start.value, edges.stop.value]);
  return {
    axis: axisOfEdges(start ?? NaN, stop ?? NaN, count),
    rows: null,
    headerUnitHz: unitHz,
    questions: isOpen ? [{ ...UNIT_QUESTION, guess: String(guess) }] : [],
    warnings: [
      "The table has no frequency column; the points were spread evenly from start to stop of the header.",
    ],
  };
}

/** Frequencies of a table in Hz, ascending; in the file's own unit while that is asked for. */
export function readTableAxis(
  table: FoundTable,
  facts: HeaderFacts,
  answers: SweepFileAnswers,
): TableAxis {
  refuseOtherAxis(table);
  const { frequencyColumn } = table.shape;
  if (frequencyColumn < 0) return readEdges(table, facts, answers);
  const levels = table.columns.flatMap((column, i) =>
    column.isNumber && i !== frequencyColumn && column.notLevels === null ? [i] : [],
  );
  const order = orderRows(table.rows, frequencyColumn, levels);
  const stated = statedUnitHz(table, facts);
  const unitHz = stated ?? answers.frequencyUnitHz ?? null;
  const ends = tableEnds(table);
  const axis = axisOfColumn(table, order.rows, unitHz ?? 1);
  if (pointCount(axis) < 2)
    throw new Refusal(
      "The table has only one frequency; a trace needs at least two points. Export the whole trace.",
      table.rows.firstLine,
    );
  const endsHz: [number, number] = [ends[0] * (unitHz ?? 1), ends[1] * (unitHz ?? 1)];
  const fitted = unitHz === null ? null : headerUnitHz(facts, table.shape.decimal, endsHz);
  const isInHz = headerEdges(facts, table.shape.decimal) === null && stated === 1;
  const bare = ["rbw", "vbw"] as const;
  const isBare = bare.some((key) =>
    facts.get(key)?.some((entry) => quantityOf(entry, table.shape.decimal)?.unit === null),
  );
  const notes =
    fitted === null && isInHz && isBare
      ? ["The bandwidths carry no unit; they were read in Hz, as the frequencies are."]
      : [];
  return {
    axis,
    rows: order.rows,
    // Without a start and a stop to tell by, numbers of a header are taken for Hz beside a
    // frequency column that is in Hz.
    headerUnitHz: fitted ?? (isInHz ? 1 : null),
    questions: unitHz === null ? [{ ...UNIT_QUESTION, guess: String(guessUnitHz(ends)) }] : [],
    warnings: [...order.warnings, ...table.notes, ...notes],
  };
}
