import { and, desc, eq, isNull } from "drizzle-orm";
import { maskRecomputations, maskRevisions, masks } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { RECOMPUTE_MASK } from "./recompute-mask";
import { maskIdSchema } from "./schemas";

/** Sends the job of a revision that is not in force yet once more, after its tries have ended. */
export async function recomputeMaskAgain(
  ctx: Context,
  input: unknown,
): Promise<{ maskId: string; revision: number }> {
  requirePermission(ctx, "mask.write");
  const { maskId } = parseInput(maskIdSchema, input);
  const { teamId } = ctx;
  return change(ctx, async (tx, audit) => {
    const [newest] = await tx
      .select({
        id: maskRevisions.id,
        revision: maskRevisions.revision,
        inForceAt: maskRevisions.inForceAt,
        key: masks.key,
      })
      .from(masks)
      .innerJoin(
        maskRevisions,
        and(eq(maskRevisions.teamId, masks.teamId), eq(maskRevisions.maskId, masks.id)),
      )
      .where(and(eq(masks.teamId, teamId), eq(masks.id, maskId)))
      .orderBy(desc(maskRevisions.revision))
      .limit(1);
    if (!newest) throw new CommandError("not-found", "This mask does not exist.");
    const waiting = await tx
      .update(maskRecomputations)
      .set({ problem: null })
      .where(
        and(
          eq(maskRecomputations.teamId, teamId),
          eq(maskRecomputations.maskRevisionId, newest.id),
          isNull(maskRecomputations.finishedAt),
        ),
      )
      .returning({ id: maskRecomputations.maskRevisionId });
    if (waiting.length === 0)
      throw new CommandError("conflict", "No revision of this mask waits to be put in force.");
    const { revision, key } = newest;
    await ctx.jobs.send(tx, RECOMPUTE_MASK, { teamId, maskRevisionId: newest.id });
    await audit({
      action: "mask.recompute",
      subjectType: "mask",
      subjectId: maskId,
      detail: { key, revision },
    });
    return { maskId, revision };
  });
}
