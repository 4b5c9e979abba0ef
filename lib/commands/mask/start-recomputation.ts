import { and, eq, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { maskRecomputations, maskRevisions } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { RECOMPUTE_MASK } from "./recompute-mask";
import { countSweeps } from "./recompute-mask-scope";

/**
 * Has the readings of a mask's newest revision made, after which it is put in force: by a job
 * that is kept with the revision or not at all. With no sweep to read it is in force at once.
 * The caller holds the mask, so that no sweep is being stored meanwhile.
 */
export async function startRecomputation(
  tx: Transaction,
  ctx: Pick<Context, "teamId" | "jobs">,
  revision: { maskId: string; maskRevisionId: string },
): Promise<void> {
  const { teamId } = ctx;
  const { maskRevisionId } = revision;
  const { total, done } = await countSweeps(tx, { teamId, ...revision });
  if (done < total) {
    await tx.insert(maskRecomputations).values({ teamId, maskRevisionId, total, done });
    await ctx.jobs.send(tx, RECOMPUTE_MASK, { teamId, maskRevisionId });
    return;
  }
  await tx
    .update(maskRevisions)
    .set({ inForceAt: sql`clock_timestamp()` })
    .where(and(eq(maskRevisions.teamId, teamId), eq(maskRevisions.id, maskRevisionId)));
}
