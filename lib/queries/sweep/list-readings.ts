import { and, asc, eq, inArray } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { maskRevisions, masks, programMasks, readings, suspects } from "@/db/schema";
import type { Mask } from "@/lib/core/mask/mask";
import { ambientDoubt } from "@/lib/core/reading/doubts";
import type { Reading } from "@/lib/core/reading/reading";
import type { Port } from "@/lib/core/sweep/settings";
import { isNewestRevision } from "./newest-revision";

export interface ReadingDetail {
  id: string;
  maskId: string;
  maskRevisionId: string;
  maskRevision: number;
  mask: Mask;
  reading: Reading;
}

interface ReadingScope {
  sweepId: string;
  programId: string;
  /** Whether an ambient sweep of the same bench and day exists now. */
  ambientTaken: boolean;
  port: Port;
}

/** Readings of a sweep against the program's masks in force, with their suspects. */
export async function listReadings(
  tx: Transaction,
  teamId: string,
  scope: ReadingScope,
): Promise<ReadingDetail[]> {
  const rows = await tx
    .select({
      id: readings.id,
      maskId: readings.maskId,
      maskRevisionId: readings.maskRevisionId,
      maskRevision: maskRevisions.revision,
      mask: maskRevisions.content,
      content: readings.content,
    })
    .from(readings)
    .innerJoin(
      maskRevisions,
      and(eq(maskRevisions.teamId, readings.teamId), eq(maskRevisions.id, readings.maskRevisionId)),
    )
    .innerJoin(masks, and(eq(masks.teamId, readings.teamId), eq(masks.id, readings.maskId)))
    .innerJoin(
      programMasks,
      and(
        eq(programMasks.teamId, readings.teamId),
        eq(programMasks.maskId, readings.maskId),
        eq(programMasks.programId, scope.programId),
      ),
    )
    .where(
      and(eq(readings.teamId, teamId), eq(readings.sweepId, scope.sweepId), isNewestRevision()),
    )
    .orderBy(asc(masks.key));
  const ids = rows.map((row) => row.id);
  const found =
    ids.length === 0
      ? []
      : await tx
          .select()
          .from(suspects)
          .where(and(eq(suspects.teamId, teamId), inArray(suspects.readingId, ids)))
          .orderBy(asc(suspects.number));
  return rows.map(({ content, ...row }) => ({
    ...row,
    reading: {
      ...content,
      doubts: [...content.doubts, ...ambientDoubt(scope.port, scope.ambientTaken)],
      suspects: found
        .filter((suspect) => suspect.readingId === row.id)
        .map(({ teamId: _team, readingId: _reading, tracePosition, ...suspect }) => ({
          ...suspect,
          traceIndex: tracePosition,
          partIndex: 0,
        })),
    },
  }));
}
