import { and, eq, inArray, isNull } from "drizzle-orm";
import { ladderSteps, sweeps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { lockStep } from "../ladder/lock-ladder";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { recordStepSchema } from "./schemas";

/**
 * Makes one step of a ladder what counts for the build's trend: its product sweeps come into the
 * line of record, those of the ladder's other steps go out of it.
 */
export async function recordStep(ctx: Context, input: unknown): Promise<{ sweeps: number }> {
  requirePermission(ctx, "sweep.write");
  const { stepId } = parseInput(recordStepSchema, input);
  const { teamId } = ctx;
  return change(ctx, async (tx, audit) => {
    const step = await lockStep(tx, teamId, stepId);
    const siblings = tx
      .select({ id: ladderSteps.id })
      .from(ladderSteps)
      .where(and(eq(ladderSteps.teamId, teamId), eq(ladderSteps.ladderId, step.ladderId)));
    await tx
      .update(sweeps)
      .set({ onRecord: false })
      .where(and(eq(sweeps.teamId, teamId), inArray(sweeps.stepId, siblings)));
    const put = await tx
      .update(sweeps)
      .set({ onRecord: true })
      .where(
        and(
          eq(sweeps.teamId, teamId),
          eq(sweeps.stepId, stepId),
          eq(sweeps.purpose, "product"),
          isNull(sweeps.archivedAt),
        ),
      )
      .returning({ id: sweeps.id });
    if (put.length === 0) {
      throw new CommandError("conflict", "This step has no product sweep yet: import one first.");
    }
    await audit({
      action: "step.put-on-record",
      subjectType: "step",
      subjectId: stepId,
      detail: { sweeps: put.map((row) => row.id) },
    });
    return { sweeps: put.length };
  });
}
