"use client";

import { useMemo } from "react";
import type { DataColumn } from "@/components/ui/data-table";
import { DataTable } from "@/components/ui/data-table";
import type { BenchCheckContent, CheckLine } from "@/lib/core/bench/bench-check";
import { formatDelta, formatFrequency, formatLevel } from "@/lib/core/units/format";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import { isDrifted } from "./check-answer";

type Row = Omit<CheckLine, "levelDb"> & { levelDb: number | null };

interface CheckLinesTableProps {
  content: BenchCheckContent;
  isReference: boolean;
  toleranceDb: number;
}

/** What is to be said of a line besides its numbers. */
function remark(line: Row, isReference: boolean): string | null {
  if (isReference) return null;
  if (line.levelDb === null) return "missing: no level here";
  if (line.referenceDb === null) return "not in the reference";
  return line.standsOut ? null : "does not stand out: the drift is a bound";
}

function columnsOf(props: CheckLinesTableProps): DataColumn<Row>[] {
  const { content, isReference, toleranceDb } = props;
  const { unit, stepHz } = content;
  const inUnit = `in ${LEVEL_UNIT_LABELS[unit]}`;
  const level = (db: number | null) => (db === null ? null : formatLevel(db, unit));
  const frequency: DataColumn<Row> = {
    id: "frequency",
    header: "Frequency in Hz",
    align: "right",
    mono: true,
    value: (l) => l.frequencyHz,
    cell: (l) => formatFrequency(l.frequencyHz, stepHz),
  };
  const own: DataColumn<Row> = {
    id: "level",
    header: `Level ${inUnit}`,
    align: "right",
    mono: true,
    value: (l) => l.levelDb,
    cell: (l) => level(l.levelDb),
  };
  if (isReference) return [frequency, own];
  return [
    frequency,
    own,
    {
      id: "reference",
      header: `Reference ${inUnit}`,
      align: "right",
      mono: true,
      value: (l) => l.referenceDb,
      cell: (l) => level(l.referenceDb),
    },
    {
      id: "drift",
      header: "Drift in dB",
      align: "right",
      mono: true,
      value: (l) => l.driftDb,
      cell: (l) =>
        l.driftDb === null ? null : (
          <span className={isDrifted(l.driftDb, toleranceDb) ? "bg-shoal-bed px-1 text-shoal" : ""}>
            {formatDelta(l.driftDb)}
          </span>
        ),
    },
    {
      id: "remark",
      header: "Remark",
      value: (l) => remark(l, isReference),
      cell: (l) => <span className="text-sm text-ink-soft">{remark(l, isReference)}</span>,
    },
  ];
}

/** Line by line what a check found, with the lines that it misses. */
export function CheckLinesTable(props: CheckLinesTableProps) {
  const { content } = props;
  const columns = columnsOf(props);
  const rows = useMemo(() => {
    const missing = content.missingHz.map((frequencyHz) => ({
      frequencyHz,
      levelDb: null,
      referenceDb: null,
      driftDb: null,
      standsOut: false,
    }));
    return [...content.lines, ...missing].sort((a, b) => a.frequencyHz - b.frequencyHz);
  }, [content]);
  return (
    <DataTable
      label="Lines of the source"
      columns={columns}
      rows={rows}
      rowKey={(line: Row) => `${line.frequencyHz}`}
      exportName="bench-check-lines"
    />
  );
}
