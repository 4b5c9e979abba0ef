import { and, asc, count, eq, isNull } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { builds, clocks, ladders, ladderSteps, programs, sweeps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";
import { isId } from "../is-id";
import { loadReadings } from "../sweep/load-readings";
import { worstStanding } from "../sweep/standings";

/** A build with its clocks, ladders and where it stands; null when the team has none of this id. */
export async function readBuild(ctx: Context, buildId: string) {
  requirePermission(ctx, "program.read");
  if (!isId(buildId)) return null;
  return inTeam(ctx.db, ctx.teamId, async (tx) => {
    const [build] = await tx
      .select({
        id: builds.id,
        name: builds.name,
        builtOn: builds.builtOn,
        notes: builds.notes,
        archivedAt: builds.archivedAt,
        programId: programs.id,
        programName: programs.name,
        targetMarginDb: programs.targetMarginDb,
        programArchivedAt: programs.archivedAt,
      })
      .from(builds)
      .innerJoin(
        programs,
        and(eq(programs.teamId, builds.teamId), eq(programs.id, builds.programId)),
      )
      .where(and(eq(builds.teamId, ctx.teamId), eq(builds.id, buildId)));
    if (!build) return null;
    const clockRows = await tx
      .select({
        id: clocks.id,
        name: clocks.name,
        frequencyHz: clocks.frequencyHz,
        tolerancePpm: clocks.tolerancePpm,
      })
      .from(clocks)
      .where(and(eq(clocks.teamId, ctx.teamId), eq(clocks.buildId, buildId)))
      .orderBy(asc(clocks.frequencyHz));
    const ladderRows = await tx
      .select({
        id: ladders.id,
        name: ladders.name,
        notes: ladders.notes,
        steps: count(ladderSteps.id),
      })
      .from(ladders)
      .leftJoin(
        ladderSteps,
        and(eq(ladderSteps.teamId, ladders.teamId), eq(ladderSteps.ladderId, ladders.id)),
      )
      .where(
        and(
          eq(ladders.teamId, ctx.teamId),
          eq(ladders.buildId, buildId),
          isNull(ladders.archivedAt),
        ),
      )
      .groupBy(ladders.teamId, ladders.id)
      .orderBy(asc(ladders.createdAt));
    const onRecord = and(eq(sweeps.buildId, buildId), eq(sweeps.onRecord, true));
    const held = await loadReadings(tx, ctx.teamId, onRecord);
    const worst = await worstStanding(tx, ctx.teamId, held);
    return { ...build, clocks: clockRows, ladders: ladderRows, worst };
  });
}

export type BuildDetail = NonNullable<Awaited<ReturnType<typeof readBuild>>>;
