import { and, eq } from "drizzle-orm";
import { ladders } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockLadder } from "./lock-ladder";
import { ladderIdSchema } from "./schemas";

export async function restoreLadder(ctx: Context, input: unknown): Promise<{ ladderId: string }> {
  requirePermission(ctx, "sweep.write");
  const { ladderId } = parseInput(ladderIdSchema, input);
  return change(ctx, async (tx, audit) => {
    const ladder = await lockLadder(tx, ctx.teamId, ladderId);
    if (!ladder.archivedAt) throw new CommandError("conflict", "This ladder is not archived.");
    await tx
      .update(ladders)
      .set({ archivedAt: null })
      .where(and(eq(ladders.teamId, ctx.teamId), eq(ladders.id, ladderId)));
    await audit({ action: "ladder.restore", subjectType: "ladder", subjectId: ladderId });
    return { ladderId };
  });
}
