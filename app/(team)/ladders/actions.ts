"use server";

import { defineAction } from "@/lib/adapters/define-action";
import { refreshed } from "@/lib/adapters/refreshed";
import { acceptMismatch } from "@/lib/commands/delta/accept-mismatch";
import { withdrawAcceptance } from "@/lib/commands/delta/withdraw-acceptance";
import { addStep } from "@/lib/commands/ladder/add-step";
import { archiveLadder } from "@/lib/commands/ladder/archive-ladder";
import { createLadder } from "@/lib/commands/ladder/create-ladder";
import { editLadder } from "@/lib/commands/ladder/edit-ladder";
import { editStep } from "@/lib/commands/ladder/edit-step";
import { removeStep } from "@/lib/commands/ladder/remove-step";
import { reorderSteps } from "@/lib/commands/ladder/reorder-steps";
import { restoreLadder } from "@/lib/commands/ladder/restore-ladder";
import { setStepState } from "@/lib/commands/ladder/set-step-state";
import { recordStep } from "@/lib/commands/sweep/record-step";

const runCreate = defineAction(createLadder);
const runEdit = defineAction(editLadder);
const runArchive = defineAction(archiveLadder);
const runRestore = defineAction(restoreLadder);
const runAddStep = defineAction(addStep);
const runEditStep = defineAction(editStep);
const runRemoveStep = defineAction(removeStep);
const runReorder = defineAction(reorderSteps);
const runSetState = defineAction(setStepState);
const runAccept = defineAction(acceptMismatch);
const runWithdraw = defineAction(withdrawAcceptance);
const runRecordStep = defineAction(recordStep);

export async function startLadder(input: unknown) {
  return refreshed(runCreate(input));
}

export async function changeLadder(input: unknown) {
  return refreshed(runEdit(input));
}

export async function putLadderAside(ladderId: string) {
  return refreshed(runArchive({ ladderId }));
}

export async function fetchLadderBack(ladderId: string) {
  return refreshed(runRestore({ ladderId }));
}

export async function appendStep(input: unknown) {
  return refreshed(runAddStep(input));
}

export async function changeStep(input: unknown) {
  return refreshed(runEditStep(input));
}

export async function takeStepAway(stepId: string) {
  return refreshed(runRemoveStep({ stepId }));
}

export async function putStepOnRecord(stepId: string) {
  return refreshed(runRecordStep({ stepId }));
}

/** The ladder's id comes first, so that a page can bind it. */
export async function putStepsInOrder(ladderId: string, stepIds: string[]) {
  return refreshed(runReorder({ ladderId, stepIds }));
}

export async function markStep(stepId: string, state: string) {
  return refreshed(runSetState({ stepId, state }));
}

export async function acceptDifference(input: unknown) {
  return refreshed(runAccept(input));
}

export async function takeAcceptanceBack(acceptanceId: string) {
  return refreshed(runWithdraw({ acceptanceId }));
}
