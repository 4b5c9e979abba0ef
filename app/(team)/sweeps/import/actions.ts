"use server";

import { defineAction } from "@/lib/adapters/define-action";
import { refreshed } from "@/lib/adapters/refreshed";
import { importSweep } from "@/lib/commands/sweep/import-sweep";
import { previewFile } from "@/lib/commands/sweep/preview-file";

/** The file of a form and what was said about it, as the commands take them. */
async function readUpload(form: FormData): Promise<unknown> {
  const file = form.get("file");
  const said = form.get("said");
  const bytes = file instanceof File ? new Uint8Array(await file.arrayBuffer()) : null;
  const about: unknown = typeof said === "string" ? JSON.parse(said) : {};
  return Object.assign({}, about, { bytes, fileName: file instanceof File ? file.name : "" });
}

const runPreview = defineAction(async (ctx, form: FormData) =>
  previewFile(ctx, await readUpload(form)),
);
const runImport = defineAction(async (ctx, form: FormData) =>
  importSweep(ctx, await readUpload(form)),
);

export async function previewUpload(form: FormData) {
  return runPreview(form);
}

export async function importUpload(form: FormData) {
  return refreshed(runImport(form));
}
