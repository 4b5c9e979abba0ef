"use server";

import { defineAction } from "@/lib/adapters/define-action";
import { refreshed } from "@/lib/adapters/refreshed";
import { setDistanceRestating } from "@/lib/commands/program/set-distance-restating";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import { restoreSweep } from "@/lib/commands/sweep/restore-sweep";
import { setOnRecord } from "@/lib/commands/sweep/set-on-record";

const runSetRestating = defineAction(setDistanceRestating);
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

export async function chooseRestating(programId: string, maskId: string, restate: boolean) {
  return refreshed(runSetRestating({ programId, maskId, restate }));
}
