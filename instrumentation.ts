/** Runs once when a server process starts: jobs are done beside the requests. */
export async function register(): Promise<void> {
  if (process.env.NEXT_RUNTIME === "nodejs") {
    const url = process.env.NEAP_APP_DATABASE_URL;
    // A build needs no database, and whoever runs workers alone starts the app without one.
    if (!url || process.env.NEXT_PHASE === "phase-production-build") return;
    if (process.env.NEAP_WORKER === "0") return;
    const { keepWorker } = await import("@/lib/adapters/jobs/worker");
    const worker = keepWorker(url);
    process.once("SIGTERM", () => void worker.stop());
    process.once("SIGINT", () => void worker.stop());
  }
}
