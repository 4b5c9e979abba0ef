import type { Standing } from "@/lib/core/reading/reading";

const WORST_FIRST: readonly Standing[] = ["over", "undecided", "inside-guard", "clear"];

/**
 * What several readings say together: the worst standing and, independently, the lowest margin,
 * whose reading is returned. A sweep of a narrow band is undecided for want of coverage, and must
 * not hide a lower margin elsewhere. Only what is over is known by its own margins: a bound that
 * reads lower still decides nothing.
 */
export function worstOf<T extends { standing: Standing; marginDb: number | null }>(
  readings: readonly T[],
): T | null {
  const standing = WORST_FIRST.find((s) => readings.some((reading) => reading.standing === s));
  if (standing === undefined) return null;
  const margin = (r: T) => r.marginDb ?? Number.POSITIVE_INFINITY;
  const heard = standing === "over" ? readings.filter((r) => r.standing === "over") : readings;
  const lowest = heard.reduce((a, b) => (margin(b) < margin(a) ? b : a));
  return { ...lowest, standing };
}
