import { and, asc, eq, inArray } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { maskRevisions, masks, programMasks, readings, suspects } from "@/db/schema";
import type { Mask } from "@/lib/core/mask/mask";
import type { SuspectAmbient } from "@/lib/core/reading/ambient-check";
import type { Reading, Suspect } from "@/lib/core/reading/reading";
import type { Port } from "@/lib/core/sweep/settings";
import { checkOfDay } from "../bench-check/check-of-day";
import { deriveDoubts } from "./derive-doubts";
import type { AmbientLink, BenchDay } from "./list-ambient";
import { ambientsOf, loadHeldAmbients } from "./list-ambient";
import { isNewestRevision } from "./newest-revision";

export interface ReadingDetail {
  id: string;
  maskId: string;
  maskRevisionId: string;
  maskRevision: number;
  mask: Mask;
  /** With the doubts that are derived from the bench's day. */
  reading: Reading;
  /** Of the suspects that a comparable ambient sweep of the day covers; the others are unknown. */
  ambient: SuspectAmbient[];
}

interface ReadingScope extends BenchDay {
  sweepId: string;
  programId: string;
  port: Port;
  /** Ambient sweeps of the bench and day that are there now. */
  ambients: readonly AmbientLink[];
}

/** Suspects of some readings in their order, by the reading's id. */
export async function loadSuspects(
  tx: Transaction,
  teamId: string,
  readingIds: readonly string[],
): Promise<Map<string, Suspect[]>> {
  const byReading = new Map<string, Suspect[]>();
  if (readingIds.length === 0) return byReading;
  const rows = await tx
    .select()
    .from(suspects)
    .where(and(eq(suspects.teamId, teamId), inArray(suspects.readingId, [...readingIds])))
    .orderBy(asc(suspects.number));
  for (const { teamId: _team, readingId, tracePosition, ...suspect } of rows) {
    const own = byReading.get(readingId) ?? [];
    own.push({ ...suspect, traceIndex: tracePosition, partIndex: 0 });
    byReading.set(readingId, own);
  }
  return byReading;
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
  const found = await loadSuspects(tx, teamId, ids);
  const heldOf = await loadHeldAmbients(tx, teamId, ids);
  const ambients = ambientsOf(scope.ambients, scope, scope.port);
  const check =
    scope.measuredOn === null || ids.length === 0
      ? null
      : await checkOfDay(tx, teamId, scope.benchId, scope.measuredOn);
  return rows.map(({ content, ...row }) => {
    const reading = { ...content, suspects: found.get(row.id) ?? [] };
    const derived = deriveDoubts(reading, {
      port: scope.port,
      ambients: heldOf(row.id, ambients),
      check,
    });
    return {
      ...row,
      reading: { ...reading, doubts: [...content.doubts, ...derived.doubts] },
      ambient: derived.ambient,
    };
  });
}
