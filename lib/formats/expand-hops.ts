import type { ColumnInfo } from "./describe-columns";
import type { FoundTable } from "./find-tables";

interface HopLayout {
  low: Float64Array;
  high: Float64Array;
  bins: number;
  levels: Float64Array[];
}

/** Columns low, high, bin width, perhaps a count, then one level per bin and perhaps one more. */
function hopLayout(table: FoundTable): HopLayout | null {
  const numbers = table.rows.values.filter((values) => values !== null);
  const [low, high, width] = numbers;
  if (!low || !high || !width || numbers.length < 5 || table.rows.rows < 2) return null;
  const bins = Math.round(((high[0] ?? NaN) - (low[0] ?? NaN)) / (width[0] ?? NaN));
  const isHop = low.every(
    (start, row) =>
      (high[row] ?? NaN) > start &&
      Math.abs(((high[row] ?? NaN) - start) / (width[row] ?? NaN) - bins) < 0.01 * bins,
  );
  if (!isHop || bins < 2) return null;
  for (const first of [4, 3]) {
    const levels = numbers.slice(first);
    // Some writers repeat the last bin at the end of the row.
    if (levels.length === bins || levels.length === bins + 1)
      return { low, high, bins, levels: levels.slice(0, bins) };
  }
  return null;
}

function numberColumn(name: string): ColumnInfo {
  return {
    isNumber: true,
    name,
    rowUnit: null,
    frequencyUnitHz: null,
    levelUnit: null,
    unitText: null,
    notLevels: null,
  };
}

/**
 * Turns rows that each hold one stretch of spectrum into a table of frequency and level. Rows may
 * stand in any order; where several passes cover a bin, its highest level counts. null: no such
 * table.
 */
export function expandHops(table: FoundTable): FoundTable | null {
  const layout = hopLayout(table);
  if (layout === null) return null;
  const { low, high, bins, levels } = layout;
  const highest = new Map<number, number>();
  let passes = 1;
  const seen = new Map<number, number>();
  low.forEach((start, row) => {
    const width = ((high[row] ?? NaN) - start) / bins;
    const times = (seen.get(start) ?? 0) + 1;
    seen.set(start, times);
    passes = Math.max(passes, times);
    levels.forEach((values, bin) => {
      const frequency = Number((start + (bin + 0.5) * width).toPrecision(15));
      const level = values[row] ?? NaN;
      const known = highest.get(frequency);
      if (known === undefined || !(level <= known)) highest.set(frequency, level);
    });
  });
  const points = [...highest].sort(([a], [b]) => a - b);
  const printed = points.slice(0, 1).map(([frequency]) => [String(frequency), ""]);
  const name = passes > 1 ? `Max hold of ${passes} passes` : "Sweep";
  return {
    ...table,
    shape: {
      ...table.shape,
      columns: [{ kind: "number" }, { kind: "number" }],
      frequencyColumn: 0,
    },
    rows: {
      ...table.rows,
      values: [0, 1].map((i) => Float64Array.from(points, (point) => point[i] ?? NaN)),
      rows: points.length,
      jumps: [],
    },
    columns: [numberColumn("Frequency"), numberColumn(name)],
    probe: printed,
    notes: [
      `Each row holds ${bins} bins from one frequency to another; every level was put in the middle of its bin.`,
      ...(passes > 1
        ? [`The file holds ${passes} passes; the highest level of each bin was kept.`]
        : []),
    ],
  };
}
