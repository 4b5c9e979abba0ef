import { and, eq } from "drizzle-orm";
import { reports } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { change, parseInput, requirePermission } from "../run";
import { lockReport } from "./lock-report";
import { reportIdSchema } from "./schemas";

/** Throws a draft away; it never had a number. */
export async function discardDraft(ctx: Context, input: unknown): Promise<{ reportId: string }> {
  requirePermission(ctx, "report.write");
  const { reportId } = parseInput(reportIdSchema, input);
  return change(ctx, async (tx, audit) => {
    const otherwise = "An issued report is never thrown away; it can be withdrawn.";
    const report = await lockReport(tx, ctx.teamId, reportId, ["draft"], otherwise);
    await tx.delete(reports).where(and(eq(reports.teamId, ctx.teamId), eq(reports.id, reportId)));
    await audit({
      action: "report.discard",
      subjectType: "report",
      subjectId: reportId,
      detail: { title: report.title },
    });
    return { reportId };
  });
}
