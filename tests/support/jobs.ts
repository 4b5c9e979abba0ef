import PgBoss from "pg-boss";
import { bossQueue } from "@/lib/adapters/jobs/boss-queue";
import { bossSql } from "@/lib/adapters/jobs/boss-sql";
import { JOB_HANDLERS } from "@/lib/adapters/jobs/handlers";
import type { TestDatabase } from "./database";

/** A queue is a table here as in the app; no worker polls it, so a test says when jobs run. */
export function bossOf(database: TestDatabase): PgBoss {
  return new PgBoss({ db: bossSql(database.app), supervise: false, schedule: false });
}

/** Runs the jobs that are waiting, and those that these send, until none is left. */
export async function runJobs(database: TestDatabase): Promise<number> {
  const boss = bossOf(database);
  const tools = { db: database.app, jobs: bossQueue, mayGoOn: () => true };
  let ran = 0;
  for (const [name, handle] of Object.entries(JOB_HANDLERS)) {
    for (;;) {
      const [job] = await boss.fetch<unknown>(name, { ignoreStartAfter: true });
      if (!job) break;
      try {
        await handle(tools, job.data);
      } catch (error) {
        await boss.fail(name, job.id);
        throw error;
      }
      await boss.complete(name, job.id);
      ran += 1;
    }
  }
  return ran;
}

/** Data of the jobs of a team that wait for a worker. */
export async function waitingJobs(database: TestDatabase, teamId: string): Promise<unknown[]> {
  const found = await database.owner.query<{ data: unknown }>(
    `select data from pgboss.job where state < 'active' and data->>'teamId' = $1
     order by created_on`,
    [teamId],
  );
  return found.rows.map((row) => row.data);
}
