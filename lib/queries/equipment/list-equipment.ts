import { asc, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { equipment } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { loadUses, type EquipmentUse } from "@/lib/commands/equipment/load-uses";
import { requirePermission } from "@/lib/commands/run";
import { dueState, type DueState } from "@/lib/core/bench/due-state";
import type { EquipmentKind } from "@/lib/core/bench/equipment";
import { newestCalibrations, type NewestCalibration } from "./newest-calibrations";

export interface EquipmentRow {
  id: string;
  kind: EquipmentKind;
  name: string;
  inventoryNumber: string;
  archived: boolean;
  /** The newest calibration that was not withdrawn; null: none is on record. */
  newest: NewestCalibration | null;
  /** "uncalibrated": no calibration is on record. */
  state: DueState | "uncalibrated";
  uses: Omit<EquipmentUse, "equipmentId">[];
}

const ORDER = ["overdue", "due-soon", "uncalibrated", "undated", "in-date"];

/**
 * Equipment of the team, archived too, with its state on a day (ISO): what is due first, then by
 * due date and name.
 */
export async function listEquipment(ctx: Context, onDate: string): Promise<EquipmentRow[]> {
  requirePermission(ctx, "bench.read");
  return inTeam(ctx.db, ctx.teamId, async (tx) => {
    const rows = await tx
      .select({
        id: equipment.id,
        kind: equipment.kind,
        name: equipment.name,
        inventoryNumber: equipment.inventoryNumber,
        archivedAt: equipment.archivedAt,
      })
      .from(equipment)
      .where(eq(equipment.teamId, ctx.teamId))
      .orderBy(asc(equipment.name));
    const newest = await newestCalibrations(tx, ctx.teamId);
    const uses = await loadUses(tx, ctx.teamId);
    return rows
      .map(({ archivedAt, ...row }): EquipmentRow => {
        const calibration = newest.get(row.id) ?? null;
        return {
          ...row,
          archived: archivedAt !== null,
          newest: calibration,
          state: calibration ? dueState(calibration.dueOn, onDate) : "uncalibrated",
          uses: uses
            .filter((use) => use.equipmentId === row.id)
            .map(({ benchId, benchName, as }) => ({ benchId, benchName, as })),
        };
      })
      .sort(
        (a, b) =>
          ORDER.indexOf(a.state) - ORDER.indexOf(b.state) ||
          (a.newest?.dueOn ?? "").localeCompare(b.newest?.dueOn ?? ""),
      );
  });
}
