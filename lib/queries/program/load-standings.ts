import { and, asc, desc, eq, inArray, isNotNull, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { builds, maskRevisions, masks, programMasks, sweeps } from "@/db/schema";
import { loadReadings } from "../sweep/load-readings";
import type { MaskStanding } from "../sweep/standings";
import { standingsOf } from "../sweep/standings";
import { worstOf } from "../sweep/worst-of";

export interface BuildTrend {
  id: string;
  name: string;
  builtOn: string | null;
  /** One for each mask that a sweep on record reaches. */
  standings: MaskStanding[];
}

export interface ProgramTrend {
  programId: string;
  masks: { id: string; title: string; provenance: string }[];
  /** In their order, archived ones left out. */
  builds: BuildTrend[];
}

/** Where each build of some programs stands under each of the program's masks. */
export async function loadProgramTrends(
  tx: Transaction,
  teamId: string,
  programIds: string[],
): Promise<ProgramTrend[]> {
  if (programIds.length === 0) return [];
  const buildRows = await tx
    .select({
      id: builds.id,
      programId: builds.programId,
      name: builds.name,
      builtOn: builds.builtOn,
    })
    .from(builds)
    .where(
      and(
        eq(builds.teamId, teamId),
        inArray(builds.programId, programIds),
        isNull(builds.archivedAt),
      ),
    )
    .orderBy(asc(builds.sequence));
  const maskRows = await tx
    .selectDistinctOn([masks.key, programMasks.programId], {
      id: masks.id,
      programId: programMasks.programId,
      content: maskRevisions.content,
    })
    .from(programMasks)
    .innerJoin(masks, and(eq(masks.teamId, programMasks.teamId), eq(masks.id, programMasks.maskId)))
    .innerJoin(
      maskRevisions,
      and(
        eq(maskRevisions.teamId, masks.teamId),
        eq(maskRevisions.maskId, masks.id),
        isNotNull(maskRevisions.inForceAt),
      ),
    )
    .where(and(eq(programMasks.teamId, teamId), inArray(programMasks.programId, programIds)))
    .orderBy(asc(masks.key), asc(programMasks.programId), desc(maskRevisions.revision));
  const held = await loadReadings(
    tx,
    teamId,
    and(inArray(builds.programId, programIds), eq(sweeps.onRecord, true)),
  );
  const standings = new Map<string, MaskStanding[]>();
  for (const { id } of buildRows) {
    const own = held.filter((row) => row.buildId === id);
    standings.set(id, await standingsOf(tx, teamId, own));
  }
  return programIds.map((programId) => {
    const own = maskRows.filter((mask) => mask.programId === programId);
    return {
      programId,
      masks: own.map(({ id, content }) => ({
        id,
        title: content.title,
        provenance: content.provenance,
      })),
      builds: buildRows
        .filter((build) => build.programId === programId)
        .map(({ id, name, builtOn }) => ({
          id,
          name,
          builtOn,
          standings: standings.get(id) ?? [],
        })),
    };
  });
}

/** The newest build that stands anywhere, with its worst standing; null when none does. */
export function newestStanding(
  trend: ProgramTrend,
): { build: BuildTrend; worst: MaskStanding } | null {
  for (const build of [...trend.builds].reverse()) {
    const worst = worstOf(build.standings);
    if (worst) return { build, worst };
  }
  return null;
}

/** Titles of the program's masks under which a build has no standing: nothing on record reaches them. */
export function unreachedMasks(trend: ProgramTrend, build: BuildTrend): string[] {
  return trend.masks
    .filter((mask) => build.standings.every((standing) => standing.maskId !== mask.id))
    .map((mask) => mask.title);
}
