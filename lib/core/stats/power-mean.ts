/** Mean of levels in dB as powers, 10·log10(mean(10^(L/10))), dB; NaN without any. */
export function powerMeanDb(levelsDb: readonly number[]): number {
  const [first = Number.NaN] = levelsDb;
  // One value, or several that are the same, is its own mean to the last digit.
  if (levelsDb.every((level) => level === first)) return first;
  // Held against the highest, so that no level overflows.
  const top = Math.max(...levelsDb);
  const sum = levelsDb.reduce((total, level) => total + 10 ** ((level - top) / 10), 0);
  return top + 10 * Math.log10(sum / levelsDb.length);
}

/**
 * Margin in dB that the power mean of the levels has: −10·log10(mean(10^(−m/10))), which is
 * nearer to the lowest margin than the plain mean. NaN without any.
 */
export function powerMeanMarginDb(marginsDb: readonly number[]): number {
  return -powerMeanDb(marginsDb.map((margin) => -margin));
}
