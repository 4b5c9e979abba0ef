import type { TestDatabase } from "../../support/database";

const TABLES = ["stored_files", "sweeps", "traces", "trace_blocks", "readings", "suspects"];

/** How many rows a team has in each table that an import writes to. */
export async function countRows(database: TestDatabase, teamId: string) {
  const counts: Record<string, number> = {};
  for (const table of TABLES) {
    const found = await database.owner.query(
      `select count(*)::int as n from ${table} where team_id = $1`,
      [teamId],
    );
    counts[table] = found.rows[0].n;
  }
  return counts;
}

export const NOTHING = Object.fromEntries(TABLES.map((table) => [table, 0]));

interface ReadingRow {
  sweep_id: string;
  mask_id: string;
  revision: number;
  margin_db: number | null;
  standing: string;
}

/** All readings of a team, also those that no list shows any more, in the order of revisions. */
export async function readingRows(database: TestDatabase, teamId: string): Promise<ReadingRow[]> {
  const found = await database.owner.query<ReadingRow>(
    `select g.sweep_id, g.mask_id, r.revision, g.margin_db, g.standing
     from readings g join mask_revisions r on r.id = g.mask_revision_id
     where g.team_id = $1 order by r.revision, g.margin_db`,
    [teamId],
  );
  return found.rows;
}

async function waiting(database: TestDatabase): Promise<number> {
  // Inside a transaction the activity is otherwise shown as it was at the first look.
  await database.owner.query("select pg_stat_clear_snapshot()");
  const found = await database.owner.query(
    `select count(*)::int as n from pg_stat_activity
     where datname = current_database() and wait_event_type = 'Lock'`,
  );
  return found.rows[0].n;
}

/**
 * Starts pieces of work one after the other, each held up before it can commit, and lets all go
 * when each of them waits: for the audit trail at its end, or for one that came before it.
 */
export async function heldTogether<T>(
  database: TestDatabase,
  works: (() => Promise<T>)[],
): Promise<PromiseSettledResult<T>[]> {
  const running: Promise<T>[] = [];
  await database.owner.query("begin");
  await database.owner.query("lock table audit_events in exclusive mode");
  try {
    for (const [i, work] of works.entries()) {
      const started = work();
      started.catch(() => undefined);
      running.push(started);
      while ((await waiting(database)) <= i) {
        await new Promise((resolve) => setTimeout(resolve, 10));
      }
    }
  } finally {
    await database.owner.query("commit");
  }
  return Promise.allSettled(running);
}
