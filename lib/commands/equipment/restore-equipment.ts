import { and, eq } from "drizzle-orm";
import { equipment } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockEquipment } from "./lock-equipment";
import { equipmentIdSchema } from "./schemas";

/** Puts an archived piece of equipment back on the list. */
export async function restoreEquipment(
  ctx: Context,
  input: unknown,
): Promise<{ equipmentId: string }> {
  requirePermission(ctx, "bench.write");
  const { equipmentId } = parseInput(equipmentIdSchema, input);
  return change(ctx, async (tx, audit) => {
    const piece = await lockEquipment(tx, ctx, equipmentId);
    if (piece.archivedAt === null) throw new CommandError("conflict", "This is not archived.");
    await tx
      .update(equipment)
      .set({ archivedAt: null })
      .where(and(eq(equipment.teamId, ctx.teamId), eq(equipment.id, equipmentId)));
    await audit({
      action: "equipment.restore",
      subjectType: "equipment",
      subjectId: equipmentId,
      detail: { name: piece.name },
    });
    return { equipmentId };
  });
}
