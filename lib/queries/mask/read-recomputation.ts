import { and, desc, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { maskRecomputations, maskRevisions } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";
import { isId } from "../is-id";

/** How far the newest revision of a mask is on its way into force. */
export interface Recomputation {
  revision: number;
  isInForce: boolean;
  /** Sweeps to read under it, and how many are read; both 0 when there was nothing to read. */
  total: number;
  done: number;
  /** What kept the last try from finishing, as a sentence. */
  problem: string | null;
}

/** null when the team has no mask of this id. */
export async function readRecomputation(
  ctx: Context,
  maskId: string,
): Promise<Recomputation | null> {
  requirePermission(ctx, "mask.read");
  if (!isId(maskId)) return null;
  return inTeam(ctx.db, ctx.teamId, async (tx) => {
    const [newest] = await tx
      .select({
        revision: maskRevisions.revision,
        inForceAt: maskRevisions.inForceAt,
        total: maskRecomputations.total,
        done: maskRecomputations.done,
        problem: maskRecomputations.problem,
      })
      .from(maskRevisions)
      .leftJoin(
        maskRecomputations,
        and(
          eq(maskRecomputations.teamId, maskRevisions.teamId),
          eq(maskRecomputations.maskRevisionId, maskRevisions.id),
        ),
      )
      .where(and(eq(maskRevisions.teamId, ctx.teamId), eq(maskRevisions.maskId, maskId)))
      .orderBy(desc(maskRevisions.revision))
      .limit(1);
    if (!newest) return null;
    const { revision, inForceAt, total, done, problem } = newest;
    return {
      revision,
      isInForce: inForceAt !== null,
      total: total ?? 0,
      done: done ?? 0,
      problem,
    };
  });
}
