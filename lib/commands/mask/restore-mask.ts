import { and, eq } from "drizzle-orm";
import { masks } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockMask } from "./lock-mask";
import { maskIdSchema } from "./schemas";

/** Puts an archived mask back into the library. */
export async function restoreMask(ctx: Context, input: unknown): Promise<{ maskId: string }> {
  requirePermission(ctx, "mask.write");
  const { maskId } = parseInput(maskIdSchema, input);
  return change(ctx, async (tx, audit) => {
    const { mask } = await lockMask(tx, ctx, maskId);
    if (mask.archivedAt === null) throw new CommandError("conflict", "This mask is not archived.");
    await tx
      .update(masks)
      .set({ archivedAt: null })
      .where(and(eq(masks.teamId, ctx.teamId), eq(masks.id, maskId)));
    await audit({
      action: "mask.restore",
      subjectType: "mask",
      subjectId: maskId,
      detail: { key: mask.key },
    });
    return { maskId };
  });
}
