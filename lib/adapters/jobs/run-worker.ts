import { keepWorker } from "./worker";

/** A worker alone, without the app: `NEAP_APP_DATABASE_URL=… node --import tsx` and this file. */
const url = process.env.NEAP_APP_DATABASE_URL;
if (!url) {
  console.error("NEAP_APP_DATABASE_URL is not set: there is no database to work for.");
  process.exitCode = 1;
} else {
  const worker = keepWorker(url);
  // Nothing else keeps the process up while it waits for the database.
  const alive = setInterval(() => undefined, 60_000);
  for (const signal of ["SIGTERM", "SIGINT"] as const) {
    process.once(signal, () => {
      clearInterval(alive);
      void worker.stop();
    });
  }
}
