import { sql } from "drizzle-orm";
import { maskRevisions } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import type { Mask } from "@/lib/core/mask/mask";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockMask } from "./lock-mask";
import { confirmMaskSchema } from "./schemas";
import { startRecomputation } from "./start-recomputation";

/**
 * Says that somebody compared every limit of a mask with their own copy of its document. The same
 * lines become the mask's next revision, which names the edition and is no longer from memory; a
 * mask that differs from the document is not confirmed but copied and edited.
 */
export async function confirmMask(
  ctx: Context,
  input: unknown,
): Promise<{ maskId: string; maskRevisionId: string; revision: number }> {
  requirePermission(ctx, "mask.write");
  const { maskId, basedOnRevision, copy, edition, note } = parseInput(confirmMaskSchema, input);
  return change(ctx, async (tx, audit) => {
    const { mask, current } = await lockMask(tx, ctx, maskId);
    if (mask.archivedAt !== null) {
      throw new CommandError("conflict", "This mask is archived: restore it before confirming it.");
    }
    if (current.revision !== basedOnRevision) {
      throw new CommandError(
        "conflict",
        `You compared revision ${basedOnRevision}, and revision ${current.revision} is the newest now. Compare that one; nothing was stored.`,
      );
    }
    if (current.inForceAt === null) {
      throw new CommandError(
        "conflict",
        `Revision ${current.revision} is still being put in force. Confirm it once that is done.`,
      );
    }
    const content: Mask = {
      ...current.content,
      provenance: "team",
      edition,
      note: note ?? current.content.note,
    };
    const revision = current.revision + 1;
    const [row] = await tx
      .insert(maskRevisions)
      .values({
        teamId: ctx.teamId,
        maskId,
        revision,
        content,
        source: "confirmation",
        confirmedBy: ctx.userId,
        confirmedAt: sql`clock_timestamp()`,
        confirmedCopy: copy,
        inForceAt: null,
      })
      .returning({ id: maskRevisions.id });
    if (!row) throw new Error("The confirmation was not stored.");
    const maskRevisionId = row.id;
    await startRecomputation(tx, ctx, { maskId, maskRevisionId });
    await audit({
      action: "mask.confirm",
      subjectType: "mask",
      subjectId: maskId,
      detail: { key: mask.key, title: content.title, revision, edition, copy },
    });
    return { maskId, maskRevisionId, revision };
  });
}
