import type { SQL } from "drizzle-orm";
import { and, asc, eq, inArray, isNotNull, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { StoredReading } from "@/db/schema";
import { builds, maskRevisions, masks, readings, sweeps, traces } from "@/db/schema";
import type { Mask } from "@/lib/core/mask/mask";
import { reachesMask } from "@/lib/core/reading/combine-readings";
import type { SweepOutline } from "@/lib/core/reading/must-read-together";
import type { MeasurementSettings } from "@/lib/core/sweep/settings";
import { isNewestRevision } from "./newest-revision";

export interface HeldReading {
  sweepId: string;
  buildId: string;
  maskId: string;
  maskRevisionId: string;
  mask: Mask;
  /** Levels were restated to the mask's distance on request. */
  restated: boolean;
  reading: StoredReading;
  settings: MeasurementSettings;
  traces: SweepOutline["traces"];
}

/**
 * Readings of sweeps that are not archived against the masks that their program names now, in
 * force; those that cannot be compared or only touch a mask are left out. By mask.
 */
export async function loadReadings(
  tx: Transaction,
  teamId: string,
  scope: SQL | undefined,
): Promise<HeldReading[]> {
  const rows = await tx
    .select({
      sweepId: readings.sweepId,
      buildId: sweeps.buildId,
      maskId: readings.maskId,
      maskRevisionId: readings.maskRevisionId,
      mask: maskRevisions.content,
      restated: readings.restated,
      reading: readings.content,
      settings: sweeps.settings,
    })
    .from(readings)
    .innerJoin(sweeps, and(eq(sweeps.teamId, readings.teamId), eq(sweeps.id, readings.sweepId)))
    .innerJoin(builds, and(eq(builds.teamId, sweeps.teamId), eq(builds.id, sweeps.buildId)))
    .innerJoin(masks, and(eq(masks.teamId, readings.teamId), eq(masks.id, readings.maskId)))
    .innerJoin(
      maskRevisions,
      and(eq(maskRevisions.teamId, readings.teamId), eq(maskRevisions.id, readings.maskRevisionId)),
    )
    .where(
      and(
        eq(readings.teamId, teamId),
        isNull(sweeps.archivedAt),
        isNull(readings.notComparable),
        isNotNull(readings.marginDb),
        isNewestRevision(),
        scope,
      ),
    )
    .orderBy(asc(masks.key), asc(sweeps.createdAt), asc(sweeps.id));
  const reaching = rows.filter((row) => reachesMask(row.reading));
  const outlines = await loadOutlines(tx, teamId, [...new Set(reaching.map((row) => row.sweepId))]);
  return reaching.map((row) => ({ ...row, traces: outlines.get(row.sweepId) ?? [] }));
}

/** What the traces of some sweeps are, without their levels. */
async function loadOutlines(tx: Transaction, teamId: string, sweepIds: string[]) {
  const outlines = new Map<string, SweepOutline["traces"]>();
  if (sweepIds.length === 0) return outlines;
  const rows = await tx
    .select({
      sweepId: traces.sweepId,
      kind: traces.kind,
      detector: traces.detector,
      hold: traces.hold,
      firstHz: traces.firstHz,
      lastHz: traces.lastHz,
      stepHz: traces.stepHz,
    })
    .from(traces)
    .where(and(eq(traces.teamId, teamId), inArray(traces.sweepId, sweepIds)))
    .orderBy(asc(traces.position));
  for (const { sweepId, ...trace } of rows)
    outlines.set(sweepId, [...(outlines.get(sweepId) ?? []), trace]);
  return outlines;
}
