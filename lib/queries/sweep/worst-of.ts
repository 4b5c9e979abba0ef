import type { Standing } from "@/lib/core/reading/reading";

const WORST_FIRST: readonly Standing[] = ["over", "undecided", "inside-guard", "clear"];

/** The reading that decides among several: the worst standing, and in it the lowest margin. */
export function worstOf<T extends { standing: Standing; marginDb: number | null }>(
  readings: readonly T[],
): T | null {
  const rank = (r: T) => WORST_FIRST.indexOf(r.standing);
  const margin = (r: T) => r.marginDb ?? Number.POSITIVE_INFINITY;
  let worst: T | null = null;
  for (const reading of readings) {
    if (
      !worst ||
      rank(reading) < rank(worst) ||
      (rank(reading) === rank(worst) && margin(reading) < margin(worst))
    )
      worst = reading;
  }
  return worst;
}
