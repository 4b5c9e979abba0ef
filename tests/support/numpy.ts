import { spawnSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";

/** Whether Debian's python3-numpy and python3-scipy are there as an outside reader. */
export const hasNumpy =
  spawnSync("python3", ["-c", "import numpy, scipy"], { stdio: "ignore" }).status === 0;

/** Ends the name of a test that needs them, so that a skipped one says why. */
export const NUMPY_NOTE = hasNumpy ? "" : " (skipped: python3-numpy, python3-scipy are missing)";

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

/**
 * The same, with arrays handed over as raw little-endian files in a folder that is gone afterwards;
 * the script finds the folder as `folder` in its input.
 */
export function runPythonOnFiles<T>(
  script: string,
  files: Record<string, Float32Array | Float64Array>,
  input: Record<string, unknown>,
): T {
  const folder = mkdtempSync(join(tmpdir(), "neap-numpy-"));
  try {
    for (const [name, { buffer, byteOffset, byteLength }] of Object.entries(files))
      writeFileSync(join(folder, name), new Uint8Array(buffer, byteOffset, byteLength));
    return runPython<T>(script, { ...input, folder });
  } finally {
    rmSync(folder, { recursive: true });
  }
}
