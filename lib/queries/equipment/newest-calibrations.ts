import { and, desc, eq, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { calibrations } from "@/db/schema";

export interface NewestCalibration {
  id: string;
  /** ISO dates; null: no due date was stated. */
  calibratedOn: string;
  dueOn: string | null;
  laboratory: string;
  hasFactors: boolean;
}

/** The newest calibration of every piece of equipment, by its id; withdrawn ones do not count. */
export async function newestCalibrations(
  tx: Transaction,
  teamId: string,
): Promise<Map<string, NewestCalibration>> {
  const rows = await tx
    .selectDistinctOn([calibrations.equipmentId], {
      equipmentId: calibrations.equipmentId,
      id: calibrations.id,
      calibratedOn: calibrations.calibratedOn,
      dueOn: calibrations.dueOn,
      laboratory: calibrations.laboratory,
      factors: calibrations.factors,
    })
    .from(calibrations)
    .where(and(eq(calibrations.teamId, teamId), isNull(calibrations.withdrawnAt)))
    .orderBy(
      calibrations.equipmentId,
      desc(calibrations.calibratedOn),
      desc(calibrations.createdAt),
    );
  return new Map(
    rows.map(({ equipmentId, factors, ...row }) => [
      equipmentId,
      { ...row, hasFactors: factors !== null },
    ]),
  );
}
