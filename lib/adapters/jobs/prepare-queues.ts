import { Client } from "pg";
import PgBoss from "pg-boss";
import { JOB_HANDLERS } from "./handlers";

/**
 * A job works for a short while and sends the next one, so that one whose process was killed is
 * taken up again soon: it counts as lost after `expireInSeconds`.
 */
const QUEUE = { retryLimit: 5, retryDelay: 4, retryBackoff: true, expireInSeconds: 120 };

/** No more than taking jobs up, sending them and tidying away the old ones needs. */
const GRANTS = `
  grant usage on schema pgboss to neap_app;
  grant select, insert, update, delete on pgboss.job, pgboss.archive to neap_app;
  grant select, update on pgboss.version to neap_app;
  grant select on pgboss.queue to neap_app`;

/** Makes or updates pg-boss's tables and the queues, as the owner; the app only uses them. */
export async function prepareQueues(ownerUrl: string): Promise<void> {
  const boss = new PgBoss({
    connectionString: ownerUrl,
    max: 1,
    supervise: false,
    schedule: false,
  });
  let problem: Error | undefined;
  boss.on("error", (error) => (problem ??= error));
  await boss.start();
  try {
    for (const name of Object.keys(JOB_HANDLERS)) {
      await boss.createQueue(name, { name, ...QUEUE });
      await boss.updateQueue(name, { name, ...QUEUE });
    }
  } finally {
    await boss.stop({ graceful: false });
  }
  if (problem) throw problem;
  const client = new Client({ connectionString: ownerUrl });
  await client.connect();
  try {
    await client.query(GRANTS);
  } finally {
    await client.end();
  }
}
