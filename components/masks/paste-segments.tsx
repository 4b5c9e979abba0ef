"use client";

import { Button } from "@/components/ui/button";
import { TextArea } from "@/components/ui/text-area";

interface PasteSegmentsProps {
  text: string;
  problems: readonly string[];
  onText: (text: string) => void;
  onAdd: () => void;
}

/** A place to paste a whole table; pasting one into a cell works as well. */
export function PasteSegments({ text, problems, onText, onAdd }: PasteSegmentsProps) {
  return (
    <details className="mt-3" open={problems.length > 0 ? true : undefined}>
      <summary className="cursor-pointer text-deep">Paste segments from a spreadsheet</summary>
      <div className="mt-2">
        <TextArea
          label="Rows"
          hint="Start, end, limit, and where the limit slopes the limit at the end. A header may name the unit of frequency."
          rows={5}
          spellCheck={false}
          className="font-mono"
          value={text}
          onChange={(event) => onText(event.target.value)}
          error={problems.length > 0 ? problems.join(" ") : undefined}
        />
        <Button look="quiet" onClick={onAdd}>
          Add these rows
        </Button>
      </div>
    </details>
  );
}
