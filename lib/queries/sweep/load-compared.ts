import { and, asc, eq, inArray, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { benches, signalPathRevisions, sweeps, traces } from "@/db/schema";
import type { ComparedSweep } from "@/lib/core/delta/compared-sweep";
import { loadReadings } from "./load-readings";

/** Sweeps as a delta compares them, by the time of their import, archived ones left out. */
export async function loadComparedSweeps(
  tx: Transaction,
  teamId: string,
  sweepIds: string[],
): Promise<ComparedSweep[]> {
  if (sweepIds.length === 0) return [];
  const rows = await tx
    .select({
      id: sweeps.id,
      name: sweeps.name,
      purpose: sweeps.purpose,
      benchId: sweeps.benchId,
      benchName: benches.name,
      signalPathRevisionId: sweeps.signalPathRevisionId,
      signalPathRevision: signalPathRevisions.revision,
      corrected: sweeps.corrected,
      settings: sweeps.settings,
    })
    .from(sweeps)
    .innerJoin(benches, and(eq(benches.teamId, sweeps.teamId), eq(benches.id, sweeps.benchId)))
    .innerJoin(
      signalPathRevisions,
      and(
        eq(signalPathRevisions.teamId, sweeps.teamId),
        eq(signalPathRevisions.id, sweeps.signalPathRevisionId),
      ),
    )
    .where(and(eq(sweeps.teamId, teamId), inArray(sweeps.id, sweepIds), isNull(sweeps.archivedAt)))
    .orderBy(asc(sweeps.createdAt), asc(sweeps.id));
  const traceRows = await tx
    .select()
    .from(traces)
    .where(and(eq(traces.teamId, teamId), inArray(traces.sweepId, sweepIds)))
    .orderBy(asc(traces.position));
  const held = await loadReadings(tx, teamId, inArray(sweeps.id, sweepIds));
  return rows.map((row) => {
    const own = traceRows.filter((trace) => trace.sweepId === row.id);
    return {
      ...row,
      traces: own,
      readings: held
        .filter(({ sweepId }) => sweepId === row.id)
        .map(({ maskRevisionId, mask, reading }) => ({
          maskRevisionId,
          maskTitle: mask.title,
          lines: reading.lines.map((line) => ({
            name: line.name,
            standing: line.standing,
            marginDb: line.worst?.marginDb ?? null,
            decidedBy: line.worst ? (own[line.worst.traceIndex]?.detector ?? null) : null,
          })),
        })),
    };
  });
}
