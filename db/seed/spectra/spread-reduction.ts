import type { SpreadSpectrum } from "@/lib/core/link/link-settings";
import type { SeedDetector } from "./setup";

/** Smooth lesser of two reductions in dB. */
function softLesser(first: number, second: number, sharpness: number): number {
  const sum = 10 ** ((-sharpness * first) / 10) + 10 ** ((-sharpness * second) / 10);
  return -(10 / sharpness) * Math.log10(sum);
}

/** How a line that is swept over a width reads. */
export interface SweptReading {
  /** Reduction of the power found on average over the width, dB. */
  reductionDb: number;
  /** How far the ripple over the width rises above that, dB. */
  rippleDb: number;
}

/** A ripple between nothing and twice the mean: more cannot be drawn as a wave. */
const MOST_RIPPLE_DB = 10 * Math.log10(2);

/**
 * Reading of one line that is swept over `widthHz`, with a Gaussian filter. The highest level
 * follows closed forms fitted to a simulation (computed, within 0.4 dB for width ≥ 40 modulation
 * rates). The average form is the triangular one for all profiles, and a cubic profile counts as
 * triangular. On average over the width an average detector finds the line's whole power.
 */
export function readSweptLine(
  spread: SpreadSpectrum,
  widthHz: number,
  rbwHz: number,
  detector: SeedDetector,
): SweptReading {
  const rateHz = spread.modulationHz;
  const b3Hz = rbwHz / Math.SQRT2;
  const ratio = widthHz / rateHz;
  const q = (2 * widthHz * rateHz) / b3Hz ** 2;
  const z = (widthHz * rateHz ** 2) / b3Hz ** 3;
  const log = Math.log10;
  if (detector === "average") {
    const mean = 3.33 * log(1 + (widthHz / (1.0645 * b3Hz)) ** 3);
    const fast = 3.12 * (1 - 1 / (1 + (q / 13.7) ** 1.09));
    const least = Math.max(0, softLesser(mean - fast, 10 * log(ratio) - 3.1, 14));
    const rippleDb = Math.min(MOST_RIPPLE_DB, Math.max(0, mean - least));
    return { reductionDb: least + rippleDb, rippleDb };
  }
  const peak =
    spread.profile === "sinusoidal"
      ? softLesser(6.59 * log(1 + (0.5037 * z) ** 1.012), 6.67 * log(ratio) + 1.44, 3.9)
      : softLesser(8.58 * log(1 + (0.1172 * q) ** 1.166), 10 * log(ratio) - 2.92, 4.1);
  // The line comes by twice per modulation period, far faster than a quasi-peak detector lets
  // go, so that detector reads little under peak (common practice, no source).
  const furtherDb = detector === "quasi-peak" ? Math.min(1, 0.2 * peak) : 0;
  return { reductionDb: Math.max(0, peak + furtherDb), rippleDb: 0 };
}
