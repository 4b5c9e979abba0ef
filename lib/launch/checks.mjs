import { single } from "./counts.mjs";
import { run } from "./run.mjs";

const bin = (path, ...args) => [process.execPath, [`node_modules/${path}`, ...args]];

/** The checks that read the sources without running them, in the order they are shown. */
const CHECKS = [
  ["format", bin("prettier/bin/prettier.cjs", "--check", "--log-level", "warn", ".")],
  ["lint", bin("eslint/bin/eslint.js", "--max-warnings", "0", ".")],
  ["route types", bin("next/dist/bin/next", "typegen")],
  ["types", bin("typescript/bin/tsc", "--noEmit", "-p", ".")],
  ["unused code", bin("knip/bin/knip.js", "--no-progress")],
];

/** Runs them all and resolves to one { name, counts } each. */
export async function runChecks(root) {
  const outcomes = [];
  for (const [name, [command, args]] of CHECKS) {
    console.log(`\n— ${name}`);
    const { code } = await run(command, args, {
      cwd: root,
      env: { ...process.env, NEXT_TELEMETRY_DISABLED: "1" },
    });
    outcomes.push({ name, counts: single(code === 0) });
  }
  return outcomes;
}
