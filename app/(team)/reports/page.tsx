import type { Metadata } from "next";
import Link from "next/link";
import { ReportTable } from "@/components/reports/report-table";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { isAllowed } from "@/lib/auth/context";
import { currentContext } from "@/lib/auth/session";
import { listReports } from "@/lib/queries/report/list-reports";

export const metadata: Metadata = { title: "Reports" };

interface ReportsPageProps {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function ReportsPage(props: ReportsPageProps) {
  const { program } = await props.searchParams;
  const programId = typeof program === "string" ? program : null;
  const ctx = await currentContext();
  const reports = await listReports(ctx, programId);
  return (
    <>
      <PageHead
        title="Reports"
        lead={
          programId ? (
            <>
              Reports of one program.{" "}
              <Link href="/reports" className="text-deep underline">
                Show all
              </Link>
            </>
          ) : (
            "Numbered summaries for managers and labs. What was issued is never edited."
          )
        }
      />
      {reports.length > 0 ? (
        <ReportTable reports={reports} />
      ) : (
        <EmptyState>
          No reports {programId ? "of this program " : ""}yet.{" "}
          {isAllowed(ctx, "report.write")
            ? "Make one from a build: choose its sweeps, then issue it."
            : "They appear here as soon as an engineer issues one."}
        </EmptyState>
      )}
    </>
  );
}
