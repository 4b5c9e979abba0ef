import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { Client } from "pg";
import { startLocalServer } from "../../db/local-server.mjs";
import { ensurePostgres } from "../../lib/launch/debian.mjs";
import { runTypeScript } from "../../lib/launch/run.mjs";

const APP_PASSWORD = "only-for-tests";

/** One throw-away cluster for a whole run, with a migrated template that test files copy. */
export default async function setUp(): Promise<() => Promise<void>> {
  const dataDir = mkdtempSync(join(tmpdir(), "neap-test-"));
  const server = await startLocalServer({
    programs: await ensurePostgres(),
    dataDir,
    throwAway: true,
  });
  const close = async () => {
    await server.stop();
    rmSync(dataDir, { recursive: true, force: true });
  };
  try {
    const owner = new Client({ connectionString: server.url });
    await owner.connect();
    await owner.query("create database neap_template");
    await owner.end();
    const template = new URL(server.url);
    template.pathname = "/neap_template";
    const { code, output } = await runTypeScript(
      "db/migrate.ts",
      { NEAP_OWNER_DATABASE_URL: template.toString(), NEAP_APP_PASSWORD: APP_PASSWORD },
      { capture: true },
    );
    if (code !== 0) throw new Error(`The migrations do not run:\n${output}`);
  } catch (error) {
    await close();
    throw error;
  }
  process.env.NEAP_TEST_OWNER_URL = server.url;
  process.env.NEAP_TEST_APP_PASSWORD = APP_PASSWORD;
  return close;
}
