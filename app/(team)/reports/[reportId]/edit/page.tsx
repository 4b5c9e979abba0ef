import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { ReportForm } from "@/components/reports/report-form";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { readReport } from "@/lib/queries/report/read-report";
import { readReportChoices } from "@/lib/queries/report/read-report-choices";
import { changeDraft } from "../../actions";

export const metadata: Metadata = { title: "Edit draft" };

export default async function EditReportPage(props: { params: Promise<{ reportId: string }> }) {
  const { reportId } = await props.params;
  const ctx = await currentContext();
  const report = await readReport(ctx, reportId);
  if (!report) notFound();
  const choices = await readReportChoices(ctx, report.buildId);
  if (!choices) notFound();
  const refusal = !isAllowed(ctx, "report.write")
    ? "Your role in this team may read reports, not write them."
    : report.state !== "draft"
      ? "What was issued is never edited. Make a new report that replaces it."
      : null;
  return (
    <>
      <PageHead
        title={`Edit ${report.title}`}
        trail={[
          { href: "/reports", label: "Reports" },
          { href: `/reports/${report.id}`, label: report.title },
        ]}
      />
      {refusal ? (
        <p>{refusal}</p>
      ) : (
        <ReportForm
          about={{ reportId: report.id }}
          values={{ ...report, sweepIds: report.sweeps.map((sweep) => sweep.id) }}
          sweeps={choices.sweeps}
          ladders={choices.ladders}
          issued={choices.issued}
          action={changeDraft}
        />
      )}
    </>
  );
}
