import { and, desc, eq, isNull, lte } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { benches, calibrations, equipment } from "@/db/schema";
import type { SweepInstrument } from "@/lib/core/bench/equipment";
import { newestBudget } from "./newest-budget";

/** What a sweep keeps of its bench's quality at the import. */
export interface BenchQuality {
  instrument: SweepInstrument | null;
  budgetId: string | null;
}

/**
 * The bench's instrument with the dates of its newest calibration that was not withdrawn, and the
 * id of its newest budget. With `onDay` (ISO) a calibration made after that day does not count: it
 * says nothing about a sweep that was measured before it.
 */
export async function loadBenchQuality(
  tx: Transaction,
  teamId: string,
  benchId: string,
  onDay: string | null = null,
): Promise<BenchQuality> {
  const [found] = await tx
    .select({ equipmentId: equipment.id, name: equipment.name })
    .from(benches)
    .innerJoin(
      equipment,
      and(eq(equipment.teamId, benches.teamId), eq(equipment.id, benches.instrumentId)),
    )
    .where(and(eq(benches.teamId, teamId), eq(benches.id, benchId)));
  const budget = await newestBudget(tx, teamId, benchId);
  const budgetId = budget?.id ?? null;
  if (!found) return { instrument: null, budgetId };
  const [newest] = await tx
    .select({ calibratedOn: calibrations.calibratedOn, dueOn: calibrations.dueOn })
    .from(calibrations)
    .where(
      and(
        eq(calibrations.teamId, teamId),
        eq(calibrations.equipmentId, found.equipmentId),
        isNull(calibrations.withdrawnAt),
        ...(onDay === null ? [] : [lte(calibrations.calibratedOn, onDay)]),
      ),
    )
    .orderBy(desc(calibrations.calibratedOn), desc(calibrations.createdAt))
    .limit(1);
  return {
    instrument: {
      ...found,
      calibratedOn: newest?.calibratedOn ?? null,
      dueOn: newest?.dueOn ?? null,
    },
    budgetId,
  };
}
