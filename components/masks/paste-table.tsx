"use client";

import { useEffect, useRef } from "react";
import { Button } from "@/components/ui/button";
import { TextArea } from "@/components/ui/text-area";
import type { LevelUnit } from "@/lib/core/units/level-units";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import type { LineDraft } from "./mask-draft";
import { PastePreview } from "./paste-preview";
import type { PastedLine, PastedTable } from "./read-pasted-table";
import { readPastedTable } from "./read-pasted-table";

interface PasteTableProps {
  summary: string;
  text: string;
  onText: (text: string) => void;
  /** Unit of plain frequencies, and the unit of the mask's limit as far as it is chosen. */
  frequencyUnit: string;
  unit: LevelUnit | "";
  /** The line that rows go into; without it each detector becomes a new line. */
  line?: LineDraft;
  /** Counts up when a table was pasted into a cell: then it is shown here. */
  pastes?: number;
  onAdd: (lines: PastedLine[], unit: LevelUnit | null) => void;
}

/** What keeps a table that was read from being added where it was pasted. */
function placeProblems(table: PastedTable, unit: LevelUnit | "", line?: LineDraft): string[] {
  if (!table.ok) return table.problems;
  const problems: string[] = [];
  if (table.unit !== null && unit !== "" && table.unit !== unit)
    problems.push(
      `The table's limits are in ${LEVEL_UNIT_LABELS[table.unit]}, this mask's in ${LEVEL_UNIT_LABELS[unit]}.`,
    );
  const [only] = table.lines;
  if (line && table.lines.length > 1)
    problems.push(
      `This table makes ${table.lines.length} lines: paste it under "Paste a table with several bands and detectors", below the lines.`,
    );
  else if (line && only && line.detector !== "" && only.detector !== null)
    if (line.detector !== only.detector)
      problems.push("The table is for another detector than this line.");
  return problems;
}

/** A place to paste a table; what it was understood as stands below it before it is added. */
export function PasteTable(props: PasteTableProps) {
  const { summary, text, frequencyUnit, unit, line, pastes = 0 } = props;
  const area = useRef<HTMLDivElement>(null);
  const isBlank = text.trim() === "";
  const table = isBlank ? null : readPastedTable(text, frequencyUnit);
  const problems = table ? placeProblems(table, unit, line) : [];
  const segments = table?.ok ? table.lines.reduce((sum, { rows }) => sum + rows.length, 0) : 0;

  useEffect(() => {
    if (pastes > 0) area.current?.querySelector("textarea")?.focus();
  }, [pastes]);

  return (
    <details className="mt-3" open={isBlank ? undefined : true}>
      <summary className="cursor-pointer text-deep">{summary}</summary>
      <div className="mt-2" ref={area}>
        <TextArea
          label="Table"
          hint={`Start, end and limit per row; a limit that slopes as "66 to 56" or in a column for its end. With a head: one column per detector (PK, QP, AV), units in brackets, RBW. Plain frequencies are in ${frequencyUnit}.`}
          rows={5}
          spellCheck={false}
          className="font-mono"
          value={text}
          onChange={(event) => props.onText(event.target.value)}
          error={problems.length > 0 ? problems.slice(0, 12).join(" ") : undefined}
        />
        {table?.ok ? (
          <>
            <p role="status" className="mb-2 text-sm text-ink-soft">
              Nothing is added yet. This is what the table was read as
              {table.unit ? `, in ${LEVEL_UNIT_LABELS[table.unit]}` : ""}
              {table.unused.length > 0 ? `; not read: ${table.unused.join(", ")}` : ""}.
            </p>
            <PastePreview
              lines={table.lines}
              into={line ? `into ${line.name.trim() || "this line"}` : "a new line"}
            />
          </>
        ) : null}
        <Button
          look="quiet"
          disabled={!table?.ok || problems.length > 0}
          onClick={() => {
            if (table?.ok) props.onAdd(table.lines, table.unit);
          }}
        >
          {segments === 0
            ? "Add these rows"
            : `Add ${segments} ${segments === 1 ? "segment" : "segments"}`}
        </Button>
      </div>
    </details>
  );
}
