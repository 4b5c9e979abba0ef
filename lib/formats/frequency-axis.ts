import { medianStepHz, frequencyAt, makeAxis, pointCount } from "@/lib/core/sweep/axis";
import type { FrequencyAxis } from "@/lib/core/sweep/trace";
import { parseFrequencyUnit } from "@/lib/core/units/parse-unit";
import type { FoundTable } from "./find-tables";
import { frequencyHzOf, quantityOf } from "./header-values";
import type { HeaderFacts } from "./read-header";
import { printedResolution } from "./parse-number";
import { Refusal } from "./refusal";

const UNITS_HZ = [1, 1e3, 1e6, 1e9];

interface Edge {
  value: number;
  unit: string | null;
}

/** Start and stop of the header, when it states each of them once. */
export function headerEdges(
  facts: HeaderFacts,
  decimal: "." | ",",
): { start: Edge; stop: Edge } | null {
  const [start, stop] = (["start", "stop"] as const).map((key) => {
    const found = (facts.get(key) ?? []).flatMap((entry) => quantityOf(entry, decimal) ?? []);
    return found.every((edge) => edge.value === found[0]?.value) ? found[0] : undefined;
  });
  return start && stop ? { start, stop } : null;
}

/** Unit under which two ends of a table lie at two frequencies in Hz, within 2 % of the span. */
function unitThatFits(ends: [number, number], startHz: number, stopHz: number): number | null {
  const slack = 0.02 * (stopHz - startHz);
  const fits = UNITS_HZ.filter(
    (unitHz) =>
      Math.abs(ends[0] * unitHz - startHz) <= slack && Math.abs(ends[1] * unitHz - stopHz) <= slack,
  );
  return slack > 0 && fits.length === 1 ? (fits[0] ?? null) : null;
}

export function tableEnds(table: FoundTable): [number, number] {
  const values = table.rows.values[table.shape.frequencyColumn];
  const ends = [values?.[0] ?? NaN, values?.[values.length - 1] ?? NaN];
  return [Math.min(...ends), Math.max(...ends)];
}

/** Hz per unit of the frequency column as the file states it; null when it does not. */
export function statedUnitHz(table: FoundTable, facts: HeaderFacts): number | null {
  const own = table.columns[table.shape.frequencyColumn]?.frequencyUnitHz ?? null;
  if (own !== null) return own;
  for (const entry of facts.get("frequencyUnit") ?? []) {
    const unitHz = parseFrequencyUnit(entry.values[0] ?? "");
    if (unitHz !== null) return unitHz;
  }
  const edges = headerEdges(facts, table.shape.decimal);
  if (edges === null) return null;
  const [startHz, stopHz] = [edges.start, edges.stop].map((edge) => frequencyHzOf(edge, null));
  return startHz !== null && stopHz !== null && startHz !== undefined && stopHz !== undefined
    ? unitThatFits(tableEnds(table), startHz, stopHz)
    : null;
}

/** Hz per unit of header numbers without one: the unit in which start and stop meet the table. */
export function headerUnitHz(
  facts: HeaderFacts,
  decimal: "." | ",",
  endsHz: [number, number],
): number | null {
  const edges = headerEdges(facts, decimal);
  if (edges === null || edges.start.unit !== null || edges.stop.unit !== null) return null;
  const fits = UNITS_HZ.filter(
    (unitHz) =>
      unitThatFits(
        [endsHz[0], endsHz[1]],
        edges.start.value * unitHz,
        edges.stop.value * unitHz,
      ) === 1,
  );
  return fits.length === 1 ? (fits[0] ?? null) : null;
}

/** Unit to offer when none is stated: bench sweeps lie between 9 kHz and some tens of GHz. */
export function guessUnitHz([first, last]: [number, number]): number {
  if (last >= 1e7) return 1;
  if (last >= 4e4) return 1e3;
  return first >= 0.5 && last <= 8 ? 1e9 : 1e6;
}

/** No swept spectrum of this kind reaches it; beyond it the unit was mistaken. */
const HIGHEST_HZ = 1e12;

/** One multiplication leaves an error in the last bit; whole hertz are meant as such. */
function toHz(value: number, unitHz: number): number {
  const hz = value * unitHz;
  const whole = Math.round(hz);
  return Math.abs(hz - whole) <= 4e-16 * Math.abs(hz) ? whole : hz;
}

/** Axis from the frequency column, its rows in the given order. */
export function axisOfColumn(
  table: FoundTable,
  rows: Uint32Array | null,
  unitHz: number,
): FrequencyAxis {
  const { frequencyColumn, decimal } = table.shape;
  const values = table.rows.values[frequencyColumn] ?? new Float64Array(0);
  const hz = new Float64Array(rows?.length ?? values.length);
  for (let i = 0; i < hz.length; i += 1) hz[i] = toHz(values[rows?.[i] ?? i] ?? NaN, unitHz);
  const highest = Math.max(hz[0] ?? 0, hz.at(-1) ?? 0);
  if (highest > HIGHEST_HZ)
    throw new Refusal(
      `Read in that unit the sweep would reach ${(highest / 1e12).toPrecision(3)} THz. Check the unit of the frequencies.`,
    );
  const resolution = table.probe.reduce(
    (most, cells) => Math.max(most, printedResolution(cells[frequencyColumn] ?? "", decimal)),
    0,
  );
  return makeAxis(hz, resolution * unitHz);
}

/** Axis of a table without frequencies, from start and stop of the header. */
export function axisOfEdges(start: number, stop: number, count: number): FrequencyAxis {
  if (!(stop > start) || start < 0)
    throw new Refusal(
      `The table has no frequency column, and the header's start ${start} and stop ${stop} do not rise. Export the trace with its frequencies.`,
    );
  return { kind: "regular", startHz: start, stepHz: (stop - start) / (count - 1), count };
}

/**
 * Whether an axis reads like single-frequency readings: few points, hardly two spacings alike,
 * neither in hertz nor in ratio.
 */
export function looksLikeSpots(axis: FrequencyAxis): boolean {
  const count = pointCount(axis);
  if (axis.kind === "regular" || count < 3 || count > 300) return false;
  const typical = medianStepHz(axis);
  let odd = 0;
  for (let i = 2; i < count; i += 1) {
    const [a, b, c] = [frequencyAt(axis, i - 2), frequencyAt(axis, i - 1), frequencyAt(axis, i)];
    const isEven = Math.abs(c - b - (b - a)) <= 0.05 * typical;
    const isGeometric =
      a > 0 && Math.abs(Math.log(c / b) - Math.log(b / a)) <= 0.05 * Math.log(b / a);
    if (!isEven && !isGeometric) odd += 1;
  }
  return odd > (count - 2) / 2;
}
