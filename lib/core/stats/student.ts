/** Above this the expansion below is closer than the beta function's own rounding. */
const EXPANSION_FROM_DOF = 1e5;
const SMALLEST = 1e-300;

/** ln Γ(x) for x > 0 (Lanczos, g = 7, nine coefficients). */
function logGamma(x: number): number {
  const coefficients = [
    676.5203681218851, -1259.1392167224028, 771.32342877765313, -176.61502916214059,
    12.507343278686905, -0.13857109526572012, 9.9843695780195716e-6, 1.5056327351493116e-7,
  ];
  if (x < 0.5) return Math.log(Math.PI / Math.sin(Math.PI * x)) - logGamma(1 - x);
  const z = x - 1;
  let sum = 0.99999999999980993;
  for (const [i, c] of coefficients.entries()) sum += c / (z + i + 1);
  const t = z + 7.5;
  return 0.5 * Math.log(2 * Math.PI) + (z + 0.5) * Math.log(t) - t + Math.log(sum);
}

/** Continued fraction of the incomplete beta function, by Lentz's method. */
function betaFraction(x: number, a: number, b: number): number {
  const keep = (value: number) => (Math.abs(value) < SMALLEST ? SMALLEST : value);
  let c = 1;
  let d = 1 / keep(1 - ((a + b) * x) / (a + 1));
  let fraction = d;
  for (let m = 1; m < 10_000; m += 1) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / keep(1 + even * d);
    c = keep(1 + even / c);
    fraction *= d * c;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / keep(1 + odd * d);
    c = keep(1 + odd / c);
    fraction *= d * c;
    if (Math.abs(d * c - 1) < 1e-15) break;
  }
  return fraction;
}

/** Regularized incomplete beta function I_x(a, b) with y = 1 − x given, so that none is lost. */
function betaShare(x: number, y: number, a: number, b: number): number {
  if (x <= 0) return 0;
  if (y <= 0) return 1;
  const front = Math.exp(
    logGamma(a + b) - logGamma(a) - logGamma(b) + a * Math.log(x) + b * Math.log(y),
  );
  return x < (a + 1) / (a + b + 2)
    ? (front * betaFraction(x, a, b)) / a
    : 1 - (front * betaFraction(y, b, a)) / b;
}

/** Share of Student's distribution above t > 0. */
function tailAbove(t: number, dof: number): number {
  const whole = dof + t * t;
  return betaShare(dof / whole, (t * t) / whole, dof / 2, 0.5) / 2;
}

/** Share of the normal distribution above z ≥ 0, by its series around 0. */
function normalAbove(z: number): number {
  let term = z;
  let sum = z;
  for (let k = 3; term > sum * 1e-17; k += 2) {
    term *= (z * z) / k;
    sum += term;
  }
  return 0.5 - (Math.exp((-z * z) / 2) / Math.sqrt(2 * Math.PI)) * sum;
}

/** Where a falling function reaches `share`, by halving. */
function solve(above: (at: number) => number, share: number): number {
  let high = 1;
  while (above(high) > share && high < 1e150) high *= 2;
  let low = 0;
  for (let i = 0; i < 200 && high - low > 1e-15 * high; i += 1) {
    const middle = (low + high) / 2;
    if (above(middle) > share) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/**
 * The value that Student's t stays below with probability p, for `dof` degrees of freedom above
 * 0, which need not be whole (Welch–Satterthwaite gives fractions; GUM G.4 lets them be truncated
 * or interpolated); Infinity gives the normal distribution. NaN outside 0 < p < 1 or for no
 * degrees of freedom. A two-sided coverage of 95.45 % is p = 0.97725 (GUM table G.2).
 */
export function studentQuantile(p: number, dof: number): number {
  if (!(p > 0 && p < 1) || !(dof > 0)) return Number.NaN;
  if (p === 0.5) return 0;
  const share = Math.min(p, 1 - p);
  const sign = p < 0.5 ? -1 : 1;
  if (dof < EXPANSION_FROM_DOF) return sign * solve((t) => tailAbove(t, dof), share);
  const z = solve(normalAbove, share);
  // Cornish–Fisher around the normal distribution; the next term is of the order of dof⁻².
  return sign * (z + (z ** 3 + z) / (4 * dof));
}
