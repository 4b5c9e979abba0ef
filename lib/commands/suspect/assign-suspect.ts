import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { followedSuspects, members, users } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockFollowed, storeNote } from "./lock-followed";
import { assignSuspectSchema } from "./schemas";

async function findName(tx: Transaction, teamId: string, userId: string) {
  const [member] = await tx
    .select({ name: users.name, deactivatedAt: members.deactivatedAt })
    .from(members)
    .innerJoin(users, eq(users.id, members.userId))
    .where(and(eq(members.teamId, teamId), eq(members.userId, userId)));
  return member ?? null;
}

/** Gives a suspect to a member of the team, or to nobody. */
export async function assignSuspect(ctx: Context, input: unknown): Promise<{ suspectId: string }> {
  requirePermission(ctx, "suspect.assign");
  const { suspectId, ownerId } = parseInput(assignSuspectSchema, input);
  return change(ctx, async (tx, audit) => {
    const before = await lockFollowed(ctx, tx, suspectId);
    if (before.ownerId === ownerId) return { suspectId };
    const next = ownerId === null ? null : await findName(tx, ctx.teamId, ownerId);
    if (ownerId !== null && (!next || next.deactivatedAt !== null)) {
      throw new CommandError("invalid", "Some fields need another look.", {
        ownerId: "Choose an active member of your team.",
      });
    }
    const last = before.ownerId === null ? null : await findName(tx, ctx.teamId, before.ownerId);
    await tx
      .update(followedSuspects)
      .set({ ownerId })
      .where(and(eq(followedSuspects.teamId, ctx.teamId), eq(followedSuspects.id, suspectId)));
    const owner = { from: last?.name ?? null, to: next?.name ?? null };
    await storeNote(ctx, tx, suspectId, { text: "", change: { owner } });
    await audit({
      action: "suspect.assign",
      subjectType: "suspect",
      subjectId: suspectId,
      detail: {
        name: before.name,
        from: { owner: owner.from, ownerId: before.ownerId },
        to: { owner: owner.to, ownerId },
      },
    });
    return { suspectId };
  });
}
