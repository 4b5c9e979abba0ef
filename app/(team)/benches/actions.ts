"use server";

import { revalidatePath } from "next/cache";
import { defineAction } from "@/lib/adapters/define-action";
import { archiveBench } from "@/lib/commands/bench/archive-bench";
import { createBench } from "@/lib/commands/bench/create-bench";
import { editBench } from "@/lib/commands/bench/edit-bench";
import { restoreBench } from "@/lib/commands/bench/restore-bench";
import { reviseSignalPath } from "@/lib/commands/bench/revise-signal-path";
import { readFactorTable } from "@/lib/queries/bench/read-factor-table";

const runCreateBench = defineAction(createBench);
const runEditBench = defineAction(editBench);
const runArchiveBench = defineAction(archiveBench);
const runRestoreBench = defineAction(restoreBench);
const runReviseSignalPath = defineAction(reviseSignalPath);
const runReadFactorTable = defineAction(readFactorTable);

export async function addBench(input: unknown) {
  const result = await runCreateBench(input);
  if (result.ok) revalidatePath("/", "layout");
  return result;
}

export async function changeBench(input: unknown) {
  const result = await runEditBench(input);
  if (result.ok) revalidatePath("/", "layout");
  return result;
}

export async function putBenchAway(input: unknown) {
  const result = await runArchiveBench(input);
  if (result.ok) revalidatePath("/", "layout");
  return result;
}

export async function bringBenchBack(input: unknown) {
  const result = await runRestoreBench(input);
  if (result.ok) revalidatePath("/", "layout");
  return result;
}

export async function saveSignalPath(input: unknown) {
  const result = await runReviseSignalPath(input);
  if (result.ok) revalidatePath("/", "layout");
  return result;
}

export async function readTypedTable(input: unknown) {
  return runReadFactorTable(input);
}
