import { z } from "zod";
import { EQUIPMENT_KINDS } from "@/lib/core/bench/equipment";
import { factorTableSchema } from "../bench/schemas";
import { storable } from "../storable-text";

const equipmentFields = {
  kind: z.enum(EQUIPMENT_KINDS, "Choose what this is."),
  name: storable.trim().min(1, "Give it a name.").max(120, "Keep the name under 120 characters."),
  inventoryNumber: storable.trim().max(80, "Keep the number under 80 characters."),
  notes: storable.trim().max(4000, "Keep the notes under 4,000 characters."),
};

const equipmentId = z.uuid("Choose a piece of equipment.");

export const createEquipmentSchema = z.object(equipmentFields);
export const editEquipmentSchema = z.object({ equipmentId, ...equipmentFields });
export const equipmentIdSchema = z.object({ equipmentId });

const day = z.iso
  .date("Write the date as year-month-day, for example 2026-03-31.")
  .refine((date) => date >= "1950", "No calibration in use is older than 1950.")
  .refine((date) => date <= "2199", "This year is out of reach.");

const MOST_CERTIFICATE_BYTES = 20 * 1024 * 1024;

const certificateSchema = z.object({
  fileName: storable
    .trim()
    .min(1, "The file has no name.")
    .max(255, "The file's name is too long."),
  mediaType: z.string().max(100),
  bytes: z
    .instanceof(Uint8Array, { message: "Choose a file." })
    .refine((bytes) => bytes.length > 0, "The file is empty.")
    .refine((bytes) => bytes.length <= MOST_CERTIFICATE_BYTES, "The file is larger than 20 MB."),
});

export const recordCalibrationSchema = z
  .object({
    equipmentId,
    calibratedOn: day,
    dueOn: day.nullable(),
    laboratory: storable.trim().max(200, "Keep the laboratory under 200 characters."),
    certificateNumber: storable.trim().max(120, "Keep the number under 120 characters."),
    certificate: certificateSchema.nullable(),
    /** Factors that the certificate states; null: it has none, or they are typed later. */
    table: factorTableSchema.nullable(),
  })
  .refine(({ calibratedOn, dueOn }) => dueOn === null || dueOn >= calibratedOn, {
    path: ["dueOn"],
    message: "The due date lies before the calibration.",
  });

export const withdrawCalibrationSchema = z.object({
  equipmentId,
  calibrationId: z.uuid("Choose a calibration."),
});
