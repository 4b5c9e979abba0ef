import { runChecks } from "./checks.mjs";
import { ensurePackages } from "./packages.mjs";
import { runMain } from "./plain-stop.mjs";
import { ROOT, checkNode } from "./prepare.mjs";
import { summarize } from "./summary.mjs";
import { runVitest } from "./vitest.mjs";

await runMain(async () => {
  checkNode();
  await ensurePackages(ROOT);
  const outcomes = await runChecks(ROOT);
  outcomes.push(await runVitest(ROOT, { name: "import rules", filters: ["tests/architecture"] }));
  return summarize(outcomes);
});
