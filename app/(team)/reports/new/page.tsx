import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { ReportForm } from "@/components/reports/report-form";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { readReportChoices } from "@/lib/queries/report/read-report-choices";
import { draftReport } from "../actions";

export const metadata: Metadata = { title: "New report" };

interface NewReportPageProps {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function NewReportPage(props: NewReportPageProps) {
  const { build: buildId } = await props.searchParams;
  const ctx = await currentContext();
  const choices = await readReportChoices(ctx, typeof buildId === "string" ? buildId : "");
  if (!choices) notFound();
  const { build, sweeps } = choices;
  return (
    <>
      <PageHead
        title="New report"
        trail={[
          { href: `/programs/${build.programId}`, label: build.programName },
          { href: `/programs/${build.programId}/builds/${build.id}`, label: build.name },
        ]}
        lead="A draft first: it gets its number and its hash when it is issued."
      />
      {isAllowed(ctx, "report.write") ? (
        <ReportForm
          about={{ buildId: build.id }}
          values={{
            title: `${build.programName} ${build.name}, bench summary`,
            summary: "",
            paper: "a4",
            sweepIds: sweeps.filter((sweep) => sweep.onRecord).map((sweep) => sweep.id),
            ladderId: choices.ladders[0]?.id ?? null,
            replacesId: null,
          }}
          sweeps={sweeps}
          ladders={choices.ladders}
          issued={choices.issued}
          action={draftReport}
        />
      ) : (
        <p>Your role in this team may read reports, not write them.</p>
      )}
    </>
  );
}
