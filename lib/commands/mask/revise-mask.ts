import { maskRevisions } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { change, parseInput, requirePermission } from "../run";
import { lockMask } from "./lock-mask";
import { readMaskInput } from "./read-mask-input";
import { revisionContent } from "./revision-content";
import { reviseMaskSchema } from "./schemas";
import { startRecomputation } from "./start-recomputation";

/**
 * Adds the next revision of a team's mask. It is in force once the sweeps that are here are read
 * under it; until then the one before counts.
 */
export async function reviseMask(
  ctx: Context,
  input: unknown,
): Promise<{ maskId: string; maskRevisionId: string; revision: number }> {
  requirePermission(ctx, "mask.write");
  const values = parseInput(reviseMaskSchema, input);
  const { maskId, basedOnRevision } = values;
  const typed = readMaskInput(values.mask);
  return change(ctx, async (tx, audit) => {
    // The lock keeps two revisions saved at once from taking the same number.
    const { mask, current } = await lockMask(tx, ctx, maskId);
    const content = revisionContent({ mask, current }, typed, basedOnRevision);
    const revision = current.revision + 1;
    const [row] = await tx
      .insert(maskRevisions)
      .values({ teamId: ctx.teamId, maskId, revision, content, inForceAt: null })
      .returning({ id: maskRevisions.id });
    if (!row) throw new Error("The mask was not stored.");
    const maskRevisionId = row.id;
    await startRecomputation(tx, ctx, { maskId, maskRevisionId });
    await audit({
      action: "mask.revise",
      subjectType: "mask",
      subjectId: maskId,
      detail: { key: mask.key, revision, title: content.title, provenance: content.provenance },
    });
    return { maskId, maskRevisionId, revision };
  });
}
