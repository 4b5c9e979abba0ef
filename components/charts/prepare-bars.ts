export interface DeltaItem {
  label: string;
  /** Change of the margin in dB, positive is better; null when the two cannot be compared. */
  changeDb: number | null;
}

export interface DeltaBar {
  label: string;
  changeDb: number | null;
  /** Where the bar starts and how long it is, as percentages of the whole width. */
  leftPercent: number;
  widthPercent: number;
}

/** Bars around a common zero. Zero stands where both the best and the worst bar have room. */
export function prepareBars(items: readonly DeltaItem[]): {
  zeroPercent: number;
  bars: DeltaBar[];
} {
  const values = items.flatMap(({ changeDb }) =>
    changeDb !== null && Number.isFinite(changeDb) ? [changeDb] : [],
  );
  const low = Math.min(0, ...values);
  const high = Math.max(0, ...values);
  const span = high - low || 1;
  const zeroPercent = (-low / span) * 100;
  const bars = items.map(({ label, changeDb }) => {
    const known = changeDb !== null && Number.isFinite(changeDb) ? changeDb : null;
    const widthPercent = (Math.abs(known ?? 0) / span) * 100;
    const leftPercent = known !== null && known < 0 ? zeroPercent - widthPercent : zeroPercent;
    return { label, changeDb: known, leftPercent, widthPercent };
  });
  return { zeroPercent, bars };
}
