import { spawnSync } from "node:child_process";

/** Whether Debian's python3-numpy and python3-scipy are there as an outside reader. */
export const hasNumpy =
  spawnSync("python3", ["-c", "import numpy, scipy"], { stdio: "ignore" }).status === 0;

/** Runs a script that reads JSON from stdin and prints JSON. */
export function runPython<T>(script: string, input: unknown): T {
  const { status, stdout, stderr } = spawnSync("python3", ["-c", script], {
    input: JSON.stringify(input),
    encoding: "utf8",
    maxBuffer: 1 << 28,
  });
  if (status !== 0) throw new Error(stderr);
  return JSON.parse(stdout) as T;
}
