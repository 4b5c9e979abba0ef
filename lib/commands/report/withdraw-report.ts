import type { Context } from "@/lib/auth/context";
import { change, parseInput, requirePermission } from "../run";
import { lockReport } from "./lock-report";
import { moveReport } from "./move-report";
import { withdrawReportSchema } from "./schemas";

/** Withdraws an issued or approved report; its PDF says so on every page from now on. */
export async function withdrawReport(ctx: Context, input: unknown): Promise<{ reportId: string }> {
  requirePermission(ctx, "report.write");
  const { reportId, reason } = parseInput(withdrawReportSchema, input);
  return change(ctx, async (tx, audit) => {
    const otherwise = "Only an issued or approved report can be withdrawn.";
    const report = await lockReport(tx, ctx.teamId, reportId, ["issued", "approved"], otherwise);
    await moveReport(tx, ctx, reportId, {
      state: "withdrawn",
      withdrawnBy: ctx.userId,
      withdrawnAt: new Date(),
      withdrawnReason: reason,
    });
    await audit({
      action: "report.withdraw",
      subjectType: "report",
      subjectId: reportId,
      detail: { title: report.title, number: report.number, reason },
    });
    return { reportId };
  });
}
