import { and, eq } from "drizzle-orm";
import { ladders } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { ladderIdSchema } from "./schemas";

export async function restoreLadder(ctx: Context, input: unknown): Promise<{ ladderId: string }> {
  requirePermission(ctx, "sweep.write");
  const { ladderId } = parseInput(ladderIdSchema, input);
  return change(ctx, async (tx, audit) => {
    const [row] = await tx
      .update(ladders)
      .set({ archivedAt: null })
      .where(and(eq(ladders.teamId, ctx.teamId), eq(ladders.id, ladderId)))
      .returning({ id: ladders.id });
    if (!row) throw new CommandError("not-found", "This ladder does not exist.");
    await audit({ action: "ladder.restore", subjectType: "ladder", subjectId: ladderId });
    return { ladderId };
  });
}
