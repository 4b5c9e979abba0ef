const STEPS = [0.1, 0.2, 0.5, 1, 2, 5, 10, 20, 50, 100];

/** Bottom and top of a level axis in dB. */
export interface LevelRange {
  fromDb: number;
  toDb: number;
}

/** The smallest round step in dB that puts at least `spacingPx` between two ticks. */
export function levelStepDb(spanDb: number, heightPx: number, spacingPx = 30): number {
  const atMost = Math.max(1, Math.floor(heightPx / spacingPx));
  return STEPS.find((step) => spanDb / step <= atMost) ?? 100;
}

/** Round levels inside a range, ascending, in dB. */
export function levelTicks(range: LevelRange, heightPx: number, spacingPx?: number): number[] {
  const step = levelStepDb(range.toDb - range.fromDb, heightPx, spacingPx);
  const first = Math.ceil(range.fromDb / step - 1e-9);
  const last = Math.floor(range.toDb / step + 1e-9);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => {
    const tick = Number(((first + i) * step).toFixed(1));
    return tick === 0 ? 0 : tick;
  });
}

/**
 * A range that holds every finite value with some air, its ends on round steps of 5 dB, at least
 * `minimumSpanDb` wide. Without any finite value it is `minimumSpanDb` from zero.
 */
export function levelRange(
  valuesDb: readonly (number | null)[],
  air: { belowDb: number; aboveDb: number },
  minimumSpanDb = 30,
): LevelRange {
  let low = Number.POSITIVE_INFINITY;
  let high = Number.NEGATIVE_INFINITY;
  for (const value of valuesDb) {
    if (value === null || !Number.isFinite(value)) continue;
    if (value < low) low = value;
    if (value > high) high = value;
  }
  if (low > high) return { fromDb: 0, toDb: minimumSpanDb };
  const fromDb = Math.floor((low - air.belowDb) / 5) * 5;
  const toDb = Math.ceil((high + air.aboveDb) / 5) * 5;
  const missing = Math.max(0, minimumSpanDb - (toDb - fromDb));
  return {
    fromDb: fromDb - Math.floor(missing / 10) * 5,
    toDb: toDb + Math.ceil(missing / 10) * 5,
  };
}

/** A level on an axis: a true minus, and a decimal only where the step needs it. */
export function labelLevel(levelDb: number): string {
  const size = Math.abs(levelDb);
  return `${levelDb < 0 ? "\u2212" : ""}${Number.isInteger(size) ? size : size.toFixed(1)}`;
}
