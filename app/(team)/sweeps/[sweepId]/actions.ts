"use server";

import { defineAction } from "@/lib/adapters/define-action";
import { refreshed } from "@/lib/adapters/refreshed";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import { restoreSweep } from "@/lib/commands/sweep/restore-sweep";
import { setOnRecord } from "@/lib/commands/sweep/set-on-record";

const runArchive = defineAction(archiveSweep);
const runRestore = defineAction(restoreSweep);
const runSetOnRecord = defineAction(setOnRecord);

export async function putAside(sweepId: string) {
  return refreshed(runArchive({ sweepId }));
}

export async function fetchBack(sweepId: string) {
  return refreshed(runRestore({ sweepId }));
}

export async function chooseOnRecord(sweepId: string, onRecord: boolean) {
  return refreshed(runSetOnRecord({ sweepId, onRecord }));
}
