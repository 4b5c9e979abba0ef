import { and, eq } from "drizzle-orm";
import { ladders } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, isDuplicate, parseInput, requirePermission } from "../run";
import { lockOpenLadder } from "./lock-ladder";
import { editLadderSchema } from "./schemas";

export async function editLadder(ctx: Context, input: unknown): Promise<{ ladderId: string }> {
  requirePermission(ctx, "sweep.write");
  const { ladderId, ...values } = parseInput(editLadderSchema, input);
  try {
    return await change(ctx, async (tx, audit) => {
      await lockOpenLadder(tx, ctx.teamId, ladderId);
      await tx
        .update(ladders)
        .set(values)
        .where(and(eq(ladders.teamId, ctx.teamId), eq(ladders.id, ladderId)));
      await audit({
        action: "ladder.edit",
        subjectType: "ladder",
        subjectId: ladderId,
        detail: values,
      });
      return { ladderId };
    });
  } catch (error) {
    if (!isDuplicate(error, "ladders_name")) throw error;
    throw new CommandError("conflict", "This build has a ladder of this name already.", {
      name: "Choose another name.",
    });
  }
}
