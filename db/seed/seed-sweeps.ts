import type { Context } from "@/lib/auth/context";
import { addStep } from "@/lib/commands/ladder/add-step";
import { createLadder } from "@/lib/commands/ladder/create-ladder";
import { importSweep } from "@/lib/commands/sweep/import-sweep";
import { recordStep } from "@/lib/commands/sweep/record-step";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import type { DemoLadder, DemoSweep } from "./spectra/demo-sweeps";
import { demoLadders, makeDemoCsv } from "./spectra/demo-sweeps";

/** A product that is off has no link settings to state. */
const LINK_OFF: LinkSettings = {
  bitRateHz: null,
  payload: null,
  patternBits: null,
  scrambler: null,
  scramblerPolynomial: null,
  scramblerRestartBits: null,
  coding: null,
  spread: null,
  spreadOff: null,
  edgeTimeS: null,
  cable: null,
};

interface Place {
  buildId: string;
  stepId: string | null;
  benchIds: Map<string, string>;
}

/** Takes a demo sweep in as a person would: as the file that the analyzer wrote. */
async function seedSweep(ctx: Context, place: Place, sweep: DemoSweep): Promise<string> {
  const { sweepId } = await importSweep(ctx, {
    buildId: place.buildId,
    stepId: place.stepId,
    benchId: place.benchIds.get(sweep.benchKey),
    fileName: sweep.fileName,
    bytes: new TextEncoder().encode(makeDemoCsv(sweep)),
    answers: { hold: "none" },
    name: sweep.name,
    purpose: sweep.purpose,
    measuredOn: sweep.measuredOn,
    corrected: false,
    settings: sweep.settings,
    link: sweep.link ?? LINK_OFF,
    notes: "",
    onRecord: false,
    again: false,
  });
  return sweepId;
}

export interface SeededLadder {
  buildName: string;
  buildId: string;
  ladderId: string;
  /** Product sweeps of the last step. */
  lastSweepIds: string[];
}

async function seedLadder(
  ctx: Context,
  demo: DemoLadder,
  buildId: string,
  benchIds: Map<string, string>,
): Promise<SeededLadder> {
  const [start, ...rest] = demo.steps;
  if (!start) throw new Error(`The ladder of ${demo.buildName} has no step.`);
  for (const sweep of demo.background)
    await seedSweep(ctx, { buildId, stepId: null, benchIds }, sweep);
  const { ladderId, stepId } = await createLadder(ctx, {
    buildId,
    name: demo.name,
    notes: demo.description,
    startName: start.name,
    startDescription: start.description,
  });
  let lastStep = stepId;
  let lastSweepIds: string[] = [];
  for (const step of [start, ...rest]) {
    if (step !== start) {
      const { name, description } = step;
      lastStep = (await addStep(ctx, { ladderId, name, description })).stepId;
    }
    lastSweepIds = [];
    for (const sweep of step.sweeps)
      lastSweepIds.push(await seedSweep(ctx, { buildId, stepId: lastStep, benchIds }, sweep));
  }
  await recordStep(ctx, { stepId: lastStep });
  return { buildName: demo.buildName, buildId, ladderId, lastSweepIds };
}

/** Makes every ladder of the demo with its sweeps; the last step of each goes on record. */
export async function seedSweeps(
  ctx: Context,
  buildIds: Map<string, string>,
  benchIds: Map<string, string>,
): Promise<SeededLadder[]> {
  const seeded: SeededLadder[] = [];
  for (const demo of demoLadders()) {
    const buildId = buildIds.get(demo.buildName);
    if (!buildId) throw new Error(`The demo has no build ${demo.buildName}.`);
    seeded.push(await seedLadder(ctx, demo, buildId, benchIds));
  }
  return seeded;
}
