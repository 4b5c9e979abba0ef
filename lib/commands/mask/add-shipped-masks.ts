import { isDeepStrictEqual } from "node:util";
import { and, asc, desc, eq, inArray } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { maskRevisions, masks } from "@/db/schema";
import type { Mask } from "@/lib/core/mask/mask";
import { completeReadings } from "../sweep/complete-readings";

/**
 * Brings a team's shipped masks up to date: adds those it lacks as revision 1, and a revision to
 * those whose content changed. A mask whose newest revision the team confirmed stays as confirmed:
 * what somebody compared with the document is not put aside by what Neap ships. Masks that are no
 * longer shipped stay, since readings name them.
 * Not a command: it runs inside the caller's transaction, for the team of that transaction.
 */
export async function addShippedMasks(
  tx: Transaction,
  teamId: string,
  shipped: Mask[],
): Promise<void> {
  if (shipped.length === 0) return;
  const keys = shipped.map((mask) => mask.key);
  await tx
    .insert(masks)
    .values(keys.map((key) => ({ teamId, key, origin: "shipped" as const })))
    .onConflictDoNothing();
  // Two processes may start at once: the lock, in one order, lets them number in turn.
  const rows = await tx
    .select({ id: masks.id, key: masks.key, origin: masks.origin })
    .from(masks)
    .where(and(eq(masks.teamId, teamId), inArray(masks.key, keys)))
    .orderBy(asc(masks.key))
    .for("update");
  const ids = rows.map((row) => row.id);
  const latest = await tx
    .selectDistinctOn([maskRevisions.maskId], {
      maskId: maskRevisions.maskId,
      revision: maskRevisions.revision,
      content: maskRevisions.content,
      source: maskRevisions.source,
    })
    .from(maskRevisions)
    .where(and(eq(maskRevisions.teamId, teamId), inArray(maskRevisions.maskId, ids)))
    .orderBy(asc(maskRevisions.maskId), desc(maskRevisions.revision));
  const current = new Map(latest.map((row) => [row.maskId, row]));
  const fresh = rows.flatMap((row) => {
    const content = shipped.find((mask) => mask.key === row.key);
    if (!content) return [];
    if (row.origin !== "shipped")
      throw new Error(`The key ${row.key} of a shipped mask is taken by a mask of the team's own.`);
    const before = current.get(row.id);
    if (before?.source === "confirmation") return [];
    if (before && isDeepStrictEqual(before.content, content)) return [];
    return [
      {
        teamId,
        maskId: row.id,
        revision: (before?.revision ?? 0) + 1,
        content,
        source: "shipped" as const,
      },
    ];
  });
  if (fresh.length === 0) return;
  await tx.insert(maskRevisions).values(fresh);
  for (const { maskId, revision } of fresh) {
    if (revision > 1) await completeReadings(tx, teamId, { maskId });
  }
}
