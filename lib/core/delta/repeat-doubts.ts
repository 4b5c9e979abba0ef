import type { Repeats } from "./pair-sweeps";

const named = (side: Repeats) => side.map((sweep) => sweep.name).join(", ");

/** What speaks against taking the sweeps of one side for repeats of one state; whole sentences. */
export function findRepeatDoubts(side: Repeats): string[] {
  const [first, ...rest] = side;
  if (rest.length === 0) return [];
  const doubts: string[] = [];
  const link = JSON.stringify(first.link);
  if (rest.some((sweep) => JSON.stringify(sweep.link) !== link))
    doubts.push(`Taken as repeats although their link settings differ: ${named(side)}.`);
  const read = (sweep: Repeats[number]) =>
    JSON.stringify(sweep.traces.map((t) => [t.maxDb, t.floorDb, t.powerSumDb]));
  if (rest.some((sweep) => read(sweep) === read(first)))
    doubts.push(
      `Some repeats read the same to the last digit, as if one sweep had been imported twice: ${named(side)}.`,
    );
  return doubts;
}
