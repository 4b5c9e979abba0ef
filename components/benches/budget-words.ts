import type { ExpandedUncertainty } from "@/lib/core/bench/expanded-uncertainty";
import { U_CISPR_DB } from "@/lib/core/bench/guard";
import type {
  Distribution,
  GuardRule,
  ReferenceUncertainty,
} from "@/lib/core/bench/uncertainty-budget";

export const DISTRIBUTION_LABELS: Record<Distribution, string> = {
  normal: "normal, value at k = 2",
  rectangular: "rectangular, half-width",
  triangular: "triangular, half-width",
  "u-shaped": "U-shaped, half-width",
  "type-a": "type A, standard deviation",
};

/** What turns the value into a standard uncertainty. */
export const DIVISORS: Record<Distribution, string> = {
  normal: "÷ 2",
  rectangular: "÷ √3",
  triangular: "÷ √6",
  "u-shaped": "÷ √2",
  "type-a": "÷ √n",
};

export const REFERENCE_LABELS: Record<ReferenceUncertainty, string> = {
  "mains-9k-150k": "conducted, mains, 9 kHz to 150 kHz",
  "mains-150k-30m": "conducted, mains, 150 kHz to 30 MHz",
  "oats-sac-30m-1g": "radiated, open site or semi-anechoic, 30 MHz to 1 GHz",
  "far-30m-1g": "radiated, fully anechoic, 30 MHz to 1 GHz",
  "field-1g-6g": "radiated, 1 GHz to 6 GHz",
  "field-6g-18g": "radiated, 6 GHz to 18 GHz",
};

export const GUARD_RULE_LABELS: Record<GuardRule, string> = {
  stated: "stated: the number that the team types",
  none: "none: no guard",
  expanded: "U: the whole expanded uncertainty",
  excess: "U − U_CISPR: what U exceeds CISPR's value by",
};

export const inDb = (db: number) => `${db.toFixed(2)} dB`;

/** Degrees of freedom as people read them: truncated, as GUM G.4.1 has it for tables. */
export function degreesWords(degrees: number): string {
  return Number.isFinite(degrees) ? (Math.floor(degrees * 10 + 1e-6) / 10).toFixed(1) : "unlimited";
}

/** Where the guard in force comes from, in one sentence. */
export function guardSentence(
  rule: GuardRule,
  guardDb: number,
  result: ExpandedUncertainty | null,
  reference: ReferenceUncertainty | null,
): string {
  switch (rule) {
    case "none":
      return "No guard: every margin of 0 dB or more is clear, however uncertain the bench is.";
    case "stated":
      return `The guard of ${guardDb} dB is stated by the team${result ? `; the budget below gives U = ${inDb(result.expandedDb)}` : ""}.`;
    case "expanded":
      return `The guard of ${guardDb} dB is the expanded uncertainty U of the budget (ILAC-G8:09/2019, guard band w = U), rounded up to 0.01 dB.`;
    case "excess": {
      if (result === null || reference === null) return `The guard is ${guardDb} dB.`;
      const published = `U_CISPR = ${U_CISPR_DB[reference].toFixed(1)} dB (CISPR 16-4-2, from memory)`;
      return guardDb === 0
        ? `No guard is needed: U = ${inDb(result.expandedDb)} lies within ${published}.`
        : `The guard of ${guardDb} dB is what U = ${inDb(result.expandedDb)} exceeds ${published} by, rounded up to 0.01 dB.`;
    }
  }
}
