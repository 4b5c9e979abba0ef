import { and, eq, inArray } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { signalPathRevisions, sweeps } from "@/db/schema";
import { arrangementOf, partOf } from "@/lib/commands/sweep/sweep-to-read";
import type { SweepPart } from "@/lib/core/reading/sweep-part";
import { loadFileLevels, loadTraces } from "./load-trace";

/** Sweeps with all their levels as the core holds them together, in the order of their ids here. */
export async function loadParts(
  tx: Transaction,
  teamId: string,
  sweepIds: readonly string[],
): Promise<SweepPart[]> {
  const rows = await tx
    .select({
      id: sweeps.id,
      benchId: sweeps.benchId,
      link: sweeps.link,
      settings: sweeps.settings,
      guardDb: sweeps.guardDb,
      measuredOn: sweeps.measuredOn,
      corrected: sweeps.corrected,
      instrument: sweeps.instrument,
      path: signalPathRevisions.content,
    })
    .from(sweeps)
    .innerJoin(
      signalPathRevisions,
      and(
        eq(signalPathRevisions.teamId, sweeps.teamId),
        eq(signalPathRevisions.id, sweeps.signalPathRevisionId),
      ),
    )
    .where(and(eq(sweeps.teamId, teamId), inArray(sweeps.id, [...sweepIds])));
  const parts: SweepPart[] = [];
  for (const id of sweepIds) {
    const row = rows.find((one) => one.id === id);
    if (!row) throw new Error("A sweep that was to be read together is gone.");
    const traces = await loadTraces(tx, teamId, id);
    const part = partOf(row, traces, await loadFileLevels(tx, teamId, id));
    parts.push({ ...part, arrangement: arrangementOf(row) });
  }
  return parts;
}
