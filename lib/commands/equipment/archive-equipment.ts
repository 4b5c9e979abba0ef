import { and, eq } from "drizzle-orm";
import { equipment } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { loadUses } from "./load-uses";
import { lockEquipment } from "./lock-equipment";
import { equipmentIdSchema } from "./schemas";

/**
 * Takes a piece of equipment off the list; its calibrations stay. One that stands on a bench is
 * refused: its due date would drop out of sight while sweeps go on relying on it.
 */
export async function archiveEquipment(
  ctx: Context,
  input: unknown,
): Promise<{ equipmentId: string }> {
  requirePermission(ctx, "bench.write");
  const { equipmentId } = parseInput(equipmentIdSchema, input);
  return change(ctx, async (tx, audit) => {
    const piece = await lockEquipment(tx, ctx, equipmentId);
    if (piece.archivedAt !== null) throw new CommandError("conflict", "This is archived already.");
    const use = (await loadUses(tx, ctx.teamId)).find((u) => u.equipmentId === equipmentId);
    if (use) {
      const part = use.as === "instrument" ? "the instrument" : "in the signal path";
      throw new CommandError(
        "conflict",
        `It is ${part} of the bench ${use.benchName}: take it off there first.`,
      );
    }
    await tx
      .update(equipment)
      .set({ archivedAt: new Date() })
      .where(and(eq(equipment.teamId, ctx.teamId), eq(equipment.id, equipmentId)));
    await audit({
      action: "equipment.archive",
      subjectType: "equipment",
      subjectId: equipmentId,
      detail: { name: piece.name },
    });
    return { equipmentId };
  });
}
