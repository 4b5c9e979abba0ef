import { and, desc, eq, ne, sql } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { builds, programs, reports } from "@/db/schema";
import { isAllowed, type Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";
import { isId } from "../is-id";

const LINE = {
  id: reports.id,
  number: reports.number,
  title: reports.title,
  state: reports.state,
  issuedAt: reports.issuedAt,
  createdAt: reports.createdAt,
  buildName: builds.name,
  programId: programs.id,
  programName: programs.name,
};

/** Reports of the team or of one program, the newest first; drafts only for those who may see them. */
export async function listReports(ctx: Context, programId: string | null) {
  requirePermission(ctx, "report.read");
  if (programId !== null && !isId(programId)) return [];
  return inTeam(ctx.db, ctx.teamId, (tx) =>
    tx
      .select(LINE)
      .from(reports)
      .innerJoin(builds, and(eq(builds.teamId, reports.teamId), eq(builds.id, reports.buildId)))
      .innerJoin(
        programs,
        and(eq(programs.teamId, builds.teamId), eq(programs.id, builds.programId)),
      )
      .where(
        and(
          eq(reports.teamId, ctx.teamId),
          isAllowed(ctx, "report.read-draft") ? undefined : ne(reports.state, "draft"),
          programId === null ? undefined : eq(programs.id, programId),
        ),
      )
      .orderBy(sql`${reports.number} desc nulls first`, desc(reports.createdAt)),
  );
}
