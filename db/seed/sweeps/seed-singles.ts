import type { Context } from "@/lib/auth/context";
import { readSweepDetail } from "@/lib/queries/sweep/read-sweep";
import { makeSpotsCsv } from "../spectra/demo-sweep";
import { demoSingles, type DemoSingle } from "../spectra/demo-singles";
import { importDemoSweep } from "./import-demo-sweep";
import type { SeededPlaces } from "./seed-ladders";

/** The frequencies that a sweep's re-measure list asks for and that were done: the worst first. */
async function measuredPoints(
  ctx: Context,
  { sweepName, measured }: NonNullable<DemoSingle["spotsOf"]>,
  sweepIds: ReadonlyMap<string, string>,
): Promise<number[]> {
  const detail = await readSweepDetail(ctx, sweepIds.get(sweepName) ?? "");
  const points = detail?.readings.flatMap(({ reading }) => reading.remeasure) ?? [];
  const byFrequency = new Map(points.map((point) => [point.frequencyHz, point]));
  return [...byFrequency.values()]
    .sort((a, b) => a.limitDb - a.boundDb - (b.limitDb - b.boundDb))
    .slice(0, measured)
    .map((point) => point.frequencyHz)
    .sort((a, b) => a - b);
}

/** Takes in the sweeps that belong to no ladder. */
export async function seedSingles(ctx: Context, places: SeededPlaces): Promise<void> {
  const { buildIds, benches, sweepIds } = places;
  for (const { sweep, notes, onRecord, spotsOf } of demoSingles()) {
    const buildName = sweep.name.split(" ")[0] ?? "";
    const buildId = buildIds.get(buildName);
    if (!buildId) throw new Error(`The demo has no build ${buildName}.`);
    await benches.advanceTo(sweep.measuredOn);
    const place = { buildId, stepId: null, benchIds: benches.benchIds };
    const csv = spotsOf
      ? makeSpotsCsv(sweep, await measuredPoints(ctx, spotsOf, sweepIds))
      : undefined;
    const taken = { notes, onRecord, ...(csv ? { csv, isSpots: true } : {}) };
    sweepIds.set(sweep.name, await importDemoSweep(ctx, place, sweep, taken));
  }
}
