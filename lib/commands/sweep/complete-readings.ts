import type { SQL } from "drizzle-orm";
import { and, eq, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import {
  builds,
  maskRevisions,
  masks,
  programMasks,
  readings,
  signalPathRevisions,
  sweeps,
} from "@/db/schema";
import { prepareParts } from "@/lib/core/reading/prepare-parts";
import { loadFileLevels, loadTraces } from "@/lib/queries/sweep/load-trace";
import { loadAmbients } from "./hold-ambient";
import { isRevisionToRead } from "./list-program-masks";
import type { SweepToRead } from "./store-reading";
import { storeReading } from "./store-reading";
import { partOf } from "./sweep-to-read";

/** Which sweeps to look at: all that concern one program or one mask, or a single one. */
type Scope = { programId: string } | { maskId: string } | { sweepId: string };

function inScope(scope: Scope): SQL {
  if ("maskId" in scope) return eq(masks.id, scope.maskId);
  if ("sweepId" in scope) return eq(sweeps.id, scope.sweepId);
  return eq(builds.programId, scope.programId);
}

/** Product sweeps in scope and the mask revisions that they have not been held against yet. */
function selectMissing(tx: Transaction, teamId: string, scope: Scope) {
  return tx
    .select({
      sweepId: sweeps.id,
      settings: sweeps.settings,
      guardDb: sweeps.guardDb,
      measuredOn: sweeps.measuredOn,
      corrected: sweeps.corrected,
      instrument: sweeps.instrument,
      benchId: sweeps.benchId,
      path: signalPathRevisions.content,
      maskId: masks.id,
      revisionId: maskRevisions.id,
      content: maskRevisions.content,
      restated: programMasks.restateDistance,
    })
    .from(sweeps)
    .innerJoin(builds, and(eq(builds.teamId, sweeps.teamId), eq(builds.id, sweeps.buildId)))
    .innerJoin(
      programMasks,
      and(eq(programMasks.teamId, builds.teamId), eq(programMasks.programId, builds.programId)),
    )
    .innerJoin(masks, and(eq(masks.teamId, programMasks.teamId), eq(masks.id, programMasks.maskId)))
    .innerJoin(
      maskRevisions,
      and(
        eq(maskRevisions.teamId, masks.teamId),
        eq(maskRevisions.maskId, masks.id),
        isRevisionToRead(),
      ),
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
        eq(readings.maskRevisionId, maskRevisions.id),
        eq(readings.restated, programMasks.restateDistance),
      ),
    )
    .where(
      and(
        eq(sweeps.teamId, teamId),
        eq(sweeps.purpose, "product"),
        isNull(sweeps.archivedAt),
        isNull(readings.id),
        inScope(scope),
      ),
    )
    .orderBy(sweeps.id);
}

/**
 * Makes the readings that are missing after a mask or a program's masks changed, inside the
 * transaction of that change. Returns how many were made.
 */
export async function completeReadings(
  tx: Transaction,
  teamId: string,
  scope: Scope,
): Promise<number> {
  const missing = await selectMissing(tx, teamId, scope);
  let sweep: SweepToRead | undefined;
  // Rows come ordered by sweep, so that only one sweep's levels are in memory at a time.
  for (const row of missing) {
    if (sweep?.sweepId !== row.sweepId) {
      const traces = await loadTraces(tx, teamId, row.sweepId);
      const fileLevels = await loadFileLevels(tx, teamId, row.sweepId);
      sweep = {
        teamId,
        sweepId: row.sweepId,
        prepared: prepareParts([partOf(row, traces, fileLevels)]),
        ambients: await loadAmbients(tx, teamId, row),
      };
    }
    await storeReading(tx, sweep, row);
  }
  return missing.length;
}
