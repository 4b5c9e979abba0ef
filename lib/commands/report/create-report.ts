import { reports, reportSweeps } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { change, parseInput, requirePermission } from "../run";
import { findBuild } from "../sweep/find-place";
import { checkSelection } from "./check-selection";
import { createReportSchema } from "./schemas";

/** Makes a draft: what it will speak of can still change, and it has no number yet. */
export async function createReport(ctx: Context, input: unknown): Promise<{ reportId: string }> {
  requirePermission(ctx, "report.write");
  const { sweepIds, ...values } = parseInput(createReportSchema, input);
  const { teamId } = ctx;
  return change(ctx, async (tx, audit) => {
    await findBuild(tx, teamId, values.buildId, null);
    await checkSelection(tx, teamId, values.buildId, { sweepIds, ...values });
    const [row] = await tx
      .insert(reports)
      .values({ teamId, ...values, state: "draft", createdBy: ctx.userId })
      .returning({ id: reports.id });
    if (!row) throw new Error("The report was not stored.");
    await tx
      .insert(reportSweeps)
      .values(
        sweepIds.map((sweepId, position) => ({ teamId, reportId: row.id, sweepId, position })),
      );
    await audit({
      action: "report.create",
      subjectType: "report",
      subjectId: row.id,
      detail: { title: values.title, sweeps: sweepIds.length },
    });
    return { reportId: row.id };
  });
}
