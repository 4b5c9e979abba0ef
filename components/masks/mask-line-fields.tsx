"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { SelectField } from "@/components/ui/select-field";
import type { LevelUnit } from "@/lib/core/units/level-units";
import { BANDWIDTH_KINDS, DETECTOR_LABELS, DETECTORS } from "@/lib/core/sweep/settings";
import type { LineDraft } from "./mask-draft";
import { settleFrequency } from "./mask-draft";
import type { DraftProblem } from "./mask-problems";
import { problemAt, problemsOfRow } from "./mask-problems";
import { BANDWIDTH_KIND_LABELS } from "./mask-words";
import { PasteTable } from "./paste-table";
import type { PastedLine } from "./read-pasted-table";
import { SegmentRow } from "./segment-row";
import type { LineChanges } from "./use-mask-draft";

const DETECTOR_OPTIONS = [
  { value: "", label: "Choose…" },
  ...DETECTORS.map((value) => ({ value, label: DETECTOR_LABELS[value] })),
];
const KIND_OPTIONS = [
  { value: "", label: "not stated" },
  ...BANDWIDTH_KINDS.map((value) => ({ value, label: BANDWIDTH_KIND_LABELS[value] })),
];
const HEADS = ["", "Start", "End", "Limit at start", "Limit at end", "Between", "Row"];

interface MaskLineFieldsProps {
  line: LineDraft;
  place: number;
  frequencyUnit: string;
  /** Unit of the mask's limit, as far as it is chosen. */
  unit: LevelUnit | "";
  problems: readonly DraftProblem[];
  changes: LineChanges;
}

/** One limit line: its detector, its bandwidth and its segments as a table. */
export function MaskLineFields(props: MaskLineFieldsProps) {
  const { line, place, frequencyUnit, unit, problems, changes } = props;
  const [pasted, setPasted] = useState("");
  // Where rows pasted into a cell go once they are looked at; at the end without one.
  const [pasteAt, setPasteAt] = useState<number | null>(null);
  const [pastes, setPastes] = useState(0);
  const at = `lines.${place}`;
  const called = line.name.trim() || `line ${place + 1}`;
  const errorAt = (field: string) => problemAt(problems, `${at}.${field}`);

  /** A table pasted into a cell is shown first; what was waiting there already stays above it. */
  function paste(rowId: number, text: string) {
    setPasted((waiting) => (waiting.trim() === "" ? text : `${waiting.trimEnd()}\n${text}`));
    setPasteAt(rowId);
    setPastes((count) => count + 1);
  }

  function add([only]: PastedLine[]) {
    if (!only) return;
    const isStillThere = line.segments.some(({ id }) => id === pasteAt);
    changes.insertSegments(isStillThere ? pasteAt : null, only.rows);
    changes.patch({
      detector: line.detector || (only.detector ?? ""),
      rbw: line.rbw || only.rbw,
      name: line.name || only.name,
    });
    setPasted("");
    setPasteAt(null);
  }

  return (
    <fieldset className="mb-6 min-w-0 border border-rule bg-sheet p-4">
      <legend className="px-2 font-title text-lg">{line.name.trim() || `Line ${place + 1}`}</legend>
      <div className="grid gap-x-4 sm:grid-cols-2">
        <Field
          label="Line"
          name={`${at}.name`}
          value={line.name}
          onChange={(event) => changes.patch({ name: event.target.value })}
          error={errorAt("name")}
        />
        <SelectField
          label="Detector"
          name={`${at}.detector`}
          options={DETECTOR_OPTIONS}
          value={line.detector}
          onChange={(event) =>
            changes.patch({ detector: DETECTORS.find((d) => d === event.target.value) ?? "" })
          }
          error={errorAt("detector")}
        />
        <Field
          label="Resolution bandwidth"
          name={`${at}.rbwHz`}
          hint="As 120 kHz; a plain number is kHz. Empty when it is not stated."
          value={line.rbw}
          onChange={(event) => changes.patch({ rbw: event.target.value })}
          onBlur={() => changes.patch({ rbw: settleFrequency(line.rbw, "kHz") })}
          error={errorAt("rbwHz")}
        />
        <SelectField
          label="Bandwidth counted"
          name={`${at}.rbwKind`}
          hint="Which points of the filter it lies between."
          options={KIND_OPTIONS}
          value={line.rbwKind}
          onChange={(event) =>
            changes.patch({ rbwKind: BANDWIDTH_KINDS.find((k) => k === event.target.value) ?? "" })
          }
        />
      </div>
      <div className="overflow-x-auto">
        <table className="w-full text-left">
          <caption className="sr-only">Segments of {called}</caption>
          <thead className="text-sm text-ink-soft">
            <tr>
              {HEADS.map((head) => (
                <th key={head} scope="col" className="px-1 py-1 align-bottom font-medium">
                  {head || <span className="sr-only">Number</span>}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {line.segments.map((segment, k) => (
              <SegmentRow
                key={segment.id}
                segment={segment}
                place={k}
                at={`${at}.segments.${k}`}
                lineName={called}
                frequencyUnit={frequencyUnit}
                problems={problemsOfRow(problems, `${at}.segments.${k}`)}
                onPatch={(change) => changes.patchSegment(segment.id, change)}
                onPaste={(text) => paste(segment.id, text)}
                onAdd={changes.addSegment}
                onDuplicate={() => changes.duplicateSegment(segment.id)}
                onRemove={() => changes.removeSegment(segment.id)}
              />
            ))}
          </tbody>
        </table>
      </div>
      {errorAt("segments") ? (
        <p className="mt-2 text-sm text-aground">{errorAt("segments")}</p>
      ) : null}
      <div className="mt-3 flex flex-wrap gap-2">
        <Button look="quiet" onClick={changes.addSegment}>
          Add segment
        </Button>
        <Button
          look="quiet"
          className="ml-auto"
          aria-label={`Remove ${called}`}
          onClick={changes.remove}
        >
          Remove line
        </Button>
      </div>
      <PasteTable
        summary="Paste segments from a spreadsheet"
        text={pasted}
        onText={setPasted}
        frequencyUnit={frequencyUnit}
        unit={unit}
        line={line}
        pastes={pastes}
        onAdd={add}
      />
    </fieldset>
  );
}
