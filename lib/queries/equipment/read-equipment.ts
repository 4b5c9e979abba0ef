import { and, desc, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { calibrations, equipment, users } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { loadUses, type EquipmentUse } from "@/lib/commands/equipment/load-uses";
import { requirePermission } from "@/lib/commands/run";
import type { EquipmentKind } from "@/lib/core/bench/equipment";
import type { FactorPoint } from "@/lib/core/bench/signal-path";
import { isId } from "../is-id";

export interface CalibrationRow {
  id: string;
  calibratedOn: string;
  dueOn: string | null;
  laboratory: string;
  certificateNumber: string;
  /** Null: no certificate was uploaded. */
  fileName: string | null;
  factors: FactorPoint[] | null;
  recordedBy: string;
  recordedAt: Date;
  withdrawnAt: Date | null;
}

export interface EquipmentDetail {
  id: string;
  kind: EquipmentKind;
  name: string;
  inventoryNumber: string;
  notes: string;
  archivedAt: Date | null;
  /** Newest calibration first, withdrawn ones among them. */
  calibrations: CalibrationRow[];
  uses: EquipmentUse[];
}

/** One piece of equipment with its history; null when the team has none of this id. */
export async function readEquipment(
  ctx: Context,
  equipmentId: string,
): Promise<EquipmentDetail | null> {
  requirePermission(ctx, "bench.read");
  if (!isId(equipmentId)) return null;
  return inTeam(ctx.db, ctx.teamId, async (tx) => {
    const [piece] = await tx
      .select({
        id: equipment.id,
        kind: equipment.kind,
        name: equipment.name,
        inventoryNumber: equipment.inventoryNumber,
        notes: equipment.notes,
        archivedAt: equipment.archivedAt,
      })
      .from(equipment)
      .where(and(eq(equipment.teamId, ctx.teamId), eq(equipment.id, equipmentId)));
    if (!piece) return null;
    const history = await tx
      .select({
        id: calibrations.id,
        calibratedOn: calibrations.calibratedOn,
        dueOn: calibrations.dueOn,
        laboratory: calibrations.laboratory,
        certificateNumber: calibrations.certificateNumber,
        fileName: calibrations.fileName,
        factors: calibrations.factors,
        recordedBy: users.name,
        recordedAt: calibrations.createdAt,
        withdrawnAt: calibrations.withdrawnAt,
      })
      .from(calibrations)
      .innerJoin(users, eq(users.id, calibrations.recordedBy))
      .where(and(eq(calibrations.teamId, ctx.teamId), eq(calibrations.equipmentId, equipmentId)))
      .orderBy(desc(calibrations.calibratedOn), desc(calibrations.createdAt));
    const uses = await loadUses(tx, ctx.teamId);
    return {
      ...piece,
      calibrations: history,
      uses: uses.filter((use) => use.equipmentId === equipmentId),
    };
  });
}
