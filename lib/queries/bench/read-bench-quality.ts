import { and, desc, eq, inArray, isNull } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { benches, calibrations, uncertaintyBudgets, users } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { loadBenchQuality } from "@/lib/commands/bench/load-bench-quality";
import { requirePermission } from "@/lib/commands/run";
import { calibrationGaps, type CalibrationGap } from "@/lib/core/bench/calibration-gap";
import type { SweepInstrument } from "@/lib/core/bench/equipment";
import type { SignalPath } from "@/lib/core/bench/signal-path";
import type { GuardRule, UncertaintyBudget } from "@/lib/core/bench/uncertainty-budget";
import { isId } from "../is-id";

export interface BudgetRevision {
  revision: number;
  content: UncertaintyBudget;
  createdAt: Date;
  createdBy: string;
}

export interface BenchQualityDetail {
  guardRule: GuardRule;
  guardDb: number;
  checkToleranceDb: number;
  instrument: SweepInstrument | null;
  /** Newest first; empty while there is no budget. */
  budgets: BudgetRevision[];
  /** Transducers of `path` whose equipment has another calibration on record. */
  gaps: CalibrationGap[];
}

/** What makes a bench's numbers trustworthy, and where its path lags behind; null: no such bench. */
export async function readBenchQuality(
  ctx: Context,
  benchId: string,
  path: SignalPath,
): Promise<BenchQualityDetail | null> {
  requirePermission(ctx, "bench.read");
  if (!isId(benchId)) return null;
  const ids = path.transducers.flatMap(({ equipmentId }) => equipmentId ?? []);
  return inTeam(ctx.db, ctx.teamId, async (tx) => {
    const [bench] = await tx
      .select({
        guardRule: benches.guardRule,
        guardDb: benches.guardDb,
        checkToleranceDb: benches.checkToleranceDb,
      })
      .from(benches)
      .where(and(eq(benches.teamId, ctx.teamId), eq(benches.id, benchId)));
    if (!bench) return null;
    const { instrument } = await loadBenchQuality(tx, ctx.teamId, benchId);
    const budgets = await tx
      .select({
        revision: uncertaintyBudgets.revision,
        content: uncertaintyBudgets.content,
        createdAt: uncertaintyBudgets.createdAt,
        createdBy: users.name,
      })
      .from(uncertaintyBudgets)
      .innerJoin(users, eq(users.id, uncertaintyBudgets.createdBy))
      .where(
        and(eq(uncertaintyBudgets.teamId, ctx.teamId), eq(uncertaintyBudgets.benchId, benchId)),
      )
      .orderBy(desc(uncertaintyBudgets.revision));
    const known =
      ids.length === 0
        ? []
        : await tx
            .select({
              equipmentId: calibrations.equipmentId,
              calibratedOn: calibrations.calibratedOn,
            })
            .from(calibrations)
            .where(
              and(
                eq(calibrations.teamId, ctx.teamId),
                inArray(calibrations.equipmentId, ids),
                isNull(calibrations.withdrawnAt),
              ),
            );
    return { ...bench, instrument, budgets, gaps: calibrationGaps(path, known) };
  });
}
