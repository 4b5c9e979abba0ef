import { and, asc, desc, eq, inArray, isNull } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { builds, ladders, programs, reports } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";
import { isId } from "../is-id";
import { listBuildSweeps } from "../sweep/list-sweeps";

/** What a report about a build can speak of; null when the team has no such build. */
export async function readReportChoices(ctx: Context, buildId: string) {
  requirePermission(ctx, "report.read");
  if (!isId(buildId)) return null;
  const found = await inTeam(ctx.db, ctx.teamId, async (tx) => {
    const [build] = await tx
      .select({
        id: builds.id,
        name: builds.name,
        programId: programs.id,
        programName: programs.name,
      })
      .from(builds)
      .innerJoin(
        programs,
        and(eq(programs.teamId, builds.teamId), eq(programs.id, builds.programId)),
      )
      .where(and(eq(builds.teamId, ctx.teamId), eq(builds.id, buildId)));
    if (!build) return null;
    const ladderRows = await tx
      .select({ id: ladders.id, name: ladders.name })
      .from(ladders)
      .where(
        and(
          eq(ladders.teamId, ctx.teamId),
          eq(ladders.buildId, buildId),
          isNull(ladders.archivedAt),
        ),
      )
      .orderBy(asc(ladders.createdAt));
    const issued = await tx
      .select({ id: reports.id, number: reports.number, title: reports.title })
      .from(reports)
      .innerJoin(builds, and(eq(builds.teamId, reports.teamId), eq(builds.id, reports.buildId)))
      .where(
        and(
          eq(reports.teamId, ctx.teamId),
          eq(builds.programId, build.programId),
          inArray(reports.state, ["issued", "approved"]),
        ),
      )
      .orderBy(desc(reports.number));
    return { build, ladders: ladderRows, issued };
  });
  if (!found) return null;
  return { ...found, sweeps: await listBuildSweeps(ctx, buildId) };
}
