import { limitAt } from "@/lib/core/mask/limit-at";
import type { Mask, MaskLine, MaskSegment } from "@/lib/core/mask/mask";
import { maskPolyline, type PolylinePoint } from "@/lib/core/mask/polyline";
import type { Detector } from "@/lib/core/sweep/settings";
import { hzAtShare, shareOfHz, type AxisScaleKind, type FrequencyView } from "./frequency-scale";

/** One line style per detector; undefined is an unbroken line. */
export const DETECTOR_DASHES: Record<Detector, string | undefined> = {
  "quasi-peak": undefined,
  peak: "12 3 2 3",
  average: "7 4",
  "rms-average": "7 3 1.5 3 1.5 3",
  sample: "1.5 3",
  "negative-peak": "3 3",
};

const LINEAR_PIECES = 24;

function isDrawable(segment: MaskSegment): boolean {
  const { startHz, stopHz, startDb, stopDb } = segment;
  return (
    [startHz, stopHz, startDb, stopDb].every(Number.isFinite) && startHz > 0 && stopHz > startHz
  );
}

/** Lines of a mask without the segments that are still being typed. */
export function drawableLines(mask: Mask): MaskLine[] {
  return mask.lines
    .map((line) => ({ ...line, segments: line.segments.filter(isDrawable) }))
    .filter((line) => line.segments.length > 0);
}

/** What is straight in log f is curved on a linear axis, and needs points in between. */
function bendForLinearAxis(line: MaskLine, piece: PolylinePoint[], view: FrequencyView) {
  return piece.flatMap((point, i) => {
    const next = piece[i + 1];
    if (!next || next.hz <= point.hz || next.db === point.db) return [point];
    const from = shareOfHz(view, "linear", point.hz);
    const to = shareOfHz(view, "linear", next.hz);
    const count = Math.max(1, Math.ceil((to - from) * LINEAR_PIECES * 4));
    const between = Array.from({ length: count - 1 }, (_, k) => {
      const hz = hzAtShare(view, "linear", from + ((to - from) * (k + 1)) / count);
      return { hz, db: limitAt(line, hz) ?? point.db };
    });
    return [point, ...between];
  });
}

/** Polylines of one mask line in view, right for either axis. */
export function linePieces(
  line: MaskLine,
  view: FrequencyView,
  scale: AxisScaleKind,
): PolylinePoint[][] {
  const pieces = maskPolyline(line, view.fromHz, view.toHz);
  if (scale === "log") return pieces;
  return pieces.map((piece) => bendForLinearAxis(line, piece, view));
}

/** The lowest limit over several lines as one line: where segments overlap the lower applies. */
export function lowestLine(lines: readonly MaskLine[]): MaskLine | null {
  const [first] = lines;
  return first ? { ...first, segments: lines.flatMap((line) => line.segments) } : null;
}
