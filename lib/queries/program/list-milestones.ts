import { and, asc, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { milestones } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";

export interface MilestoneRow {
  name: string;
  dueOn: string;
  /** null: the program's target counts. */
  requiredMarginDb: number | null;
}

/** Milestones of one program, the earliest first. */
export async function listMilestones(ctx: Context, programId: string): Promise<MilestoneRow[]> {
  requirePermission(ctx, "program.read");
  return inTeam(ctx.db, ctx.teamId, (tx) =>
    tx
      .select({
        name: milestones.name,
        dueOn: milestones.dueOn,
        requiredMarginDb: milestones.requiredMarginDb,
      })
      .from(milestones)
      .where(and(eq(milestones.teamId, ctx.teamId), eq(milestones.programId, programId)))
      .orderBy(asc(milestones.dueOn), asc(milestones.name)),
  );
}
