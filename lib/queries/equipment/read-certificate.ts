import { and, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { calibrations, storedFiles } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { fileKey, sha256Of } from "@/lib/commands/file/store-file";
import { requirePermission } from "@/lib/commands/run";
import { isId } from "../is-id";

/** The certificate of a calibration, byte for byte; null when the team has none of these ids. */
export async function readCertificate(
  ctx: Context,
  equipmentId: string,
  calibrationId: string,
): Promise<{ fileName: string; mediaType: string; bytes: Uint8Array } | null> {
  requirePermission(ctx, "bench.read");
  if (!isId(equipmentId) || !isId(calibrationId)) return null;
  const [file] = await inTeam(ctx.db, ctx.teamId, (tx) =>
    tx
      .select({
        fileName: calibrations.fileName,
        mediaType: storedFiles.mediaType,
        sha256: storedFiles.sha256,
      })
      .from(calibrations)
      .innerJoin(
        storedFiles,
        and(eq(storedFiles.teamId, calibrations.teamId), eq(storedFiles.id, calibrations.fileId)),
      )
      .where(
        and(
          eq(calibrations.teamId, ctx.teamId),
          eq(calibrations.equipmentId, equipmentId),
          eq(calibrations.id, calibrationId),
        ),
      ),
  );
  if (!file) return null;
  const bytes = await ctx.files.get(fileKey(ctx.teamId, file.sha256));
  if (!bytes) throw new Error(`The certificate ${file.sha256} is missing from storage.`);
  if (sha256Of(bytes) !== file.sha256)
    throw new Error(`The certificate ${file.sha256} has changed in storage.`);
  return { fileName: file.fileName ?? "certificate", mediaType: file.mediaType, bytes };
}
