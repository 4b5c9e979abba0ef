import { ladders, ladderSteps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, isDuplicate, parseInput, requirePermission } from "../run";
import { findBuild } from "../sweep/find-place";
import { createLadderSchema } from "./schemas";

/** Starts a ladder on a build, with the step 0 that later steps are held against. */
export async function createLadder(
  ctx: Context,
  input: unknown,
): Promise<{ ladderId: string; stepId: string }> {
  requirePermission(ctx, "sweep.write");
  const values = parseInput(createLadderSchema, input);
  const { teamId } = ctx;
  try {
    return await change(ctx, async (tx, audit) => {
      await findBuild(tx, teamId, values.buildId, null);
      const { startName, startDescription, ...own } = values;
      const [row] = await tx
        .insert(ladders)
        .values({ teamId, ...own })
        .returning({ id: ladders.id });
      if (!row) throw new Error("The ladder was not stored.");
      const start = { name: startName, description: startDescription };
      const [step] = await tx
        .insert(ladderSteps)
        .values({ teamId, ladderId: row.id, position: 0, ...start })
        .returning({ id: ladderSteps.id });
      if (!step) throw new Error("The first step was not stored.");
      await audit({
        action: "ladder.create",
        subjectType: "ladder",
        subjectId: row.id,
        detail: values,
      });
      return { ladderId: row.id, stepId: step.id };
    });
  } catch (error) {
    if (!isDuplicate(error, "ladders_name")) throw error;
    throw new CommandError("conflict", "This build has a ladder of this name already.", {
      name: "Choose another name.",
    });
  }
}
