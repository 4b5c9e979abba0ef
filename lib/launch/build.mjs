import { existsSync } from "node:fs";
import { join } from "node:path";
import { PlainStop } from "./plain-stop.mjs";
import { run } from "./run.mjs";
import { BUILD_SOURCES, hashSources, isStamped, stamp } from "./sources.mjs";

/** Makes the production build when the sources changed since the last one. */
export async function ensureBuild(root, distDir = ".next") {
  const file = join(root, distDir, ".neap-build");
  const hash = hashSources(root, BUILD_SOURCES);
  if (existsSync(join(root, distDir, "BUILD_ID")) && isStamped(file, hash)) return;
  console.log("Building the application …");
  const { code } = await run(process.execPath, ["node_modules/next/dist/bin/next", "build"], {
    cwd: root,
    env: { ...process.env, NEXT_TELEMETRY_DISABLED: "1", NEAP_DIST_DIR: distDir },
  });
  if (code !== 0)
    throw new PlainStop("the application could not be built; the lines above say why.");
  stamp(file, hash);
}
