import type { Context } from "@/lib/auth/context";
import { createEquipment } from "@/lib/commands/equipment/create-equipment";
import { recordCalibration } from "@/lib/commands/equipment/record-calibration";

export const ANALYZER = {
  kind: "instrument",
  name: "Analyzer",
  inventoryNumber: "E-07",
  notes: "",
};
export const CABLE = { kind: "cable", name: "Reed cable", inventoryNumber: "K-3", notes: "" };

export const CALIBRATION = {
  calibratedOn: "2026-02-01",
  dueOn: "2027-02-01",
  laboratory: "Harbour calibration",
  certificateNumber: "HC-2026-14",
  certificate: null,
  table: null,
};

export const CERTIFICATE = {
  fileName: "certificate 14.pdf",
  mediaType: "application/pdf",
  bytes: new TextEncoder().encode("%PDF-1.7 an invented certificate"),
};

export async function equipmentOf(ctx: Context, change: object = {}): Promise<string> {
  return (await createEquipment(ctx, { ...ANALYZER, ...change })).equipmentId;
}

export async function calibrationOf(
  ctx: Context,
  equipmentId: string,
  change: object = {},
): Promise<string> {
  const made = await recordCalibration(ctx, { ...CALIBRATION, equipmentId, ...change });
  return made.calibrationId;
}
