"use server";

import { defineAction } from "@/lib/adapters/define-action";
import { refreshed } from "@/lib/adapters/refreshed";
import { addMember } from "@/lib/commands/team/add-member";
import { changeRole } from "@/lib/commands/team/change-role";
import { deactivateMember } from "@/lib/commands/team/deactivate-member";
import { reactivateMember } from "@/lib/commands/team/reactivate-member";

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
