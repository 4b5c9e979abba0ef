import type { Context } from "@/lib/auth/context";
import { createBench } from "@/lib/commands/bench/create-bench";
import { reviseSignalPath } from "@/lib/commands/bench/revise-signal-path";
import { DEMO_BENCHES } from "./spectra/demo-benches";

/** Makes the demo's benches with their signal paths; resolves to benches by key. */
export async function seedBenches(ctx: Context): Promise<Map<string, string>> {
  const benchIds = new Map<string, string>();
  for (const bench of DEMO_BENCHES) {
    const { benchId } = await createBench(ctx, {
      name: bench.name,
      site: "Boat hall, semi-open, ground plane 4 m × 3 m",
      instrument: "Measuring receiver, 9 kHz to 7 GHz",
      distanceM: bench.distanceM,
      guardDb: 2,
      notes: "",
      impedanceOhm: bench.path.impedanceOhm,
    });
    const { impedanceOhm, transducers } = bench.path;
    await reviseSignalPath(ctx, { benchId, impedanceOhm, transducers });
    benchIds.set(bench.key, benchId);
  }
  return benchIds;
}
