"use server";

import { defineAction } from "@/lib/adapters/define-action";
import { changeOwnPassword } from "@/lib/commands/team/change-own-password";

const runChangeOwnPassword = defineAction(changeOwnPassword);

export async function storeOwnPassword(input: unknown) {
  return runChangeOwnPassword(input);
}
