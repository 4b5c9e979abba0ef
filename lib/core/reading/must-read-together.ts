import type { Mask } from "../mask/mask";
import type { MeasurementSettings } from "../sweep/settings";
import type { Trace } from "../sweep/trace";
import { basisOf, tightness } from "./basis";
import { speaksFor } from "./position";

/** What is known of a sweep without its levels. */
export interface SweepOutline {
  settings: MeasurementSettings;
  arrangement?: string;
  traces: readonly TraceOutline[];
}

interface TraceOutline extends Pick<Trace, "kind" | "detector" | "hold"> {
  firstHz: number;
  lastHz: number;
  /** Spacing of a regular axis; null where it varies. */
  stepHz: number | null;
}

/** Spacing in Hz that no median of the trace's steps is above. */
const widestStepHz = ({ firstHz, lastHz, stepHz }: TraceOutline) => stepHz ?? lastHz - firstHz;

/**
 * How far in Hz a tighter trace may speak beyond its own ends: a spot within the RBW or step of the
 * looser trace, a scan half a step.
 */
function reachHz(tight: TraceOutline, loose: TraceOutline, rbwHz: number | null): number {
  const hz = Math.max(rbwHz ?? 0, widestStepHz(loose), widestStepHz(tight) / 2);
  return hz * (1 + 1e-9);
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
            speaksFor(tight, loose) &&
            tight.traces.some((trace) => {
              const reach = reachHz(trace, bound, loose.settings.rbwHz);
              return (
                basisOf(trace, line.detector) !== "cannot-decide" &&
                tightness(trace.detector) > tightness(bound.detector) &&
                trace.firstHz <= bound.lastHz + reach &&
                trace.lastHz >= bound.firstHz - reach
              );
            }),
        );
      }),
    ),
  );
}
