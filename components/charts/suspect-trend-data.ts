import type { Standing } from "@/lib/core/reading/reading";

/** What one build says of a followed suspect. */
export interface SuspectTrendPoint {
  buildName: string;
  kind: "seen" | "not-seen" | "not-swept";
  /** null unless seen under a limit, dB. */
  marginDb: number | null;
  /** null unless seen and in the chart's unit, dB. */
  levelDb: number | null;
  standing: Standing | null;
  /** Points of the same key may be subtracted: the line runs between them. */
  comparableKey: string;
  href: string | null;
}
