/**
 * How the value of a line becomes a standard uncertainty: a normal one is given at k = 2, of a
 * rectangular, triangular or U-shaped one the half-width, of type A the standard deviation s of
 * n observations.
 */
export const DISTRIBUTIONS = ["normal", "rectangular", "triangular", "u-shaped", "type-a"] as const;
export type Distribution = (typeof DISTRIBUTIONS)[number];

export interface BudgetLine {
  name: string;
  /** In dB. */
  value: number;
  distribution: Distribution;
  /** How much the level in dB moves per unit of this quantity; usually 1. */
  sensitivity: number;
  /** Degrees of freedom; null: infinitely many, as for a limit from a data sheet. */
  degreesOfFreedom: number | null;
  /** Number of observations of a type A line, otherwise null. */
  observations: number | null;
}

/** The measurement that a published U_CISPR belongs to (CISPR 16-4-2). */
export const REFERENCE_UNCERTAINTIES = [
  "mains-9k-150k",
  "mains-150k-30m",
  "oats-sac-30m-1g",
  "far-30m-1g",
  "field-1g-6g",
  "field-6g-18g",
] as const;
export type ReferenceUncertainty = (typeof REFERENCE_UNCERTAINTIES)[number];

/** Content of one revision of a bench's uncertainty budget. */
export interface UncertaintyBudget {
  version: 1;
  title: string;
  lines: BudgetLine[];
  reference: ReferenceUncertainty | null;
}

/** Where the guard of a bench comes from. */
export const GUARD_RULES = ["stated", "none", "expanded", "excess"] as const;
export type GuardRule = (typeof GUARD_RULES)[number];
