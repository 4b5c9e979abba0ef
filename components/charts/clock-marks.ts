import type { ChartPlane } from "./chart-plane";

/** A known clock or one of its harmonics, "2 × 156.25 MHz". */
export interface ClockMark {
  hz: number;
  label: string;
}

export interface PreparedClocks {
  /** Short ticks along the top edge. */
  path: string;
  /** Labels of those that have room for one. */
  labels: { x: number; text: string }[];
}

const TICK_PX = 6;
const CHARACTER_PX = 5.6;

/** Ticks of the clocks in view, ascending, with as many labels as do not touch each other. */
export function prepareClocks(clocks: readonly ClockMark[], plane: ChartPlane): PreparedClocks {
  const seen = clocks
    .filter(({ hz }) => hz >= plane.view.fromHz && hz <= plane.view.toHz)
    .map(({ hz, label }) => ({ x: plane.xOf(hz), label }))
    .sort((a, b) => a.x - b.x);
  const labels: PreparedClocks["labels"] = [];
  let free = plane.left;
  for (const { x, label } of seen) {
    const half = (label.length * CHARACTER_PX) / 2 + 4;
    if (x - half < free || x + half > plane.right) continue;
    labels.push({ x, text: label });
    free = x + half;
  }
  return {
    path: seen.map(({ x }) => `M${x.toFixed(1)},${plane.top}v${TICK_PX}`).join(""),
    labels,
  };
}
