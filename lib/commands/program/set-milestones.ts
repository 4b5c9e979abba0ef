import { and, asc, eq } from "drizzle-orm";
import { milestones } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { change, parseInput, requirePermission } from "../run";
import { lockOpenProgram } from "./find-open";
import { setMilestonesSchema } from "./schemas";

/** Replaces the program's milestones by the given list, all of them or none. */
export async function setMilestones(ctx: Context, input: unknown): Promise<{ count: number }> {
  requirePermission(ctx, "program.write");
  const { programId, milestones: wanted } = parseInput(setMilestonesSchema, input);
  return change(ctx, async (tx, audit) => {
    await lockOpenProgram(ctx, tx, programId);
    const ofProgram = and(eq(milestones.teamId, ctx.teamId), eq(milestones.programId, programId));
    const before = await tx
      .select({
        name: milestones.name,
        dueOn: milestones.dueOn,
        requiredMarginDb: milestones.requiredMarginDb,
      })
      .from(milestones)
      .where(ofProgram)
      .orderBy(asc(milestones.dueOn), asc(milestones.name));
    await tx.delete(milestones).where(ofProgram);
    if (wanted.length > 0) {
      await tx
        .insert(milestones)
        .values(wanted.map((row) => ({ teamId: ctx.teamId, programId, ...row })));
    }
    await audit({
      action: "program.set-milestones",
      subjectType: "program",
      subjectId: programId,
      detail: { from: before, to: wanted },
    });
    return { count: wanted.length };
  });
}
