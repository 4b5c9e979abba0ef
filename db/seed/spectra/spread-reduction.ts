import type { SpreadSpectrum } from "@/lib/core/link/link-settings";
import type { SeedDetector } from "./setup";

/** Smooth lesser of two reductions in dB. */
function softLesser(first: number, second: number, sharpness: number): number {
  const sum = 10 ** ((-sharpness * first) / 10) + 10 ** ((-sharpness * second) / 10);
  return -(10 / sharpness) * Math.log10(sum);
}

/**
 * Reduction in dB of one line that is swept over `widthHz`, read with a Gaussian filter. Closed
 * forms fitted to a simulation (computed, within 0.4 dB for width ≥ 40 modulation rates). The
 * average form is the triangular one for all profiles, and a cubic profile counts as triangular.
 */
export function spreadReductionDb(
  spread: SpreadSpectrum,
  widthHz: number,
  rbwHz: number,
  detector: SeedDetector,
): number {
  const rateHz = spread.modulationHz;
  const b3Hz = rbwHz / Math.SQRT2;
  const ratio = widthHz / rateHz;
  const q = (2 * widthHz * rateHz) / b3Hz ** 2;
  const z = (widthHz * rateHz ** 2) / b3Hz ** 3;
  const log = Math.log10;
  if (detector === "average") {
    const far = 3.33 * log(1 + (widthHz / (1.0645 * b3Hz)) ** 3);
    const fast = 3.12 * (1 - 1 / (1 + (q / 13.7) ** 1.09));
    return Math.max(0, softLesser(far - fast, 10 * log(ratio) - 3.1, 14));
  }
  const peak =
    spread.profile === "sinusoidal"
      ? softLesser(6.59 * log(1 + (0.5037 * z) ** 1.012), 6.67 * log(ratio) + 1.44, 3.9)
      : softLesser(8.58 * log(1 + (0.1172 * q) ** 1.166), 10 * log(ratio) - 2.92, 4.1);
  // The line comes by twice per modulation period, far faster than a quasi-peak detector lets
  // go, so that detector reads little under peak (common practice, no source).
  return Math.max(0, detector === "quasi-peak" ? peak + Math.min(1, 0.2 * peak) : peak);
}
