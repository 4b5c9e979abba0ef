import type { Mask, MaskLine } from "@/lib/core/mask/mask";
import type { Detector } from "@/lib/core/sweep/settings";
import { areaPath, linePath, type ScreenPoint } from "./chart-path";
import type { ChartPlane } from "./chart-plane";
import { DETECTOR_DASHES, drawableLines, linePieces, lowestLine } from "./coast-lines";
import { placeNames, type Box, type PlacedName } from "./place-names";

export interface Coastline {
  /** Everything above the lowest limit that applies. */
  land: string;
  /** The lower edge of the land alone. */
  shore: string;
  lines: { name: string; detector: Detector; path: string; dash: string | undefined }[];
  names: PlacedName[];
  /** Lines in view whose names found no room. */
  unplaced: string[];
  /** Land above the lines of one detector, to tell what a trace with that detector runs over. */
  landOf: (detector: Detector) => string;
}

function piecesInPx(line: MaskLine | null, plane: ChartPlane): ScreenPoint[][] {
  if (!line) return [];
  return linePieces(line, plane.view, plane.scale).map((piece) =>
    piece.map(({ hz, db }) => ({ x: plane.xOf(hz), y: plane.yOf(db) })),
  );
}

const joined = (pieces: ScreenPoint[][]) => pieces.flatMap((piece) => [...piece, null]);

/** Land, coast and names of a mask in px, whatever is still missing from it. */
export function prepareCoastline(
  mask: Mask,
  plane: ChartPlane,
  obstacles: readonly Box[] = [],
  isOnWater: (box: Box) => boolean = () => false,
): Coastline {
  const lines = drawableLines(mask);
  const curves = lines.map((line) => ({ line, name: line.name, pieces: piecesInPx(line, plane) }));
  const seen = curves.filter((curve) => curve.pieces.length > 0);
  const plot = { left: plane.left, right: plane.right, top: plane.top, bottom: plane.bottom };
  const { placed, unplaced } = placeNames(seen, plot, obstacles, isOnWater);
  const landAbove = (above: readonly MaskLine[]) =>
    areaPath(joined(piecesInPx(lowestLine(above), plane)), plane.top);
  return {
    land: landAbove(lines),
    shore: linePath(joined(piecesInPx(lowestLine(lines), plane))),
    lines: seen.map(({ line, pieces }) => ({
      name: line.name,
      detector: line.detector,
      path: linePath(joined(pieces)),
      dash: DETECTOR_DASHES[line.detector],
    })),
    names: placed,
    unplaced,
    landOf: (detector) => landAbove(lines.filter((line) => line.detector === detector)),
  };
}

/** Every limit in dB that is drawn between two frequencies, to choose a level axis by. */
export function limitsWithin(mask: Mask, fromHz: number, toHz: number): number[] {
  return drawableLines(mask).flatMap((line) =>
    linePieces(line, { fromHz, toHz }, "log").flatMap((piece) => piece.map((point) => point.db)),
  );
}
