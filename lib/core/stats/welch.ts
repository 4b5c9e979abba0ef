import { studentQuantile } from "./student";

/** s²/n with the sample variance (n − 1); exactly 0 when all values are the same. */
function meanVariance(values: readonly number[]): number {
  const [first = Number.NaN] = values;
  if (values.every((value) => value === first)) return 0;
  const n = values.length;
  const mean = values.reduce((sum, value) => sum + value, 0) / n;
  return values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (n - 1) / n;
}

/**
 * Half of the two-sided 95 % interval of a difference between two groups of repeats, in their
 * unit: k·√(s₁²/n₁ + s₂²/n₂) with Student's k for the degrees of freedom of Welch and
 * Satterthwaite. Null when a group has fewer than two values: then no scatter is known.
 */
export function welchHalfWidth(before: readonly number[], after: readonly number[]): number | null {
  if (before.length < 2 || after.length < 2) return null;
  const [a, b] = [meanVariance(before), meanVariance(after)];
  const sum = a + b;
  if (sum === 0) return 0;
  // Written as shares of the sum, so that a very small scatter does not underflow.
  const dof = 1 / ((a / sum) ** 2 / (before.length - 1) + (b / sum) ** 2 / (after.length - 1));
  return studentQuantile(0.975, dof) * Math.sqrt(sum);
}
