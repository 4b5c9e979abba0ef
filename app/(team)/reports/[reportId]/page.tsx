import type { Metadata } from "next";
import Link from "next/link";
import { notFound, redirect } from "next/navigation";
import { ReportLines } from "@/components/reports/report-lines";
import { ReportState } from "@/components/reports/report-state";
import { WithdrawForm } from "@/components/reports/withdraw-form";
import { ActionButton } from "@/components/ui/action-button";
import { ButtonLink } from "@/components/ui/button";
import { ConfirmButton } from "@/components/ui/confirm-button";
import { Facts } from "@/components/ui/facts";
import { PageHead } from "@/components/ui/page-head";
import { Section } from "@/components/ui/section";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { formatReportNumber } from "@/lib/core/report/report-number";
import type { ReportDetail } from "@/lib/queries/report/read-report";
import { readReport } from "@/lib/queries/report/read-report";
import { approveIssued, issueDraft, throwDraftAway, withdrawIssued } from "../actions";

export const metadata: Metadata = { title: "Report" };

export default async function ReportPage(props: { params: Promise<{ reportId: string }> }) {
  const { reportId } = await props.params;
  const ctx = await currentContext();
  const report = await readReport(ctx, reportId);
  if (!report) notFound();
  const number = report.number === null ? null : formatReportNumber(report.number);
  const isOwn = report.issuedById === ctx.userId;
  const mayWrite = isAllowed(ctx, "report.write");
  return (
    <>
      <PageHead
        title={number ? `${number} ${report.title}` : report.title}
        trail={[
          { href: "/reports", label: "Reports" },
          { href: `/programs/${report.programId}`, label: report.programName },
          {
            href: `/programs/${report.programId}/builds/${report.buildId}`,
            label: report.buildName,
          },
        ]}
        lead={<ReportState state={report.state} />}
        actions={
          <>
            {number ? (
              <ButtonLink look="primary" href={`/api/v1/reports/${report.id}/pdf`} prefetch={false}>
                Download PDF
              </ButtonLink>
            ) : null}
            {report.state === "draft" && mayWrite ? <DraftActions report={report} /> : null}
            {report.state === "issued" && isAllowed(ctx, "report.approve") && !isOwn ? (
              <ActionButton look="primary" action={approveIssued.bind(null, report.id)}>
                Approve
              </ActionButton>
            ) : null}
          </>
        }
      />
      <p className="mb-6 text-lg">{stateSentence(report, isOwn)}</p>
      {report.summary ? (
        <p className="mb-6 whitespace-pre-line border-l-2 border-deep pl-4">{report.summary}</p>
      ) : null}
      <Facts items={factsOf(report)} />
      {report.sha256 ? (
        <p className="mt-3 text-sm text-ink-soft">
          SHA-256 of the content <span className="font-mono break-all">{report.sha256}</span>
        </p>
      ) : null}
      {report.said ? (
        <Section
          title="What it says"
          lead="Its product sweeps together, as it was when it was issued."
        >
          <ReportLines {...report.said} />
        </Section>
      ) : (
        <Section title="Sweeps">
          <ul className="border border-rule bg-sheet">
            {report.sweeps.map((sweep) => (
              <li key={sweep.id} className="border-b border-rule px-4 py-2.5 last:border-0">
                <Link href={`/sweeps/${sweep.id}`} className="text-deep underline">
                  {sweep.name}
                </Link>
                {sweep.archivedAt ? " (archived: it has to leave the draft)" : ""}
              </li>
            ))}
          </ul>
        </Section>
      )}
      {(report.state === "issued" || report.state === "approved") && mayWrite ? (
        <Section title="Withdraw">
          <WithdrawForm reportId={report.id} action={withdrawIssued} />
        </Section>
      ) : null}
    </>
  );
}

function DraftActions({ report }: { report: ReportDetail }) {
  const discard = async () => {
    "use server";
    const result = await throwDraftAway(report.id);
    if (result.ok) redirect("/reports");
    return result;
  };
  return (
    <>
      <ButtonLink href={`/reports/${report.id}/edit`}>Edit draft</ButtonLink>
      <ConfirmButton
        label="Discard"
        title="Discard this draft?"
        confirmLabel="Discard"
        action={discard}
      >
        It has no number yet, and nothing but this selection is lost.
      </ConfirmButton>
      <ConfirmButton
        label="Issue"
        title="Issue this report?"
        confirmLabel="Issue"
        action={issueDraft.bind(null, report.id)}
      >
        It gets its number, and what it says can never be changed afterwards: a newer report can
        replace it.
        {report.replacesNumber === null
          ? ""
          : ` ${formatReportNumber(report.replacesNumber)} is withdrawn at the same moment.`}
      </ConfirmButton>
    </>
  );
}

const dayOf = (date: Date | null) => date?.toISOString().slice(0, 10) ?? "";

function stateSentence(report: ReportDetail, isOwn: boolean): string {
  switch (report.state) {
    case "draft":
      return "A draft: nothing is fixed yet.";
    case "issued":
      return `Issued by ${report.issuedBy} on ${dayOf(report.issuedAt)}, not yet approved.${isOwn ? " Somebody else has to approve it." : ""}`;
    case "approved":
      return `Issued by ${report.issuedBy} on ${dayOf(report.issuedAt)} and approved by ${report.approvedBy} on ${dayOf(report.approvedAt)}.`;
    case "withdrawn":
      return `Withdrawn by ${report.withdrawnBy} on ${dayOf(report.withdrawnAt)}: ${report.withdrawnReason}`;
  }
}

function factsOf(report: ReportDetail) {
  return [
    { label: "Sweeps", value: String(report.sweeps.length), mono: true },
    { label: "Ladder", value: report.ladderName ?? "none" },
    {
      label: "Replaces",
      value:
        report.replacesNumber === null || !report.replacesId ? (
          "no earlier report"
        ) : (
          <Link href={`/reports/${report.replacesId}`} className="text-deep underline">
            {formatReportNumber(report.replacesNumber)}
          </Link>
        ),
    },
    { label: "Paper", value: report.paper === "a4" ? "A4" : "US Letter" },
  ];
}
