import { and, asc, desc, eq, isNotNull } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { builds, programs } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";

export interface ArchivedRow {
  id: string;
  name: string;
  description: string;
  archivedAt: Date | null;
}

/** Archived programs of the team, the latest archived first. */
export async function listArchivedPrograms(ctx: Context): Promise<ArchivedRow[]> {
  requirePermission(ctx, "program.read");
  return inTeam(ctx.db, ctx.teamId, (tx) =>
    tx
      .select({
        id: programs.id,
        name: programs.name,
        description: programs.description,
        archivedAt: programs.archivedAt,
      })
      .from(programs)
      .where(and(eq(programs.teamId, ctx.teamId), isNotNull(programs.archivedAt)))
      .orderBy(desc(programs.archivedAt), asc(programs.name)),
  );
}

/** Archived builds of one program in their order. */
export async function listArchivedBuilds(ctx: Context, programId: string): Promise<ArchivedRow[]> {
  requirePermission(ctx, "program.read");
  return inTeam(ctx.db, ctx.teamId, (tx) =>
    tx
      .select({
        id: builds.id,
        name: builds.name,
        description: builds.notes,
        archivedAt: builds.archivedAt,
      })
      .from(builds)
      .where(
        and(
          eq(builds.teamId, ctx.teamId),
          eq(builds.programId, programId),
          isNotNull(builds.archivedAt),
        ),
      )
      .orderBy(asc(builds.sequence)),
  );
}
