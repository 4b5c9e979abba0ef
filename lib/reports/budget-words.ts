import type { Distribution, ReferenceUncertainty } from "@/lib/core/bench/uncertainty-budget";
import type { SnapshotBudget } from "./report-content";

export const DISTRIBUTION_LABELS: Record<Distribution, string> = {
  normal: "normal, k = 2, ÷ 2",
  rectangular: "rectangular, ÷ √3",
  triangular: "triangular, ÷ √6",
  "u-shaped": "U-shaped, ÷ √2",
  "type-a": "type A, s ÷ √n",
};

export const REFERENCE_LABELS: Record<ReferenceUncertainty, string> = {
  "mains-9k-150k": "conducted, mains, 9 kHz to 150 kHz",
  "mains-150k-30m": "conducted, mains, 150 kHz to 30 MHz",
  "oats-sac-30m-1g": "radiated, open site or semi-anechoic, 30 MHz to 1 GHz",
  "far-30m-1g": "radiated, fully anechoic, 30 MHz to 1 GHz",
  "field-1g-6g": "radiated, 1 GHz to 6 GHz",
  "field-6g-18g": "radiated, 6 GHz to 18 GHz",
};

/** How guards come to be; the rule that a reader holds the standing against. */
export const GUARD_RULE =
  "The guard band is w = U, the expanded uncertainty (ILAC-G8:09/2019), or max(0, U − U_CISPR), what U exceeds the published uncertainty by (CISPR 16-4-2), or none, or a number that the team states; each sweep keeps the guard that was in force at its import.";

export const inDb = (db: number) => `${db.toFixed(2)} dB`;

/** Truncated to one decimal, so that no more freedom is claimed than there is. */
export function degreesWords(degrees: number | null): string {
  return degrees === null ? "unlimited" : (Math.floor(degrees * 10 + 1e-6) / 10).toFixed(1);
}

/** A guard that a rule computes is rounded up to 0.01 dB. */
const isRoundedUp = (guardDb: number, exactDb: number) =>
  Math.abs(guardDb - Math.ceil(exactDb * 100 - 1e-9) / 100) < 1e-6;

/**
 * Which rule gives the guard recorded with a sweep, from its budget. Only what the numbers say:
 * a typed number that happens to equal U reads the same.
 */
export function guardSource(guardDb: number, budget: SnapshotBudget | null): string {
  if (guardDb === 0 && budget === null) return "no guard";
  if (!budget) return "stated by the team";
  const { expandedDb, reference } = budget;
  if (isRoundedUp(guardDb, expandedDb)) return "U of the budget (w = U), rounded up";
  if (reference && isRoundedUp(guardDb, Math.max(0, expandedDb - reference.uncertaintyDb)))
    return guardDb === 0
      ? "U lies within U_CISPR, or no guard"
      : "U − U_CISPR of the budget, rounded up";
  return guardDb === 0 ? "no guard" : "stated by the team";
}
