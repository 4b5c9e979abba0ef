import type { Detector } from "../sweep/settings";
import type { Trace } from "../sweep/trace";
import type { Basis } from "./reading";

/** From loose to tight: PK ≥ QP ≥ RMS-AV ≥ AV (CISPR 16-1-1). */
const TIGHTNESS: Partial<Record<Detector, number>> = {
  peak: 0,
  "quasi-peak": 1,
  "rms-average": 2,
  average: 3,
};

/** How tight a trace bounds the true value; traces outside the order give 0. */
export function tightness(detector: Detector | null): number {
  return detector === null ? 0 : (TIGHTNESS[detector] ?? 0);
}

/**
 * What a trace can say about a line of the given detector. Min hold and an unstated detector
 * decide nothing. Averaged repeats of a peak read below the peak, so they bound averages only.
 */
export function basisOf(trace: Pick<Trace, "detector" | "hold">, line: Detector): Basis {
  const { detector, hold } = trace;
  if (detector === null || hold === "min-hold") return "cannot-decide";
  const lineAverages = line === "average" || line === "rms-average";
  if (hold === "average" && !lineAverages) return "cannot-decide";
  if (detector === line) return "like-for-like";
  const own = TIGHTNESS[detector];
  const wanted = TIGHTNESS[line];
  return own !== undefined && wanted !== undefined && own < wanted
    ? "upper-bound"
    : "cannot-decide";
}
