import type { SQL } from "drizzle-orm";
import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";

export interface RevisionToRead {
  teamId: string;
  maskId: string;
  maskRevisionId: string;
}

/** Sweeps that are held against a mask, `g` being their reading under the revision when there. */
const scope = ({ teamId, maskId, maskRevisionId }: RevisionToRead): SQL => sql`
  from sweeps s
  join builds b on b.team_id = s.team_id and b.id = s.build_id
  join program_masks pm on pm.team_id = b.team_id and pm.program_id = b.program_id
  left join readings g on g.team_id = s.team_id and g.sweep_id = s.id
    and g.mask_revision_id = ${maskRevisionId} and g.restated = pm.restate_distance
  where s.team_id = ${teamId} and pm.mask_id = ${maskId}
    and s.purpose = 'product' and s.archived_at is null`;

/** How many sweeps there are to read under a revision, and how many of them are read. */
export async function countSweeps(
  tx: Transaction,
  revision: RevisionToRead,
): Promise<{ total: number; done: number }> {
  const { rows } = await tx.execute<{ total: number; done: number }>(
    sql`select count(*)::int as total, count(g.id)::int as done ${scope(revision)}`,
  );
  return rows[0] ?? { total: 0, done: 0 };
}

/** Sweeps that have no reading under a revision yet, newest first: those are looked at most. */
export async function listUnreadSweeps(
  tx: Transaction,
  revision: RevisionToRead,
): Promise<{ sweepId: string; name: string }[]> {
  const { rows } = await tx.execute<{ sweepId: string; name: string }>(
    sql`select s.id as "sweepId", s.name ${scope(revision)} and g.id is null
      order by s.created_at desc, s.id`,
  );
  return rows;
}
