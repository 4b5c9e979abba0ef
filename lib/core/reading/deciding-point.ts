import type { LineReading, MarginPoint, Reading } from "./reading";

/**
 * The margin that a reading is known by: of the line that gives the standing or, when that line
 * was not swept, the lowest of the others. Null when no line has a margin.
 */
export function decidingPoint(
  reading: Pick<Reading, "lines" | "worstLineIndex">,
): { line: LineReading; point: MarginPoint } | null {
  const { lines, worstLineIndex } = reading;
  const worst = worstLineIndex === null ? undefined : lines[worstLineIndex];
  if (worst?.worst) return { line: worst, point: worst.worst };
  let lowest: { line: LineReading; point: MarginPoint } | null = null;
  for (const line of lines) {
    if (line.worst && (!lowest || line.worst.marginDb < lowest.point.marginDb))
      lowest = { line, point: line.worst };
  }
  return lowest;
}
