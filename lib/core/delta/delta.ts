import type { Standing } from "../reading/reading";

/** Why two sweeps may not be compared. `text` is a whole sentence with both values. */
export interface Mismatch {
  field:
    | "bench"
    | "signal-path"
    | "distance"
    | "rbw"
    | "rbw-kind"
    | "detector"
    | "unit"
    | "span"
    | "purpose"
    | "polarization"
    | "position"
    | "port";
  text: string;
}

export interface MarginChange {
  maskRevisionId: string;
  maskTitle: string;
  lineName: string;
  beforeDb: number | null;
  afterDb: number | null;
  beforeStanding: Standing;
  afterStanding: Standing;
  /** after minus before, dB; positive means more room under the mask. */
  changeDb: number | null;
}

/** What changed between two sweeps, all in dB, after minus before. */
export interface SweepDelta {
  mismatches: Mismatch[];
  /** Differences that weaken the delta without forbidding it (attenuation, VBW, sweep time …). */
  doubts: string[];
  /** null when there are mismatches. */
  changes: {
    margins: MarginChange[];
    peakDb: number | null;
    floorDb: number | null;
    bandPowerDb: number | null;
    /** Band power of a peak trace is a comparative sum, not power. */
    bandPowerIsPower: boolean;
    sentence: string;
  } | null;
}
