import { and, count, eq, gt } from "drizzle-orm";
import { ladderSteps, sweeps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockStep } from "./lock-ladder";
import { stepIdSchema } from "./schemas";

/** Takes away the last step of a ladder while it has no sweeps; sweeps are never lost. */
export async function removeStep(ctx: Context, input: unknown): Promise<{ stepId: string }> {
  requirePermission(ctx, "sweep.write");
  const { stepId } = parseInput(stepIdSchema, input);
  const { teamId } = ctx;
  return change(ctx, async (tx, audit) => {
    const step = await lockStep(tx, teamId, stepId);
    const [held] = await tx
      .select({ sweeps: count() })
      .from(sweeps)
      .where(and(eq(sweeps.teamId, teamId), eq(sweeps.stepId, stepId)));
    if (held && held.sweeps > 0) {
      throw new CommandError("conflict", "This step has sweeps, and a sweep keeps its step.");
    }
    const [branch] = await tx
      .select({ name: ladderSteps.name })
      .from(ladderSteps)
      .where(and(eq(ladderSteps.teamId, teamId), eq(ladderSteps.branchOfId, stepId)))
      .limit(1);
    if (branch) throw new CommandError("conflict", `“${branch.name}” starts from this step.`);
    const [later] = await tx
      .select({ id: ladderSteps.id })
      .from(ladderSteps)
      .where(
        and(
          eq(ladderSteps.teamId, teamId),
          eq(ladderSteps.ladderId, step.ladderId),
          gt(ladderSteps.position, step.position),
        ),
      )
      .limit(1);
    if (later || step.position === 0) {
      throw new CommandError("conflict", "Only the last step of a ladder can be taken away.");
    }
    await tx
      .delete(ladderSteps)
      .where(and(eq(ladderSteps.teamId, teamId), eq(ladderSteps.id, stepId)));
    await audit({
      action: "step.remove",
      subjectType: "step",
      subjectId: stepId,
      detail: { name: step.name, position: step.position },
    });
    return { stepId };
  });
}
