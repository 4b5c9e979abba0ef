export interface Figure {
  name: string;
  /** What was measured, in words and numbers with their unit. */
  measured: string;
  /** Absolute numbers that the figure rests on. */
  beside: string;
  /** Left out: the figure is for information and nothing depends on it. */
  limit?: { text: string; isHeld: boolean };
}

/** Columns of equal width, the last one as long as it is. */
function alignRows(rows: string[][]): string[] {
  const widths = rows.reduce<number[]>(
    (most, row) => row.map((cell, i) => Math.max(most[i] ?? 0, cell.length)),
    [],
  );
  return rows.map((row) =>
    row
      .map((cell, i) => cell.padEnd(widths[i] ?? 0))
      .join("  ")
      .trimEnd(),
  );
}

/** Prints the table and the closing line; returns how many limits are not held. */
export function printFigures(figures: readonly Figure[]): number {
  const header = ["figure", "measured", "limit", "", "beside"];
  const rows = figures.map(({ name, measured, limit, beside }) => [
    name,
    measured,
    limit?.text ?? "–",
    limit ? (limit.isHeld ? "held" : "NOT HELD") : "",
    beside,
  ]);
  for (const line of alignRows([header, ...rows])) console.log(line);
  const limits = figures.flatMap(({ limit }) => (limit ? [limit] : []));
  const held = limits.filter(({ isHeld }) => isHeld).length;
  console.log(`\n${held} held, ${limits.length - held} not held`);
  return limits.length - held;
}
