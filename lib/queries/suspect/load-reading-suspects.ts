import { and, asc, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { builds, readings, suspects, sweeps } from "@/db/schema";
import { loadSteps, resolutionOf } from "./resolution";

/** A reading's suspects with what it takes to follow them; null when the team has no such reading. */
export async function loadReadingSuspects(tx: Transaction, teamId: string, readingId: string) {
  const [row] = await tx
    .select({
      sweepId: sweeps.id,
      sweepName: sweeps.name,
      archivedAt: sweeps.archivedAt,
      programId: builds.programId,
      settings: sweeps.settings,
      link: sweeps.link,
      content: readings.content,
    })
    .from(readings)
    .innerJoin(sweeps, and(eq(sweeps.teamId, readings.teamId), eq(sweeps.id, readings.sweepId)))
    .innerJoin(builds, and(eq(builds.teamId, sweeps.teamId), eq(builds.id, sweeps.buildId)))
    .where(and(eq(readings.teamId, teamId), eq(readings.id, readingId)));
  if (!row) return null;
  const found = await tx
    .select({
      number: suspects.number,
      frequencyHz: suspects.frequencyHz,
      marginDb: suspects.marginDb,
      basis: suspects.basis,
    })
    .from(suspects)
    .where(and(eq(suspects.teamId, teamId), eq(suspects.readingId, readingId)))
    .orderBy(asc(suspects.number));
  const steps = await loadSteps(tx, teamId, [row.sweepId]);
  return {
    sweepId: row.sweepId,
    sweepName: row.sweepName,
    archivedAt: row.archivedAt,
    programId: row.programId,
    guardDb: row.content.guardDb,
    resolution: resolutionOf(row.settings, row.link, steps.get(row.sweepId)),
    suspects: found,
  };
}

export type ReadingSuspects = NonNullable<Awaited<ReturnType<typeof loadReadingSuspects>>>;
