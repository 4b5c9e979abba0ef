"use server";

import { revalidatePath } from "next/cache";
import { defineAction } from "@/lib/adapters/define-action";
import { archiveMask } from "@/lib/commands/mask/archive-mask";
import { copyMask } from "@/lib/commands/mask/copy-mask";
import { createMask } from "@/lib/commands/mask/create-mask";
import { importMask } from "@/lib/commands/mask/import-mask";
import { restoreMask } from "@/lib/commands/mask/restore-mask";
import { reviseMask } from "@/lib/commands/mask/revise-mask";

const runCreateMask = defineAction(createMask);
const runCopyMask = defineAction(copyMask);
const runReviseMask = defineAction(reviseMask);
const runImportMask = defineAction(importMask);
const runArchiveMask = defineAction(archiveMask);
const runRestoreMask = defineAction(restoreMask);

export async function addMask(input: unknown) {
  const result = await runCreateMask(input);
  if (result.ok) revalidatePath("/", "layout");
  return result;
}

export async function duplicateMask(input: unknown) {
  const result = await runCopyMask(input);
  if (result.ok) revalidatePath("/", "layout");
  return result;
}

export async function saveMask(input: unknown) {
  const result = await runReviseMask(input);
  if (result.ok) revalidatePath("/", "layout");
  return result;
}

export async function takeMaskFile(input: unknown) {
  const result = await runImportMask(input);
  if (result.ok) revalidatePath("/", "layout");
  return result;
}

export async function putMaskAway(input: unknown) {
  const result = await runArchiveMask(input);
  if (result.ok) revalidatePath("/", "layout");
  return result;
}

export async function bringMaskBack(input: unknown) {
  const result = await runRestoreMask(input);
  if (result.ok) revalidatePath("/", "layout");
  return result;
}
