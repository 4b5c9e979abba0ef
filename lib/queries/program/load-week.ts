import { and, asc, count, eq, gte, isNotNull, isNull, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { builds, reports, sweeps } from "@/db/schema";

export interface ProgramWeek {
  /** Sweeps imported in the last seven days and still here. */
  sweeps: number;
  /** Numbers of the reports issued in the last seven days. */
  reports: number[];
}

/** What came to each program in the seven days up to an ISO date; programs without news are left out. */
export async function loadWeek(
  tx: Transaction,
  teamId: string,
  today: string,
): Promise<Map<string, ProgramWeek>> {
  const since = sql`${today}::date - 7`;
  const imported = await tx
    .select({ programId: builds.programId, sweeps: count() })
    .from(sweeps)
    .innerJoin(builds, and(eq(builds.teamId, sweeps.teamId), eq(builds.id, sweeps.buildId)))
    .where(and(eq(sweeps.teamId, teamId), isNull(sweeps.archivedAt), gte(sweeps.createdAt, since)))
    .groupBy(builds.programId);
  const issued = await tx
    .select({ programId: builds.programId, number: reports.number })
    .from(reports)
    .innerJoin(builds, and(eq(builds.teamId, reports.teamId), eq(builds.id, reports.buildId)))
    .where(and(eq(reports.teamId, teamId), isNotNull(reports.number), gte(reports.issuedAt, since)))
    .orderBy(asc(reports.number));
  const weeks = new Map<string, ProgramWeek>();
  for (const row of imported) weeks.set(row.programId, { sweeps: row.sweeps, reports: [] });
  for (const { programId, number } of issued) {
    const week = weeks.get(programId) ?? { sweeps: 0, reports: [] };
    if (number !== null) week.reports.push(number);
    weeks.set(programId, week);
  }
  return weeks;
}
