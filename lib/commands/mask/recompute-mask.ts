import { and, eq, isNull, max, sql } from "drizzle-orm";
import { z } from "zod";
import type { Database, Transaction } from "@/db/client";
import { inTeam } from "@/db/client";
import { maskRecomputations, maskRevisions, masks } from "@/db/schema";
import type { JobQueue } from "@/lib/auth/context";
import { completeReadings } from "../sweep/complete-readings";
import type { RevisionToRead } from "./recompute-mask-scope";
import { countSweeps, listUnreadSweeps } from "./recompute-mask-scope";

/** Name of the queue and of its jobs. */
export const RECOMPUTE_MASK = "recompute-mask";

const jobSchema = z.object({ teamId: z.uuid(), maskRevisionId: z.uuid() });
type Job = z.infer<typeof jobSchema>;

export interface JobTools {
  db: Database;
  jobs: JobQueue;
  /** Asked between two sweeps; when it says no, the rest is left to a job of its own. */
  mayGoOn: () => boolean;
}

/** Whether a job is still to be done; if so, its row is held until the transaction ends. */
async function holdUnfinished(tx: Transaction, job: Job): Promise<boolean> {
  const rows = await tx
    .select({ total: maskRecomputations.total })
    .from(maskRecomputations)
    .where(and(ofJob(job), isNull(maskRecomputations.finishedAt)))
    .for("update");
  return rows.length > 0;
}

const ofJob = (job: Job) =>
  and(
    eq(maskRecomputations.teamId, job.teamId),
    eq(maskRecomputations.maskRevisionId, job.maskRevisionId),
  );

const ofRevision = (job: Job) =>
  and(eq(maskRevisions.teamId, job.teamId), eq(maskRevisions.id, job.maskRevisionId));

/** A later revision takes the place of one that is not in force yet, which then never is. */
async function isNewest(tx: Transaction, job: Job & { maskId: string }): Promise<boolean> {
  const [own] = await tx
    .select({ revision: maskRevisions.revision })
    .from(maskRevisions)
    .where(ofRevision(job));
  const [newest] = await tx
    .select({ revision: max(maskRevisions.revision) })
    .from(maskRevisions)
    .where(and(eq(maskRevisions.teamId, job.teamId), eq(maskRevisions.maskId, job.maskId)));
  return own !== undefined && own.revision === newest?.revision;
}

/** Reads one sweep under the revision; false when nothing is left to be done for it. */
async function readOne(tx: Transaction, revision: RevisionToRead, sweepId: string) {
  // Two workers at one revision take turns, so that neither makes a reading that is there.
  if (!(await holdUnfinished(tx, revision)) || !(await isNewest(tx, revision))) return false;
  await completeReadings(tx, revision.teamId, { sweepId });
  // Counted, not counted up: whatever else made a reading meanwhile is in it.
  const counted = await countSweeps(tx, revision);
  await tx
    .update(maskRecomputations)
    .set({ ...counted, problem: null })
    .where(ofJob(revision));
  return true;
}

/** Completes what came in meanwhile and puts the revision in force, unless a later one came. */
async function finish(tx: Transaction, revision: RevisionToRead): Promise<void> {
  const { teamId, maskId } = revision;
  if (!(await holdUnfinished(tx, revision))) return;
  // Waits for imports that hold the mask, and keeps others and a next revision out until the end.
  await tx
    .select({ id: masks.id })
    .from(masks)
    .where(and(eq(masks.teamId, teamId), eq(masks.id, maskId)))
    .for("update");
  if (await isNewest(tx, revision)) {
    await completeReadings(tx, teamId, { maskId });
    await tx
      .update(maskRevisions)
      .set({ inForceAt: sql`clock_timestamp()` })
      .where(ofRevision(revision));
  }
  const counted = await countSweeps(tx, revision);
  await tx
    .update(maskRecomputations)
    .set({ ...counted, finishedAt: sql`clock_timestamp()`, problem: null })
    .where(ofJob(revision));
}

async function tellProblem(tx: Transaction, job: Job, problem: string): Promise<void> {
  await tx
    .update(maskRecomputations)
    .set({ problem })
    .where(and(ofJob(job), isNull(maskRecomputations.finishedAt)));
}

/**
 * The job behind a new mask revision: makes the readings that are missing under it, a sweep per
 * transaction, and puts it in force when all are there. Not a command: a worker runs it, and it
 * may be run twice, by several at once and again after it stopped anywhere.
 */
export async function recomputeMask(tools: JobTools, data: unknown): Promise<void> {
  const job = jobSchema.parse(data);
  const inUnit = <T>(work: (tx: Transaction) => Promise<T>) => inTeam(tools.db, job.teamId, work);
  const start = await inUnit(async (tx) => {
    const [row] = await tx
      .select({ maskId: maskRevisions.maskId })
      .from(maskRevisions)
      .where(ofRevision(job));
    if (!row || !(await holdUnfinished(tx, job))) return null;
    const revision = { ...job, maskId: row.maskId };
    return { revision, unread: await listUnreadSweeps(tx, revision) };
  });
  if (!start) return;
  let doing = "";
  try {
    for (const { sweepId, name } of start.unread) {
      if (!tools.mayGoOn()) {
        await inUnit((tx) => tools.jobs.send(tx, RECOMPUTE_MASK, job));
        return;
      }
      doing = `The sweep "${name}" could not be read`;
      if (!(await inUnit((tx) => readOne(tx, start.revision, sweepId)))) break;
    }
    doing = "The sweeps are read, but the revision could not be put in force";
    await inUnit((tx) => finish(tx, start.revision));
  } catch (error) {
    // Where the database itself is gone this cannot be told, and the job's own error counts.
    await inUnit((tx) => tellProblem(tx, job, `${doing}; the log of the worker says why.`)).catch(
      () => undefined,
    );
    throw error;
  }
}
