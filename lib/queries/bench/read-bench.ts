import { and, desc, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { benches, signalPathRevisions } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import type { SignalPath } from "@/lib/core/bench/signal-path";
import type { GuardRule } from "@/lib/core/bench/uncertainty-budget";
import { requirePermission } from "@/lib/commands/run";
import { isId } from "../is-id";

export interface SignalPathRevision {
  id: string;
  revision: number;
  content: SignalPath;
  createdAt: Date;
}

export interface BenchDetail {
  id: string;
  name: string;
  site: string;
  instrument: string;
  distanceM: number | null;
  guardDb: number;
  guardRule: GuardRule;
  instrumentId: string | null;
  checkToleranceDb: number;
  notes: string;
  archivedAt: Date | null;
  /** Newest first. */
  revisions: SignalPathRevision[];
}

/** One bench with every revision of its signal path; null when the team has none of this id. */
export async function readBench(ctx: Context, benchId: string): Promise<BenchDetail | null> {
  requirePermission(ctx, "bench.read");
  if (!isId(benchId)) return null;
  return inTeam(ctx.db, ctx.teamId, async (tx) => {
    const [bench] = await tx
      .select({
        id: benches.id,
        name: benches.name,
        site: benches.site,
        instrument: benches.instrument,
        distanceM: benches.distanceM,
        guardDb: benches.guardDb,
        guardRule: benches.guardRule,
        instrumentId: benches.instrumentId,
        checkToleranceDb: benches.checkToleranceDb,
        notes: benches.notes,
        archivedAt: benches.archivedAt,
      })
      .from(benches)
      .where(and(eq(benches.teamId, ctx.teamId), eq(benches.id, benchId)));
    if (!bench) return null;
    const revisions = await tx
      .select({
        id: signalPathRevisions.id,
        revision: signalPathRevisions.revision,
        content: signalPathRevisions.content,
        createdAt: signalPathRevisions.createdAt,
      })
      .from(signalPathRevisions)
      .where(
        and(eq(signalPathRevisions.teamId, ctx.teamId), eq(signalPathRevisions.benchId, benchId)),
      )
      .orderBy(desc(signalPathRevisions.revision));
    return { ...bench, revisions };
  });
}
