import { and, eq, inArray } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { reports, users } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { renderReport } from "@/lib/reports/render-report";
import { storeFile } from "../file/store-file";
import type { ReportRow } from "./lock-report";

/**
 * Draws the report in its present state and keeps the PDF. The snapshot stays as it was issued;
 * what was decided about it since is printed beside it.
 */
export async function storePdf(tx: Transaction, ctx: Context, report: ReportRow): Promise<void> {
  const { snapshot, sha256, state } = report;
  if (!snapshot || !sha256 || state === "draft") throw new Error("A draft has no PDF.");
  const ids = [report.approvedBy, report.withdrawnBy].filter((id) => id !== null);
  const people =
    ids.length === 0
      ? []
      : await tx
          .select({ id: users.id, name: users.name })
          .from(users)
          .where(inArray(users.id, ids));
  const nameOf = (id: string | null) => people.find((person) => person.id === id)?.name ?? null;
  const pdf = await renderReport(snapshot, {
    state,
    sha256,
    approvedBy: nameOf(report.approvedBy),
    approvedAt: report.approvedAt?.toISOString() ?? null,
    withdrawnBy: nameOf(report.withdrawnBy),
    withdrawnAt: report.withdrawnAt?.toISOString() ?? null,
    withdrawnReason: report.withdrawnReason,
  });
  const { fileId } = await storeFile(tx, ctx, pdf, "application/pdf");
  await tx
    .update(reports)
    .set({ fileId })
    .where(and(eq(reports.teamId, ctx.teamId), eq(reports.id, report.id)));
}
