"use server";

import { defineAction } from "@/lib/adapters/define-action";
import { refreshed } from "@/lib/adapters/refreshed";
import { archiveBuild } from "@/lib/commands/program/archive-build";
import { archiveProgram } from "@/lib/commands/program/archive-program";
import { editBuild } from "@/lib/commands/program/edit-build";
import { editProgram } from "@/lib/commands/program/edit-program";
import { restoreBuild } from "@/lib/commands/program/restore-build";
import { restoreProgram } from "@/lib/commands/program/restore-program";
import { setClocks } from "@/lib/commands/program/set-clocks";
import { setMilestones } from "@/lib/commands/program/set-milestones";
import { setProgramMasks } from "@/lib/commands/program/set-program-masks";

const runEditProgram = defineAction(editProgram);
const runEditBuild = defineAction(editBuild);
const runSetMilestones = defineAction(setMilestones);
const runSetProgramMasks = defineAction(setProgramMasks);
const runSetClocks = defineAction(setClocks);
const runArchiveProgram = defineAction(archiveProgram);
const runRestoreProgram = defineAction(restoreProgram);
const runArchiveBuild = defineAction(archiveBuild);
const runRestoreBuild = defineAction(restoreBuild);

export async function storeProgram(input: unknown) {
  return refreshed(runEditProgram(input));
}

export async function storeBuild(input: unknown) {
  return refreshed(runEditBuild(input));
}

export async function storeMilestones(input: unknown) {
  return refreshed(runSetMilestones(input));
}

export async function storeProgramMasks(input: unknown) {
  return refreshed(runSetProgramMasks(input));
}

export async function storeClocks(input: unknown) {
  return refreshed(runSetClocks(input));
}

export async function putProgramAway(programId: string) {
  return refreshed(runArchiveProgram({ programId }));
}

export async function bringProgramBack(programId: string) {
  return refreshed(runRestoreProgram({ programId }));
}

export async function putBuildAway(buildId: string) {
  return refreshed(runArchiveBuild({ buildId }));
}

export async function bringBuildBack(buildId: string) {
  return refreshed(runRestoreBuild({ buildId }));
}
