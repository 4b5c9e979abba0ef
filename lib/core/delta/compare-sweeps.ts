import { isPower } from "../sweep/band-power";
import { DETECTOR_LABELS } from "../sweep/settings";
import type { ComparedLine, ComparedSweep } from "./compared-sweep";
import type { MarginChange, SweepDelta } from "./delta";
import { describeChange } from "./describe-change";
import { findDeltaDoubts } from "./find-delta-doubts";
import { findMismatches, sharedTraces } from "./find-mismatches";

const change = (before: number | null, after: number | null) =>
  before === null || after === null ? null : after - before;

/** Two margins of one line are only a change when one detector decided both. */
function decidedApart(before: ComparedLine, after: ComparedLine): string | null {
  if (before.decidedBy === after.decidedBy) return null;
  const said = (line: ComparedLine) =>
    line.decidedBy === null ? "nothing" : DETECTOR_LABELS[line.decidedBy];
  return `Decided by ${said(before)} before and ${said(after)} after, so the difference is not a change of the product.`;
}

function marginChanges(before: ComparedSweep, after: ComparedSweep): MarginChange[] {
  return before.readings.flatMap((earlier) => {
    const later = after.readings.find((r) => r.maskRevisionId === earlier.maskRevisionId);
    if (!later) return [];
    return earlier.lines.flatMap((line) => {
      const next = later.lines.find((l) => l.name === line.name);
      if (!next) return [];
      const both = line.marginDb !== null && next.marginDb !== null;
      const note = both ? decidedApart(line, next) : null;
      return [
        {
          maskRevisionId: earlier.maskRevisionId,
          maskTitle: earlier.maskTitle,
          lineName: line.name,
          beforeDb: line.marginDb,
          afterDb: next.marginDb,
          beforeStanding: line.standing,
          afterStanding: next.standing,
          changeDb: note ? null : change(line.marginDb, next.marginDb),
          note,
        },
      ];
    });
  });
}

/**
 * What changed from one sweep to another, in dB, after minus before; or every reason why the two
 * may not be compared. The noise bandwidth cancels in the change of band power, because sweeps
 * of different bandwidths are not compared.
 */
export function compareSweeps(before: ComparedSweep, after: ComparedSweep): SweepDelta {
  const named = { beforeName: before.name, afterName: after.name };
  const mismatches = findMismatches(before, after);
  const doubts = findDeltaDoubts(before, after);
  const shared = sharedTraces(before, after);
  if (mismatches.length > 0 || !shared) return { ...named, mismatches, doubts, changes: null };
  const moved = {
    peakDb: change(shared.before.maxDb, shared.after.maxDb),
    floorDb: change(shared.before.floorDb, shared.after.floorDb),
    bandPowerDb: change(shared.before.powerSumDb, shared.after.powerSumDb),
    bandPowerIsPower: isPower(shared.detector),
  };
  return {
    ...named,
    mismatches,
    doubts,
    changes: {
      detector: shared.detector,
      margins: marginChanges(before, after),
      ...moved,
      sentence: describeChange(moved),
    },
  };
}
