import { and, eq } from "drizzle-orm";
import { members } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { change, parseInput, requirePermission } from "../run";
import { lockMember, requireOtherAdmin } from "./find-member";
import { changeRoleSchema } from "./schemas";

/** Gives a member another role; it counts from that member's next request on. */
export async function changeRole(ctx: Context, input: unknown): Promise<{ userId: string }> {
  requirePermission(ctx, "people.write");
  const { userId, role } = parseInput(changeRoleSchema, input);
  return change(ctx, async (tx, audit) => {
    const member = await lockMember(ctx, tx, userId);
    if (member.role === role) return { userId };
    const losesAdmin = member.role === "admin" && member.deactivatedAt === null;
    if (losesAdmin) await requireOtherAdmin(ctx, tx, userId);
    await tx
      .update(members)
      .set({ role })
      .where(and(eq(members.teamId, ctx.teamId), eq(members.userId, userId)));
    await audit({
      action: "member.change-role",
      subjectType: "member",
      subjectId: userId,
      detail: { name: member.name, from: member.role, to: role },
    });
    return { userId };
  });
}
