"use client";

import { useState } from "react";
import { SelectField } from "@/components/ui/select-field";
import { TextArea } from "@/components/ui/text-area";
import { readTextFile } from "./read-text-file";
import type { TransducerDraft } from "./transducer-draft";
import { FREQUENCY_UNIT_OPTIONS, tableWords } from "./transducer-draft";

interface FactorTableFieldProps {
  draft: TransducerDraft;
  /** Name of the control, which is also the path of its error. */
  name: string;
  error: string | undefined;
  onChange: (change: Partial<Pick<TransducerDraft, "text" | "unit">>) => void;
}

/** A factor table: typed, pasted from a spreadsheet, or loaded from a CSV file. */
export function FactorTableField({ draft, name, error, onChange }: FactorTableFieldProps) {
  const [fileMessage, setFileMessage] = useState<string | null>(null);

  async function load(input: HTMLInputElement) {
    const file = input.files?.[0];
    if (!file) return;
    const read = await readTextFile(file);
    setFileMessage(read.ok ? `Loaded from ${file.name}.` : read.message);
    if (read.ok) onChange({ text: read.text });
    // The same file may be chosen again after it was mended.
    input.value = "";
  }

  const typed = draft.table.state === "unreadable" ? draft.table.message : undefined;
  return (
    <div>
      <TextArea
        label="Factor table"
        name={name}
        hint="Frequency and factor in two columns, one row per point: typed, pasted from a spreadsheet, or from a CSV file."
        rows={8}
        spellCheck={false}
        className="font-mono"
        value={draft.text}
        onChange={(event) => onChange({ text: event.target.value })}
        error={typed ?? error}
      />
      <p role="status" className="-mt-3 mb-3 text-sm text-ink-soft">
        {[tableWords(draft.table), fileMessage ?? ""].join(" ").trim()}
      </p>
      <div className="flex flex-wrap gap-x-6">
        <SelectField
          label="Frequencies are in"
          options={FREQUENCY_UNIT_OPTIONS}
          value={draft.unit}
          onChange={(event) => onChange({ unit: event.target.value })}
        />
        <label className="mb-4 block">
          <span className="mb-1 block font-medium">Load a CSV file</span>
          <input
            type="file"
            accept=".csv,.tsv,.txt,text/*"
            className="block max-w-full"
            onChange={(event) => void load(event.currentTarget)}
          />
        </label>
      </div>
    </div>
  );
}
