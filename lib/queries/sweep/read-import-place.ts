import type { SQL } from "drizzle-orm";
import { and, asc, desc, eq, isNull } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { benches, builds, ladders, ladderSteps, programs, sweeps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";
import { isId } from "../is-id";

/**
 * What the import page needs: the build, its steps, the benches, and the tags of the last import
 * of the same step (or else of the same build) to start from; null when there is no such build.
 */
export async function readImportPlace(ctx: Context, buildId: string, stepId: string | null) {
  requirePermission(ctx, "sweep.read");
  if (!isId(buildId) || (stepId !== null && !isId(stepId))) return null;
  const { teamId } = ctx;
  return inTeam(ctx.db, teamId, async (tx) => {
    const [build] = await tx
      .select({
        id: builds.id,
        name: builds.name,
        programId: programs.id,
        programName: programs.name,
      })
      .from(builds)
      .innerJoin(
        programs,
        and(eq(programs.teamId, builds.teamId), eq(programs.id, builds.programId)),
      )
      .where(
        and(
          eq(builds.teamId, teamId),
          eq(builds.id, buildId),
          isNull(builds.archivedAt),
          isNull(programs.archivedAt),
        ),
      );
    if (!build) return null;
    const steps = await tx
      .select({
        id: ladderSteps.id,
        name: ladderSteps.name,
        position: ladderSteps.position,
        ladderId: ladders.id,
        ladderName: ladders.name,
      })
      .from(ladderSteps)
      .innerJoin(
        ladders,
        and(eq(ladders.teamId, ladderSteps.teamId), eq(ladders.id, ladderSteps.ladderId)),
      )
      .where(
        and(eq(ladders.teamId, teamId), eq(ladders.buildId, buildId), isNull(ladders.archivedAt)),
      )
      .orderBy(asc(ladders.createdAt), asc(ladderSteps.position));
    const benchRows = await tx
      .select({ id: benches.id, name: benches.name, distanceM: benches.distanceM })
      .from(benches)
      .where(and(eq(benches.teamId, teamId), isNull(benches.archivedAt)))
      .orderBy(asc(benches.name));
    const lastOf = (own?: SQL) =>
      tx
        .select({
          name: sweeps.name,
          benchId: sweeps.benchId,
          purpose: sweeps.purpose,
          corrected: sweeps.corrected,
          settings: sweeps.settings,
          link: sweeps.link,
        })
        .from(sweeps)
        .where(
          and(
            eq(sweeps.teamId, teamId),
            eq(sweeps.buildId, buildId),
            eq(sweeps.purpose, "product"),
            // Put aside, maybe because of its tags: nothing to start from.
            isNull(sweeps.archivedAt),
            own,
          ),
        )
        .orderBy(desc(sweeps.createdAt))
        .limit(1);
    const [ofStep] = stepId === null ? [] : await lastOf(eq(sweeps.stepId, stepId));
    const [ofBuild] = ofStep ? [] : await lastOf();
    const last = ofStep
      ? { ...ofStep, from: "step" as const }
      : ofBuild
        ? { ...ofBuild, from: "build" as const }
        : null;
    return { build, steps, benches: benchRows, last };
  });
}
