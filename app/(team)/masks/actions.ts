"use server";

import { defineAction } from "@/lib/adapters/define-action";
import { refreshed } from "@/lib/adapters/refreshed";
import { archiveMask } from "@/lib/commands/mask/archive-mask";
import { confirmMask } from "@/lib/commands/mask/confirm-mask";
import { copyMask } from "@/lib/commands/mask/copy-mask";
import { createMask } from "@/lib/commands/mask/create-mask";
import { importMask } from "@/lib/commands/mask/import-mask";
import { recomputeMaskAgain } from "@/lib/commands/mask/recompute-mask-again";
import { restoreMask } from "@/lib/commands/mask/restore-mask";
import { reviseMask } from "@/lib/commands/mask/revise-mask";
import { previewRevision } from "@/lib/queries/mask/preview-revision";

const runCreateMask = defineAction(createMask);
const runConfirmMask = defineAction(confirmMask);
const runCopyMask = defineAction(copyMask);
const runPreviewRevision = defineAction(previewRevision);
const runReviseMask = defineAction(reviseMask);
const runRecomputeMaskAgain = defineAction(recomputeMaskAgain);
const runImportMask = defineAction(importMask);
const runArchiveMask = defineAction(archiveMask);
const runRestoreMask = defineAction(restoreMask);

export async function addMask(input: unknown) {
  return refreshed(runCreateMask(input));
}

export async function confirmLimits(input: unknown) {
  return refreshed(runConfirmMask(input));
}

export async function duplicateMask(input: unknown) {
  return refreshed(runCopyMask(input));
}

export async function foreseeRevision(input: unknown) {
  return runPreviewRevision(input);
}

export async function putInForceAgain(input: unknown) {
  return refreshed(runRecomputeMaskAgain(input));
}

export async function saveMask(input: unknown) {
  return refreshed(runReviseMask(input));
}

export async function takeMaskFile(input: unknown) {
  return refreshed(runImportMask(input));
}

export async function putMaskAway(input: unknown) {
  return refreshed(runArchiveMask(input));
}

export async function bringMaskBack(input: unknown) {
  return refreshed(runRestoreMask(input));
}
