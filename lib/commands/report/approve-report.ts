import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { lockReport } from "./lock-report";
import { moveReport } from "./move-report";
import { reportIdSchema } from "./schemas";

/** Approves an issued report. Nobody approves a report that they issued themselves. */
export async function approveReport(ctx: Context, input: unknown): Promise<{ reportId: string }> {
  requirePermission(ctx, "report.approve");
  const { reportId } = parseInput(reportIdSchema, input);
  return change(ctx, async (tx, audit) => {
    const otherwise = "Only an issued report can be approved.";
    const report = await lockReport(tx, ctx.teamId, reportId, ["issued"], otherwise);
    if (report.issuedBy === ctx.userId) {
      throw new CommandError("denied", "Nobody approves a report that they issued themselves.");
    }
    await moveReport(tx, ctx, reportId, {
      state: "approved",
      approvedBy: ctx.userId,
      approvedAt: new Date(),
    });
    await audit({
      action: "report.approve",
      subjectType: "report",
      subjectId: reportId,
      detail: { title: report.title, number: report.number },
    });
    return { reportId };
  });
}
