import type { Context } from "@/lib/auth/context";
import { createReport } from "@/lib/commands/report/create-report";
import type { Place } from "./sweeps";
import { importLevels, levelsOf, makePlace } from "./sweeps";

/** What a draft about one sweep is made of. */
export const reportInput = (buildId: string, sweepIds: string[]) => ({
  buildId,
  title: "Reed, bench summary",
  summary: "Cable clamp fitted.",
  paper: "a4" as const,
  sweepIds,
  ladderId: null,
  replacesId: null as string | null,
});

/** A draft about a single sweep, with the place that it belongs to. */
export async function makeDraft(
  ctx: Context,
): Promise<{ reportId: string; sweepId: string; place: Place }> {
  const place = await makePlace(ctx);
  const { sweepId } = await importLevels(ctx, place, levelsOf(20, { 7: 40 }));
  const { reportId } = await createReport(ctx, reportInput(place.buildId, [sweepId]));
  return { reportId, sweepId, place };
}
