import { and, desc, eq, isNull, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { StoredReading } from "@/db/schema";
import { builds, programMasks, programs, readings, signalPathRevisions, sweeps } from "@/db/schema";
import type { SignalPath } from "@/lib/core/bench/signal-path";
import type { MeasurementSettings } from "@/lib/core/sweep/settings";

export interface SweepToPreview {
  sweepId: string;
  name: string;
  programName: string;
  buildName: string;
  onRecord: boolean;
  settings: MeasurementSettings;
  guardDb: number;
  path: SignalPath;
  restateDistance: boolean;
  /** Points of all its traces. */
  points: number;
  /** The reading under the revision in force; null when it has none yet. */
  reading: StoredReading | null;
}

/** The newest sweeps that are held against a mask, in the scope of a recomputation. */
export async function listSweepsToPreview(
  tx: Transaction,
  teamId: string,
  mask: { maskId: string; inForceId: string },
  limit: number,
): Promise<SweepToPreview[]> {
  return tx
    .select({
      sweepId: sweeps.id,
      name: sweeps.name,
      programName: programs.name,
      buildName: builds.name,
      onRecord: sweeps.onRecord,
      settings: sweeps.settings,
      guardDb: sweeps.guardDb,
      path: signalPathRevisions.content,
      restateDistance: programMasks.restateDistance,
      points: sql<number>`(select coalesce(sum((t.axis->>'count')::int), 0)::int from traces t
        where t.team_id = ${sweeps.teamId} and t.sweep_id = ${sweeps.id})`,
      reading: readings.content,
    })
    .from(sweeps)
    .innerJoin(builds, and(eq(builds.teamId, sweeps.teamId), eq(builds.id, sweeps.buildId)))
    .innerJoin(programs, and(eq(programs.teamId, builds.teamId), eq(programs.id, builds.programId)))
    .innerJoin(
      programMasks,
      and(eq(programMasks.teamId, programs.teamId), eq(programMasks.programId, programs.id)),
    )
    .innerJoin(
      signalPathRevisions,
      and(
        eq(signalPathRevisions.teamId, sweeps.teamId),
        eq(signalPathRevisions.id, sweeps.signalPathRevisionId),
      ),
    )
    .leftJoin(
      readings,
      and(
        eq(readings.teamId, sweeps.teamId),
        eq(readings.sweepId, sweeps.id),
        eq(readings.maskRevisionId, mask.inForceId),
        eq(readings.restated, programMasks.restateDistance),
      ),
    )
    .where(
      and(
        eq(sweeps.teamId, teamId),
        eq(programMasks.maskId, mask.maskId),
        eq(sweeps.purpose, "product"),
        isNull(sweeps.archivedAt),
      ),
    )
    .orderBy(desc(sweeps.createdAt), desc(sweeps.id))
    .limit(limit);
}
