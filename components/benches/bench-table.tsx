"use client";

import Link from "next/link";
import type { DataColumn } from "@/components/ui/data-table";
import { DataTable } from "@/components/ui/data-table";
import { keepUnits } from "@/components/ui/keep-units";
import { calibrationWords } from "./calibration";

interface BenchLine {
  id: string;
  name: string;
  site: string;
  instrument: string;
  distanceM: number | null;
  guardDb: number;
  revision: number;
  transducers: number;
  overdue: number;
  undated: number;
  archived: boolean;
}

const COLUMNS: DataColumn<BenchLine>[] = [
  {
    id: "name",
    header: "Bench",
    value: (b) => b.name,
    cell: (b) => (
      <>
        <Link
          href={`/benches/${b.id}`}
          className="inline-block min-w-40 font-medium text-deep underline"
        >
          {keepUnits(b.name)}
        </Link>
        {b.archived ? <span className="ml-2 text-sm text-ink-soft">archived</span> : null}
      </>
    ),
  },
  {
    id: "calibrations",
    header: "Calibrations",
    value: calibrationWords,
    cell: (b) => (
      <span className={b.overdue > 0 ? "bg-shoal-bed px-1 whitespace-nowrap text-shoal" : ""}>
        {calibrationWords(b)}
      </span>
    ),
  },
  {
    id: "site",
    header: "Site",
    value: (b) => b.site || null,
    cell: (b) => <span className="block text-sm max-sm:min-w-44">{keepUnits(b.site)}</span>,
  },
  {
    id: "instrument",
    header: "Instrument",
    value: (b) => b.instrument || null,
    cell: (b) => <span className="block text-sm max-sm:min-w-44">{keepUnits(b.instrument)}</span>,
  },
  {
    id: "distance",
    header: "Distance in m",
    align: "right",
    mono: true,
    value: (b) => b.distanceM,
  },
  { id: "guard", header: "Guard in dB", align: "right", mono: true, value: (b) => b.guardDb },
  {
    id: "transducers",
    header: "Transducers",
    align: "right",
    mono: true,
    value: (b) => b.transducers,
  },
  { id: "revision", header: "Revision", align: "right", mono: true, value: (b) => b.revision },
];

export function BenchTable({ benches }: { benches: BenchLine[] }) {
  return (
    <DataTable
      label="Benches"
      columns={COLUMNS}
      rows={benches}
      rowKey={(bench) => bench.id}
      exportName="benches"
    />
  );
}
