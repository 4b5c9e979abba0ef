import type { Context } from "@/lib/auth/context";
import { change, parseInput, requirePermission } from "../run";
import { readMaskInput } from "./read-mask-input";
import { createMaskSchema } from "./schemas";
import { storeMask } from "./store-mask";

/** Adds a mask of the team's own; its key is made from its title. */
export async function createMask(ctx: Context, input: unknown): Promise<{ maskId: string }> {
  requirePermission(ctx, "mask.write");
  const mask = readMaskInput(parseInput(createMaskSchema, input).mask);
  return change(ctx, async (tx, audit) => {
    const { maskId, key } = await storeMask(tx, ctx, mask);
    await audit({
      action: "mask.create",
      subjectType: "mask",
      subjectId: maskId,
      detail: { key, title: mask.title, provenance: mask.provenance },
    });
    return { maskId };
  });
}
