import type { LinkSettings } from "../link/link-settings";
import type { Standing } from "../reading/reading";
import type {
  Detector,
  Hold,
  MeasurementSettings,
  SweepPurpose,
  TraceKind,
} from "../sweep/settings";
import type { LevelUnit } from "../units/level-units";

/** A trace as a delta sees it; Hz and dB of `unit`. */
export interface ComparedTrace {
  name: string;
  kind: TraceKind;
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

/** A margin and the detector of the trace that gave it. */
export interface ComparedMargin {
  marginDb: number | null;
  decidedBy: Detector | null;
}

export interface ComparedBand extends ComparedMargin {
  startHz: number;
  stopHz: number;
}

export interface ComparedLine extends ComparedMargin {
  name: string;
  standing: Standing;
  bands: ComparedBand[];
}

export interface ComparedSuspect {
  frequencyHz: number;
  levelDb: number;
  /** Index into the sweep's traces. */
  traceIndex: number;
}

export interface ComparedReading {
  maskRevisionId: string;
  maskTitle: string;
  /** Guard that the sweep was read with, dB. */
  guardDb: number;
  lines: ComparedLine[];
  suspects: ComparedSuspect[];
}

/** All of a sweep that a delta depends on, but for its levels. */
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
  link: LinkSettings;
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
