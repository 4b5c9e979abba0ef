import { and, asc, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { builds, programs, reports, reportSweeps, sweeps, teams } from "@/db/schema";
import { loadLadderSteps } from "@/lib/queries/ladder/load-ladder-steps";
import { gatherSweep } from "./gather-sweep";
import { formatReportNumber } from "@/lib/core/report/report-number";
import type { ReportSnapshot } from "./report-snapshot";

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
): Promise<ReportSnapshot> {
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
  const gathered: ReportSnapshot["sweeps"] = [];
  for (const { sweepId } of chosen) gathered.push(await gatherSweep(tx, teamId, sweepId));
  return {
    version: 1,
    number: issue.number,
    title: draft.title,
    summary: draft.summary,
    paper: draft.paper,
    ...about,
    issuedAt: issue.issuedAt.toISOString(),
    issuedBy: issue.issuedBy,
    replaces: await numberOf(tx, teamId, draft.replacesId),
    sweeps: gathered,
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

async function gatherLadder(
  tx: Transaction,
  teamId: string,
  ladderId: string | null,
): Promise<ReportSnapshot["ladder"]> {
  if (ladderId === null) return null;
  const found = await loadLadderSteps(tx, teamId, ladderId);
  if (!found) return null;
  return {
    name: found.name,
    steps: found.steps.map((step) => ({
      position: step.position,
      name: step.name,
      description: step.description,
      sweeps: step.sweeps.map((sweep) => sweep.name),
      againstPrevious: step.againstPrevious,
      againstStart: step.againstStart,
    })),
  };
}
