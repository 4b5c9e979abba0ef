"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { SelectField } from "@/components/ui/select-field";
import { BANDWIDTH_KINDS, DETECTOR_LABELS, DETECTORS } from "@/lib/core/sweep/settings";
import type { LineDraft } from "./mask-draft";
import { settleFrequency } from "./mask-draft";
import type { DraftProblem } from "./mask-problems";
import { problemAt, problemsOfRow } from "./mask-problems";
import { BANDWIDTH_KIND_LABELS } from "./mask-words";
import { PasteSegments } from "./paste-segments";
import { readPastedSegments } from "./read-pasted-segments";
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
  problems: readonly DraftProblem[];
  changes: LineChanges;
}

/** One limit line: its detector, its bandwidth and its segments as a table. */
export function MaskLineFields(props: MaskLineFieldsProps) {
  const { line, place, frequencyUnit, problems, changes } = props;
  const [pasted, setPasted] = useState("");
  const [pasteProblems, setPasteProblems] = useState<string[]>([]);
  const at = `lines.${place}`;
  const called = line.name.trim() || `line ${place + 1}`;
  const errorAt = (field: string) => problemAt(problems, `${at}.${field}`);

  /** What cannot be read is kept in the text area, to be mended there. */
  function paste(at: number | null, text: string) {
    const read = readPastedSegments(text, frequencyUnit);
    setPasteProblems(read.ok ? [] : read.problems);
    setPasted(read.ok ? "" : text);
    if (read.ok) changes.insertSegments(at, read.rows);
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
      <PasteSegments
        text={pasted}
        problems={pasteProblems}
        onText={setPasted}
        onAdd={() => paste(null, pasted)}
      />
    </fieldset>
  );
}
