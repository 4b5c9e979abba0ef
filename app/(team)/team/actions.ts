"use server";

import { revalidatePath } from "next/cache";
import { defineAction } from "@/lib/adapters/define-action";
import { addMember } from "@/lib/commands/team/add-member";
import { changeRole } from "@/lib/commands/team/change-role";
import { deactivateMember } from "@/lib/commands/team/deactivate-member";
import { reactivateMember } from "@/lib/commands/team/reactivate-member";

/** A changed role may be the own one, which every page depends on. */
async function refreshed<R extends { ok: boolean }>(running: Promise<R>): Promise<R> {
  const result = await running;
  if (result.ok) revalidatePath("/", "layout");
  return result;
}

const runAddMember = defineAction(addMember);
const runChangeRole = defineAction(changeRole);
const runDeactivate = defineAction(deactivateMember);
const runReactivate = defineAction(reactivateMember);

export async function addPerson(input: unknown) {
  return refreshed(runAddMember(input));
}

export async function storeRole(userId: string, role: string) {
  return refreshed(runChangeRole({ userId, role }));
}

export async function shutOut(userId: string) {
  return refreshed(runDeactivate({ userId }));
}

export async function letInAgain(userId: string) {
  return refreshed(runReactivate({ userId }));
}
