"use client";

import type { DataColumn } from "@/components/ui/data-table";
import { DataTable } from "@/components/ui/data-table";
import type { RemeasureRow } from "@/lib/core/reading/remeasure-rows";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { formatFrequency, formatLevel } from "@/lib/core/units/format";
import type { LevelUnit } from "@/lib/core/units/level-units";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";

const columnsFor = (unit: LevelUnit, isSeveral: boolean): DataColumn<RemeasureRow>[] => [
  {
    id: "frequency",
    header: "Frequency",
    exportHeader: "Frequency, Hz",
    mono: true,
    align: "right",
    value: (p) => p.frequencyHz,
    cell: (p) => formatFrequency(p.frequencyHz),
  },
  { id: "detector", header: "Detector", value: (p) => DETECTOR_LABELS[p.detector] },
  {
    id: "rbw",
    header: "RBW",
    exportHeader: "RBW, Hz",
    mono: true,
    align: "right",
    value: (p) => p.rbwHz,
    cell: (p) => (p.rbwHz === null ? "" : formatFrequency(p.rbwHz)),
  },
  { id: "line", header: "Mask line", value: (p) => p.lineName },
  {
    id: "polarization",
    header: "Polarization",
    value: (p) => p.polarization,
    cell: (p) => p.polarization ?? "not stated",
  },
  {
    id: "height",
    header: "Height",
    exportHeader: "Height, m",
    mono: true,
    align: "right",
    value: (p) => p.heightM,
    cell: (p) => (p.heightM === null ? "" : `${p.heightM} m`),
  },
  {
    id: "azimuth",
    header: "Azimuth",
    exportHeader: "Azimuth, °",
    mono: true,
    align: "right",
    value: (p) => p.azimuthDeg,
    cell: (p) => (p.azimuthDeg === null ? "" : `${p.azimuthDeg}°`),
  },
  {
    id: "bound",
    header: "Upper bound",
    exportHeader: `Upper bound, ${LEVEL_UNIT_LABELS[unit]}`,
    mono: true,
    align: "right",
    value: (p) => Number(p.boundDb.toFixed(2)),
    cell: (p) => formatLevel(p.boundDb, unit),
  },
  {
    id: "limit",
    header: "Limit",
    exportHeader: `Limit, ${LEVEL_UNIT_LABELS[unit]}`,
    mono: true,
    align: "right",
    value: (p) => Number(p.limitDb.toFixed(2)),
    cell: (p) => formatLevel(p.limitDb, unit),
  },
  ...(isSeveral
    ? [{ id: "sweep", header: "Bound from", value: (p: RemeasureRow) => p.sweepName }]
    : []),
];

interface RemeasureListProps {
  rows: RemeasureRow[];
  unit: LevelUnit;
  exportName: string;
  /** More than one sweep was held: each row names its own. */
  isSeveral?: boolean;
}

/** Where to measure again with the mask line's own detector, ready for the bench. */
export function RemeasureList({ rows, unit, exportName, isSeveral = false }: RemeasureListProps) {
  return (
    <DataTable
      label="Measure again"
      columns={columnsFor(unit, isSeveral)}
      rows={rows}
      rowKey={(p) => `${p.lineName} ${p.frequencyHz} ${p.partIndex}`}
      exportName={exportName}
    />
  );
}
