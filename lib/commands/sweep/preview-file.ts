import { inTeam } from "@/db/client";
import type { Context } from "@/lib/auth/context";
import { previewSweepFile } from "@/lib/formats/preview-sweep-file";
import type { SweepFilePreview } from "@/lib/formats/sweep-file";
import { sha256Of } from "../file/store-file";
import { parseInput, requirePermission } from "../run";
import type { SameFile } from "./find-same-file";
import { findSameFile } from "./find-same-file";
import { previewFileSchema } from "./schemas";

export interface FilePreview extends SweepFilePreview {
  sha256: string;
  sizeBytes: number;
  /** Sweeps made from the same bytes before. */
  same: SameFile[];
}

/** What is in a file, before anything is stored. */
export async function previewFile(ctx: Context, input: unknown): Promise<FilePreview> {
  requirePermission(ctx, "sweep.write");
  const { bytes, fileName, answers } = parseInput(previewFileSchema, input);
  const sha256 = sha256Of(bytes);
  const same = await inTeam(ctx.db, ctx.teamId, (tx) => findSameFile(tx, ctx.teamId, sha256));
  return { ...previewSweepFile(bytes, fileName, answers), sha256, sizeBytes: bytes.length, same };
}
