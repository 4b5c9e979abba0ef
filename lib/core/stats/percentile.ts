/** Percentile (0…100) of the finite values, linear between ranks; NaN when there are none. */
export function percentile(values: ArrayLike<number>, percent: number): number {
  const finite = new Float64Array(values.length);
  let count = 0;
  for (let i = 0; i < values.length; i += 1) {
    const value = values[i] ?? Number.NaN;
    if (Number.isFinite(value)) finite[count++] = value;
  }
  const sorted = finite.subarray(0, count).sort();
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
