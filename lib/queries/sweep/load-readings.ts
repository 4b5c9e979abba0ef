import type { SQL } from "drizzle-orm";
import { and, asc, eq, isNotNull, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { StoredReading } from "@/db/schema";
import { builds, maskRevisions, masks, readings, sweeps } from "@/db/schema";
import type { Mask } from "@/lib/core/mask/mask";
import { combineReadings, reachesMask } from "@/lib/core/reading/combine-readings";
import type { Standing } from "@/lib/core/reading/reading";
import { isNewestRevision } from "./newest-revision";
import { worstOf } from "./worst-of";

export interface HeldReading {
  sweepId: string;
  buildId: string;
  maskId: string;
  maskRevisionId: string;
  mask: Mask;
  reading: StoredReading;
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
      reading: readings.content,
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
  return rows.filter((row) => reachesMask(row.reading));
}

/** Where some sweeps together stand under one mask. */
export interface MaskStanding {
  maskId: string;
  maskTitle: string;
  standing: Standing;
  marginDb: number;
  marginAtHz: number;
  lineName: string;
  /** The sweep that gave the margin. */
  sweepId: string;
  coverage: number;
}

/** Readings taken together mask by mask, in their order. */
export function standingsOf(held: readonly HeldReading[]): MaskStanding[] {
  const maskIds = [...new Set(held.map((row) => row.maskId))];
  return maskIds.flatMap((maskId) => {
    const own = held.filter((row) => row.maskId === maskId);
    const [first] = own;
    if (!first) return [];
    const combined = combineReadings(
      first.mask,
      own.map((row) => row.reading),
    );
    const { deciding } = combined;
    const decidedBy = deciding ? own[deciding.source] : undefined;
    if (!deciding || !decidedBy) return [];
    return [
      {
        maskId,
        maskTitle: first.mask.title,
        standing: combined.standing,
        marginDb: deciding.worst.marginDb,
        marginAtHz: deciding.worst.frequencyHz,
        lineName: deciding.name,
        sweepId: decidedBy.sweepId,
        coverage: combined.coverage,
      },
    ];
  });
}

/** The mask under which some sweeps stand worst; null when they reach none. */
export function worstStanding(held: readonly HeldReading[]): MaskStanding | null {
  return worstOf(standingsOf(held));
}
