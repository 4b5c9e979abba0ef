import type { Context } from "@/lib/auth/context";
import { createBench } from "@/lib/commands/bench/create-bench";
import { reviseBudget } from "@/lib/commands/bench/revise-budget";
import { reviseSignalPath } from "@/lib/commands/bench/revise-signal-path";
import { setGuardRule } from "@/lib/commands/bench/set-guard-rule";
import type { SignalPath } from "@/lib/core/bench/signal-path";
import { onDay } from "../demo-day";
import { DEMO_BENCHES, RECALIBRATED_FROM, type DemoBench } from "../spectra/demo-benches";
import { BUDGET_ABOVE_1_GHZ, BUDGET_BELOW_1_GHZ } from "./demo-budgets";
import { ANALYZER, RECEIVER } from "./demo-equipment";

export interface SeededBenches {
  benchIds: ReadonlyMap<string, string>;
  /** Lets time go on to a day of the story: what changed on the benches until then is done. */
  advanceTo: (day: string) => Promise<void>;
}

async function setPath(
  ctx: Context,
  benchId: string,
  { impedanceOhm, transducers }: SignalPath,
  equipmentIds: ReadonlyMap<string, string>,
): Promise<void> {
  await reviseSignalPath(ctx, {
    benchId,
    impedanceOhm,
    transducers: transducers.map((transducer) => ({
      ...transducer,
      calibratedOn: transducer.calibratedOn && onDay(transducer.calibratedOn),
      dueOn: transducer.dueOn && onDay(transducer.dueOn),
      equipmentId: equipmentIds.get(transducer.name) ?? null,
    })),
  });
}

/** From the cable's new calibration on: its path, a budget for each bench, and one guard from it. */
async function recalibrate(
  ctx: Context,
  bench: DemoBench,
  benchId: string,
  equipmentIds: ReadonlyMap<string, string>,
): Promise<void> {
  if (bench.laterPath) await setPath(ctx, benchId, bench.laterPath, equipmentIds);
  if (bench.key === "above-1-ghz") {
    // Its budget is there to be seen; the guard stays as it was stated.
    await reviseBudget(ctx, { benchId, ...BUDGET_ABOVE_1_GHZ });
    return;
  }
  await reviseBudget(ctx, { benchId, ...BUDGET_BELOW_1_GHZ });
  await setGuardRule(ctx, { benchId, guardRule: "excess", guardDb: null });
}

/** Makes the demo's benches as they were when the story begins. */
export async function seedBenches(
  ctx: Context,
  equipmentIds: ReadonlyMap<string, string>,
): Promise<SeededBenches> {
  const benchIds = new Map<string, string>();
  for (const bench of DEMO_BENCHES) {
    const instrument = bench.key === "above-1-ghz" ? ANALYZER : RECEIVER;
    const { benchId } = await createBench(ctx, {
      name: bench.name,
      site: "Boat hall, semi-open, ground plane 4 m × 3 m",
      instrument,
      instrumentId: equipmentIds.get(instrument),
      distanceM: bench.distanceM,
      guardDb: 2,
      notes: "",
      impedanceOhm: bench.path.impedanceOhm,
    });
    await setPath(ctx, benchId, bench.path, equipmentIds);
    benchIds.set(bench.key, benchId);
  }
  let isRecalibrated = false;
  return {
    benchIds,
    advanceTo: async (day) => {
      if (isRecalibrated || day < RECALIBRATED_FROM) return;
      isRecalibrated = true;
      for (const bench of DEMO_BENCHES)
        await recalibrate(ctx, bench, benchIds.get(bench.key) ?? "", equipmentIds);
    },
  };
}
