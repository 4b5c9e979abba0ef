import { and, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { builds, programs } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";
import { isId } from "../is-id";

export interface BuildDetails {
  id: string;
  name: string;
  builtOn: string | null;
  notes: string;
  archivedAt: Date | null;
  program: { id: string; name: string; archivedAt: Date | null };
}

/** One build of one program as it is edited; null when the team has none of these ids. */
export async function readBuildDetails(
  ctx: Context,
  ids: { programId: string; buildId: string },
): Promise<BuildDetails | null> {
  requirePermission(ctx, "program.read");
  if (!isId(ids.programId) || !isId(ids.buildId)) return null;
  const rows = await inTeam(ctx.db, ctx.teamId, (tx) =>
    tx
      .select({
        id: builds.id,
        name: builds.name,
        builtOn: builds.builtOn,
        notes: builds.notes,
        archivedAt: builds.archivedAt,
        program: { id: programs.id, name: programs.name, archivedAt: programs.archivedAt },
      })
      .from(builds)
      .innerJoin(
        programs,
        and(eq(programs.teamId, builds.teamId), eq(programs.id, builds.programId)),
      )
      .where(
        and(
          eq(builds.teamId, ctx.teamId),
          eq(builds.id, ids.buildId),
          eq(builds.programId, ids.programId),
        ),
      ),
  );
  return rows[0] ?? null;
}
