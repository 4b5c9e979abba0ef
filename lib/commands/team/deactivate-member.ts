import { and, eq, sql } from "drizzle-orm";
import { members } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockMember, requireOtherAdmin } from "./find-member";
import { memberRefSchema } from "./schemas";

/** Shuts a member out at once, open sessions included; what the person did stays theirs. */
export async function deactivateMember(ctx: Context, input: unknown): Promise<{ userId: string }> {
  requirePermission(ctx, "people.write");
  const { userId } = parseInput(memberRefSchema, input);
  if (userId.toLowerCase() === ctx.userId) {
    throw new CommandError("conflict", "Nobody deactivates themselves: ask another admin.");
  }
  return change(ctx, async (tx, audit) => {
    const member = await lockMember(ctx, tx, userId);
    if (member.deactivatedAt) {
      throw new CommandError("conflict", `${member.name} is deactivated already.`);
    }
    if (member.role === "admin") await requireOtherAdmin(ctx, tx, userId);
    await tx
      .update(members)
      .set({ deactivatedAt: sql`now()` })
      .where(and(eq(members.teamId, ctx.teamId), eq(members.userId, userId)));
    await audit({
      action: "member.deactivate",
      subjectType: "member",
      subjectId: userId,
      detail: { name: member.name },
    });
    return { userId };
  });
}
