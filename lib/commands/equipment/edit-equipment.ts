import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { calibrations, equipment } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, isDuplicate, parseInput, requirePermission } from "../run";
import { nameTaken } from "./create-equipment";
import { loadUses } from "./load-uses";
import { lockOpenEquipment } from "./lock-equipment";
import { editEquipmentSchema } from "./schemas";

/** Factors mean one thing for a cable and another for an antenna, so a kind that is used stays. */
async function refuseOtherKind(tx: Transaction, ctx: Context, equipmentId: string) {
  const [calibrated] = await tx
    .select({ id: calibrations.id })
    .from(calibrations)
    .where(and(eq(calibrations.teamId, ctx.teamId), eq(calibrations.equipmentId, equipmentId)))
    .limit(1);
  const used = (await loadUses(tx, ctx.teamId)).find((use) => use.equipmentId === equipmentId);
  if (!calibrated && !used) return;
  throw new CommandError("conflict", "The kind can no longer be changed.", {
    kind: calibrated
      ? "It has calibrations, which belong to this kind: add another piece of equipment instead."
      : `It stands on the bench ${used?.benchName ?? ""}: take it off there first.`,
  });
}

/** Changes what a piece of equipment is called; its calibrations have commands of their own. */
export async function editEquipment(
  ctx: Context,
  input: unknown,
): Promise<{ equipmentId: string }> {
  requirePermission(ctx, "bench.write");
  const { equipmentId, ...values } = parseInput(editEquipmentSchema, input);
  try {
    return await change(ctx, async (tx, audit) => {
      const before = await lockOpenEquipment(tx, ctx, equipmentId);
      if (values.kind !== before.kind) await refuseOtherKind(tx, ctx, equipmentId);
      await tx
        .update(equipment)
        .set(values)
        .where(and(eq(equipment.teamId, ctx.teamId), eq(equipment.id, equipmentId)));
      const { kind, name, inventoryNumber, notes } = before;
      await audit({
        action: "equipment.edit",
        subjectType: "equipment",
        subjectId: equipmentId,
        detail: { name: values.name, from: { kind, name, inventoryNumber, notes }, to: values },
      });
      return { equipmentId };
    });
  } catch (error) {
    throw isDuplicate(error, "equipment_name") ? nameTaken() : error;
  }
}
