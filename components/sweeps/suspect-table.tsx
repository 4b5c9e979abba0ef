"use client";

import { useMemo } from "react";
import { BASIS_LABELS } from "@/components/readings/basis-labels";
import type { DataColumn } from "@/components/ui/data-table";
import { DataTable } from "@/components/ui/data-table";
import { EmptyState } from "@/components/ui/empty-state";
import { Section } from "@/components/ui/section";
import type { Suspect } from "@/lib/core/reading/reading";
import { formatFrequency, formatLevel, formatMargin } from "@/lib/core/units/format";
import type { LevelUnit } from "@/lib/core/units/level-units";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";

interface SuspectTableProps {
  suspects: Suspect[];
  stepHz: number | null;
  unit: LevelUnit;
  exportName: string;
  highlighted: number | null;
  onHighlight: (number: number | null) => void;
}

function columnsFor(unit: LevelUnit, stepHz: number | null): DataColumn<Suspect>[] {
  return [
    { id: "number", header: "No.", mono: true, align: "right", value: (s) => s.number },
    {
      id: "frequency",
      header: "Frequency",
      mono: true,
      align: "right",
      value: (s) => s.frequencyHz,
      cell: (s) => formatFrequency(s.frequencyHz, stepHz ?? undefined),
    },
    {
      id: "level",
      header: `Level, ${LEVEL_UNIT_LABELS[unit]}`,
      align: "right",
      mono: true,
      value: (s) => Number(s.levelDb.toFixed(2)),
      cell: (s) => formatLevel(s.levelDb, unit).split(" ")[0],
    },
    {
      id: "limit",
      header: `Limit, ${LEVEL_UNIT_LABELS[unit]}`,
      align: "right",
      mono: true,
      value: (s) => (s.limitDb === null ? null : Number(s.limitDb.toFixed(2))),
      cell: (s) => (s.limitDb === null ? "" : formatLevel(s.limitDb, unit).split(" ")[0]),
    },
    {
      id: "margin",
      header: "Margin",
      align: "right",
      mono: true,
      value: (s) => (s.marginDb === null ? null : Number(s.marginDb.toFixed(2))),
      cell: (s) => (
        <span className={(s.marginDb ?? 0) < 0 ? "text-aground" : ""}>
          {formatMargin(s.marginDb)}
        </span>
      ),
    },
    { id: "line", header: "Mask line", value: (s) => s.lineName },
    { id: "basis", header: "Basis", value: (s) => BASIS_LABELS[s.basis] },
  ];
}

/** Peaks worth following, the lowest margin first. */
export function SuspectTable(props: SuspectTableProps) {
  const { suspects, stepHz, unit, exportName, highlighted, onHighlight } = props;
  const columns = useMemo(() => columnsFor(unit, stepHz), [unit, stepHz]);
  return (
    <Section
      title="Suspects"
      lead="Peaks that stand 6 dB or more out of their surroundings, at most 20 dB under the mask."
    >
      {suspects.length === 0 ? (
        <EmptyState>No peak stands out within 20 dB of this mask.</EmptyState>
      ) : (
        <div className="max-h-[36rem] overflow-y-auto">
          <DataTable
            label="Suspects"
            columns={columns}
            rows={suspects}
            rowKey={(suspect) => String(suspect.number)}
            exportName={exportName}
            highlighted={highlighted === null ? null : String(highlighted)}
            onHighlight={(key) => onHighlight(key === null ? null : Number(key))}
          />
        </div>
      )}
    </Section>
  );
}
