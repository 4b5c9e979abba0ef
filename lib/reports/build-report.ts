import { and, asc, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { builds, programs, reports, reportSweeps, sweeps, teams } from "@/db/schema";
import { formatReportNumber } from "@/lib/core/report/report-number";
import type { SweepDetail } from "@/lib/queries/sweep/load-sweep-detail";
import { gatherCombined } from "./gather-combined";
import { gatherLadder } from "./gather-ladder";
import { gatherNotHeld } from "./gather-not-held";
import { gatherSweep, loadReportSweep } from "./gather-sweep";
import { loadMaskNotes } from "./mask-notes";
import type { ReportContent, SnapshotSweep } from "./report-content";

interface Issue {
  number: string;
  issuedAt: Date;
  issuedBy: string;
}

type Draft = Pick<
  typeof reports.$inferSelect,
  "id" | "buildId" | "ladderId" | "replacesId" | "title" | "summary" | "paper"
>;

/** Gathers all that a report says, as it is at this moment. */
export async function buildReport(
  tx: Transaction,
  teamId: string,
  draft: Draft,
  issue: Issue,
): Promise<ReportContent> {
  const [about] = await tx
    .select({
      team: teams.name,
      program: {
        name: programs.name,
        description: programs.description,
        targetMarginDb: programs.targetMarginDb,
      },
      build: { name: builds.name, builtOn: builds.builtOn, notes: builds.notes },
    })
    .from(builds)
    .innerJoin(teams, eq(teams.id, builds.teamId))
    .innerJoin(programs, and(eq(programs.teamId, builds.teamId), eq(programs.id, builds.programId)))
    .where(and(eq(builds.teamId, teamId), eq(builds.id, draft.buildId)));
  if (!about) throw new Error("A report's build is gone.");
  const chosen = await tx
    .select({ sweepId: reportSweeps.sweepId })
    .from(reportSweeps)
    .innerJoin(
      sweeps,
      and(eq(sweeps.teamId, reportSweeps.teamId), eq(sweeps.id, reportSweeps.sweepId)),
    )
    .where(and(eq(reportSweeps.teamId, teamId), eq(reportSweeps.reportId, draft.id)))
    .orderBy(asc(reportSweeps.position));
  const details: SweepDetail[] = [];
  for (const { sweepId } of chosen) details.push(await loadReportSweep(tx, teamId, sweepId));
  const revisionIds = details.flatMap(({ readings }) => readings.map((one) => one.maskRevisionId));
  const notes = await loadMaskNotes(tx, teamId, [...new Set(revisionIds)]);
  const gathered: SnapshotSweep[] = [];
  for (const detail of details) gathered.push(await gatherSweep(tx, teamId, detail, notes));
  const combined = await gatherCombined(tx, teamId, details, notes);
  return {
    version: 2,
    number: issue.number,
    title: draft.title,
    summary: draft.summary,
    paper: draft.paper,
    ...about,
    issuedAt: issue.issuedAt.toISOString(),
    issuedBy: issue.issuedBy,
    replaces: await numberOf(tx, teamId, draft.replacesId),
    sweeps: gathered,
    combined,
    notHeld: await gatherNotHeld(tx, teamId, draft.buildId, details, combined),
    ladder: await gatherLadder(tx, teamId, draft.ladderId),
  };
}

async function numberOf(tx: Transaction, teamId: string, reportId: string | null) {
  if (reportId === null) return null;
  const [row] = await tx
    .select({ number: reports.number })
    .from(reports)
    .where(and(eq(reports.teamId, teamId), eq(reports.id, reportId)));
  return row?.number ? formatReportNumber(row.number) : null;
}
