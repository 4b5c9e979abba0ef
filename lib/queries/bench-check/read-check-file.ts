import { and, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { benchChecks, storedFiles } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { fileKey, sha256Of } from "@/lib/commands/file/store-file";
import { requirePermission } from "@/lib/commands/run";
import { isId } from "../is-id";

/** The file of a bench check, byte for byte; null when the team has no such check. */
export async function readCheckFile(
  ctx: Context,
  checkId: string,
): Promise<{ fileName: string; mediaType: string; bytes: Uint8Array } | null> {
  requirePermission(ctx, "bench.read");
  if (!isId(checkId)) return null;
  const [file] = await inTeam(ctx.db, ctx.teamId, (tx) =>
    tx
      .select({
        fileName: benchChecks.fileName,
        mediaType: storedFiles.mediaType,
        sha256: storedFiles.sha256,
      })
      .from(benchChecks)
      .innerJoin(
        storedFiles,
        and(eq(storedFiles.teamId, benchChecks.teamId), eq(storedFiles.id, benchChecks.fileId)),
      )
      .where(and(eq(benchChecks.teamId, ctx.teamId), eq(benchChecks.id, checkId))),
  );
  if (!file) return null;
  const { fileName, mediaType, sha256 } = file;
  const bytes = await ctx.files.get(fileKey(ctx.teamId, sha256));
  if (!bytes) throw new Error(`The original file ${sha256} is missing from storage.`);
  if (sha256Of(bytes) !== sha256)
    throw new Error(`The original file ${sha256} has changed in storage.`);
  return { fileName, mediaType, bytes };
}
