"use server";

import { defineAction } from "@/lib/adapters/define-action";
import { refreshed } from "@/lib/adapters/refreshed";
import { archiveEquipment } from "@/lib/commands/equipment/archive-equipment";
import { createEquipment } from "@/lib/commands/equipment/create-equipment";
import { editEquipment } from "@/lib/commands/equipment/edit-equipment";
import { recordCalibration } from "@/lib/commands/equipment/record-calibration";
import { restoreEquipment } from "@/lib/commands/equipment/restore-equipment";
import { withdrawCalibration } from "@/lib/commands/equipment/withdraw-calibration";

const KNOWN_TYPES = ["application/pdf", "image/png", "image/jpeg"];

/** The certificate of a form and what was said about it, as the command takes them. */
async function readCalibration(form: FormData): Promise<unknown> {
  const file = form.get("certificate");
  const said = form.get("said");
  const about: unknown = typeof said === "string" ? JSON.parse(said) : {};
  const certificate =
    file instanceof File
      ? {
          fileName: file.name,
          mediaType: KNOWN_TYPES.find((type) => type === file.type) ?? "application/octet-stream",
          bytes: new Uint8Array(await file.arrayBuffer()),
        }
      : null;
  return Object.assign({}, about, { certificate });
}

const runCreate = defineAction(createEquipment);
const runEdit = defineAction(editEquipment);
const runArchive = defineAction(archiveEquipment);
const runRestore = defineAction(restoreEquipment);
const runRecord = defineAction(async (ctx, form: FormData) =>
  recordCalibration(ctx, await readCalibration(form)),
);
const runWithdraw = defineAction(withdrawCalibration);

export async function addEquipment(input: unknown) {
  return refreshed(runCreate(input));
}

export async function changeEquipment(input: unknown) {
  return refreshed(runEdit(input));
}

export async function putEquipmentAway(input: unknown) {
  return refreshed(runArchive(input));
}

export async function bringEquipmentBack(input: unknown) {
  return refreshed(runRestore(input));
}

export async function addCalibration(form: FormData) {
  return refreshed(runRecord(form));
}

export async function takeCalibrationBack(input: unknown) {
  return refreshed(runWithdraw(input));
}
