import { and, eq } from "drizzle-orm";
import { ladderSteps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockStep } from "./lock-ladder";
import { stepStateSchema } from "./schemas";

/** Says whether a step's change stayed in the product or was taken out again. */
export async function setStepState(ctx: Context, input: unknown): Promise<{ stepId: string }> {
  requirePermission(ctx, "sweep.write");
  const { stepId, state } = parseInput(stepStateSchema, input);
  return change(ctx, async (tx, audit) => {
    const step = await lockStep(tx, ctx.teamId, stepId);
    if (step.position === 0)
      throw new CommandError("conflict", "Step 0 is the starting point and cannot be dropped.");
    if (step.state === state)
      throw new CommandError("conflict", `This step is marked as ${state} already.`);
    await tx
      .update(ladderSteps)
      .set({ state })
      .where(and(eq(ladderSteps.teamId, ctx.teamId), eq(ladderSteps.id, stepId)));
    await audit({
      action: "step.set-state",
      subjectType: "step",
      subjectId: stepId,
      detail: { from: { state: step.state }, to: { state } },
    });
    return { stepId };
  });
}
