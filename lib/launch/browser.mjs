import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { ensureBuild } from "./build.mjs";
import { playwrightCounts, single } from "./counts.mjs";
import { freePort } from "./free-port.mjs";
import { prepare } from "./prepare.mjs";
import { run } from "./run.mjs";
import { serve } from "./serve.mjs";
import { readReport } from "./vitest.mjs";

/** Builds, serves a throw-away demo team and drives it in Chromium; resolves to { name, counts }. */
export async function runBrowserTests(root, filters = []) {
  const name = "browser tests";
  console.log(`\n— ${name}`);
  const folder = mkdtempSync(join(tmpdir(), "neap-browser-"));
  let database;
  let app;
  try {
    const distDir = ".neap/test-build";
    await ensureBuild(root, distDir);
    database = await prepare({ dataDir: folder, throwAway: true });
    const env = { ...database.env, NEAP_DIST_DIR: distDir };
    app = await serve(root, { port: await freePort(), env });
    const file = join(folder, "playwright.json");
    const { code } = await run(
      process.execPath,
      ["node_modules/@playwright/test/cli.js", "test", "--reporter=list,json", ...filters],
      {
        cwd: root,
        env: {
          ...process.env,
          NEAP_ADDRESS: app.address,
          PLAYWRIGHT_JSON_OUTPUT_NAME: file,
        },
      },
    );
    return { name, counts: playwrightCounts(readReport(file), code) };
  } catch (error) {
    console.error(error);
    return { name, counts: single(false) };
  } finally {
    await app?.stop();
    await database?.stop();
    rmSync(folder, { recursive: true, force: true });
  }
}
