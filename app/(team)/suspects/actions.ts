"use server";

import { defineAction } from "@/lib/adapters/define-action";
import { refreshed } from "@/lib/adapters/refreshed";
import { addNote } from "@/lib/commands/suspect/add-note";
import { assignSuspect } from "@/lib/commands/suspect/assign-suspect";
import { editSuspect } from "@/lib/commands/suspect/edit-suspect";
import { followAllNear } from "@/lib/commands/suspect/follow-all-near";
import { followSuspect } from "@/lib/commands/suspect/follow-suspect";
import { setSuspectState } from "@/lib/commands/suspect/set-suspect-state";

const runFollow = defineAction(followSuspect);
const runFollowNear = defineAction(followAllNear);
const runEdit = defineAction(editSuspect);
const runAssign = defineAction(assignSuspect);
const runSetState = defineAction(setSuspectState);
const runAddNote = defineAction(addNote);

export async function startToFollow(readingId: string, number: number) {
  return refreshed(runFollow({ readingId, number }));
}

export async function followEveryNear(readingId: string) {
  return refreshed(runFollowNear({ readingId }));
}

export async function changeSource(input: unknown) {
  return refreshed(runEdit(input));
}

export async function changeOwner(input: unknown) {
  return refreshed(runAssign(input));
}

export async function changeState(input: unknown) {
  return refreshed(runSetState(input));
}

export async function sayNote(input: unknown) {
  return refreshed(runAddNote(input));
}
