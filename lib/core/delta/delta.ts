import type { Standing } from "../reading/reading";
import type { Detector } from "../sweep/settings";

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
  /** Why there is no change although both have a margin; a whole sentence. */
  note: string | null;
}

/** What changed between two sweeps, all in dB, after minus before. */
export interface SweepDelta {
  beforeName: string;
  afterName: string;
  mismatches: Mismatch[];
  /** Differences that weaken the delta without forbidding it (attenuation, VBW, sweep time …). */
  doubts: string[];
  /** null when there are mismatches. */
  changes: {
    /** Detector of the traces that peak, floor and band power were taken from. */
    detector: Detector;
    margins: MarginChange[];
    peakDb: number | null;
    floorDb: number | null;
    bandPowerDb: number | null;
    /** Band power of a peak trace is a comparative sum, not power. */
    bandPowerIsPower: boolean;
    sentence: string;
  } | null;
}
