import { sql } from "drizzle-orm";
import type { PgColumn } from "drizzle-orm/pg-core";
import type { Transaction } from "@/db/client";
import { suspects } from "@/db/schema";
import type { Suspect } from "@/lib/core/reading/reading";

/**
 * Keeps the suspects of a reading, however many: one array per column instead of one value per
 * cell, of which a statement takes 65,535 and which take longer to name than to store.
 */
export async function storeSuspects(
  tx: Transaction,
  owner: { teamId: string; readingId: string },
  found: readonly Suspect[],
): Promise<void> {
  if (found.length === 0) return;
  const columns: [PgColumn, (suspect: Suspect) => string | number | null][] = [
    [suspects.number, (s) => s.number],
    [suspects.frequencyHz, (s) => s.frequencyHz],
    [suspects.sampleHz, (s) => s.sampleHz],
    [suspects.levelDb, (s) => s.levelDb],
    [suspects.limitDb, (s) => s.limitDb],
    [suspects.marginDb, (s) => s.marginDb],
    [suspects.prominenceDb, (s) => s.prominenceDb],
    [suspects.lineName, (s) => s.lineName],
    [suspects.basis, (s) => s.basis],
    [suspects.tracePosition, (s) => s.traceIndex],
  ];
  const names = columns.map(([column]) => sql.identifier(column.name));
  const arrays = columns.map(
    ([column, valueOf]) => sql`${sql.param(found.map(valueOf))}::${sql.raw(column.getSQLType())}[]`,
  );
  await tx.execute(sql`
    insert into ${suspects} (team_id, reading_id, ${sql.join(names, sql`, `)})
    select ${owner.teamId}::uuid, ${owner.readingId}::uuid, given.*
      from unnest(${sql.join(arrays, sql`, `)}) as given`);
}
