import type { ScreenPoint } from "./chart-path";

export interface Box {
  left: number;
  right: number;
  top: number;
  bottom: number;
}

export interface NamedCurve {
  name: string;
  pieces: ScreenPoint[][];
}

export interface PlacedName {
  name: string;
  x: number;
  y: number;
  /** Along the line, degrees clockwise as SVG turns. */
  angleDeg: number;
}

const CHARACTER_PX = 5.9;
const HALF_HEIGHT_PX = 7;
const EDGE_PX = 6;
/** A name this close to another line could be taken for that line's. */
const NEIGHBOUR_PX = 7;

export function overlaps(a: Box, b: Box): boolean {
  return a.left < b.right && a.right > b.left && a.top < b.bottom && a.bottom > b.top;
}

function inflate(box: Box, by: number): Box {
  return { ...box, top: box.top - by, bottom: box.bottom + by };
}

function yAt(piece: readonly ScreenPoint[], x: number): number | null {
  for (let i = 0; i + 1 < piece.length; i += 1) {
    const a = piece[i];
    const b = piece[i + 1];
    if (!a || !b || x < a.x || x > b.x || b.x === a.x) continue;
    return a.y + ((b.y - a.y) * (x - a.x)) / (b.x - a.x);
  }
  return null;
}

function crosses(piece: readonly ScreenPoint[], box: Box): boolean {
  for (let k = 0; k <= 8; k += 1) {
    const y = yAt(piece, box.left + ((box.right - box.left) * k) / 8);
    if (y !== null && y > box.top && y < box.bottom) return true;
  }
  return false;
}

/** Places a name can take along a piece: near its ends and at its middle, above and below. */
function candidates(piece: readonly ScreenPoint[], widthPx: number, plot: Box) {
  const first = piece[0]?.x ?? 0;
  const last = piece.at(-1)?.x ?? 0;
  const slack = Math.max(0, last - first - widthPx);
  const starts =
    slack > 0
      ? [1, 0, 0.5, 0.75, 0.25].map((share) =>
          Math.min(
            last - widthPx,
            Math.max(first, first + EDGE_PX + (slack - 2 * EDGE_PX) * share),
          ),
        )
      : [first, last - widthPx];
  return starts.flatMap((start) => {
    const x = Math.min(plot.right - EDGE_PX - widthPx, Math.max(plot.left + EDGE_PX, start));
    const here = yAt(piece, Math.max(x, first));
    const there = yAt(piece, Math.min(x + widthPx, last));
    if (here === null || there === null) return [];
    const middle = (here + there) / 2;
    // On a bend or a step a name would leave its line.
    const bends = [1, 2, 3, 4, 5, 6, 7].some((k) => {
      const on = yAt(piece, Math.min(last, Math.max(first, x + (widthPx * k) / 8)));
      return on === null || Math.abs(here + ((there - here) * k) / 8 - on) > 3;
    });
    if (bends) return [];
    const angle = Math.atan2(there - here, widthPx);
    return Math.abs(angle) > 1 ? [] : [-1, 1].map((side) => ({ x, middle, angle, side }));
  });
}

/** Where no straight stretch is long enough: level, over an end or the top, or under the bottom. */
function levelCandidates(piece: readonly ScreenPoint[], widthPx: number, plot: Box) {
  const byHeight = [...piece].sort((a, b) => a.y - b.y);
  const spots = [
    { point: piece.at(-1), side: -1 },
    { point: piece[0], side: -1 },
    { point: byHeight[0], side: -1 },
    { point: byHeight.at(-1), side: 1 },
  ];
  return spots.flatMap(({ point, side }) => {
    if (!point) return [];
    const centred = point.x - widthPx / 2;
    const x = Math.min(plot.right - EDGE_PX - widthPx, Math.max(plot.left + EDGE_PX, centred));
    return [{ x, middle: point.y + side * 3, angle: 0, side }];
  });
}

/**
 * Writes each name on its line where it meets neither another line nor another name, in the
 * widest piece that has room, and preferably not over the water (`isOnWater`). Names that fit nowhere are handed back as `unplaced`.
 */
export function placeNames(
  curves: readonly NamedCurve[],
  plot: Box,
  obstacles: readonly Box[] = [],
  isOnWater: (box: Box) => boolean = () => false,
): { placed: PlacedName[]; unplaced: string[] } {
  const taken: Box[] = [...obstacles];
  const placed: PlacedName[] = [];
  const unplaced: string[] = [];
  for (const curve of curves) {
    if (curve.pieces.length === 0 || curve.name === "") continue;
    const widthPx = curve.name.length * CHARACTER_PX;
    const width = (piece: ScreenPoint[]) => (piece.at(-1)?.x ?? 0) - (piece[0]?.x ?? 0);
    const widest = [...curve.pieces].sort((a, b) => width(b) - width(a));
    const spots = [
      ...widest.flatMap((piece) => candidates(piece, widthPx, plot)),
      ...widest.flatMap((piece) => levelCandidates(piece, widthPx, plot)),
    ];
    const boxes = spots.map(({ x, middle, angle, side }) => {
      const centreX = x + widthPx / 2 - Math.sin(angle) * side * -1 * (HALF_HEIGHT_PX + 2);
      const centreY = middle + side * Math.cos(angle) * (HALF_HEIGHT_PX + 2);
      const halfWidth = (widthPx / 2) * Math.cos(angle);
      const halfHeight = HALF_HEIGHT_PX + (widthPx / 2) * Math.abs(Math.sin(angle));
      const box = {
        left: centreX - halfWidth,
        right: centreX + halfWidth,
        top: centreY - halfHeight,
        bottom: centreY + halfHeight,
      };
      return { box, centreX, centreY, angle };
    });
    const free = boxes.filter(
      ({ box, angle }) =>
        box.top >= plot.top &&
        box.bottom <= plot.bottom &&
        !taken.some((other) => overlaps(box, other)) &&
        !curves.some((other) => {
          const near = other === curve ? (angle === 0 ? box : null) : inflate(box, NEIGHBOUR_PX);
          return near !== null && other.pieces.some((piece) => crosses(piece, near));
        }),
    );
    const found = free.find(({ box }) => !isOnWater(box)) ?? free[0];
    if (!found) {
      unplaced.push(curve.name);
      continue;
    }
    taken.push(found.box);
    placed.push({
      name: curve.name,
      x: found.centreX,
      y: found.centreY,
      angleDeg: (found.angle * 180) / Math.PI,
    });
  }
  return { placed, unplaced };
}
