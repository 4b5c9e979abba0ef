import { and, asc, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { builds, followedSuspects, users } from "@/db/schema";
import { recogniseSuspects, recognitionWindow } from "@/lib/core/reading/recognise-suspects";
import { standingOfSuspect } from "@/lib/core/reading/suspect-state";
import { loadProgramReadings, loadSuspectsWithin } from "./load-program-readings";
import { loadSteps, resolutionOf } from "./resolution";
import type { BuildSighting, Sighting } from "./sighting";
import { coversFrequency, rankSightings } from "./sighting";

const followedRows = (tx: Transaction, teamId: string, programId: string) =>
  tx
    .select({
      id: followedSuspects.id,
      number: followedSuspects.number,
      frequencyHz: followedSuspects.frequencyHz,
      toleranceHz: followedSuspects.toleranceHz,
      source: followedSuspects.source,
      ownerId: followedSuspects.ownerId,
      ownerName: users.name,
      state: followedSuspects.state,
      createdAt: followedSuspects.createdAt,
    })
    .from(followedSuspects)
    .leftJoin(users, eq(users.id, followedSuspects.ownerId))
    .where(and(eq(followedSuspects.teamId, teamId), eq(followedSuspects.programId, programId)))
    .orderBy(asc(followedSuspects.number));

/**
 * Every suspect that a program follows with what each build says of it, in the order of builds.
 * All of them are matched together, since a peak is one suspect and not two.
 */
export async function loadFollowed(tx: Transaction, teamId: string, programId: string) {
  const followed = await followedRows(tx, teamId, programId);
  if (followed.length === 0) return [];
  const buildRows = await tx
    .select({
      id: builds.id,
      name: builds.name,
      builtOn: builds.builtOn,
      archivedAt: builds.archivedAt,
    })
    .from(builds)
    .where(and(eq(builds.teamId, teamId), eq(builds.programId, programId)))
    .orderBy(asc(builds.sequence));
  const held = await loadProgramReadings(tx, teamId, programId);
  const steps = await loadSteps(tx, teamId, [...new Set(held.map((row) => row.sweepId))]);
  const resolved = held.map((row) => ({
    ...row,
    seenBy: resolutionOf(row.settings, row.link, steps.get(row.sweepId)),
  }));
  const found = await loadSuspectsWithin(
    tx,
    teamId,
    held.map((row) => row.id),
    followed.map((one) => {
      const windows = resolved.map((row) => recognitionWindow(one, row.seenBy));
      return {
        startHz: Math.min(one.frequencyHz, ...windows.map((w) => w.startHz)),
        stopHz: Math.max(one.frequencyHz, ...windows.map((w) => w.stopHz)),
      };
    }),
  );
  const byReading = new Map<string, typeof found>();
  for (const suspect of found) {
    const own = byReading.get(suspect.readingId);
    if (own) own.push(suspect);
    else byReading.set(suspect.readingId, [suspect]);
  }
  const sightings = new Map<string, { buildId: string; sighting: Sighting }[]>();
  for (const row of resolved) {
    const own = byReading.get(row.id) ?? [];
    for (const [id, number] of recogniseSuspects(followed, own, row.seenBy)) {
      const suspect = own.find((one) => one.number === number);
      if (!suspect) continue;
      const { readingId: _reading, ...seen } = suspect;
      const sighting: Sighting = {
        ...seen,
        sweepId: row.sweepId,
        sweepName: row.sweepName,
        measuredOn: row.measuredOn,
        maskId: row.maskId,
        // Wherever a margin is told, so is that its limits were never confirmed.
        maskTitle:
          row.mask.provenance === "from memory"
            ? `${row.mask.title} (from memory, not confirmed)`
            : row.mask.title,
        unit: row.content.unit,
        standing: standingOfSuspect(suspect, row.content.guardDb),
        rbwHz: row.settings.rbwHz,
        rbwKind: row.settings.rbwKind,
        benchId: row.benchId,
        benchName: row.benchName,
        signalPathRevisionId: row.signalPathRevisionId,
        distanceM: row.settings.distanceM,
        polarization: row.settings.polarization,
        heightM: row.settings.heightM,
      };
      sightings.set(id, [...(sightings.get(id) ?? []), { buildId: row.buildId, sighting }]);
    }
  }
  return followed.map((one) => ({
    ...one,
    builds: buildRows
      .filter((build) => build.archivedAt === null)
      .map((build): BuildSighting => {
        const seen = rankSightings(
          (sightings.get(one.id) ?? [])
            .filter((entry) => entry.buildId === build.id)
            .map((entry) => entry.sighting),
        );
        const covering = resolved.filter(
          (row) =>
            row.buildId === build.id &&
            coversFrequency(row.mask, row.content.lines, one.frequencyHz),
        );
        const sweptBy = new Map(covering.map((row) => [row.sweepId, row.sweepName]));
        return {
          buildId: build.id,
          buildName: build.name,
          builtOn: build.builtOn,
          kind: seen.length > 0 ? "seen" : sweptBy.size > 0 ? "not-seen" : "not-swept",
          best: seen[0] ?? null,
          sightings: seen,
          sweptBy: [...sweptBy].map(([sweepId, sweepName]) => ({ sweepId, sweepName })),
        };
      }),
  }));
}

export type FollowedSuspect = Awaited<ReturnType<typeof loadFollowed>>[number];

/** The newest build that was swept at the suspect's frequency; null when none was. */
export function newestSwept(suspect: Pick<FollowedSuspect, "builds">): BuildSighting | null {
  return suspect.builds.findLast((build) => build.kind !== "not-swept") ?? null;
}
