import type { ClockMark } from "@/components/charts/clock-marks";

export interface KnownClock {
  name: string;
  frequencyHz: number;
}

/** More ticks than this along one edge say nothing. */
const MOST_MARKS = 120;

/** Harmonics of known clocks in view, clock by clock; one with too many of them is left out. */
export function harmonicsIn(
  clocks: readonly KnownClock[],
  view: { fromHz: number; toHz: number },
): ClockMark[] {
  return clocks.flatMap(({ name, frequencyHz }) => {
    const first = Math.max(1, Math.ceil(view.fromHz / frequencyHz));
    const last = Math.floor(view.toHz / frequencyHz);
    if (last - first + 1 > MOST_MARKS) return [];
    return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => {
      const order = first + i;
      return { hz: order * frequencyHz, label: order === 1 ? name : `${name} × ${order}` };
    });
  });
}
