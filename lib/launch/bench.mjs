import { ensurePackages } from "./packages.mjs";
import { runMain } from "./plain-stop.mjs";
import { ROOT, checkNode } from "./prepare.mjs";
import { run } from "./run.mjs";

/** Measures on a throw-away database; ends with status 1 when a limit is not held. */
await runMain(async () => {
  checkNode();
  await ensurePackages(ROOT);
  const args = ["--expose-gc", "--import", "tsx", "tests/bench/index.ts"];
  const { code } = await run(process.execPath, args, { cwd: ROOT });
  return code;
});
