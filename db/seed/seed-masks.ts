import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { maskRevisions, masks } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { confirmMask } from "@/lib/commands/mask/confirm-mask";

/** From memory as it is shipped, and held at 10 m: no bench of the demo stands there. */
export const CONFIRMED_MASK = "cispr-11-group-1-class-b-10m";

/**
 * Confirms one of the masks from memory, before any sweep is there to be read again. Others stay
 * marked.
 */
export async function seedMasks(tx: Transaction, ctx: Context): Promise<void> {
  const [mask] = await tx
    .select({ id: masks.id, revision: maskRevisions.revision })
    .from(masks)
    .innerJoin(
      maskRevisions,
      and(eq(maskRevisions.teamId, masks.teamId), eq(maskRevisions.maskId, masks.id)),
    )
    .where(and(eq(masks.teamId, ctx.teamId), eq(masks.key, CONFIRMED_MASK)));
  if (!mask) throw new Error(`The mask ${CONFIRMED_MASK} is not there.`);
  await confirmMask(ctx, {
    maskId: mask.id,
    basedOnRevision: mask.revision,
    copy: "Printed copy 2 in the reading room",
    edition: "As of the team's copy (demo)",
    note: "Demo data: this confirmation is part of the invented story. Compare the mask with your own copy before you use it.",
    isCompared: true,
  });
}
