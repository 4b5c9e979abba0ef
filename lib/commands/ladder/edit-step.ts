import { and, eq } from "drizzle-orm";
import { ladderSteps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { editStepSchema } from "./schemas";

export async function editStep(ctx: Context, input: unknown): Promise<{ stepId: string }> {
  requirePermission(ctx, "sweep.write");
  const { stepId, ...values } = parseInput(editStepSchema, input);
  return change(ctx, async (tx, audit) => {
    const [row] = await tx
      .update(ladderSteps)
      .set(values)
      .where(and(eq(ladderSteps.teamId, ctx.teamId), eq(ladderSteps.id, stepId)))
      .returning({ id: ladderSteps.id });
    if (!row) throw new CommandError("not-found", "This step does not exist.");
    await audit({ action: "step.edit", subjectType: "step", subjectId: stepId, detail: values });
    return { stepId };
  });
}
