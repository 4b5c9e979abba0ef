"use client";

import { useState } from "react";
import { FileField } from "@/components/ui/file-field";
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

  async function load(file: File) {
    const read = await readTextFile(file);
    setFileMessage(read.ok ? `Loaded from ${file.name}.` : read.message);
    if (read.ok) onChange({ text: read.text });
  }

  const typed = draft.table.state === "unreadable" ? draft.table.message : undefined;
  return (
    <div>
      <TextArea
        label="Factor table"
        name={name}
        hint="Frequency and factor in two columns, one row per point."
        rows={9}
        spellCheck={false}
        className="font-mono [tab-size:14]"
        value={draft.text}
        onChange={(event) => onChange({ text: event.target.value })}
        error={typed ?? error}
      />
      <p role="status" className="-mt-2 mb-3 text-sm">
        {[tableWords(draft.table), fileMessage ?? ""].join(" ").trim()}
      </p>
      <div className="flex flex-wrap gap-x-6">
        <SelectField
          label="Frequencies are in"
          options={FREQUENCY_UNIT_OPTIONS}
          value={draft.unit}
          onChange={(event) => onChange({ unit: event.target.value })}
        />
        <FileField
          label="Load a CSV file"
          accept=".csv,.tsv,.txt,text/*"
          onFile={(file) => void load(file)}
        />
      </div>
    </div>
  );
}
