import { existsSync } from "node:fs";
import { join } from "node:path";
import { PlainStop } from "./plain-stop.mjs";
import { run } from "./run.mjs";
import { hashSources, isStamped, stamp } from "./sources.mjs";

/** Installs the npm packages when they are missing or the lock file changed. */
export async function ensurePackages(root) {
  const file = join(root, "node_modules", ".neap-packages");
  const hash = hashSources(root, ["package-lock.json"]);
  if (existsSync(join(root, "node_modules")) && isStamped(file, hash)) return;
  console.log("Installing packages …");
  const { code } = await run("npm", ["ci", "--no-audit", "--no-fund"], {
    cwd: root,
    env: { ...process.env, PLAYWRIGHT_SKIP_BROWSER_DOWNLOAD: "1" },
  });
  if (code !== 0) {
    throw new PlainStop(
      "the npm packages could not be installed; check the npm registry and retry.",
    );
  }
  stamp(file, hash);
}
