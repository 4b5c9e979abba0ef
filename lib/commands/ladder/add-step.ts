import { ladderSteps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { change, parseInput, requirePermission } from "../run";
import { checkBranch } from "./check-branch";
import { listSteps, lockOpenLadder } from "./lock-ladder";
import { addStepSchema } from "./schemas";

/** Adds a step after the last one of its ladder. */
export async function addStep(ctx: Context, input: unknown): Promise<{ stepId: string }> {
  requirePermission(ctx, "sweep.write");
  const values = parseInput(addStepSchema, input);
  const { teamId } = ctx;
  return change(ctx, async (tx, audit) => {
    // The lock keeps two steps added at once from taking the same place.
    const ladder = await lockOpenLadder(tx, teamId, values.ladderId);
    const steps = await listSteps(tx, teamId, ladder.id);
    const position = (steps.at(-1)?.position ?? -1) + 1;
    checkBranch(steps, values.branchOfId, position);
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
