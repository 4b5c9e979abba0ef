import { and, desc, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { maskRevisions, masks } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";

/**
 * The team's mask with its newest revision, in force or not, locked until the transaction ends, or
 * a refusal. The next revision is numbered and based on it.
 */
export async function lockMask(tx: Transaction, ctx: Context, maskId: string) {
  const [mask] = await tx
    .select()
    .from(masks)
    .where(and(eq(masks.teamId, ctx.teamId), eq(masks.id, maskId)))
    .for("update");
  if (!mask) throw new CommandError("not-found", "This mask does not exist.");
  const [current] = await tx
    .select({
      revision: maskRevisions.revision,
      content: maskRevisions.content,
      inForceAt: maskRevisions.inForceAt,
    })
    .from(maskRevisions)
    .where(and(eq(maskRevisions.teamId, ctx.teamId), eq(maskRevisions.maskId, maskId)))
    .orderBy(desc(maskRevisions.revision))
    .limit(1);
  if (!current) throw new Error(`Mask ${maskId} has no revision.`);
  return { mask, current };
}
