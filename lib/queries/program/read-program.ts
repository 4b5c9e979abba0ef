import { and, asc, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { builds, programs } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";

export interface ProgramDetail {
  id: string;
  name: string;
  description: string;
  targetMarginDb: number;
  archivedAt: Date | null;
  builds: { id: string; name: string; sequence: number; builtOn: string | null; notes: string }[];
}

/** One program with its builds in their order; null when the team has none of this id. */
export async function readProgram(ctx: Context, programId: string): Promise<ProgramDetail | null> {
  requirePermission(ctx, "program.read");
  if (!/^[0-9a-f-]{36}$/i.test(programId)) return null;
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
    const rows = await tx
      .select({
        id: builds.id,
        name: builds.name,
        sequence: builds.sequence,
        builtOn: builds.builtOn,
        notes: builds.notes,
      })
      .from(builds)
      .where(and(eq(builds.teamId, ctx.teamId), eq(builds.programId, programId)))
      .orderBy(asc(builds.sequence));
    return { ...program, builds: rows };
  });
}
