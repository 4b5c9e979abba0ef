import { and, desc, eq, sql } from "drizzle-orm";
import { alias } from "drizzle-orm/pg-core";
import { inTeam } from "@/db/client";
import { benchChecks, benches, users } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";
import { isId } from "../is-id";

export interface BenchCheckRow {
  id: string;
  /** ISO date. */
  measuredOn: string;
  source: string;
  isReference: boolean;
  /** What it was compared with; null for a reference. */
  reference: { id: string; measuredOn: string; archived: boolean } | null;
  driftMeanDb: number | null;
  driftWorstDb: number | null;
  /** Lines that were compared; of a reference, all its lines. */
  lines: number;
  /** Compared lines that do not stand out in the check: their drift is a bound. */
  sunk: number;
  /** Lines of the reference where the check has no level. */
  missing: number;
  fileName: string;
  checkedBy: string;
  archived: boolean;
}

export interface BenchChecks {
  bench: { id: string; name: string; archived: boolean; toleranceDb: number };
  /** Newest first: by the day it was measured, then by when it was recorded. */
  checks: BenchCheckRow[];
  /** The database's day, which checks are dated by. */
  today: string;
}

/** A bench's checks, archived ones too; null when the team has no such bench. */
export async function listBenchChecks(ctx: Context, benchId: string): Promise<BenchChecks | null> {
  requirePermission(ctx, "bench.read");
  if (!isId(benchId)) return null;
  const { teamId } = ctx;
  const reference = alias(benchChecks, "reference");
  return inTeam(ctx.db, teamId, async (tx) => {
    const [bench] = await tx
      .select({
        id: benches.id,
        name: benches.name,
        archivedAt: benches.archivedAt,
        toleranceDb: benches.checkToleranceDb,
        today: sql<string>`current_date::text`,
      })
      .from(benches)
      .where(and(eq(benches.teamId, teamId), eq(benches.id, benchId)));
    if (!bench) return null;
    const count = (where: string) =>
      sql<number>`jsonb_array_length(jsonb_path_query_array(${benchChecks.content}, ${where}::jsonpath))`;
    const rows = await tx
      .select({
        id: benchChecks.id,
        measuredOn: benchChecks.measuredOn,
        source: benchChecks.source,
        isReference: benchChecks.isReference,
        referenceId: benchChecks.referenceId,
        referenceOn: reference.measuredOn,
        referenceArchivedAt: reference.archivedAt,
        driftMeanDb: benchChecks.driftMeanDb,
        driftWorstDb: benchChecks.driftWorstDb,
        all: count("$.lines[*]"),
        compared: count("$.lines[*] ? (@.driftDb != null)"),
        sunk: count("$.lines[*] ? (@.standsOut == false)"),
        missing: count("$.missingHz[*]"),
        fileName: benchChecks.fileName,
        checkedBy: users.name,
        archivedAt: benchChecks.archivedAt,
      })
      .from(benchChecks)
      .innerJoin(users, eq(users.id, benchChecks.checkedBy))
      .leftJoin(
        reference,
        and(eq(reference.teamId, benchChecks.teamId), eq(reference.id, benchChecks.referenceId)),
      )
      .where(and(eq(benchChecks.teamId, teamId), eq(benchChecks.benchId, benchId)))
      .orderBy(desc(benchChecks.measuredOn), desc(benchChecks.createdAt));
    const { archivedAt, today, ...known } = bench;
    return {
      bench: { ...known, archived: archivedAt !== null },
      today,
      checks: rows.map(
        ({ referenceId, referenceOn, referenceArchivedAt, all, compared, ...row }) => ({
          id: row.id,
          measuredOn: row.measuredOn,
          source: row.source,
          isReference: row.isReference,
          reference:
            referenceId === null || referenceOn === null
              ? null
              : {
                  id: referenceId,
                  measuredOn: referenceOn,
                  archived: referenceArchivedAt !== null,
                },
          driftMeanDb: row.driftMeanDb,
          driftWorstDb: row.driftWorstDb,
          lines: row.isReference ? all : compared,
          sunk: row.sunk,
          missing: row.missing,
          fileName: row.fileName,
          checkedBy: row.checkedBy,
          archived: row.archivedAt !== null,
        }),
      ),
    };
  });
}
