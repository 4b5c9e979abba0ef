import { and, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { storedFiles, sweeps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { fileKey, sha256Of } from "@/lib/commands/file/store-file";
import { requirePermission } from "@/lib/commands/run";
import { isId } from "../is-id";

/** The file of a sweep, byte for byte as it was imported; null when the team has no such sweep. */
export async function readOriginalFile(
  ctx: Context,
  sweepId: string,
): Promise<{ fileName: string; mediaType: string; bytes: Uint8Array } | null> {
  requirePermission(ctx, "sweep.read");
  if (!isId(sweepId)) return null;
  const [file] = await inTeam(ctx.db, ctx.teamId, (tx) =>
    tx
      .select({
        fileName: sweeps.fileName,
        mediaType: storedFiles.mediaType,
        sha256: storedFiles.sha256,
      })
      .from(sweeps)
      .innerJoin(
        storedFiles,
        and(eq(storedFiles.teamId, sweeps.teamId), eq(storedFiles.id, sweeps.fileId)),
      )
      .where(and(eq(sweeps.teamId, ctx.teamId), eq(sweeps.id, sweepId))),
  );
  if (!file) return null;
  const bytes = await ctx.files.get(fileKey(ctx.teamId, file.sha256));
  if (!bytes) throw new Error(`The original file ${file.sha256} is missing from storage.`);
  if (sha256Of(bytes) !== file.sha256)
    throw new Error(`The original file ${file.sha256} has changed in storage.`);
  return { fileName: file.fileName, mediaType: file.mediaType, bytes };
}
