import { expandedUncertainty } from "./expanded-uncertainty";
import type { GuardRule, ReferenceUncertainty, UncertaintyBudget } from "./uncertainty-budget";

/** U_CISPR in dB, k = 2 (CISPR 16-4-2). From memory: check it against your own copy. */
export const U_CISPR_DB: Record<ReferenceUncertainty, number> = {
  "mains-9k-150k": 3.8,
  "mains-150k-30m": 3.4,
  "oats-sac-30m-1g": 6.3,
  "far-30m-1g": 5.3,
  "field-1g-6g": 5.2,
  "field-6g-18g": 5.5,
};

/** A guard beyond this leaves no margin to read; a typing error in a budget has it. */
export const MAX_GUARD_DB = 40;

/** Rules that compute the guard from a budget. */
export function needsBudget(rule: GuardRule): boolean {
  return rule === "expanded" || rule === "excess";
}

/** Up to the next hundredth, so that the number shown is the number that counts. */
const roundUp = (db: number) => Math.max(0, Math.ceil(db * 100 - 1e-9)) / 100;

/**
 * The guard in dB that a rule gives: none 0; expanded w = U (ILAC-G8:09/2019); excess
 * max(0, U − U_CISPR) (CISPR 16-4-2); stated what was typed. A computed one is rounded up to
 * 0.01 dB. Null when the rule needs a budget with lines, or the measurement it is compared with,
 * and there is none.
 */
export function guardOf(
  rule: GuardRule,
  budget: UncertaintyBudget | null,
  statedGuardDb: number,
): number | null {
  if (rule === "none") return 0;
  if (rule === "stated") return statedGuardDb;
  if (budget === null || budget.lines.length === 0) return null;
  const { expandedDb } = expandedUncertainty(budget);
  if (rule === "expanded") return roundUp(expandedDb);
  if (budget.reference === null) return null;
  return roundUp(Math.max(0, expandedDb - U_CISPR_DB[budget.reference]));
}
