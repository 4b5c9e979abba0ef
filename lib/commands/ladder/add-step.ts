import { and, eq, isNull, max } from "drizzle-orm";
import { ladders, ladderSteps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { addStepSchema } from "./schemas";

/** Adds a step after the last one of its ladder. */
export async function addStep(ctx: Context, input: unknown): Promise<{ stepId: string }> {
  requirePermission(ctx, "sweep.write");
  const values = parseInput(addStepSchema, input);
  const { teamId } = ctx;
  return change(ctx, async (tx, audit) => {
    // The lock keeps two steps added at once from taking the same place.
    const [ladder] = await tx
      .select({ id: ladders.id })
      .from(ladders)
      .where(
        and(
          eq(ladders.teamId, teamId),
          eq(ladders.id, values.ladderId),
          isNull(ladders.archivedAt),
        ),
      )
      .for("update");
    if (!ladder) throw new CommandError("not-found", "This ladder does not exist or is archived.");
    const [last] = await tx
      .select({ position: max(ladderSteps.position) })
      .from(ladderSteps)
      .where(and(eq(ladderSteps.teamId, teamId), eq(ladderSteps.ladderId, ladder.id)));
    const position = (last?.position ?? -1) + 1;
    const [row] = await tx
      .insert(ladderSteps)
      .values({ teamId, position, ...values })
      .returning({ id: ladderSteps.id });
    if (!row) throw new Error("The step was not stored.");
    await audit({
      action: "step.add",
      subjectType: "step",
      subjectId: row.id,
      detail: { ...values, position },
    });
    return { stepId: row.id };
  });
}
