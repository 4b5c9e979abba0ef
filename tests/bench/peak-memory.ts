import { run } from "../../lib/launch/run.mjs";
import type { Figure } from "./report";

/** Memory at its highest while a process of its own imports one large file. */
export async function measurePeakMemory(): Promise<Figure> {
  const { code, output } = await run(
    process.execPath,
    ["--expose-gc", "--import", "tsx", "tests/bench/import-once.ts"],
    { capture: true },
  );
  const found = /points (\d+) file (\d+) before (\d+) peak (\d+)/.exec(output);
  if (code !== 0 || !found) throw new Error(`The import in its own process failed:\n${output}`);
  const [points = 0, file = 0, before = 0, peak = 0] = found.slice(1).map(Number);
  const megabytes = (bytes: number) => `${(bytes / 1e6).toFixed(0)} MB`;
  return {
    name: `Memory that importing ${points} points adds at its peak ÷ file size`,
    measured: ((peak - before) / file).toFixed(1),
    beside: `file ${megabytes(file)}; from ${megabytes(before)} to ${megabytes(peak)}`,
  };
}
