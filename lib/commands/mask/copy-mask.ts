import type { Context } from "@/lib/auth/context";
import { change, parseInput, requirePermission } from "../run";
import { lockMask } from "./lock-mask";
import { maskIdSchema } from "./schemas";
import { storeMask } from "./store-mask";

/**
 * Makes a mask of the team's own from the current revision of any mask. It keeps its provenance:
 * copying a limit from memory does not confirm it.
 */
export async function copyMask(ctx: Context, input: unknown): Promise<{ maskId: string }> {
  requirePermission(ctx, "mask.write");
  const { maskId } = parseInput(maskIdSchema, input);
  return change(ctx, async (tx, audit) => {
    const { mask, current } = await lockMask(tx, ctx, maskId);
    const title = `${current.content.title} (copy)`;
    const copy = await storeMask(tx, ctx, { ...current.content, title });
    await audit({
      action: "mask.copy",
      subjectType: "mask",
      subjectId: copy.maskId,
      detail: { key: copy.key, from: { maskId, key: mask.key, revision: current.revision } },
    });
    return { maskId: copy.maskId };
  });
}
