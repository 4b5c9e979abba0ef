import { and, asc, desc, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { benches, signalPathRevisions } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";

export interface BenchRow {
  id: string;
  name: string;
  site: string;
  instrument: string;
  distanceM: number | null;
  guardDb: number;
  /** Of the current signal path. */
  revision: number;
  transducers: number;
  overdue: number;
  /** Transducers whose due date nobody stated: neither in date nor overdue. */
  undated: number;
  archived: boolean;
}

/** Benches of the team by name, archived ones too; calibrations are overdue as of `onDate` (ISO). */
export async function listBenches(ctx: Context, onDate: string): Promise<BenchRow[]> {
  requirePermission(ctx, "bench.read");
  return inTeam(ctx.db, ctx.teamId, async (tx) => {
    const rows = await tx
      .selectDistinctOn([benches.name, benches.id], {
        id: benches.id,
        name: benches.name,
        site: benches.site,
        instrument: benches.instrument,
        distanceM: benches.distanceM,
        guardDb: benches.guardDb,
        archivedAt: benches.archivedAt,
        revision: signalPathRevisions.revision,
        content: signalPathRevisions.content,
      })
      .from(benches)
      .innerJoin(
        signalPathRevisions,
        and(
          eq(signalPathRevisions.teamId, benches.teamId),
          eq(signalPathRevisions.benchId, benches.id),
        ),
      )
      .where(eq(benches.teamId, ctx.teamId))
      .orderBy(asc(benches.name), asc(benches.id), desc(signalPathRevisions.revision));
    return rows.map(({ content, archivedAt, ...row }) => ({
      ...row,
      transducers: content.transducers.length,
      overdue: content.transducers.filter((t) => t.dueOn !== null && t.dueOn < onDate).length,
      undated: content.transducers.filter((t) => t.dueOn === null).length,
      archived: archivedAt !== null,
    }));
  });
}
