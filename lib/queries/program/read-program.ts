import { and, asc, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { milestones, programs } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";
import { isId } from "../is-id";
import { loadProgramTrends } from "./load-standings";

/** One program with its milestones and where its builds stand; null when there is none. */
export async function readProgram(ctx: Context, programId: string) {
  requirePermission(ctx, "program.read");
  if (!isId(programId)) return null;
  return inTeam(ctx.db, ctx.teamId, async (tx) => {
    const [program] = await tx
      .select({
        id: programs.id,
        name: programs.name,
        description: programs.description,
        targetMarginDb: programs.targetMarginDb,
        archivedAt: programs.archivedAt,
      })
      .from(programs)
      .where(and(eq(programs.teamId, ctx.teamId), eq(programs.id, programId)));
    if (!program) return null;
    const due = await tx
      .select({
        id: milestones.id,
        name: milestones.name,
        dueOn: milestones.dueOn,
        requiredMarginDb: milestones.requiredMarginDb,
      })
      .from(milestones)
      .where(and(eq(milestones.teamId, ctx.teamId), eq(milestones.programId, programId)))
      .orderBy(asc(milestones.dueOn));
    const [trend] = await loadProgramTrends(tx, ctx.teamId, [programId]);
    if (!trend) throw new Error("A program was read without its trend.");
    return { ...program, milestones: due, trend };
  });
}

export type ProgramDetail = NonNullable<Awaited<ReturnType<typeof readProgram>>>;
