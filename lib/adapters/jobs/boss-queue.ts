import PgBoss from "pg-boss";
import type { JobQueue } from "@/lib/auth/context";
import { bossSql } from "./boss-sql";

/** Jobs as rows of the same database, put there by the transaction that makes them necessary. */
export const bossQueue: JobQueue = {
  send: async (tx, name, data) => {
    // Never started: it only says the statement, which runs in the transaction.
    const boss = new PgBoss({ db: bossSql(tx), migrate: false, supervise: false, schedule: false });
    const id = await boss.send(name, data);
    if (id === null) throw new Error(`There is no job queue "${name}".`);
  },
};
