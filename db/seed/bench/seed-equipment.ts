import type { Context } from "@/lib/auth/context";
import { createEquipment } from "@/lib/commands/equipment/create-equipment";
import { recordCalibration } from "@/lib/commands/equipment/record-calibration";
import { onDay } from "../demo-day";
import { CALIBRATION_LABORATORY, factorTable, makeCertificate } from "./certificate";
import { DEMO_EQUIPMENT } from "./demo-equipment";

/** Makes the demo's equipment with its calibrations; resolves to pieces by name. */
export async function seedEquipment(ctx: Context): Promise<Map<string, string>> {
  const equipmentIds = new Map<string, string>();
  for (const piece of DEMO_EQUIPMENT) {
    const { calibrations, ...values } = piece;
    const { equipmentId } = await createEquipment(ctx, values);
    equipmentIds.set(piece.name, equipmentId);
    for (const calibration of calibrations) {
      const text = factorTable(calibration);
      const dated = {
        ...calibration,
        calibratedOn: onDay(calibration.calibratedOn),
        dueOn: onDay(calibration.dueOn),
      };
      await recordCalibration(ctx, {
        equipmentId,
        calibratedOn: dated.calibratedOn,
        dueOn: dated.dueOn,
        laboratory: CALIBRATION_LABORATORY,
        certificateNumber: calibration.certificateNumber,
        certificate: {
          fileName: `${calibration.certificateNumber.toLowerCase()}.txt`,
          mediaType: "text/plain",
          bytes: makeCertificate(piece, dated),
        },
        table: text === null ? null : { text, frequencyUnitHz: null },
      });
    }
  }
  return equipmentIds;
}
