"use client";

import type { DataColumn } from "@/components/ui/data-table";
import { DataTable } from "@/components/ui/data-table";
import type { RemeasurePoint } from "@/lib/core/reading/reading";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { formatFrequency, formatLevel } from "@/lib/core/units/format";
import type { LevelUnit } from "@/lib/core/units/level-units";

const columnsFor = (unit: LevelUnit): DataColumn<RemeasurePoint>[] => [
  {
    id: "frequency",
    header: "Frequency",
    mono: true,
    align: "right",
    value: (p) => p.frequencyHz,
    cell: (p) => formatFrequency(p.frequencyHz),
  },
  { id: "detector", header: "Detector", value: (p) => DETECTOR_LABELS[p.detector] },
  {
    id: "rbw",
    header: "RBW",
    mono: true,
    align: "right",
    value: (p) => p.rbwHz,
    cell: (p) => (p.rbwHz === null ? "" : formatFrequency(p.rbwHz)),
  },
  {
    id: "bound",
    header: "Upper bound",
    mono: true,
    align: "right",
    value: (p) => Number(p.boundDb.toFixed(2)),
    cell: (p) => formatLevel(p.boundDb, unit),
  },
  {
    id: "limit",
    header: "Limit",
    mono: true,
    align: "right",
    value: (p) => Number(p.limitDb.toFixed(2)),
    cell: (p) => formatLevel(p.limitDb, unit),
  },
];

/** Where to measure again with the mask line's own detector, ready for the bench. */
export function RemeasureList({
  points,
  unit,
  exportName,
}: {
  points: RemeasurePoint[];
  unit: LevelUnit;
  exportName: string;
}) {
  return (
    <DataTable
      label="Measure again"
      columns={columnsFor(unit)}
      rows={points}
      rowKey={(p) => `${p.lineName} ${p.frequencyHz}`}
      exportName={exportName}
    />
  );
}
