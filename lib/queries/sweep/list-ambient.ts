import { and, asc, desc, eq, inArray, isNull, lte, ne, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { ambientChecks, sweeps, traces } from "@/db/schema";
import type { HeldAmbient } from "@/lib/core/reading/judge-ambient";
import type { Detector, MeasurementSettings, Port } from "@/lib/core/sweep/settings";

/** Where and when something was swept; an undated sweep has no day to share with others. */
export interface BenchDay {
  benchId: string;
  measuredOn: string | null;
}

export interface AmbientLink extends BenchDay {
  id: string;
  name: string;
  port: Port;
}

/** Ambient sweeps of some benches and days that are not archived, by name. */
export async function listAmbientSweeps(
  tx: Transaction,
  teamId: string,
  days: readonly BenchDay[],
): Promise<AmbientLink[]> {
  const dates = days.flatMap((day) => day.measuredOn ?? []);
  if (dates.length === 0) return [];
  const rows = await tx
    .select({
      id: sweeps.id,
      name: sweeps.name,
      benchId: sweeps.benchId,
      measuredOn: sweeps.measuredOn,
      settings: sweeps.settings,
    })
    .from(sweeps)
    .where(
      and(
        eq(sweeps.teamId, teamId),
        eq(sweeps.purpose, "ambient"),
        isNull(sweeps.archivedAt),
        inArray(sweeps.benchId, [...new Set(days.map((day) => day.benchId))]),
        inArray(sweeps.measuredOn, [...new Set(dates)]),
      ),
    )
    .orderBy(asc(sweeps.name), asc(sweeps.createdAt), asc(sweeps.id));
  return rows.map(({ settings, ...row }) => ({ ...row, port: settings.port }));
}

/** The ambient sweeps that speak about a sweep: of its bench, day and port. */
export function ambientsOf(all: readonly AmbientLink[], day: BenchDay, port: Port): AmbientLink[] {
  return all.filter(
    (one) =>
      day.measuredOn !== null &&
      one.benchId === day.benchId &&
      one.measuredOn === day.measuredOn &&
      one.port === port,
  );
}

/** How each of the ambient sweeps lies beside a reading; by the reading's id. */
export async function loadHeldAmbients(
  tx: Transaction,
  teamId: string,
  readingIds: readonly string[],
): Promise<(readingId: string, ambients: readonly AmbientLink[]) => HeldAmbient[]> {
  const rows =
    readingIds.length === 0
      ? []
      : await tx
          .select()
          .from(ambientChecks)
          .where(
            and(
              eq(ambientChecks.teamId, teamId),
              inArray(ambientChecks.readingId, [...readingIds]),
            ),
          );
  const checks = new Map(rows.map((row) => [`${row.readingId} ${row.ambientSweepId}`, row]));
  return (readingId, ambients) =>
    ambients.map(({ id, name }) => ({
      sweepName: name,
      check: checks.get(`${readingId} ${id}`)?.content ?? null,
    }));
}

interface FloorLink {
  id: string;
  name: string;
  measuredOn: string;
  /** Of the same stated bandwidth: only then do the floors lie at one height. */
  sameRbw: boolean;
  /** One of its traces has a detector of the sweep. */
  sameDetector: boolean;
}

interface FloorScope extends BenchDay {
  sweepId: string;
  signalPathRevisionId: string;
  settings: MeasurementSettings;
  detectors: readonly (Detector | null)[];
}

/**
 * The floor of a sweep's bench: the floor sweeps of the newest day up to the sweep's own, with the
 * same port and the same revision of the signal path.
 */
export async function listFloorSweeps(
  tx: Transaction,
  teamId: string,
  scope: FloorScope,
): Promise<FloorLink[]> {
  if (scope.measuredOn === null) return [];
  const rows = await tx
    .select({
      id: sweeps.id,
      name: sweeps.name,
      measuredOn: sweeps.measuredOn,
      settings: sweeps.settings,
      detectors: sql<
        (Detector | null)[]
      >`array_agg(${traces.detector} order by ${traces.position})`,
    })
    .from(sweeps)
    .innerJoin(traces, and(eq(traces.teamId, sweeps.teamId), eq(traces.sweepId, sweeps.id)))
    .where(
      and(
        eq(sweeps.teamId, teamId),
        eq(sweeps.benchId, scope.benchId),
        eq(sweeps.signalPathRevisionId, scope.signalPathRevisionId),
        eq(sweeps.purpose, "floor"),
        isNull(sweeps.archivedAt),
        lte(sweeps.measuredOn, scope.measuredOn),
        ne(sweeps.id, scope.sweepId),
        sql`${sweeps.settings} ->> 'port' = ${scope.settings.port}`,
      ),
    )
    .groupBy(sweeps.teamId, sweeps.id)
    .orderBy(desc(sweeps.measuredOn), asc(sweeps.name), asc(sweeps.id));
  const own = new Set(scope.detectors.filter((detector) => detector !== null));
  return rows.flatMap(({ settings, detectors, measuredOn, ...row }) =>
    measuredOn === null || measuredOn !== rows[0]?.measuredOn
      ? []
      : [
          {
            ...row,
            measuredOn,
            sameRbw:
              settings.rbwHz !== null &&
              settings.rbwHz === scope.settings.rbwHz &&
              settings.rbwKind === scope.settings.rbwKind,
            sameDetector: detectors.some((detector) => detector !== null && own.has(detector)),
          },
        ],
  );
}
