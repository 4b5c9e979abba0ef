import type { Distribution, ReferenceUncertainty } from "@/lib/core/bench/uncertainty-budget";
import type { TransducerKind } from "@/lib/core/bench/signal-path";
import type { SweepDelta } from "@/lib/core/delta/delta";
import type { StepState } from "@/lib/core/delta/ladder-order";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import type { Mask, Provenance } from "@/lib/core/mask/mask";
import type { SuspectAmbient } from "@/lib/core/reading/ambient-check";
import type { Reading, Standing } from "@/lib/core/reading/reading";
import type { SuspectState } from "@/lib/core/reading/suspect-state";
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

/** Who compared a mask's limits with their own copy, when (ISO) and with which copy. */
export interface SnapshotConfirmation {
  by: string;
  at: string;
  copy: string;
}

export interface SnapshotMask {
  maskRevisionId: string;
  maskRevision: number;
  mask: Mask;
  /** null: nobody confirmed this revision. */
  confirmation: SnapshotConfirmation | null;
}

/** A suspect that the program follows, or one beside it. */
export interface SnapshotFollowed {
  /** Of the suspect in its reading. */
  number: number;
  followedNumber: number;
  state: SuspectState;
  /** false: only within the tolerance of the followed one. */
  isSame: boolean;
}

export interface SnapshotReading extends SnapshotMask {
  /** With the doubts of the bench's day. */
  reading: Reading;
  /** Of the suspects that a comparable ambient sweep covers; the others are unknown. */
  ambient: SuspectAmbient[];
  followed: SnapshotFollowed[];
}

/** What the product sweeps of a report say about one mask revision together, level by level. */
export interface SnapshotCombined extends SnapshotMask {
  /** The sweeps held together; every `partIndex` of the reading counts in this order. */
  sweepIds: string[];
  reading: Reading;
  ambient: SuspectAmbient[];
}

/** A mask of the program under which none of the report's sweeps has a margin. */
export interface SnapshotNotHeld {
  title: string;
  maskRevision: number;
  provenance: Provenance;
  confirmation: SnapshotConfirmation | null;
  /** Whole sentences: why the sweeps say nothing about it. */
  reasons: string[];
}

/** An uncertainty budget with its results as they were, in dB. */
export interface SnapshotBudget {
  revision: number;
  title: string;
  lines: {
    name: string;
    value: number;
    distribution: Distribution;
    observations: number | null;
    sensitivity: number;
    contributionDb: number;
    /** null: infinitely many. */
    degreesOfFreedom: number | null;
  }[];
  combinedDb: number;
  effectiveDegrees: number | null;
  coverageFactor: number;
  expandedDb: number;
  /** Student's factor where there are few degrees of freedom. */
  student: { coverageFactor: number; expandedDb: number } | null;
  /** U_CISPR of the measurement that the bench is compared with; from memory. */
  reference: { measurement: ReferenceUncertainty; uncertaintyDb: number } | null;
}

/** Something with a calibration; ISO dates, null: not stated. */
export interface SnapshotInstrument {
  name: string;
  calibratedOn: string | null;
  dueOn: string | null;
}

export interface SnapshotSweep {
  sweepId: string;
  name: string;
  fileName: string;
  fileSha256: string;
  purpose: SweepPurpose;
  /** Whether it counts for the build's trend; null: the report does not know. */
  onRecord: boolean | null;
  /** ISO date of the measurement; null: not stated. */
  measuredOn: string | null;
  importedBy: string;
  importedAt: string;
  /** The instrument had applied the transducer factors itself; the signal path passed through. */
  corrected: boolean;
  settings: MeasurementSettings;
  link: LinkSettings;
  /** Names of the ambient and floor sweeps that belong to it. */
  ambientSweeps: string[];
  floorSweeps: string[];
  bench: {
    name: string;
    site: string;
    instrument: string;
    /** As it was at the import; null: the bench named none. */
    calibration: SnapshotInstrument | null;
    distanceM: number | null;
    /** Recorded with the sweep at its import. */
    guardDb: number;
    budget: SnapshotBudget | null;
    signalPathRevision: number;
    impedanceOhm: number;
    transducers: (SnapshotInstrument & { kind: TransducerKind })[];
  };
  traces: SnapshotTrace[];
  readings: SnapshotReading[];
}

/** Where the product sweeps of a step stand worst, taken together. */
interface SnapshotStanding {
  maskTitle: string;
  provenance: Provenance;
  lineName: string;
  standing: Standing;
  marginDb: number;
  marginAtHz: number;
}

export interface SnapshotStep {
  position: number;
  name: string;
  description: string;
  state: StepState;
  /** The step that it is held against; null for step 0. */
  base: { position: number; name: string } | null;
  /** Somebody said that it starts from `base`, which need not be the product as it stood. */
  isBranch: boolean;
  /** Whether it led to the product as it stands. */
  isOnLine: boolean;
  /** null: the report does not know. */
  onRecord: boolean | null;
  worst: SnapshotStanding | null;
  /** Names of the sweeps of this step. */
  sweeps: string[];
  /** Product sweeps that have no counterpart in the step held against. */
  unpaired: string[];
  /** Against `base`: one for each sweep, or repeats of one, with a counterpart. */
  againstPrevious: SweepDelta[];
  againstStart: SweepDelta[];
}

/** All that a report says, frozen when it is issued. Never edited: a newer report replaces it. */
export interface ReportContent {
  version: 2;
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
  /** One for each mask revision that a product sweep reaches. */
  combined: SnapshotCombined[];
  notHeld: SnapshotNotHeld[];
  ladder: { name: string; steps: SnapshotStep[] } | null;
}
