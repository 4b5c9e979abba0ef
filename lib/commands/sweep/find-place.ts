import { and, desc, eq, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { benches, builds, ladders, ladderSteps, programs, signalPathRevisions } from "@/db/schema";
import type { SignalPath } from "@/lib/core/bench/signal-path";
import { CommandError } from "../result";

/** The build and the step that a sweep goes to; refuses what is archived or does not fit. */
export async function findBuild(
  tx: Transaction,
  teamId: string,
  buildId: string,
  stepId: string | null,
): Promise<{ programId: string }> {
  const [build] = await tx
    .select({ programId: builds.programId })
    .from(builds)
    .innerJoin(programs, and(eq(programs.teamId, builds.teamId), eq(programs.id, builds.programId)))
    .where(
      and(
        eq(builds.teamId, teamId),
        eq(builds.id, buildId),
        isNull(builds.archivedAt),
        isNull(programs.archivedAt),
      ),
    );
  if (!build) throw new CommandError("not-found", "This build does not exist or is archived.");
  if (stepId === null) return build;
  const [step] = await tx
    .select({ id: ladderSteps.id })
    .from(ladderSteps)
    .innerJoin(
      ladders,
      and(eq(ladders.teamId, ladderSteps.teamId), eq(ladders.id, ladderSteps.ladderId)),
    )
    .where(
      and(
        eq(ladderSteps.teamId, teamId),
        eq(ladderSteps.id, stepId),
        eq(ladders.buildId, buildId),
        isNull(ladders.archivedAt),
      ),
    );
  if (!step) {
    throw new CommandError("not-found", "This step does not belong to the build or is archived.", {
      stepId: "Choose a step of this build.",
    });
  }
  return build;
}

export interface BenchInForce {
  guardDb: number;
  pathRevisionId: string;
  path: SignalPath;
}

/** A bench with the signal path revision in force. */
export async function findBench(
  tx: Transaction,
  teamId: string,
  benchId: string,
): Promise<BenchInForce> {
  const [bench] = await tx
    .select({
      guardDb: benches.guardDb,
      pathRevisionId: signalPathRevisions.id,
      path: signalPathRevisions.content,
    })
    .from(benches)
    .innerJoin(
      signalPathRevisions,
      and(
        eq(signalPathRevisions.teamId, benches.teamId),
        eq(signalPathRevisions.benchId, benches.id),
      ),
    )
    .where(and(eq(benches.teamId, teamId), eq(benches.id, benchId), isNull(benches.archivedAt)))
    .orderBy(desc(signalPathRevisions.revision))
    .limit(1);
  if (!bench) {
    throw new CommandError("not-found", "This bench does not exist or is archived.", {
      benchId: "Choose a bench of your team.",
    });
  }
  return bench;
}
