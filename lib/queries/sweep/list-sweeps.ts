import type { SQL } from "drizzle-orm";
import { and, asc, eq, isNull, sql } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { benches, ladders, ladderSteps, sweeps, traces } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import type { DoubtCode, Standing } from "@/lib/core/reading/reading";
import type { Detector, Polarization, SweepPurpose } from "@/lib/core/sweep/settings";
import { requirePermission } from "@/lib/commands/run";
import { isId } from "../is-id";
import { listSweepDoubts } from "./list-doubts";
import { loadReadings } from "./load-readings";
import { worstStanding } from "./standings";

export interface SweepRow {
  id: string;
  name: string;
  fileName: string;
  purpose: SweepPurpose;
  measuredOn: string | null;
  polarization: Polarization | null;
  onRecord: boolean;
  benchName: string;
  ladderId: string | null;
  ladderName: string | null;
  stepId: string | null;
  stepName: string | null;
  stepPosition: number | null;
  fromHz: number | null;
  toHz: number | null;
  detectors: (Detector | null)[];
  /** Over the readings against the program's masks; null for sweeps that are not held. */
  standing: Standing | null;
  marginDb: number | null;
  /** Of its readings in force, each once. */
  doubts: DoubtCode[];
}

async function selectSweeps(ctx: Context, scope: SQL): Promise<SweepRow[]> {
  requirePermission(ctx, "sweep.read");
  return inTeam(ctx.db, ctx.teamId, async (tx) => {
    const rows = await tx
      .select({
        id: sweeps.id,
        name: sweeps.name,
        fileName: sweeps.fileName,
        purpose: sweeps.purpose,
        measuredOn: sweeps.measuredOn,
        settings: sweeps.settings,
        onRecord: sweeps.onRecord,
        benchName: benches.name,
        ladderId: ladders.id,
        ladderName: ladders.name,
        stepId: ladderSteps.id,
        stepName: ladderSteps.name,
        stepPosition: ladderSteps.position,
        fromHz: sql<number | null>`min(${traces.firstHz})`,
        toHz: sql<number | null>`max(${traces.lastHz})`,
        detectors: sql<
          (Detector | null)[]
        >`array_agg(${traces.detector} order by ${traces.position})`,
      })
      .from(sweeps)
      .innerJoin(benches, and(eq(benches.teamId, sweeps.teamId), eq(benches.id, sweeps.benchId)))
      .leftJoin(
        ladderSteps,
        and(eq(ladderSteps.teamId, sweeps.teamId), eq(ladderSteps.id, sweeps.stepId)),
      )
      .leftJoin(
        ladders,
        and(eq(ladders.teamId, ladderSteps.teamId), eq(ladders.id, ladderSteps.ladderId)),
      )
      .leftJoin(traces, and(eq(traces.teamId, sweeps.teamId), eq(traces.sweepId, sweeps.id)))
      .where(and(eq(sweeps.teamId, ctx.teamId), isNull(sweeps.archivedAt), scope))
      .groupBy(sweeps.teamId, sweeps.id, benches.name, ladders.id, ladderSteps.id)
      .orderBy(asc(ladderSteps.position), asc(sweeps.measuredOn), asc(sweeps.createdAt));
    const held = await loadReadings(tx, ctx.teamId, scope);
    const doubts = await listSweepDoubts(tx, ctx.teamId, scope);
    const listed: SweepRow[] = [];
    for (const { settings, ...row } of rows) {
      const own = held.filter((reading) => reading.sweepId === row.id);
      const worst = await worstStanding(tx, ctx.teamId, own);
      listed.push({
        ...row,
        polarization: settings.polarization,
        standing: worst?.standing ?? null,
        marginDb: worst?.marginDb ?? null,
        doubts: doubts.get(row.id) ?? [],
      });
    }
    return listed;
  });
}

/** Sweeps of a build that are not archived, by step and date. */
export async function listBuildSweeps(ctx: Context, buildId: string): Promise<SweepRow[]> {
  if (!isId(buildId)) return [];
  return selectSweeps(ctx, eq(sweeps.buildId, buildId));
}
