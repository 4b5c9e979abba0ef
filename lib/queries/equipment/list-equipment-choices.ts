import { and, asc, desc, eq, isNull } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { calibrations, equipment } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";
import type { EquipmentKind } from "@/lib/core/bench/equipment";
import type { FactorPoint } from "@/lib/core/bench/signal-path";

/** A piece of equipment to choose, with what its newest calibration would fill in. */
export interface EquipmentChoice {
  id: string;
  kind: EquipmentKind;
  name: string;
  inventoryNumber: string;
  calibratedOn: string | null;
  dueOn: string | null;
  /** Null: the newest calibration brought none. */
  factors: FactorPoint[] | null;
}

/** Equipment of the team that is not archived, by name; withdrawn calibrations do not count. */
export async function listEquipmentChoices(ctx: Context): Promise<EquipmentChoice[]> {
  requirePermission(ctx, "bench.read");
  return inTeam(ctx.db, ctx.teamId, (tx) =>
    tx
      .selectDistinctOn([equipment.name, equipment.id], {
        id: equipment.id,
        kind: equipment.kind,
        name: equipment.name,
        inventoryNumber: equipment.inventoryNumber,
        calibratedOn: calibrations.calibratedOn,
        dueOn: calibrations.dueOn,
        factors: calibrations.factors,
      })
      .from(equipment)
      .leftJoin(
        calibrations,
        and(
          eq(calibrations.teamId, equipment.teamId),
          eq(calibrations.equipmentId, equipment.id),
          isNull(calibrations.withdrawnAt),
        ),
      )
      .where(and(eq(equipment.teamId, ctx.teamId), isNull(equipment.archivedAt)))
      .orderBy(
        asc(equipment.name),
        asc(equipment.id),
        desc(calibrations.calibratedOn),
        desc(calibrations.createdAt),
      ),
  );
}
