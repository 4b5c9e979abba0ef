import { and, eq } from "drizzle-orm";
import { ladderSteps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { change, parseInput, requirePermission } from "../run";
import { lockStep } from "./lock-ladder";
import { editStepSchema } from "./schemas";

export async function editStep(ctx: Context, input: unknown): Promise<{ stepId: string }> {
  requirePermission(ctx, "sweep.write");
  const { stepId, ...values } = parseInput(editStepSchema, input);
  return change(ctx, async (tx, audit) => {
    await lockStep(tx, ctx.teamId, stepId);
    await tx
      .update(ladderSteps)
      .set(values)
      .where(and(eq(ladderSteps.teamId, ctx.teamId), eq(ladderSteps.id, stepId)));
    await audit({ action: "step.edit", subjectType: "step", subjectId: stepId, detail: values });
    return { stepId };
  });
}
