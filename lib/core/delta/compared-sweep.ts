import type { Standing } from "../reading/reading";
import type { Detector, Hold, MeasurementSettings, SweepPurpose } from "../sweep/settings";
import type { LevelUnit } from "../units/level-units";

/** A trace as a delta sees it; Hz and dB of `unit`. */
export interface ComparedTrace {
  name: string;
  detector: Detector | null;
  hold: Hold;
  unit: LevelUnit;
  firstHz: number;
  lastHz: number;
  stepHz: number | null;
  maxDb: number | null;
  floorDb: number | null;
  powerSumDb: number | null;
}

export interface ComparedLine {
  name: string;
  standing: Standing;
  marginDb: number | null;
  /** Detector of the trace that gave the margin. */
  decidedBy: Detector | null;
}

export interface ComparedReading {
  maskRevisionId: string;
  maskTitle: string;
  lines: ComparedLine[];
}

/** All of a sweep that a delta depends on. */
export interface ComparedSweep {
  id: string;
  name: string;
  purpose: SweepPurpose;
  benchId: string;
  benchName: string;
  signalPathRevisionId: string;
  signalPathRevision: number;
  corrected: boolean;
  settings: MeasurementSettings;
  traces: ComparedTrace[];
  readings: ComparedReading[];
}

/** Whole extent of a sweep's traces in Hz. */
export function spanOf(sweep: ComparedSweep): { fromHz: number; toHz: number } {
  return {
    fromHz: Math.min(...sweep.traces.map((t) => t.firstHz)),
    toHz: Math.max(...sweep.traces.map((t) => t.lastHz)),
  };
}
