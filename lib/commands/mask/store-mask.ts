import { and, eq, like } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { maskRevisions, masks } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import type { Mask } from "@/lib/core/mask/mask";
import { TEAM_KEY_PREFIX, teamKey } from "./team-key";

/** Stores a mask of the team's own as revision 1, under a key made from its title. */
export async function storeMask(
  tx: Transaction,
  ctx: Context,
  mask: Mask,
): Promise<{ maskId: string; key: string }> {
  const stem = teamKey(mask.title);
  const taken = await tx
    .select({ key: masks.key })
    .from(masks)
    .where(and(eq(masks.teamId, ctx.teamId), like(masks.key, `${TEAM_KEY_PREFIX}%`)));
  const known = new Set(taken.map((row) => row.key));
  for (let n = 1; ; n += 1) {
    const key = n === 1 ? stem : `${stem}-${n}`;
    if (known.has(key)) continue;
    // Two masks of one title stored at once: whoever comes second takes the next number.
    const [row] = await tx
      .insert(masks)
      .values({ teamId: ctx.teamId, key, origin: "team" })
      .onConflictDoNothing()
      .returning({ id: masks.id });
    if (!row) continue;
    await tx
      .insert(maskRevisions)
      .values({ teamId: ctx.teamId, maskId: row.id, revision: 1, content: { ...mask, key } });
    return { maskId: row.id, key };
  }
}
