"use client";

import Link from "next/link";
import { StandingMark } from "@/components/readings/standing-mark";
import type { DataColumn } from "@/components/ui/data-table";
import { DataTable } from "@/components/ui/data-table";
import type { Standing } from "@/lib/core/reading/reading";
import { STANDING_LABELS } from "@/lib/core/reading/reading";
import type { SuspectState } from "@/lib/core/reading/suspect-state";
import { formatDelta, formatFrequency, formatLevel, formatMargin } from "@/lib/core/units/format";
import type { LevelUnit } from "@/lib/core/units/level-units";
import { StateTag } from "./state-tag";

/** A followed suspect in one line. */
export interface SuspectRow {
  id: string;
  number: number;
  frequencyHz: number;
  toleranceHz: number;
  source: string;
  ownerName: string | null;
  state: SuspectState;
  /** The newest build that was swept there; null when none was. */
  buildName: string | null;
  isSeen: boolean;
  marginDb: number | null;
  standing: Standing | null;
  levelDb: number | null;
  unit: LevelUnit | null;
  /** Change of margin since the first build; null when there is none to tell. */
  changeDb: number | null;
  /** Why there is no change to tell, or since when it is counted. */
  changeNote: string;
}

const rounded = (value: number | null) => (value === null ? null : Number(value.toFixed(2)));

const COLUMNS: DataColumn<SuspectRow>[] = [
  {
    id: "number",
    header: "No.",
    mono: true,
    align: "right",
    value: (row) => row.number,
    cell: (row) => (
      <Link href={`/suspects/${row.id}`} className="text-deep underline">
        {row.number}
      </Link>
    ),
  },
  {
    id: "frequency",
    header: "Frequency",
    mono: true,
    align: "right",
    value: (row) => row.frequencyHz,
    cell: (row) => (
      <Link href={`/suspects/${row.id}`} className="text-deep underline">
        {formatFrequency(row.frequencyHz, row.toleranceHz)}
      </Link>
    ),
  },
  {
    id: "margin",
    header: "Margin now",
    mono: true,
    align: "right",
    value: (row) => rounded(row.marginDb),
    cell: (row) => (
      <span className={row.standing === "over" ? "text-aground" : ""}>
        {row.isSeen ? formatMargin(row.marginDb) : ""}
      </span>
    ),
  },
  {
    id: "standing",
    header: "Standing",
    value: (row) => (row.standing ? STANDING_LABELS[row.standing] : standingWord(row)),
    cell: (row) =>
      row.standing ? (
        <StandingMark standing={row.standing} />
      ) : (
        <span className="whitespace-nowrap text-ink-soft">{standingWord(row)}</span>
      ),
  },
  { id: "build", header: "In build", value: (row) => row.buildName },
  {
    id: "change",
    header: "Since first seen",
    mono: true,
    align: "right",
    value: (row) => rounded(row.changeDb),
    cell: (row) => (
      <span title={row.changeNote}>
        {row.changeDb === null ? (
          <span className="font-sans text-sm text-ink-soft">{row.changeNote}</span>
        ) : (
          formatDelta(row.changeDb)
        )}
      </span>
    ),
  },
  {
    id: "level",
    header: "Level",
    mono: true,
    align: "right",
    value: (row) => rounded(row.levelDb),
    cell: (row) => (row.levelDb === null || !row.unit ? "" : formatLevel(row.levelDb, row.unit)),
  },
  {
    id: "state",
    header: "State",
    value: (row) => row.state,
    cell: (row) => <StateTag state={row.state} />,
  },
  { id: "owner", header: "Owner", value: (row) => row.ownerName ?? "nobody" },
  { id: "source", header: "Likely source", value: (row) => row.source },
];

function standingWord(row: SuspectRow): string {
  if (row.buildName === null) return "not swept";
  return row.isSeen ? "no limit" : "not seen";
}

/** Followed suspects, in the order given. */
export function SuspectList({ rows, exportName }: { rows: SuspectRow[]; exportName: string }) {
  return (
    <DataTable
      label="Followed suspects"
      columns={COLUMNS}
      rows={rows}
      rowKey={(row) => row.id}
      exportName={exportName}
    />
  );
}
