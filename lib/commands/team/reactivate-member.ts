import { and, eq } from "drizzle-orm";
import { members } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockMember } from "./find-member";
import { memberRefSchema } from "./schemas";

/** Lets a deactivated member in again, with the role and the password they had. */
export async function reactivateMember(ctx: Context, input: unknown): Promise<{ userId: string }> {
  requirePermission(ctx, "people.write");
  const { userId } = parseInput(memberRefSchema, input);
  return change(ctx, async (tx, audit) => {
    const member = await lockMember(ctx, tx, userId);
    if (!member.deactivatedAt) {
      throw new CommandError("conflict", `${member.name} is active already.`);
    }
    await tx
      .update(members)
      .set({ deactivatedAt: null })
      .where(and(eq(members.teamId, ctx.teamId), eq(members.userId, userId)));
    await audit({
      action: "member.reactivate",
      subjectType: "member",
      subjectId: userId,
      detail: { name: member.name },
    });
    return { userId };
  });
}
