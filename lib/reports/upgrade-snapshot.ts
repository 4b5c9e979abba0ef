import type { SweepDelta } from "@/lib/core/delta/delta";
import type { Reading } from "@/lib/core/reading/reading";
import { combineByMask } from "./combine-by-mask";
import type { ReportContent, SnapshotReading, SnapshotStep, SnapshotSweep } from "./report-content";
import type { ReportSnapshot } from "./report-snapshot";
import type {
  ReadingV1,
  SnapshotReadingV1,
  SnapshotStepV1,
  SnapshotSweepV1,
  SnapshotV1,
  SweepDeltaV1,
} from "./snapshot-v1";

function upgradeReading(reading: ReadingV1): Reading {
  return {
    ...reading,
    lines: reading.lines.map(({ worst, bands = [], ...line }) => ({
      ...line,
      worst: worst && { partIndex: 0, ...worst },
      bands,
    })),
    suspects: reading.suspects.map((suspect) => ({ partIndex: 0, ...suspect })),
    remeasure: reading.remeasure.map((point) => ({ traceIndex: 0, partIndex: 0, ...point })),
    remeasureOmitted: reading.remeasureOmitted ?? 0,
  };
}

function upgradeHeld({ mask, maskRevision, reading }: SnapshotReadingV1): SnapshotReading {
  return {
    // Version 1 named no id; title and revision tell its masks apart.
    maskRevisionId: `${mask.key} ${mask.title} ${maskRevision}`,
    maskRevision,
    mask,
    confirmation: null,
    reading: upgradeReading(reading),
    ambient: [],
    followed: [],
  };
}

function upgradeSweep(sweep: SnapshotSweepV1): SnapshotSweep {
  return {
    ...sweep,
    onRecord: null,
    ambientSweeps: [],
    floorSweeps: [],
    bench: { ...sweep.bench, calibration: null, budget: null },
    readings: sweep.readings.map(upgradeHeld),
  };
}

function upgradeDelta({ accepted = null, changes, ...delta }: SweepDeltaV1): SweepDelta {
  const unknown = {
    uncertaintyDb: null,
    repeats: { before: 1, after: 1 },
    isWithinRepeatability: null,
  };
  return {
    ...delta,
    accepted,
    changes: changes && {
      levels: [],
      suspects: { followed: [], fresh: [], gone: [] },
      repeatability: "No repeatability is stated for this delta.",
      ...changes,
      margins: changes.margins.map((margin) => ({ bands: [], ...unknown, ...margin })),
    },
  };
}

/** Version 1 held each step against the one before it, whatever had become of that. */
function upgradeStep(step: SnapshotStepV1, i: number, all: SnapshotStepV1[]): SnapshotStep {
  const base = all[i - 1];
  return {
    ...step,
    state: "kept",
    base: base ? { position: base.position, name: base.name } : null,
    isBranch: false,
    isOnLine: true,
    onRecord: null,
    worst: null,
    unpaired: [],
    againstPrevious: step.againstPrevious.map(upgradeDelta),
    againstStart: step.againstStart.map(upgradeDelta),
  };
}

function fromVersion1(old: SnapshotV1): ReportContent {
  const sweeps = old.sweeps.map(upgradeSweep);
  return {
    ...old,
    version: 2,
    sweeps,
    ...combineByMask(sweeps),
    ladder: old.ladder && { name: old.ladder.name, steps: old.ladder.steps.map(upgradeStep) },
  };
}

/**
 * A stored snapshot in the shape that is drawn today, one version at a time. What an earlier
 * version did not record stays unknown; its numbers are never made anew.
 */
export function upgradeSnapshot(snapshot: ReportSnapshot): ReportContent {
  return snapshot.version === 1 ? fromVersion1(snapshot) : snapshot;
}
