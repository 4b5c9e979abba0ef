/** A point on the screen in px; null in a list of them is a gap. */
export interface ScreenPoint {
  x: number;
  y: number;
}

/** A tenth of a pixel is as fine as a screen shows. */
const tenth = (px: number) => Math.round(px * 10) / 10;

const at = ({ x, y }: ScreenPoint) => `${tenth(x)},${tenth(y)}`;

/** Splits a list at its gaps. */
export function piecesOf<T>(points: readonly (T | null)[]): T[][] {
  const pieces: T[][] = [];
  let open: T[] | null = null;
  for (const point of points) {
    if (point === null) open = null;
    else if (open) open.push(point);
    else pieces.push((open = [point]));
  }
  return pieces;
}

/** Path of a line with gaps. A point between two gaps becomes a dot under a round line cap. */
export function linePath(points: readonly (ScreenPoint | null)[]): string {
  return piecesOf(points)
    .map((piece) => `M${piece.map(at).join("L")}${piece.length === 1 ? "h0" : ""}`)
    .join("");
}

/** Closed path between a line with gaps and a straight edge at `edgeY`. */
export function areaPath(points: readonly (ScreenPoint | null)[], edgeY: number): string {
  const edge = tenth(edgeY);
  return piecesOf(points)
    .map((piece) => {
      const first = piece[0];
      const last = piece.at(-1);
      if (!first || !last) return "";
      return `M${tenth(first.x)},${edge}L${piece.map(at).join("L")}L${tenth(last.x)},${edge}Z`;
    })
    .join("");
}

/** Closed path between two lines over the same x positions; a gap in either is a gap. */
export function bandPath(
  upper: readonly (ScreenPoint | null)[],
  lower: readonly (ScreenPoint | null)[],
): string {
  const pairs = upper.map((up, i) => {
    const low = lower[i] ?? null;
    return up && low ? { up, low } : null;
  });
  return piecesOf(pairs)
    .map((piece) => {
      const there = piece.map((pair) => at(pair.up)).join("L");
      const back = [...piece].reverse().map((pair) => at(pair.low));
      return `M${there}L${back.join("L")}Z`;
    })
    .join("");
}
