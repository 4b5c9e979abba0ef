import type { TransducerKind } from "@/lib/core/bench/signal-path";
import type { SweepDelta } from "@/lib/core/delta/delta";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import type { Mask } from "@/lib/core/mask/mask";
import type { Reading } from "@/lib/core/reading/reading";
import type {
  Detector,
  Hold,
  MeasurementSettings,
  SweepPurpose,
  TraceKind,
} from "@/lib/core/sweep/settings";
import type { TraceView } from "@/lib/core/sweep/trace-view";
import type { LevelUnit } from "@/lib/core/units/level-units";
import type { Paper } from "./paper";

export interface SnapshotTrace {
  name: string;
  /** Spots are drawn as points: a line between them would claim what nobody measured. */
  kind: TraceKind;
  detector: Detector | null;
  hold: Hold;
  unit: LevelUnit;
  points: number;
  firstHz: number;
  lastHz: number;
  /** Median spacing; null with fewer than two points. */
  stepHz: number | null;
  maxDb: number | null;
  maxAtHz: number | null;
  /** The whole span, decimated without losing a maximum. */
  view: TraceView;
}

export interface SnapshotReading {
  maskRevision: number;
  mask: Mask;
  reading: Reading;
}

export interface SnapshotSweep {
  sweepId: string;
  name: string;
  fileName: string;
  fileSha256: string;
  purpose: SweepPurpose;
  /** ISO date of the measurement; null: not stated. */
  measuredOn: string | null;
  importedBy: string;
  importedAt: string;
  /** The instrument had applied the transducer factors itself; the signal path passed through. */
  corrected: boolean;
  settings: MeasurementSettings;
  link: LinkSettings;
  bench: {
    name: string;
    site: string;
    instrument: string;
    distanceM: number | null;
    guardDb: number;
    signalPathRevision: number;
    impedanceOhm: number;
    transducers: {
      name: string;
      kind: TransducerKind;
      calibratedOn: string | null;
      dueOn: string | null;
    }[];
  };
  traces: SnapshotTrace[];
  readings: SnapshotReading[];
}

export interface SnapshotStep {
  position: number;
  name: string;
  description: string;
  /** Names of the sweeps of this step. */
  sweeps: string[];
  /** One entry for each sweep of the step that has a counterpart; empty for step 0. */
  againstPrevious: SweepDelta[];
  againstStart: SweepDelta[];
}

/** All that a report says, frozen when it is issued. Never edited: a newer report replaces it. */
export interface ReportSnapshot {
  version: 1;
  number: string;
  title: string;
  summary: string;
  paper: Paper;
  team: string;
  program: { name: string; description: string; targetMarginDb: number };
  build: { name: string; builtOn: string | null; notes: string };
  issuedAt: string;
  issuedBy: string;
  /** Number of the report that this one replaces. */
  replaces: string | null;
  sweeps: SnapshotSweep[];
  ladder: { name: string; steps: SnapshotStep[] } | null;
}

/** What happened to a report after its snapshot was taken; printed beside it. */
export interface ReportState {
  state: "issued" | "approved" | "withdrawn";
  sha256: string;
  approvedBy: string | null;
  approvedAt: string | null;
  withdrawnBy: string | null;
  withdrawnAt: string | null;
  withdrawnReason: string | null;
}
