import { and, desc, eq, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { benches, builds, ladders, ladderSteps, programs, signalPathRevisions } from "@/db/schema";
import type { SignalPath } from "@/lib/core/bench/signal-path";
import { CommandError } from "../result";

/**
 * The build and the step that a sweep goes to; refuses what is archived or does not fit. All of
 * it stays as it is until the transaction ends: nothing is archived or taken away meanwhile, and
 * a program's masks are not exchanged between the look at them and the sweep's commit.
 */
export async function findBuild(
  tx: Transaction,
  teamId: string,
  buildId: string,
  stepId: string | null,
): Promise<{ programId: string }> {
  const gone = () => new CommandError("not-found", "This build does not exist or is archived.");
  const ofTeam = and(eq(builds.teamId, teamId), eq(builds.id, buildId));
  const [found] = await tx.select({ programId: builds.programId }).from(builds).where(ofTeam);
  if (!found) throw gone();
  // The program before the build, as every command locks them.
  const [program] = await tx
    .select({ id: programs.id })
    .from(programs)
    .where(
      and(
        eq(programs.teamId, teamId),
        eq(programs.id, found.programId),
        isNull(programs.archivedAt),
      ),
    )
    .for("share");
  const [build] = await tx
    .select({ id: builds.id })
    .from(builds)
    .where(and(ofTeam, isNull(builds.archivedAt)))
    .for("share");
  if (!program || !build) throw gone();
  if (stepId !== null && !(await holdStep(tx, teamId, buildId, stepId))) {
    throw new CommandError("not-found", "This step does not belong to the build or is archived.", {
      stepId: "Choose a step of this build.",
    });
  }
  return found;
}

/** Whether the step is on an open ladder of the build; if so it stays there. */
async function holdStep(
  tx: Transaction,
  teamId: string,
  buildId: string,
  stepId: string,
): Promise<boolean> {
  const findStep = () =>
    tx
      .select({ ladderId: ladderSteps.ladderId })
      .from(ladderSteps)
      .where(and(eq(ladderSteps.teamId, teamId), eq(ladderSteps.id, stepId)));
  const [step] = await findStep();
  if (!step) return false;
  const [ladder] = await tx
    .select({ id: ladders.id })
    .from(ladders)
    .where(
      and(
        eq(ladders.teamId, teamId),
        eq(ladders.id, step.ladderId),
        eq(ladders.buildId, buildId),
        isNull(ladders.archivedAt),
      ),
    )
    .for("share");
  // Looked for again: it may have been taken away while the ladder was waited for.
  return ladder !== undefined && (await findStep()).length > 0;
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
