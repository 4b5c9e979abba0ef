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
 * The newest check (not a reference) of a bench on one day (ISO date), or null: nobody checked the
 * bench that day, or the checks were archived. A later check of the day stands for the day: a
 * cable may have been tightened in between.
 */
export async function checkOfDay(
  tx: Transaction,
  teamId: string,
  benchId: string,
  day: string,
): Promise<CheckOfDay | null> {
  const [row] = await tx
    .select({
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
    .orderBy(desc(benchChecks.createdAt))
    .limit(1);
  if (!row || row.driftWorstDb === null) return null;
  return { ...row, driftWorstDb: row.driftWorstDb };
}
