"use server";

import { revalidatePath } from "next/cache";
import { defineAction } from "@/lib/adapters/define-action";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import { restoreSweep } from "@/lib/commands/sweep/restore-sweep";
import { setOnRecord } from "@/lib/commands/sweep/set-on-record";

const runArchive = defineAction(archiveSweep);
const runRestore = defineAction(restoreSweep);
const runSetOnRecord = defineAction(setOnRecord);

async function refreshed<R extends { ok: boolean }>(running: Promise<R>): Promise<R> {
  const result = await running;
  if (result.ok) revalidatePath("/", "layout");
  return result;
}

export async function putAside(sweepId: string) {
  return refreshed(runArchive({ sweepId }));
}

export async function fetchBack(sweepId: string) {
  return refreshed(runRestore({ sweepId }));
}

export async function chooseOnRecord(sweepId: string, onRecord: boolean) {
  return refreshed(runSetOnRecord({ sweepId, onRecord }));
}
