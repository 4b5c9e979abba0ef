import type { Mask } from "../mask/mask";
import type { MeasurementSettings } from "../sweep/settings";
import type { Trace } from "../sweep/trace";
import { basisOf, tightness } from "./basis";
import { speaksFor } from "./position";

/** What is known of a sweep without its levels. */
export interface SweepOutline {
  settings: MeasurementSettings;
  traces: readonly (Pick<Trace, "detector" | "hold"> & { firstHz: number; lastHz: number })[];
}

/**
 * Whether sweeps have to be held against a mask together, level by level: when a trace of one of
 * them may silence an upper bound of another one. Otherwise their readings alone say the same.
 */
export function mustReadTogether(mask: Mask, sweeps: readonly SweepOutline[]): boolean {
  return mask.lines.some((line) =>
    sweeps.some((loose) =>
      loose.traces.some((bound) => {
        if (basisOf(bound, line.detector) !== "upper-bound") return false;
        return sweeps.some(
          (tight) =>
            tight !== loose &&
            speaksFor(tight.settings, loose.settings) &&
            tight.traces.some(
              (trace) =>
                basisOf(trace, line.detector) !== "cannot-decide" &&
                tightness(trace.detector) > tightness(bound.detector) &&
                trace.firstHz <= bound.lastHz &&
                trace.lastHz >= bound.firstHz,
            ),
        );
      }),
    ),
  );
}
