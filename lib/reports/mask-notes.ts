import { and, eq, inArray } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { maskRevisions, users } from "@/db/schema";
import { confirmationOf } from "@/lib/queries/mask/confirmation";
import type { SnapshotConfirmation } from "./report-content";

/** Confirmations by mask revision; a revision that nobody confirmed is not in it. */
export type MaskNotes = ReadonlyMap<string, SnapshotConfirmation>;

/** Who confirmed some mask revisions. */
export async function loadMaskNotes(
  tx: Transaction,
  teamId: string,
  revisionIds: readonly string[],
): Promise<MaskNotes> {
  if (revisionIds.length === 0) return new Map();
  const rows = await tx
    .select({
      id: maskRevisions.id,
      confirmedByName: users.name,
      confirmedAt: maskRevisions.confirmedAt,
      confirmedCopy: maskRevisions.confirmedCopy,
    })
    .from(maskRevisions)
    .leftJoin(users, eq(users.id, maskRevisions.confirmedBy))
    .where(and(eq(maskRevisions.teamId, teamId), inArray(maskRevisions.id, [...revisionIds])));
  return new Map(
    rows.flatMap((row): [string, SnapshotConfirmation][] => {
      const confirmation = confirmationOf(row);
      if (!confirmation) return [];
      const { by, at, copy } = confirmation;
      return [[row.id, { by, at: at.toISOString(), copy }]];
    }),
  );
}
