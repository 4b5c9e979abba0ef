import { and, eq, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { maskRevisions } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { completeReadings } from "../sweep/complete-readings";

/**
 * Makes the readings of a mask's newest revision and then puts it in force, inside the transaction
 * that added it.
 */
export async function startRecomputation(
  tx: Transaction,
  ctx: Context,
  revision: { maskId: string; maskRevisionId: string },
): Promise<void> {
  await completeReadings(tx, ctx.teamId, { maskId: revision.maskId });
  await tx
    .update(maskRevisions)
    .set({ inForceAt: sql`clock_timestamp()` })
    .where(
      and(eq(maskRevisions.teamId, ctx.teamId), eq(maskRevisions.id, revision.maskRevisionId)),
    );
}
