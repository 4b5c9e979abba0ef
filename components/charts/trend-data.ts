import type { Standing } from "@/lib/core/reading/reading";

export interface TrendPoint {
  buildName: string;
  /** ISO date or null. */
  builtOn: string | null;
  /** Worst margin of the build under this mask, dB; null when there is none. */
  marginDb: number | null;
  standing: Standing;
  href?: string;
}

export interface TrendSeries {
  maskTitle: string;
  points: TrendPoint[];
}

export interface TrendMilestone {
  name: string;
  /** ISO date. */
  dueOn: string;
  requiredMarginDb: number | null;
}
