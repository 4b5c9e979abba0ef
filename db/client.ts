import { sql } from "drizzle-orm";
import { drizzle } from "drizzle-orm/node-postgres";
import type { NodePgQueryResultHKT } from "drizzle-orm/node-postgres";
import type { PgDatabase } from "drizzle-orm/pg-core";
import { Pool } from "pg";
import * as schema from "./schema";

/** A connection or a transaction: inside a transaction a unit of work is a savepoint of it. */
export type Database = PgDatabase<NodePgQueryResultHKT, typeof schema>;
export type Transaction = Parameters<Parameters<Database["transaction"]>[0]>[0];

/** Opens a pool; the caller ends it. */
export function openDatabase(url: string): { db: Database; pool: Pool } {
  const pool = new Pool({ connectionString: url, max: 10 });
  return { db: drizzle(pool, { schema }), pool };
}

let shared: { url: string; db: Database } | undefined;

/** The app's own connection, as the role that owns nothing. Read lazily: a build needs no database. */
export function appDatabase(): Database {
  const url = process.env.NEAP_APP_DATABASE_URL;
  if (!url) throw new Error("NEAP_APP_DATABASE_URL is not set; start Neap with `npm start`.");
  if (shared?.url !== url) shared = { url, db: openDatabase(url).db };
  return shared.db;
}

/** One unit of work of one team: all policies compare with this setting, and it ends with the transaction. */
export function inTeam<T>(
  db: Database,
  teamId: string,
  work: (tx: Transaction) => Promise<T>,
): Promise<T> {
  return db.transaction(async (tx) => {
    await tx.execute(sql`select set_config('neap.team_id', ${teamId}, true)`);
    return work(tx);
  });
}
