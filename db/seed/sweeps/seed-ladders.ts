import type { Context } from "@/lib/auth/context";
import { acceptMismatch } from "@/lib/commands/delta/accept-mismatch";
import { addStep } from "@/lib/commands/ladder/add-step";
import { createLadder } from "@/lib/commands/ladder/create-ladder";
import { setStepState } from "@/lib/commands/ladder/set-step-state";
import { recordStep } from "@/lib/commands/sweep/record-step";
import type { SeededBenches } from "../bench/seed-benches";
import { demoSideLadders, type SideLadder } from "../spectra/demo-side-ladders";
import { demoLadders, type DemoLadder } from "../spectra/demo-sweeps";
import { importDemoSweep } from "./import-demo-sweep";

export interface SeededLadder {
  buildName: string;
  buildId: string;
  ladderId: string;
  /** Product sweeps of the last step. */
  lastSweepIds: string[];
}

/** What every part of the seeding after it needs to know. */
export interface SeededPlaces {
  buildIds: ReadonlyMap<string, string>;
  benches: SeededBenches;
  /** Sweeps by name, as they come in. */
  sweepIds: Map<string, string>;
}

async function seedLadder(
  ctx: Context,
  demo: SideLadder,
  { buildIds, benches, sweepIds }: SeededPlaces,
): Promise<SeededLadder & { lastStepId: string }> {
  const { benchIds, advanceTo } = benches;
  const buildId = buildIds.get(demo.buildName);
  if (!buildId) throw new Error(`The demo has no build ${demo.buildName}.`);
  const [start, ...rest] = demo.steps;
  if (!start) throw new Error(`The ladder of ${demo.buildName} has no step.`);
  for (const sweep of demo.background) {
    await advanceTo(sweep.measuredOn);
    sweepIds.set(
      sweep.name,
      await importDemoSweep(ctx, { buildId, stepId: null, benchIds }, sweep),
    );
  }
  const { ladderId, stepId } = await createLadder(ctx, {
    buildId,
    name: demo.name,
    notes: demo.description,
    startName: start.name,
    startDescription: start.description,
  });
  const steps = new Map([[start.name, { stepId, sweepIds: [] as string[] }]]);
  // The step that the next one is held against, and the one that came last.
  let kept = start.name;
  let last = { stepId, sweepIds: [] as string[] };
  for (const step of [start, ...rest]) {
    await advanceTo(step.measuredOn);
    const base = steps.get(step.branchOf ?? kept);
    if (step !== start) {
      const { name, description, branchOf } = step;
      const branchOfId = branchOf ? (base?.stepId ?? null) : null;
      const added = await addStep(ctx, { ladderId, name, description, branchOfId });
      last = { stepId: added.stepId, sweepIds: [] };
    }
    steps.set(step.name, last);
    for (const sweep of step.sweeps) {
      const place = { buildId, stepId: last.stepId, benchIds };
      const sweepId = await importDemoSweep(ctx, place, sweep);
      sweepIds.set(sweep.name, sweepId);
      last.sweepIds.push(sweepId);
    }
    if (step.accepted)
      await acceptMismatch(ctx, {
        beforeSweepId: base?.sweepIds.at(-1),
        afterSweepId: last.sweepIds.at(-1),
        ...step.accepted,
      });
    if (step.isDropped) await setStepState(ctx, { stepId: last.stepId, state: "dropped" });
    else kept = step.name;
  }
  const { stepId: lastStepId, sweepIds: lastSweepIds } = last;
  return { buildName: demo.buildName, buildId, ladderId, lastSweepIds, lastStepId };
}

/**
 * Makes every ladder of the demo with its sweeps, in the order of their days. The last step of a
 * build's own ladder goes on record; resolves to those ladders.
 */
export async function seedLadders(ctx: Context, places: SeededPlaces): Promise<SeededLadder[]> {
  const firstDay = ({ steps }: Pick<DemoLadder, "steps">) => steps[0]?.measuredOn ?? "";
  const own = demoLadders();
  const all: SideLadder[] = [...own, ...demoSideLadders()];
  const seeded: SeededLadder[] = [];
  for (const demo of all.sort((a, b) => firstDay(a).localeCompare(firstDay(b)))) {
    const ladder = await seedLadder(ctx, demo, places);
    if (!own.some((one) => one === demo)) continue;
    await recordStep(ctx, { stepId: ladder.lastStepId });
    seeded.push(ladder);
  }
  return seeded;
}
