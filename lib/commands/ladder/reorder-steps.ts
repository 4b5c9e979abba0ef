import { and, eq, sql } from "drizzle-orm";
import { ladderSteps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { misplacedBranch } from "@/lib/core/delta/ladder-order";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { listSteps, lockOpenLadder } from "./lock-ladder";
import { reorderStepsSchema } from "./schemas";

/** Puts the steps of a ladder into another order. Step 0 stays where it is. */
export async function reorderSteps(ctx: Context, input: unknown): Promise<{ ladderId: string }> {
  requirePermission(ctx, "sweep.write");
  const { ladderId, stepIds } = parseInput(reorderStepsSchema, input);
  const { teamId } = ctx;
  return change(ctx, async (tx, audit) => {
    await lockOpenLadder(tx, teamId, ladderId);
    const steps = await listSteps(tx, teamId, ladderId);
    const ordered = stepIds.flatMap((id) => steps.find((step) => step.id === id) ?? []);
    if (new Set(stepIds).size !== steps.length || ordered.length !== steps.length)
      throw new CommandError("conflict", "The steps of this ladder have changed: look again.");
    if (ordered[0]?.id !== steps[0]?.id)
      throw new CommandError("conflict", "Step 0 is the starting point and stays the first.");
    const misplaced = misplacedBranch(ordered);
    if (misplaced)
      throw new CommandError(
        "conflict",
        `“${misplaced.name}” starts from another step and has to come after it.`,
      );
    const own = and(eq(ladderSteps.teamId, teamId), eq(ladderSteps.ladderId, ladderId));
    // First out of the way, below zero: no two steps may share a place, not even in between.
    await tx
      .update(ladderSteps)
      .set({ position: sql`-1 - ${ladderSteps.position}` })
      .where(own);
    for (const [position, { id }] of ordered.entries())
      await tx
        .update(ladderSteps)
        .set({ position })
        .where(and(own, eq(ladderSteps.id, id)));
    await audit({
      action: "ladder.reorder-steps",
      subjectType: "ladder",
      subjectId: ladderId,
      detail: {
        from: { steps: steps.map((step) => step.name) },
        to: { steps: ordered.map((step) => step.name) },
      },
    });
    return { ladderId };
  });
}
