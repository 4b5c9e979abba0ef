import type { LineReading, MarginPoint, Reading } from "./reading";

/**
 * The margin that a reading is known by: the lowest of the lines that are over or, when none is,
 * the lowest of all lines, whatever their standing. Null when no line has a margin.
 */
export function decidingPoint(
  reading: Pick<Reading, "lines">,
): { line: LineReading; point: MarginPoint } | null {
  const over = reading.lines.filter((line) => line.standing === "over");
  let lowest: { line: LineReading; point: MarginPoint } | null = null;
  for (const line of over.length > 0 ? over : reading.lines) {
    if (line.worst && (!lowest || line.worst.marginDb < lowest.point.marginDb))
      lowest = { line, point: line.worst };
  }
  return lowest;
}
