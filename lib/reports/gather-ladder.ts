import type { Transaction } from "@/db/client";
import type { LadderStep } from "@/lib/queries/ladder/load-ladder-steps";
import { loadLadderSteps } from "@/lib/queries/ladder/load-ladder-steps";
import type { ReportContent, SnapshotStep } from "./report-content";

function snapshotStep(step: LadderStep): SnapshotStep {
  const { position, name, description, state, base, isOnLine, onRecord, worst } = step;
  return {
    position,
    name,
    description,
    state,
    base: base && { position: base.position, name: base.name },
    isBranch: step.branchOfId !== null,
    isOnLine,
    onRecord,
    worst: worst && {
      maskTitle: worst.maskTitle,
      provenance: worst.provenance,
      lineName: worst.lineName,
      standing: worst.standing,
      marginDb: worst.marginDb,
      marginAtHz: worst.marginAtHz,
    },
    sweeps: step.sweeps.map((sweep) => sweep.name),
    unpaired: step.unpaired,
    againstPrevious: step.againstPrevious,
    againstStart: step.againstStart,
  };
}

/** All that a report says about a ladder; null without one. */
export async function gatherLadder(
  tx: Transaction,
  teamId: string,
  ladderId: string | null,
): Promise<ReportContent["ladder"]> {
  if (ladderId === null) return null;
  const found = await loadLadderSteps(tx, teamId, ladderId);
  return found && { name: found.name, steps: found.steps.map(snapshotStep) };
}
