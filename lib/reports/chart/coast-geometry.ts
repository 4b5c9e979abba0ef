import { maskPolyline, type PolylinePoint } from "@/lib/core/mask/polyline";
import type { Mask, MaskLine } from "@/lib/core/mask/mask";
import type { Suspect } from "@/lib/core/reading/reading";
import { shorten } from "../printable";
import type { SnapshotTrace } from "../report-content";

export interface Frame {
  left: number;
  right: number;
  top: number;
  bottom: number;
  fromHz: number;
  toHz: number;
  fromDb: number;
  toDb: number;
}

/** Trace in the chart's unit: `shiftDb` restates its own. */
export interface DrawnTrace {
  trace: SnapshotTrace;
  shiftDb: number;
}

export function xOf(frame: Frame, hz: number): number {
  const share = Math.log(hz / frame.fromHz) / Math.log(frame.toHz / frame.fromHz);
  return frame.left + share * (frame.right - frame.left);
}

/** Held inside the frame; a level above it cannot be, since the frame is made to hold them all. */
export function yOf(frame: Frame, db: number): number {
  const share = (db - frame.fromDb) / (frame.toDb - frame.fromDb);
  return frame.bottom - Math.max(0, Math.min(1, share)) * (frame.bottom - frame.top);
}

function visibleLimits(mask: Mask | null, fromHz: number, toHz: number): number[] {
  const lines = mask?.lines ?? [];
  return lines.flatMap((line) =>
    maskPolyline(line, fromHz, toHz)
      .flat()
      .map((point) => point.db),
  );
}

/** Frame that holds every highest level and every limit over the traces' span. */
export function frameOf(
  drawn: readonly DrawnTrace[],
  mask: Mask | null,
  box: Pick<Frame, "left" | "right" | "top" | "bottom">,
): Frame | null {
  const spans = drawn.map(({ trace }) => trace.view).filter((view) => view.hz.length > 0);
  const fromHz = Math.min(...spans.map((view) => view.firstHz));
  const toHz = Math.max(...spans.map((view) => view.lastHz));
  const levels = drawn
    .flatMap(({ trace, shiftDb }) =>
      trace.view.maxDb.map((db) => (db === null ? null : db + shiftDb)),
    )
    .filter((db): db is number => db !== null && Number.isFinite(db))
    .sort((a, b) => a - b);
  const lowest = levels[Math.floor(levels.length * 0.02)];
  const highest = levels.at(-1);
  if (!(fromHz > 0 && toHz > fromHz) || lowest === undefined || highest === undefined) return null;
  const limits = visibleLimits(mask, fromHz, toHz);
  const top = limits.reduce((a, b) => Math.max(a, b), highest);
  const bottom = limits.reduce((a, b) => Math.min(a, b), lowest);
  const toDb = Math.ceil((top + 7) / 10) * 10;
  const fromDb = Math.max(Math.floor((bottom - 4) / 10) * 10, toDb - 120);
  return { ...box, fromHz, toHz, fromDb, toDb };
}

const point = (x: number, y: number) => `${x.toFixed(2)} ${y.toFixed(2)}`;

/** Runs of neighbouring buckets without a gap, as points of the page. */
function runsOf(frame: Frame, { trace, shiftDb }: DrawnTrace): { x: number; y: number }[][] {
  const runs: { x: number; y: number }[][] = [];
  let run: { x: number; y: number }[] = [];
  trace.view.hz.forEach((hz, i) => {
    const db = trace.view.maxDb[i] ?? null;
    if (db !== null && Number.isFinite(db)) {
      run.push({ x: xOf(frame, hz), y: yOf(frame, db + shiftDb) });
      return;
    }
    if (run.length > 0) runs.push(run);
    run = [];
  });
  if (run.length > 0) runs.push(run);
  return runs;
}

/** Path of a trace's highest levels; a gap lifts the pen, and a lone sample is a short tick. */
export function tracePath(frame: Frame, drawn: DrawnTrace): string {
  return runsOf(frame, drawn)
    .map((run) => {
      const [only] = run;
      if (run.length === 1 && only)
        return `M${point(only.x - 0.4, only.y)} L${point(only.x + 0.4, only.y)}`;
      return `M${run.map(({ x, y }) => point(x, y)).join(" L")}`;
    })
    .join(" ");
}

/** Area under a trace down to the foot of the frame, empty where it has gaps. */
export function waterPath(frame: Frame, drawn: DrawnTrace): string {
  return runsOf(frame, drawn)
    .map((run) => {
      const first = run[0]?.x ?? 0;
      const last = run.at(-1)?.x ?? 0;
      const edge = run.map(({ x, y }) => point(x, y)).join(" L");
      return `M${point(first, frame.bottom)} L${edge} L${point(last, frame.bottom)} Z`;
    })
    .join(" ");
}

