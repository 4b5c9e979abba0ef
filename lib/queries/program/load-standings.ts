import { and, asc, desc, eq, inArray, isNotNull, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { builds, maskRevisions, masks, programMasks, readings, sweeps } from "@/db/schema";
import type { Standing } from "@/lib/core/reading/reading";
import { isNewestRevision } from "../sweep/newest-revision";
import { worstOf } from "../sweep/worst-of";

/** The worst reading of a build under one mask, over its sweeps on the line of record. */
export interface BuildStanding {
  maskId: string;
  maskTitle: string;
  standing: Standing;
  marginDb: number | null;
  marginAtHz: number | null;
  lineName: string | null;
  sweepId: string;
  coverage: number;
}

export interface BuildTrend {
  id: string;
  name: string;
  builtOn: string | null;
  /** One for each mask that a sweep on record reaches. */
  standings: BuildStanding[];
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
      and(eq(maskRevisions.teamId, masks.teamId), eq(maskRevisions.maskId, masks.id)),
    )
    .where(and(eq(programMasks.teamId, teamId), inArray(programMasks.programId, programIds)))
    .orderBy(asc(masks.key), asc(programMasks.programId), desc(maskRevisions.revision));
  const readingRows = await tx
    .select({
      buildId: sweeps.buildId,
      sweepId: sweeps.id,
      maskId: readings.maskId,
      standing: readings.standing,
      marginDb: readings.marginDb,
      marginAtHz: readings.marginAtHz,
      lineName: readings.lineName,
      coverage: readings.coverage,
    })
    .from(readings)
    .innerJoin(sweeps, and(eq(sweeps.teamId, readings.teamId), eq(sweeps.id, readings.sweepId)))
    .innerJoin(builds, and(eq(builds.teamId, sweeps.teamId), eq(builds.id, sweeps.buildId)))
    .where(
      and(
        eq(readings.teamId, teamId),
        inArray(builds.programId, programIds),
        eq(sweeps.onRecord, true),
        isNull(sweeps.archivedAt),
        isNotNull(readings.marginDb),
        isNewestRevision(),
      ),
    );
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
          standings: own.flatMap((mask) => {
            const worst = worstOf(
              readingRows.filter((r) => r.buildId === id && r.maskId === mask.id),
            );
            if (!worst) return [];
            const { buildId: _build, ...rest } = worst;
            return [{ ...rest, maskTitle: mask.content.title }];
          }),
        })),
    };
  });
}

/** The newest build that stands anywhere, with its worst standing; null when none does. */
export function newestStanding(
  trend: ProgramTrend,
): { build: BuildTrend; worst: BuildStanding } | null {
  for (const build of [...trend.builds].reverse()) {
    const worst = worstOf(build.standings);
    if (worst) return { build, worst };
  }
  return null;
}
