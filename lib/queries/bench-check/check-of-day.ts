import { and, desc, eq, isNull, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { benchChecks, benches } from "@/db/schema";

export interface CheckOfDay {
  checkId: string;
  source: string;
  /** Largest drift in dB, with its sign. */
  driftWorstDb: number;
  /** The bench's tolerance in dB, either way. */
  toleranceDb: number;
  /** Lines of the reference where the check has no level. */
  missing: number;
}

/**
 * The check (not a reference) that stands for a bench on one day (ISO date), or null: nobody checked
 * the bench that day, or the checks were archived. Of each source the day's newest counts, since a
 * cable may have been tightened in between; of several sources the one that drifted farthest, since
 * one that is well says nothing of what the other one showed.
 */
export async function checkOfDay(
  tx: Transaction,
  teamId: string,
  benchId: string,
  day: string,
): Promise<CheckOfDay | null> {
  const rows = await tx
    .selectDistinctOn([sql`lower(${benchChecks.source})`], {
      checkId: benchChecks.id,
      source: benchChecks.source,
      driftWorstDb: benchChecks.driftWorstDb,
      toleranceDb: benches.checkToleranceDb,
      missing: sql<number>`jsonb_array_length(${benchChecks.content} -> 'missingHz')`,
    })
    .from(benchChecks)
    .innerJoin(
      benches,
      and(eq(benches.teamId, benchChecks.teamId), eq(benches.id, benchChecks.benchId)),
    )
    .where(
      and(
        eq(benchChecks.teamId, teamId),
        eq(benchChecks.benchId, benchId),
        eq(benchChecks.measuredOn, day),
        eq(benchChecks.isReference, false),
        isNull(benchChecks.archivedAt),
      ),
    )
    .orderBy(sql`lower(${benchChecks.source})`, desc(benchChecks.createdAt));
  return rows.reduce<CheckOfDay | null>((worst, { driftWorstDb, ...row }) => {
    if (driftWorstDb === null) return worst;
    if (worst && Math.abs(worst.driftWorstDb) >= Math.abs(driftWorstDb)) return worst;
    return { ...row, driftWorstDb };
  }, null);
}
