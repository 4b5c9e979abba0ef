import { and, eq } from "drizzle-orm";
import { masks } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockMask } from "./lock-mask";
import { maskIdSchema } from "./schemas";

/** Takes a mask off the library; its revisions and readings stay. */
export async function archiveMask(ctx: Context, input: unknown): Promise<{ maskId: string }> {
  requirePermission(ctx, "mask.write");
  const { maskId } = parseInput(maskIdSchema, input);
  return change(ctx, async (tx, audit) => {
    const { mask } = await lockMask(tx, ctx, maskId);
    if (mask.archivedAt !== null)
      throw new CommandError("conflict", "This mask is archived already.");
    await tx
      .update(masks)
      .set({ archivedAt: new Date() })
      .where(and(eq(masks.teamId, ctx.teamId), eq(masks.id, maskId)));
    await audit({
      action: "mask.archive",
      subjectType: "mask",
      subjectId: maskId,
      detail: { key: mask.key },
    });
    return { maskId };
  });
}
