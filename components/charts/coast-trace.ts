import type { Detector, Hold } from "@/lib/core/sweep/settings";
import type { TraceView } from "@/lib/core/sweep/trace-view";

/** A trace as the coast chart draws it: water, an outline over it, or the ambient's stipple. */
export interface CoastTrace {
  id: string;
  name: string;
  role: "main" | "outline" | "ambient";
  /** What is in view; null while it is not there. */
  view: TraceView | null;
  /** The whole trace, for the strip below and for a level axis that stays put while zooming. */
  overview?: TraceView | null;
  /**
   * With both of these the chart says which limits the trace decides, and marks what runs over
   * them. Without them it draws levels and claims nothing.
   */
  detector?: Detector | null;
  hold?: Hold;
}

export type CoastState = "ready" | "loading" | "error";
