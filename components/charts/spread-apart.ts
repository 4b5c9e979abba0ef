/**
 * Moves centres apart along one axis until blocks of the given sizes no longer overlap, and keeps
 * them between `from` and `to` as far as they fit. The order of the centres is kept.
 */
export function spreadApart(
  blocks: readonly { at: number; size: number }[],
  from: number,
  to: number,
): number[] {
  const order = blocks.map((block, i) => ({ ...block, i })).sort((a, b) => a.at - b.at);
  let edge = from;
  for (const block of order) {
    block.at = Math.max(block.at, edge + block.size / 2);
    edge = block.at + block.size / 2;
  }
  edge = to;
  for (const block of [...order].reverse()) {
    block.at = Math.min(block.at, edge - block.size / 2);
    edge = block.at - block.size / 2;
  }
  const places = new Array<number>(blocks.length).fill(from);
  for (const block of order) places[block.i] = block.at;
  return places;
}
