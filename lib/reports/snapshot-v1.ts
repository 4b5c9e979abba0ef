import type { MarginChange, SweepDelta } from "@/lib/core/delta/delta";
import type {
  LineReading,
  MarginPoint,
  Reading,
  RemeasurePoint,
  Suspect,
} from "@/lib/core/reading/reading";
import type { ReportContent, SnapshotReading, SnapshotStep, SnapshotSweep } from "./report-content";

/** `T` as it was before it had the keys `K`, which later rows of the same version may have. */
type Before<T, K extends keyof T> = Omit<T, K> & Partial<Pick<T, K>>;

type PointV1 = Before<MarginPoint, "partIndex">;

interface LineReadingV1 extends Omit<LineReading, "worst" | "bands"> {
  worst: PointV1 | null;
  bands?: LineReading["bands"];
}

export interface ReadingV1 extends Omit<
  Reading,
  "lines" | "suspects" | "remeasure" | "remeasureOmitted"
> {
  lines: LineReadingV1[];
  suspects: Before<Suspect, "partIndex">[];
  remeasure: Before<RemeasurePoint, "traceIndex" | "partIndex">[];
  remeasureOmitted?: number;
}

export type SnapshotReadingV1 = Pick<SnapshotReading, "maskRevision" | "mask"> & {
  reading: ReadingV1;
};

type BenchV1 = Omit<SnapshotSweep["bench"], "calibration" | "budget">;

export type SnapshotSweepV1 = Omit<
  SnapshotSweep,
  "onRecord" | "ambientSweeps" | "floorSweeps" | "bench" | "readings"
> & { bench: BenchV1; readings: SnapshotReadingV1[] };

type MarginChangeV1 = Before<
  MarginChange,
  "bands" | "uncertaintyDb" | "repeats" | "isWithinRepeatability"
>;

type ChangesV1 = Before<
  NonNullable<SweepDelta["changes"]>,
  "levels" | "suspects" | "repeatability"
>;

export type SweepDeltaV1 = Before<Omit<SweepDelta, "changes">, "accepted"> & {
  changes: (Omit<ChangesV1, "margins"> & { margins: MarginChangeV1[] }) | null;
};

export type SnapshotStepV1 = Pick<SnapshotStep, "position" | "name" | "description" | "sweeps"> & {
  againstPrevious: SweepDeltaV1[];
  againstStart: SweepDeltaV1[];
};

/** Version 1: readings sweep by sweep, combined only when drawn; ladders without branches. */
export type SnapshotV1 = Omit<
  ReportContent,
  "version" | "sweeps" | "combined" | "notHeld" | "ladder"
> & {
  version: 1;
  sweeps: SnapshotSweepV1[];
  ladder: { name: string; steps: SnapshotStepV1[] } | null;
};
