import { and, eq } from "drizzle-orm";
import { reports, reportSweeps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { change, parseInput, requirePermission } from "../run";
import { checkSelection } from "./check-selection";
import { lockReport } from "./lock-report";
import { editReportSchema } from "./schemas";

/** Changes a draft. What was issued is never edited: a newer report replaces it. */
export async function editReport(ctx: Context, input: unknown): Promise<{ reportId: string }> {
  requirePermission(ctx, "report.write");
  const { reportId, sweepIds, ...values } = parseInput(editReportSchema, input);
  const { teamId } = ctx;
  return change(ctx, async (tx, audit) => {
    const otherwise = "Only a draft can be edited. Make a new report that replaces this one.";
    const report = await lockReport(tx, teamId, reportId, ["draft"], otherwise);
    await checkSelection(tx, teamId, report.buildId, { sweepIds, ...values });
    await tx
      .update(reports)
      .set(values)
      .where(and(eq(reports.teamId, teamId), eq(reports.id, reportId)));
    await tx
      .delete(reportSweeps)
      .where(and(eq(reportSweeps.teamId, teamId), eq(reportSweeps.reportId, reportId)));
    await tx
      .insert(reportSweeps)
      .values(sweepIds.map((sweepId, position) => ({ teamId, reportId, sweepId, position })));
    await audit({
      action: "report.edit",
      subjectType: "report",
      subjectId: reportId,
      detail: { title: values.title, sweeps: sweepIds.length },
    });
    return { reportId };
  });
}
