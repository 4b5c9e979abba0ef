import { and, asc, count, eq, isNull } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { builds, programs } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";

export interface ProgramRow {
  id: string;
  name: string;
  description: string;
  targetMarginDb: number;
  builds: number;
}

/** Programs of the team that are not archived, by name. */
export async function listPrograms(ctx: Context): Promise<ProgramRow[]> {
  requirePermission(ctx, "program.read");
  return inTeam(ctx.db, ctx.teamId, (tx) =>
    tx
      .select({
        id: programs.id,
        name: programs.name,
        description: programs.description,
        targetMarginDb: programs.targetMarginDb,
        builds: count(builds.id),
      })
      .from(programs)
      .leftJoin(builds, and(eq(builds.teamId, programs.teamId), eq(builds.programId, programs.id)))
      .where(and(eq(programs.teamId, ctx.teamId), isNull(programs.archivedAt)))
      .groupBy(programs.teamId, programs.id)
      .orderBy(asc(programs.name)),
  );
}
