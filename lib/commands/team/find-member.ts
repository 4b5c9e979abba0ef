import { and, eq, isNull, ne } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { members, teams, users } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";

/**
 * The member whose standing in the team is about to change. Locks the team, so that two admins who
 * take each other's role at the same moment come one after the other.
 */
export async function lockMember(ctx: Context, tx: Transaction, userId: string) {
  await tx
    .select({ id: teams.id })
    .from(teams)
    .where(eq(teams.id, ctx.teamId))
    .for("no key update");
  const [member] = await tx
    .select({ role: members.role, deactivatedAt: members.deactivatedAt, name: users.name })
    .from(members)
    .innerJoin(users, eq(users.id, members.userId))
    .where(and(eq(members.teamId, ctx.teamId), eq(members.userId, userId)));
  if (!member) throw new CommandError("not-found", "This person is not a member of your team.");
  return member;
}

/** Refuses when nobody else is left who is admin and active. Needs the lock of lockMember. */
export async function requireOtherAdmin(
  ctx: Context,
  tx: Transaction,
  userId: string,
): Promise<void> {
  const [other] = await tx
    .select({ userId: members.userId })
    .from(members)
    .where(
      and(
        eq(members.teamId, ctx.teamId),
        eq(members.role, "admin"),
        isNull(members.deactivatedAt),
        ne(members.userId, userId),
      ),
    )
    .limit(1);
  if (!other) {
    throw new CommandError(
      "conflict",
      "This is the team's last active admin. Make somebody else admin first.",
    );
  }
}
