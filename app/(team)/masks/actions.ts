"use server";

import { defineAction } from "@/lib/adapters/define-action";
import { refreshed } from "@/lib/adapters/refreshed";
import { archiveMask } from "@/lib/commands/mask/archive-mask";
import { confirmMask } from "@/lib/commands/mask/confirm-mask";
import { copyMask } from "@/lib/commands/mask/copy-mask";
import { createMask } from "@/lib/commands/mask/create-mask";
import { importMask } from "@/lib/commands/mask/import-mask";
import { restoreMask } from "@/lib/commands/mask/restore-mask";
import { reviseMask } from "@/lib/commands/mask/revise-mask";

const runCreateMask = defineAction(createMask);
const runConfirmMask = defineAction(confirmMask);
const runCopyMask = defineAction(copyMask);
const runReviseMask = defineAction(reviseMask);
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
