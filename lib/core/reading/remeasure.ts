import type { CompiledLine } from "../mask/compile-line";
import { frequencyAt } from "../sweep/axis";
import type { UsedTrace } from "./line-reading";
import { eachHeardEdge, eachHeardRun, reachOf } from "./line-reading";
import { findOver, heldLevelDb } from "./lowest-margin";
import { speaksFor } from "./position";
import { originOf } from "./prepare-parts";
import type { RemeasurePoint } from "./reading";

/** More than anybody measures one by one; beyond it a scan with the line's detector is quicker. */
const MOST_POINTS = 200;

interface OverSample {
  used: UsedTrace;
  sample: number;
  frequencyHz: number;
  limitDb: number;
  marginDb: number;
}

function overSamples(line: CompiledLine, used: readonly UsedTrace[]): OverSample[] {
  const found: OverSample[] = [];
  for (const one of used) {
    if (one.basis !== "upper-bound") continue;
    const add = (sample: number, limitDb: number) => {
      const marginDb = limitDb - heldLevelDb(one.held, sample);
      const frequencyHz = frequencyAt(one.held.trace.axis, sample);
      if (marginDb < 0) found.push({ used: one, sample, frequencyHz, limitDb, marginDb });
    };
    for (const piece of line.pieces)
      eachHeardRun(one, piece, (from, to) => findOver(one.held, piece, from, to, add));
    eachHeardEdge(one, line, add);
  }
  // Of equals the one that states more, whose spot speaks for the other too.
  const unstated = ({ used: { held } }: OverSample) =>
    Number(held.part.settings.heightM === null) + Number(held.part.settings.azimuthDeg === null);
  return found.sort(
    (a, b) => a.marginDb - b.marginDb || a.frequencyHz - b.frequencyHz || unstated(a) - unstated(b),
  );
}

/** Remembers frequencies in cells as wide as the widest reach, so that near ones are found fast. */
class Taken {
  private readonly cells = new Map<number, OverSample[]>();

  constructor(private readonly widthHz: number) {}

  private cellOf(hz: number): number {
    return this.widthHz > 0 ? Math.floor(hz / this.widthHz) : hz;
  }

  has({ used, frequencyHz }: OverSample): boolean {
    const reach = reachOf(used.held);
    const cell = this.cellOf(frequencyHz);
    const near = this.widthHz > 0 ? [cell - 1, cell, cell + 1] : [cell];
    return near.some((c) =>
      (this.cells.get(c) ?? []).some(
        (t) =>
          Math.abs(t.frequencyHz - frequencyHz) <= reach &&
          // A spot speaks for its own position only.
          speaksFor(t.used.held.part, used.held.part),
      ),
    );
  }

  add(point: OverSample): void {
    const cell = this.cellOf(point.frequencyHz);
    this.cells.set(cell, [...(this.cells.get(cell) ?? []), point]);
  }
}

/**
 * The spots to measure with the line's own detector: where an upper bound lies over the line, the
 * worst first taken, and none within the reach of a worse one, since its spot speaks for both. In
 * ascending frequency; `omitted` counts what was left out beyond two hundred.
 */
export function remeasureLine(
  line: CompiledLine,
  used: readonly UsedTrace[],
): { points: RemeasurePoint[]; omitted: number } {
  const over = overSamples(line, used);
  const taken = new Taken(Math.max(0, ...used.map(({ held }) => reachOf(held))));
  const chosen: OverSample[] = [];
  for (const point of over) {
    if (taken.has(point)) continue;
    taken.add(point);
    chosen.push(point);
  }
  const { line: own } = line;
  const points = chosen
    .slice(0, MOST_POINTS)
    .sort((a, b) => a.frequencyHz - b.frequencyHz)
    .map(({ used: one, sample, frequencyHz, limitDb }): RemeasurePoint => {
      const { partIndex, traceIndex } = originOf(one.held, sample);
      return {
        frequencyHz,
        detector: own.detector,
        rbwHz: own.rbwHz,
        lineName: own.name,
        boundDb: heldLevelDb(one.held, sample),
        limitDb,
        traceIndex,
        partIndex,
      };
    });
  return { points, omitted: Math.max(0, chosen.length - MOST_POINTS) };
}
