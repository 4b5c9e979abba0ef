/** Percentile (0…100) of the finite values, linear between ranks; NaN when there are none. */
export function percentile(values: ArrayLike<number>, percent: number): number {
  const sorted = Float64Array.from(values).filter(Number.isFinite).sort();
  if (sorted.length === 0) return Number.NaN;
  const rank = ((sorted.length - 1) * percent) / 100;
  const low = Math.floor(rank);
  const below = sorted[low] ?? Number.NaN;
  const above = sorted[Math.min(low + 1, sorted.length - 1)] ?? below;
  return below + (above - below) * (rank - low);
}

/** Median of the finite values; NaN when there are none. */
export function median(values: ArrayLike<number>): number {
  return percentile(values, 50);
}
