import { studentQuantile } from "../stats/student";
import type { BudgetLine, UncertaintyBudget } from "./uncertainty-budget";

/** GUM 6.3.3: about 95.45 % where the result is close to normal. */
export const COVERAGE_FACTOR = 2;
/** Two-sided coverage that k = 2 stands for. */
export const COVERAGE = 0.9545;
/** Below this k = 2 covers noticeably less than it claims; common practice, no source. */
export const FEW_DEGREES = 30;

export interface BudgetLineResult {
  line: BudgetLine;
  /** Standard uncertainty u in dB. */
  standardDb: number;
  /** |c·u| in dB. */
  contributionDb: number;
  /** Share of u_c², 0 to 1. */
  share: number;
  /** Infinity for a line from a data sheet. */
  degreesOfFreedom: number;
}

export interface ExpandedUncertainty {
  lines: BudgetLineResult[];
  /** Combined standard uncertainty u_c in dB. */
  combinedDb: number;
  /** ν_eff; Infinity when no line is limited. */
  effectiveDegrees: number;
  /** k, always 2. */
  coverageFactor: number;
  /** U = k·u_c in dB. */
  expandedDb: number;
  /** Below 30 degrees of freedom: Student's k for 95.45 % and the U that it gives, in dB. */
  student: { coverageFactor: number; expandedDb: number } | null;
}

/** Standard uncertainty of a line in dB (GUM 4.2, 4.3). */
export function standardUncertainty(line: BudgetLine): number {
  switch (line.distribution) {
    case "normal":
      return line.value / 2;
    case "rectangular":
      return line.value / Math.sqrt(3);
    case "triangular":
      return line.value / Math.sqrt(6);
    case "u-shaped":
      return line.value / Math.SQRT2;
    case "type-a":
      return line.value / Math.sqrt(line.observations ?? Number.NaN);
  }
}

/** What a type A line does not state follows from its observations: n − 1 (GUM 4.2.6). */
function degreesOf(line: BudgetLine): number {
  if (line.degreesOfFreedom !== null) return line.degreesOfFreedom;
  if (line.distribution !== "type-a") return Infinity;
  return (line.observations ?? Number.NaN) - 1;
}

/**
 * ν_eff = u_c⁴ / Σ(u_i⁴/ν_i) of contributions with their degrees of freedom (Welch–Satterthwaite,
 * GUM G.4.1). Infinity when none of them is limited.
 */
export function effectiveDegrees(
  parts: readonly { contribution: number; degreesOfFreedom: number }[],
): number {
  const combined = Math.hypot(...parts.map((p) => p.contribution));
  if (combined === 0) return Infinity;
  // Relative to u_c, so that no fourth power leaves the range of numbers.
  const sum = parts.reduce((s, p) => s + (p.contribution / combined) ** 4 / p.degreesOfFreedom, 0);
  return sum === 0 ? Infinity : 1 / sum;
}

/**
 * Evaluates a sound budget (see validateBudget), all in dB: u_c = √Σ(c·u)², U = 2·u_c, ν_eff.
 * The quantities are taken as uncorrelated.
 */
export function expandedUncertainty(budget: UncertaintyBudget): ExpandedUncertainty {
  const parts = budget.lines.map((line) => {
    const standardDb = standardUncertainty(line);
    return {
      line,
      standardDb,
      contributionDb: Math.abs(line.sensitivity * standardDb),
      degreesOfFreedom: degreesOf(line),
    };
  });
  const combinedDb = Math.hypot(...parts.map((p) => p.contributionDb));
  const nuEff = effectiveDegrees(
    parts.map((p) => ({ contribution: p.contributionDb, degreesOfFreedom: p.degreesOfFreedom })),
  );
  const studentK = studentQuantile((1 + COVERAGE) / 2, nuEff);
  return {
    lines: parts.map((p) => ({
      ...p,
      share: combinedDb === 0 ? 0 : (p.contributionDb / combinedDb) ** 2,
    })),
    combinedDb,
    effectiveDegrees: nuEff,
    coverageFactor: COVERAGE_FACTOR,
    expandedDb: COVERAGE_FACTOR * combinedDb,
    student:
      nuEff < FEW_DEGREES ? { coverageFactor: studentK, expandedDb: studentK * combinedDb } : null,
  };
}
