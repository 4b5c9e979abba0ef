import { and, asc, eq, inArray, isNull, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import {
  benches,
  builds,
  maskRevisions,
  masks,
  readings,
  suspects,
  sweeps,
  traces,
} from "@/db/schema";
import type { FrequencyRange } from "@/lib/core/reading/reading";
import { isNewestRevision } from "../sweep/newest-revision";

/** Readings in force of what a program's builds have on the line of record, oldest build first. */
export async function loadProgramReadings(tx: Transaction, teamId: string, programId: string) {
  return tx
    .select({
      id: readings.id,
      content: readings.content,
      mask: maskRevisions.content,
      maskId: readings.maskId,
      buildId: sweeps.buildId,
      sweepId: sweeps.id,
      sweepName: sweeps.name,
      measuredOn: sweeps.measuredOn,
      settings: sweeps.settings,
      link: sweeps.link,
      benchId: sweeps.benchId,
      benchName: benches.name,
      signalPathRevisionId: sweeps.signalPathRevisionId,
    })
    .from(readings)
    .innerJoin(sweeps, and(eq(sweeps.teamId, readings.teamId), eq(sweeps.id, readings.sweepId)))
    .innerJoin(builds, and(eq(builds.teamId, sweeps.teamId), eq(builds.id, sweeps.buildId)))
    .innerJoin(benches, and(eq(benches.teamId, sweeps.teamId), eq(benches.id, sweeps.benchId)))
    .innerJoin(masks, and(eq(masks.teamId, readings.teamId), eq(masks.id, readings.maskId)))
    .innerJoin(
      maskRevisions,
      and(eq(maskRevisions.teamId, readings.teamId), eq(maskRevisions.id, readings.maskRevisionId)),
    )
    .where(
      and(
        eq(readings.teamId, teamId),
        eq(builds.programId, programId),
        isNull(builds.archivedAt),
        isNull(sweeps.archivedAt),
        eq(sweeps.onRecord, true),
        isNull(readings.notComparable),
        isNewestRevision(),
      ),
    )
    .orderBy(asc(builds.sequence), asc(masks.key), asc(sweeps.createdAt), asc(sweeps.id));
}

/** The suspects of some readings that lie in one of the ranges, each with its trace's detector. */
export async function loadSuspectsWithin(
  tx: Transaction,
  teamId: string,
  readingIds: string[],
  ranges: readonly FrequencyRange[],
) {
  if (readingIds.length === 0 || ranges.length === 0) return [];
  const starts = sql.param(ranges.map((range) => range.startHz));
  const stops = sql.param(ranges.map((range) => range.stopHz));
  return tx
    .select({
      readingId: suspects.readingId,
      number: suspects.number,
      frequencyHz: suspects.frequencyHz,
      levelDb: suspects.levelDb,
      marginDb: suspects.marginDb,
      lineName: suspects.lineName,
      basis: suspects.basis,
      detector: traces.detector,
    })
    .from(suspects)
    .innerJoin(
      readings,
      and(eq(readings.teamId, suspects.teamId), eq(readings.id, suspects.readingId)),
    )
    .innerJoin(
      traces,
      and(
        eq(traces.teamId, readings.teamId),
        eq(traces.sweepId, readings.sweepId),
        eq(traces.position, suspects.tracePosition),
      ),
    )
    .where(
      and(
        eq(suspects.teamId, teamId),
        inArray(suspects.readingId, readingIds),
        sql`exists (
          select 1 from unnest(${starts}::float8[], ${stops}::float8[]) as range(start_hz, stop_hz)
          where ${suspects.frequencyHz} between range.start_hz and range.stop_hz)`,
      ),
    )
    .orderBy(asc(suspects.readingId), asc(suspects.number));
}
