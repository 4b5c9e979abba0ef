"use server";

import { defineAction } from "@/lib/adapters/define-action";
import { refreshed } from "@/lib/adapters/refreshed";
import { archiveBenchCheck } from "@/lib/commands/bench-check/archive-bench-check";
import { recordBenchCheck } from "@/lib/commands/bench-check/record-bench-check";
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
const runRecord = defineAction(async (ctx, form: FormData) =>
  recordBenchCheck(ctx, await readUpload(form)),
);
const runArchive = defineAction(archiveBenchCheck);

export async function previewCheckFile(form: FormData) {
  return runPreview(form);
}

export async function storeCheck(form: FormData) {
  return refreshed(runRecord(form));
}

export async function putCheckAway(input: unknown) {
  return refreshed(runArchive(input));
}
