import { and, eq } from "drizzle-orm";
import { calibrations } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockOpenEquipment } from "./lock-equipment";
import { withdrawCalibrationSchema } from "./schemas";

/** Takes a calibration out of force that was entered by mistake; it stays in the history. */
export async function withdrawCalibration(
  ctx: Context,
  input: unknown,
): Promise<{ calibrationId: string }> {
  requirePermission(ctx, "bench.write");
  const { equipmentId, calibrationId } = parseInput(withdrawCalibrationSchema, input);
  return change(ctx, async (tx, audit) => {
    const piece = await lockOpenEquipment(tx, ctx, equipmentId);
    const own = and(
      eq(calibrations.teamId, ctx.teamId),
      eq(calibrations.equipmentId, equipmentId),
      eq(calibrations.id, calibrationId),
    );
    const [found] = await tx
      .select({ calibratedOn: calibrations.calibratedOn, withdrawnAt: calibrations.withdrawnAt })
      .from(calibrations)
      .where(own);
    if (!found) throw new CommandError("not-found", "This calibration does not exist.");
    if (found.withdrawnAt !== null)
      throw new CommandError("conflict", "This calibration is withdrawn already.");
    await tx.update(calibrations).set({ withdrawnAt: new Date() }).where(own);
    await audit({
      action: "equipment.withdraw-calibration",
      subjectType: "equipment",
      subjectId: equipmentId,
      detail: { name: piece.name, calibratedOn: found.calibratedOn, calibrationId },
    });
    return { calibrationId };
  });
}
