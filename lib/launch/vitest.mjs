import { existsSync, mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { vitestCounts } from "./counts.mjs";
import { run } from "./run.mjs";

export function readReport(file) {
  return existsSync(file) ? JSON.parse(readFileSync(file, "utf8")) : null;
}

/** Runs vitest over the given filters and resolves to { name, counts }. */
export async function runVitest(root, { name = "tests", filters = [], env = {} } = {}) {
  console.log(`\n— ${name}`);
  const folder = mkdtempSync(join(tmpdir(), "neap-report-"));
  const file = join(folder, "vitest.json");
  try {
    const { code } = await run(
      process.execPath,
      [
        "node_modules/vitest/vitest.mjs",
        "run",
        "--reporter=default",
        "--reporter=json",
        `--outputFile.json=${file}`,
        ...filters,
      ],
      { cwd: root, env: { ...process.env, ...env } },
    );
    return { name, counts: vitestCounts(readReport(file), code) };
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}
