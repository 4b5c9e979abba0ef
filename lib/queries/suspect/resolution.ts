import { and, eq, inArray, max } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { traces } from "@/db/schema";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import type { Resolution } from "@/lib/core/reading/recognise-suspects";
import type { MeasurementSettings } from "@/lib/core/sweep/settings";

/** The coarsest step of each sweep's scans; a sweep without a regular scan has none. */
export async function loadSteps(
  tx: Transaction,
  teamId: string,
  sweepIds: string[],
): Promise<Map<string, number>> {
  if (sweepIds.length === 0) return new Map();
  const rows = await tx
    .select({ sweepId: traces.sweepId, stepHz: max(traces.stepHz) })
    .from(traces)
    .where(
      and(eq(traces.teamId, teamId), inArray(traces.sweepId, sweepIds), eq(traces.kind, "scan")),
    )
    .groupBy(traces.sweepId);
  return new Map(rows.flatMap((row) => (row.stepHz === null ? [] : [[row.sweepId, row.stepHz]])));
}

/** How exactly a sweep tells a frequency. */
export function resolutionOf(
  settings: MeasurementSettings,
  link: LinkSettings,
  stepHz: number | undefined,
): Resolution {
  return {
    rbwHz: settings.rbwHz,
    stepHz: stepHz ?? null,
    spread: link.spreadOff === true ? null : link.spread,
  };
}
