import PgBoss from "pg-boss";
import { openDatabase } from "@/db/client";
import { bossQueue } from "./boss-queue";
import { JOB_HANDLERS } from "./handlers";

/** After this long a job hands over to the next one; well below the queue's expiry. */
const TURN_MS = 20_000;
const STOP_MS = 8_000;
const TRY_AGAIN_MS = 3_000;

export interface Worker {
  stop: () => Promise<void>;
}

/** Takes up jobs, as the app's role. Several may work on one database. */
export async function startWorker(appUrl: string): Promise<Worker> {
  const { db, pool } = openDatabase(appUrl);
  pool.on("error", (error) => console.error("[jobs]", error.message));
  const boss = new PgBoss({
    db: { executeSql: (text: string, values: unknown[]) => pool.query(text, values) },
    migrate: false,
    schedule: false,
    maintenanceIntervalSeconds: 30,
  });
  boss.on("error", (error) => console.error("[jobs]", error.message));
  let stopping = false;
  const stop = async () => {
    stopping = true;
    await boss.stop({ timeout: STOP_MS });
    await pool.end();
  };
  try {
    await boss.start();
  } catch (error) {
    await pool.end();
    throw error;
  }
  for (const [name, handle] of Object.entries(JOB_HANDLERS)) {
    await boss.work<unknown>(name, { pollingIntervalSeconds: 1 }, async (jobs) => {
      const until = Date.now() + TURN_MS;
      const mayGoOn = () => !stopping && Date.now() < until;
      for (const job of jobs) {
        try {
          await handle({ db, jobs: bossQueue, mayGoOn }, job.data);
        } catch (error) {
          console.error(`[jobs] ${name} ${job.id}`, error);
          throw error;
        }
      }
    });
  }
  return { stop };
}

/** Starts a worker as soon as the database is there, and tries again until it is. */
export function keepWorker(appUrl: string): Worker {
  let stopped = false;
  let wake = () => {};
  const starting = (async () => {
    for (let told = false; !stopped;) {
      try {
        return await startWorker(appUrl);
      } catch (error) {
        if (!told) console.error("[jobs] No worker yet:", error);
        told = true;
      }
      if (stopped) break;
      await new Promise<void>((resolve) => {
        wake = resolve;
        setTimeout(resolve, TRY_AGAIN_MS).unref();
      });
    }
    return null;
  })();
  return {
    stop: async () => {
      stopped = true;
      wake();
      await (await starting)?.stop();
    },
  };
}
