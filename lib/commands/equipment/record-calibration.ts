import { calibrations } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { latestDay } from "../bench/latest-day";
import { storeFile } from "../file/store-file";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockOpenEquipment } from "./lock-equipment";
import { readFactors } from "./read-factors";
import { recordCalibrationSchema } from "./schemas";

/** Adds a calibration with its certificate and, for a transducer, the factors that it states. */
export async function recordCalibration(
  ctx: Context,
  input: unknown,
): Promise<{ equipmentId: string; calibrationId: string }> {
  requirePermission(ctx, "bench.write");
  const values = parseInput(recordCalibrationSchema, input);
  const { equipmentId, certificate, table, ...dates } = values;
  return change(ctx, async (tx, audit) => {
    const piece = await lockOpenEquipment(tx, ctx, equipmentId);
    const today = await latestDay(tx);
    if (dates.calibratedOn > today) {
      throw new CommandError("invalid", "Some fields need another look.", {
        calibratedOn: "The calibration lies in the future: no day after today is taken.",
      });
    }
    const factors = readFactors(piece.kind, table);
    const file = certificate
      ? await storeFile(tx, ctx, certificate.bytes, certificate.mediaType)
      : null;
    const [row] = await tx
      .insert(calibrations)
      .values({
        teamId: ctx.teamId,
        equipmentId,
        ...dates,
        fileId: file?.fileId ?? null,
        fileName: certificate?.fileName ?? null,
        factors,
        recordedBy: ctx.userId,
      })
      .returning({ id: calibrations.id });
    if (!row) throw new Error("The calibration was not stored.");
    await audit({
      action: "equipment.record-calibration",
      subjectType: "equipment",
      subjectId: equipmentId,
      detail: {
        name: piece.name,
        ...dates,
        certificate: certificate?.fileName ?? null,
        sha256: file?.sha256 ?? null,
        factorRows: factors?.length ?? 0,
      },
    });
    return { equipmentId, calibrationId: row.id };
  });
}
