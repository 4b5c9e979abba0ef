import { and, asc, eq } from "drizzle-orm";
import { alias } from "drizzle-orm/pg-core";
import { inTeam } from "@/db/client";
import { builds, ladders, programs, reports, reportSweeps, sweeps, users } from "@/db/schema";
import { isAllowed, type Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";
import { reportLines } from "@/lib/reports/report-lines";
import { upgradeSnapshot } from "@/lib/reports/upgrade-snapshot";
import { isId } from "../is-id";

const issuer = alias(users, "issuer");
const approver = alias(users, "approver");
const withdrawer = alias(users, "withdrawer");
const replaced = alias(reports, "replaced");

const DETAIL = {
  id: reports.id,
  number: reports.number,
  title: reports.title,
  summary: reports.summary,
  paper: reports.paper,
  state: reports.state,
  sha256: reports.sha256,
  snapshot: reports.snapshot,
  ladderId: reports.ladderId,
  ladderName: ladders.name,
  replacesId: reports.replacesId,
  replacesNumber: replaced.number,
  issuedById: reports.issuedBy,
  issuedBy: issuer.name,
  issuedAt: reports.issuedAt,
  approvedBy: approver.name,
  approvedAt: reports.approvedAt,
  withdrawnBy: withdrawer.name,
  withdrawnAt: reports.withdrawnAt,
  withdrawnReason: reports.withdrawnReason,
  buildId: builds.id,
  buildName: builds.name,
  programId: programs.id,
  programName: programs.name,
};

/** One report; null when the team has none of this id or it is a draft that is not for this role. */
export async function readReport(ctx: Context, reportId: string) {
  requirePermission(ctx, "report.read");
  if (!isId(reportId)) return null;
  return inTeam(ctx.db, ctx.teamId, async (tx) => {
    const [report] = await tx
      .select(DETAIL)
      .from(reports)
      .innerJoin(builds, and(eq(builds.teamId, reports.teamId), eq(builds.id, reports.buildId)))
      .innerJoin(
        programs,
        and(eq(programs.teamId, builds.teamId), eq(programs.id, builds.programId)),
      )
      .leftJoin(ladders, and(eq(ladders.teamId, reports.teamId), eq(ladders.id, reports.ladderId)))
      .leftJoin(
        replaced,
        and(eq(replaced.teamId, reports.teamId), eq(replaced.id, reports.replacesId)),
      )
      .leftJoin(issuer, eq(issuer.id, reports.issuedBy))
      .leftJoin(approver, eq(approver.id, reports.approvedBy))
      .leftJoin(withdrawer, eq(withdrawer.id, reports.withdrawnBy))
      .where(and(eq(reports.teamId, ctx.teamId), eq(reports.id, reportId)));
    if (!report) return null;
    if (report.state === "draft" && !isAllowed(ctx, "report.read-draft")) return null;
    const chosen = await tx
      .select({ id: sweeps.id, name: sweeps.name, archivedAt: sweeps.archivedAt })
      .from(reportSweeps)
      .innerJoin(
        sweeps,
        and(eq(sweeps.teamId, reportSweeps.teamId), eq(sweeps.id, reportSweeps.sweepId)),
      )
      .where(and(eq(reportSweeps.teamId, ctx.teamId), eq(reportSweeps.reportId, reportId)))
      .orderBy(asc(reportSweeps.position));
    const said = report.snapshot ? reportLines(upgradeSnapshot(report.snapshot)) : null;
    return { ...report, sweeps: chosen, said };
  });
}

export type ReportDetail = NonNullable<Awaited<ReturnType<typeof readReport>>>;
