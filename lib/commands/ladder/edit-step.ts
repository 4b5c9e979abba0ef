import { and, eq } from "drizzle-orm";
import { ladderSteps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { checkBranch } from "./check-branch";
import { listSteps, lockStep } from "./lock-ladder";
import { editStepSchema } from "./schemas";

export async function editStep(ctx: Context, input: unknown): Promise<{ stepId: string }> {
  requirePermission(ctx, "sweep.write");
  const { stepId, ...values } = parseInput(editStepSchema, input);
  return change(ctx, async (tx, audit) => {
    const step = await lockStep(tx, ctx.teamId, stepId);
    if (values.branchOfId && step.position === 0)
      throw new CommandError("conflict", "Step 0 is the starting point and starts from no other.", {
        branchOfId: "Step 0 starts from no other step.",
      });
    const steps = await listSteps(tx, ctx.teamId, step.ladderId);
    checkBranch(steps, values.branchOfId ?? null, step.position);
    await tx
      .update(ladderSteps)
      .set(values)
      .where(and(eq(ladderSteps.teamId, ctx.teamId), eq(ladderSteps.id, stepId)));
    await audit({ action: "step.edit", subjectType: "step", subjectId: stepId, detail: values });
    return { stepId };
  });
}
