import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { reports } from "@/db/schema";
import { CommandError } from "../result";

export type ReportRow = typeof reports.$inferSelect;

/** The report, held until the end of the transaction, in one of the wanted states. */
export async function lockReport(
  tx: Transaction,
  teamId: string,
  reportId: string,
  wanted: readonly ReportRow["state"][],
  otherwise: string,
): Promise<ReportRow> {
  const [report] = await tx
    .select()
    .from(reports)
    .where(and(eq(reports.teamId, teamId), eq(reports.id, reportId)))
    .for("update");
  if (!report) throw new CommandError("not-found", "This report does not exist.");
  if (!wanted.includes(report.state)) throw new CommandError("conflict", otherwise);
  return report;
}
