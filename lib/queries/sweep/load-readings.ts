import type { SQL } from "drizzle-orm";
import { and, asc, eq, inArray, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { StoredReading } from "@/db/schema";
import { builds, maskRevisions, masks, readings, sweeps, traces } from "@/db/schema";
import { arrangementOf } from "@/lib/commands/sweep/sweep-to-read";
import { lineRanges } from "@/lib/core/mask/limit-at";
import type { Mask } from "@/lib/core/mask/mask";
import { reachesMask } from "@/lib/core/reading/combine-readings";
import { spansBands } from "@/lib/core/reading/coverage";
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
  arrangement: string;
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
      benchId: sweeps.benchId,
      link: sweeps.link,
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
        isNewestRevision(),
        scope,
      ),
    )
    .orderBy(asc(masks.key), asc(sweeps.createdAt), asc(sweeps.id));
  const outlines = await loadOutlines(tx, teamId, [...new Set(rows.map((row) => row.sweepId))]);
  return rows
    .map(({ benchId, link, ...row }) => ({
      ...row,
      arrangement: arrangementOf({ benchId, link, settings: row.settings }),
      traces: outlines.get(row.sweepId) ?? [],
    }))
    .filter((row) => reachesMask(row.reading) || scansMask(row.mask, row.traces));
}

/**
 * Whether a sweep scanned a mask, be it with detectors that cannot decide it: it has no margin then,
 * and yet its polarization was looked at and is to be covered.
 */
function scansMask(mask: Mask, outlines: SweepOutline["traces"]): boolean {
  return mask.lines.some((line) =>
    outlines.some(
      ({ kind, firstHz, lastHz }) =>
        kind === "scan" && spansBands(lineRanges(line), firstHz, lastHz),
    ),
  );
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