export function spotsOf(frame: Frame, drawn: DrawnTrace): { x: number; y: number }[] {
  return runsOf(frame, drawn).flat();
}

function linePolylines(frame: Frame, line: MaskLine): PolylinePoint[][] {
  return maskPolyline(line, frame.fromHz, frame.toHz);
}

export function coastPath(frame: Frame, line: MaskLine): string {
  return linePolylines(frame, line)
    .map((run) => `M${run.map(({ hz, db }) => point(xOf(frame, hz), yOf(frame, db))).join(" L")}`)
    .join(" ");
}

/** Everything above the given lines; where they overlap the lowest bounds it. */
export function landPath(frame: Frame, lines: readonly MaskLine[]): string {
  return lines
    .flatMap((line) => linePolylines(frame, line))
    .map((run) => {
      const first = xOf(frame, run[0]?.hz ?? frame.fromHz);
      const last = xOf(frame, run.at(-1)?.hz ?? frame.toHz);
      const edge = run.map(({ hz, db }) => point(xOf(frame, hz), yOf(frame, db))).join(" L");
      return `M${point(first, frame.top)} L${edge} L${point(last, frame.top)} Z`;
    })
    .join(" ");
}

/** Diagonal hatching over the whole frame, to be cut to the land. */
export function hatchPath({ left, right, top, bottom }: Frame, stepPt = 5): string {
  const height = bottom - top;
  const strokes: string[] = [];
  for (let x = left - height; x < right; x += stepPt)
    strokes.push(`M${point(x, bottom)} L${point(x + height, top)}`);
  return strokes.join(" ");
}

interface Buoy {
  number: number;
  x: number;
  y: number;
  peakX: number;
  peakY: number;
}

const BUOY_PT = 11;

/** Buoys over their peaks, moved up or aside until no two lie on each other. */
export function placeBuoys(frame: Frame, suspects: readonly Suspect[]): Buoy[] {
  const placed: Buoy[] = [];
  for (const { number, frequencyHz, levelDb } of suspects) {
    if (frequencyHz < frame.fromHz || frequencyHz > frame.toHz) continue;
    const x = xOf(frame, frequencyHz);
    const peakY = yOf(frame, levelDb);
    const isFree = (atX: number, atY: number) =>
      atY >= frame.top + BUOY_PT / 2 &&
      atX >= frame.left + BUOY_PT / 2 &&
      atX <= frame.right - BUOY_PT / 2 &&
      placed.every((b) => Math.hypot(b.x - atX, b.y - atY) >= BUOY_PT);
    const offsets = [0, -8, 8, -14, 14, -21, 21, -30, 30];
    const spots = [11, 19, 28, 38].flatMap((up) =>
      offsets.map((dx) => ({ x: x + dx, y: peakY - up })),
    );
    const spot = spots.find((s) => isFree(s.x, s.y)) ?? {
      x,
      y: Math.max(frame.top + 6, peakY - 11),
    };
    placed.push({ number, peakX: x, peakY, ...spot });
  }
  return placed;
}

const NAME_SIGN_PT = 3.75;
const NAME_HEIGHT_PT = 8;

/** Names written on their lines, kept inside the frame and off each other. */
export function placeLineNames(
  frame: Frame,
  lines: readonly MaskLine[],
): { text: string; x: number; y: number }[] {
  const placed: { text: string; x: number; y: number; width: number }[] = [];
  for (const line of lines) {
    const text = `${shorten(line.name, 40)} line`;
    const width = text.length * NAME_SIGN_PT;
    const runs = linePolylines(frame, line);
    const spots = runs.flatMap((run) => {
      const starts = run.map(({ hz, db }) => ({ x: xOf(frame, hz) + 4, y: yOf(frame, db) }));
      return [-9, 2.5].flatMap((up) => starts.map(({ x, y }) => ({ x, y: y + up })));
    });
    const inFrame = spots.map(({ x, y }) => ({
      x: Math.max(frame.left + 4, Math.min(x, frame.right - width - 4)),
      y: Math.max(frame.top + 1, Math.min(y, frame.bottom - NAME_HEIGHT_PT)),
    }));
    const isFree = ({ x, y }: { x: number; y: number }) =>
      placed.every(
        (p) => Math.abs(p.y - y) >= NAME_HEIGHT_PT || x + width + 6 < p.x || p.x + p.width + 6 < x,
      );
    const first = inFrame[0];
    if (!first) continue;
    const beside = [0, 1, 2, 3].map((k) => ({ x: first.x + k * 90, y: first.y }));
    const spot = [...inFrame, ...beside.filter(({ x }) => x + width < frame.right)].find(isFree);
    placed.push({ text, width, ...(spot ?? first) });
  }
  return placed;
}
