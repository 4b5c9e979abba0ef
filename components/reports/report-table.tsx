import Link from "next/link";
import { formatReportNumber } from "@/lib/core/report/report-number";
import type { ShownState } from "./report-state";
import { ReportState } from "./report-state";

interface ReportTableProps {
  reports: {
    id: string;
    number: number | null;
    title: string;
    state: ShownState;
    issuedAt: Date | null;
    createdAt: Date;
    programName: string;
    buildName: string;
  }[];
}

export function ReportTable({ reports }: ReportTableProps) {
  return (
    <div
      className="relative overflow-x-auto border border-rule bg-sheet"
      tabIndex={0}
      role="region"
      aria-label="Reports"
    >
      <table className="w-full text-left">
        <thead className="text-sm text-ink-soft">
          <tr className="border-b border-rule">
            <th className="hidden px-4 py-2 font-medium sm:table-cell">Number</th>
            <th className="px-4 py-2 font-medium">Report</th>
            <th className="px-4 py-2 font-medium">State</th>
            <th className="hidden px-4 py-2 font-medium sm:table-cell">Issued on</th>
            <th className="px-4 py-2 font-medium">PDF</th>
          </tr>
        </thead>
        <tbody>
          {reports.map((report) => (
            <tr key={report.id} className="border-b border-rule align-top last:border-0">
              <td className="hidden px-4 py-3 font-mono whitespace-nowrap sm:table-cell">
                {report.number === null ? "" : formatReportNumber(report.number)}
              </td>
              <td className="px-4 py-3">
                {report.number === null ? null : (
                  <span className="block font-mono text-sm sm:hidden">
                    {formatReportNumber(report.number)}
                  </span>
                )}
                <Link href={`/reports/${report.id}`} className="font-medium text-deep underline">
                  {report.title}
                </Link>
                <span className="block text-sm text-ink-soft">
                  {report.programName} {report.buildName}
                </span>
              </td>
              <td className="px-4 py-3">
                <ReportState state={report.state} />
              </td>
              <td className="hidden px-4 py-3 font-mono whitespace-nowrap sm:table-cell">
                {report.issuedAt ? (
                  <time
                    dateTime={report.issuedAt.toISOString()}
                    title={report.issuedAt.toISOString()}
                  >
                    {report.issuedAt.toISOString().slice(0, 10)}
                  </time>
                ) : (
                  ""
                )}
              </td>
              <td className="px-4 py-3">
                {report.number === null ? null : (
                  <a href={`/api/v1/reports/${report.id}/pdf`} className="text-deep underline">
                    PDF<span className="sr-only"> of {report.title}</span>
                  </a>
                )}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
