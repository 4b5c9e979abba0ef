import { spawnSync } from "node:child_process";
import { describe, expect, it } from "vitest";
import { studentQuantile } from "@/lib/core/stats/student";
import { runPython } from "../support/numpy";

// GUM (JCGM 100:2008) table G.2, columns 68.27, 90, 95, 95.45, 99 and 99.73 %; from memory.
const TABLE_G2: [number, number[]][] = [
  [1, [1.84, 6.31, 12.71, 13.97, 63.66, 235.8]],
  [2, [1.32, 2.92, 4.3, 4.53, 9.92, 19.21]],
  [3, [1.2, 2.35, 3.18, 3.31, 5.84, 9.22]],
  [5, [1.11, 2.02, 2.57, 2.65, 4.03, 5.51]],
  [10, [1.05, 1.81, 2.23, 2.28, 3.17, 3.96]],
  [20, [1.03, 1.72, 2.09, 2.13, 2.85, 3.42]],
  [50, [1.01, 1.68, 2.01, 2.05, 2.68, 3.16]],
];
const COVERAGES = [0.6827, 0.9, 0.95, 0.9545, 0.99, 0.9973];

describe("Student's quantile", () => {
  it.each(TABLE_G2)("agrees with GUM table G.2 for %d degrees of freedom", (dof, row) => {
    COVERAGES.forEach((coverage, i) => {
      const value = studentQuantile((1 + coverage) / 2, dof);
      const printed = row[i] ?? Number.NaN;
      // The table is printed to two decimals, and to one for 235.8.
      expect(Math.abs(value - printed)).toBeLessThanOrEqual(printed > 100 ? 0.06 : 0.0051);
    });
  });

  // Closed forms: one degree is the Cauchy distribution, two are x/√(2 + x²) (computed).
  it.each([0.6, 0.9, 0.97725, 0.9999])("is exact where there is a closed form, p = %d", (p) => {
    expect(studentQuantile(p, 1)).toBeCloseTo(Math.tan(Math.PI * (p - 0.5)), 8);
    expect(studentQuantile(p, 2)).toBeCloseTo((2 * p - 1) / Math.sqrt(2 * p * (1 - p)), 10);
  });

  it("is the normal distribution for infinitely many degrees of freedom", () => {
    expect(studentQuantile(0.975, Infinity)).toBeCloseTo(1.959963984540054, 12);
    expect(studentQuantile(0.975, 1e5)).toBeCloseTo(studentQuantile(0.975, 99_999), 8);
  });

  it("is odd around one half", () => {
    expect(studentQuantile(0.5, 4)).toBe(0);
    expect(studentQuantile(0.1, 4)).toBeCloseTo(-studentQuantile(0.9, 4), 12);
  });

  it.each([
    [0, 4],
    [1, 4],
    [-0.2, 4],
    [0.9, 0],
    [0.9, -3],
    [Number.NaN, 4],
    [0.9, Number.NaN],
  ])("has no value for p = %d and %d degrees of freedom", (p, dof) => {
    expect(studentQuantile(p, dof)).toBeNaN();
  });
});

const hasScipy = spawnSync("python3", ["-c", "import scipy.stats"]).status === 0;
if (!hasScipy)
  console.warn("scipy is not installed: Student's quantile goes without its outside reader.");

describe("Student's quantile beside scipy", () => {
  it.runIf(hasScipy)("agrees for whole and fractional degrees of freedom", () => {
    const dofs = [0.7, 1, 1.5, 2.3, 4, 7.77, 16.7, 29.5, 123.4, 9876.5, 99_000, 2e5, 1e7];
    const ps = [0.001, 0.05, 0.3, 0.55, 0.84, 0.95, 0.97725, 0.995, 0.99999];
    const script = `import json,sys,scipy.stats as s
d,p=json.load(sys.stdin)
print(json.dumps([[float(s.t.ppf(x,n)) for x in p] for n in d]))`;
    const expected = runPython<number[][]>(script, [dofs, ps]);
    dofs.forEach((dof, i) =>
      ps.forEach((p, j) => {
        const other = expected[i]?.[j] ?? Number.NaN;
        expect(Math.abs(studentQuantile(p, dof) / other - 1)).toBeLessThan(1e-8);
      }),
    );
  });
});
