"use server";

import { toResult } from "@/lib/adapters/define-action";
import { createFirstTeam } from "@/lib/commands/team/create-first-team";

export async function makeFirstTeam(input: unknown) {
  return toResult(() => createFirstTeam(input));
}
