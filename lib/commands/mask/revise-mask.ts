import { isDeepStrictEqual } from "node:util";
import { maskRevisions } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockMask } from "./lock-mask";
import { readMaskInput } from "./read-mask-input";
import { reviseMaskSchema } from "./schemas";
import { startRecomputation } from "./start-recomputation";

/** Adds the next revision of a team's mask; readings name the one they were made with. */
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
    if (mask.origin === "shipped") {
      throw new CommandError(
        "conflict",
        "Masks shipped with Neap are never edited. Copy it first, and edit the copy.",
      );
    }
    if (mask.archivedAt !== null) {
      throw new CommandError("conflict", "This mask is archived: restore it before changing it.");
    }
    if (basedOnRevision !== undefined && current.revision !== basedOnRevision) {
      throw new CommandError(
        "conflict",
        `Revision ${current.revision} was saved while you were editing revision ${basedOnRevision}. Open the mask in another tab, compare, and carry your change over.`,
      );
    }
    const content = { ...typed, key: mask.key };
    if (isDeepStrictEqual(current.content, content)) {
      throw new CommandError("conflict", "Nothing differs from the current revision.");
    }
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
