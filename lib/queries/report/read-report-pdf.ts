import { and, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { reports, storedFiles } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { fileKey } from "@/lib/commands/file/store-file";
import { requirePermission } from "@/lib/commands/run";
import { formatReportNumber } from "@/lib/core/report/report-number";
import { isId } from "../is-id";

/** The PDF of an issued report in its present state; null when there is none. */
export async function readReportPdf(
  ctx: Context,
  reportId: string,
): Promise<{ fileName: string; bytes: Uint8Array } | null> {
  requirePermission(ctx, "report.read");
  if (!isId(reportId)) return null;
  const [file] = await inTeam(ctx.db, ctx.teamId, (tx) =>
    tx
      .select({ number: reports.number, title: reports.title, sha256: storedFiles.sha256 })
      .from(reports)
      .innerJoin(
        storedFiles,
        and(eq(storedFiles.teamId, reports.teamId), eq(storedFiles.id, reports.fileId)),
      )
      .where(and(eq(reports.teamId, ctx.teamId), eq(reports.id, reportId))),
  );
  if (!file || file.number === null) return null;
  const bytes = await ctx.files.get(fileKey(ctx.teamId, file.sha256));
  if (!bytes) throw new Error(`The PDF ${file.sha256} is missing from storage.`);
  const title = file.title.replace(/[\\/:*?"<>|]+/g, " ").trim();
  return { fileName: `${formatReportNumber(file.number)} ${title}.pdf`, bytes };
}
