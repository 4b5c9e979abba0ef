import { runBrowserTests } from "./browser.mjs";
import { runChecks } from "./checks.mjs";
import { ensureProgram } from "./debian.mjs";
import { ensurePackages } from "./packages.mjs";
import { runMain } from "./plain-stop.mjs";
import { ROOT, checkNode } from "./prepare.mjs";
import { summarize } from "./summary.mjs";
import { runVitest } from "./vitest.mjs";

await runMain(async () => {
  checkNode();
  await ensurePackages(ROOT);
  await ensureProgram("/usr/bin/chromium", "Chromium", ["chromium"]);
  await ensureProgram("/usr/bin/pdftotext", "The PDF reader for tests", ["poppler-utils"]);
  await ensureProgram("/usr/bin/qpdf", "The PDF checker for tests", ["qpdf"]);
  const outcomes = await runChecks(ROOT);
  outcomes.push(await runVitest(ROOT, { name: "unit and database tests" }));
  outcomes.push(await runBrowserTests(ROOT));
  return summarize(outcomes);
});
