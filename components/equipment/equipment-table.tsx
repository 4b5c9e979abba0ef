"use client";

import Link from "next/link";
import type { DataColumn } from "@/components/ui/data-table";
import { DataTable } from "@/components/ui/data-table";
import { keepUnits } from "@/components/ui/keep-units";
import type { EquipmentKind } from "@/lib/core/bench/equipment";
import { DueMark } from "./due-mark";
import { EQUIPMENT_KIND_LABELS, STATE_WORDS, type EquipmentState } from "./equipment-words";

export interface EquipmentLine {
  id: string;
  kind: EquipmentKind;
  name: string;
  inventoryNumber: string;
  archived: boolean;
  state: EquipmentState;
  newest: { calibratedOn: string; dueOn: string | null } | null;
  uses: { benchId: string; benchName: string; as: string }[];
}

const COLUMNS: DataColumn<EquipmentLine>[] = [
  {
    id: "name",
    header: "Equipment",
    value: (e) => e.name,
    cell: (e) => (
      <>
        <Link
          href={`/benches/equipment/${e.id}`}
          className="inline-block min-w-40 font-medium text-deep underline"
        >
          {keepUnits(e.name)}
        </Link>
        {e.archived ? <span className="ml-2 text-sm text-ink-soft">archived</span> : null}
      </>
    ),
  },
  { id: "kind", header: "Kind", value: (e) => EQUIPMENT_KIND_LABELS[e.kind] },
  {
    id: "state",
    header: "State",
    value: (e) => STATE_WORDS[e.state],
    cell: (e) => <DueMark state={e.state} />,
  },
  { id: "due", header: "Due on", mono: true, value: (e) => e.newest?.dueOn ?? null },
  {
    id: "calibrated",
    header: "Calibrated on",
    mono: true,
    value: (e) => e.newest?.calibratedOn ?? null,
  },
  {
    id: "uses",
    header: "Stands on",
    value: (e) => e.uses.map((use) => use.benchName).join(", ") || null,
    cell: (e) => <UseLinks uses={e.uses} />,
  },
  { id: "number", header: "Number", mono: true, value: (e) => e.inventoryNumber || null },
];

/** Benches that rely on a piece of equipment. */
export function UseLinks({ uses }: Pick<EquipmentLine, "uses">) {
  if (uses.length === 0) return <span className="text-ink-soft">no bench</span>;
  return (
    <ul>
      {uses.map(({ benchId, benchName, as }) => (
        <li key={`${benchId}${as}`} className="min-w-40">
          <Link href={`/benches/${benchId}`} className="text-deep underline">
            {keepUnits(benchName)}
          </Link>{" "}
          <span className="text-sm text-ink-soft">{as}</span>
        </li>
      ))}
    </ul>
  );
}

export function EquipmentTable({ equipment }: { equipment: EquipmentLine[] }) {
  return (
    <DataTable
      label="Equipment"
      columns={COLUMNS}
      rows={equipment}
      rowKey={(piece) => piece.id}
      exportName="equipment"
    />
  );
}
