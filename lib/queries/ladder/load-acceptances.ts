import { and, desc, eq, inArray, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { acceptedMismatches, users } from "@/db/schema";
import type { Acceptance } from "@/lib/core/delta/delta";

export interface PairAcceptance {
  beforeSweepId: string;
  afterSweepId: string;
  acceptance: Acceptance;
}

/** Acceptances in force between sweeps of a list, newest first. */
export async function loadAcceptances(
  tx: Transaction,
  teamId: string,
  sweepIds: string[],
): Promise<PairAcceptance[]> {
  if (sweepIds.length === 0) return [];
  const rows = await tx
    .select({
      id: acceptedMismatches.id,
      beforeSweepId: acceptedMismatches.beforeSweepId,
      afterSweepId: acceptedMismatches.afterSweepId,
      fields: acceptedMismatches.fields,
      reason: acceptedMismatches.reason,
      at: acceptedMismatches.createdAt,
      by: users.name,
    })
    .from(acceptedMismatches)
    .innerJoin(users, eq(users.id, acceptedMismatches.acceptedBy))
    .where(
      and(
        eq(acceptedMismatches.teamId, teamId),
        isNull(acceptedMismatches.withdrawnAt),
        inArray(acceptedMismatches.beforeSweepId, sweepIds),
        inArray(acceptedMismatches.afterSweepId, sweepIds),
      ),
    )
    .orderBy(desc(acceptedMismatches.createdAt), desc(acceptedMismatches.id));
  return rows.map(({ beforeSweepId, afterSweepId, at, ...rest }) => ({
    beforeSweepId,
    afterSweepId,
    acceptance: { ...rest, at: at.toISOString() },
  }));
}

/**
 * The newest acceptance between two sides, in either order. One for any two of their sweeps holds
 * for both sides, because repeats do not differ in what a mismatch depends on.
 */
export function findAcceptance(
  acceptances: readonly PairAcceptance[],
  beforeIds: readonly string[],
  afterIds: readonly string[],
): Acceptance | null {
  const found = acceptances.find(
    ({ beforeSweepId: a, afterSweepId: b }) =>
      (beforeIds.includes(a) && afterIds.includes(b)) ||
      (beforeIds.includes(b) && afterIds.includes(a)),
  );
  return found?.acceptance ?? null;
}
