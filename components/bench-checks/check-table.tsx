"use client";

import Link from "next/link";
import { useMemo } from "react";
import type { DataColumn } from "@/components/ui/data-table";
import { DataTable } from "@/components/ui/data-table";
import { formatDelta } from "@/lib/core/units/format";
import type { CheckSummary } from "./check-answer";
import { isDrifted } from "./check-answer";

interface CheckTableProps {
  benchId: string;
  checks: CheckSummary[];
  toleranceDb: number;
  label: string;
}

function columnsOf(benchId: string, toleranceDb: number): DataColumn<CheckSummary>[] {
  return [
    {
      id: "day",
      header: "Day",
      mono: true,
      value: (c) => c.measuredOn,
      cell: (c) => (
        <Link href={`/benches/${benchId}/checks/${c.id}`} className="text-deep underline">
          {c.measuredOn}
        </Link>
      ),
    },
    { id: "source", header: "Source", value: (c) => c.source },
    {
      id: "worst",
      header: "Largest drift in dB",
      align: "right",
      value: (c) => c.driftWorstDb,
      cell: (c) =>
        c.driftWorstDb === null ? (
          <span className="text-ink-soft">{c.isReference ? "reference" : "not known"}</span>
        ) : (
          <span
            className={
              isDrifted(c.driftWorstDb, toleranceDb)
                ? "bg-shoal-bed px-1 whitespace-nowrap text-shoal"
                : "whitespace-nowrap"
            }
          >
            <span className="font-mono">{formatDelta(c.driftWorstDb)}</span>
            {isDrifted(c.driftWorstDb, toleranceDb) ? " drifted" : ""}
          </span>
        ),
    },
    {
      id: "mean",
      header: "Mean in dB",
      align: "right",
      mono: true,
      value: (c) => c.driftMeanDb,
      cell: (c) => (c.driftMeanDb === null ? null : formatDelta(c.driftMeanDb)),
    },
    { id: "lines", header: "Lines", align: "right", mono: true, value: (c) => c.lines },
    {
      id: "missing",
      header: "Missing",
      align: "right",
      mono: true,
      value: (c) => (c.isReference ? null : c.missing),
    },
    {
      id: "reference",
      header: "Reference of",
      value: (c) => c.reference?.measuredOn ?? null,
      cell: (c) =>
        c.reference ? (
          <>
            <span className="font-mono whitespace-nowrap">{c.reference.measuredOn}</span>
            {c.reference.archived ? (
              <span className="ml-2 text-sm text-ink-soft">archived</span>
            ) : null}
          </>
        ) : null,
    },
    { id: "by", header: "By", value: (c) => c.checkedBy },
  ];
}

/** Every check of a bench, newest first until it is sorted otherwise. */
export function CheckTable({ benchId, checks, toleranceDb, label }: CheckTableProps) {
  const columns = useMemo(() => columnsOf(benchId, toleranceDb), [benchId, toleranceDb]);
  return (
    <DataTable
      label={label}
      columns={columns}
      rows={checks}
      rowKey={(check) => check.id}
      exportName="bench-checks"
    />
  );
}
