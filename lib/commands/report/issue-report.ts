import { and, eq, max } from "drizzle-orm";
import { reports, reportSweeps, teams, users } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { buildReport } from "@/lib/reports/build-report";
import { formatReportNumber } from "@/lib/core/report/report-number";
import { hashSnapshot } from "@/lib/reports/snapshot-hash";
import { change, parseInput, requirePermission } from "../run";
import { checkSelection } from "./check-selection";
import { lockReport } from "./lock-report";
import { moveReport } from "./move-report";
import { reportIdSchema } from "./schemas";

/**
 * Issues a draft: it gets its number, and what it says is frozen with its hash. The report that
 * it replaces is withdrawn at the same moment.
 */
export async function issueReport(
  ctx: Context,
  input: unknown,
): Promise<{ reportId: string; number: string }> {
  requirePermission(ctx, "report.write");
  const { reportId } = parseInput(reportIdSchema, input);
  const { teamId, userId } = ctx;
  return change(ctx, async (tx, audit) => {
    // The team's row is the lock under which numbers are given one by one, without gaps.
    await tx.select({ id: teams.id }).from(teams).where(eq(teams.id, teamId)).for("update");
    const draft = await lockReport(
      tx,
      teamId,
      reportId,
      ["draft"],
      "This report is issued already.",
    );
    const chosen = await tx
      .select({ id: reportSweeps.sweepId })
      .from(reportSweeps)
      .where(and(eq(reportSweeps.teamId, teamId), eq(reportSweeps.reportId, reportId)));
    // What was chosen for the draft may have been archived since.
    const sweepIds = chosen.map((sweep) => sweep.id);
    await checkSelection(tx, teamId, draft.buildId, { ...draft, sweepIds });
    const [last] = await tx
      .select({ number: max(reports.number) })
      .from(reports)
      .where(eq(reports.teamId, teamId));
    const number = (last?.number ?? 0) + 1;
    const issuedAt = new Date();
    const [issuer] = await tx.select({ name: users.name }).from(users).where(eq(users.id, userId));
    const snapshot = await buildReport(tx, teamId, draft, {
      number: formatReportNumber(number),
      issuedAt,
      issuedBy: issuer?.name ?? "",
    });
    const sha256 = hashSnapshot(snapshot);
    await moveReport(tx, ctx, reportId, {
      state: "issued",
      number,
      snapshot,
      sha256,
      issuedBy: userId,
      issuedAt,
    });
    await audit({
      action: "report.issue",
      subjectType: "report",
      subjectId: reportId,
      detail: { title: draft.title, number, sha256 },
    });
    if (draft.replacesId !== null) {
      const replaced = await lockReport(
        tx,
        teamId,
        draft.replacesId,
        ["issued", "approved", "withdrawn"],
        "The report to be replaced was never issued.",
      );
      if (replaced.state !== "withdrawn") {
        const reason = `Replaced by ${formatReportNumber(number)}.`;
        await moveReport(tx, ctx, replaced.id, {
          state: "withdrawn",
          withdrawnBy: userId,
          withdrawnAt: issuedAt,
          withdrawnReason: reason,
        });
        await audit({
          action: "report.withdraw",
          subjectType: "report",
          subjectId: replaced.id,
          detail: { title: replaced.title, reason },
        });
      }
    }
    return { reportId, number: formatReportNumber(number) };
  });
}
