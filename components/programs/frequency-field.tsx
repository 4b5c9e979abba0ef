"use client";

import { useState } from "react";
import { Field } from "@/components/ui/field";
import { readFrequency, writeFrequency } from "./read-frequency";

interface FrequencyFieldProps {
  name: string;
  initialHz: number | null;
  error: string | undefined;
}

/** A frequency typed with its unit; says below when it was read otherwise than it was written. */
export function FrequencyField({ name, initialHz, error }: FrequencyFieldProps) {
  const [text, setText] = useState(initialHz === null ? "" : writeFrequency(initialHz));
  const frequencyHz = readFrequency(text);
  return (
    <div>
      <Field
        label="Frequency"
        name={name}
        value={text}
        placeholder="27 MHz"
        autoComplete="off"
        className="font-mono"
        onChange={(event) => setText(event.target.value)}
        error={error}
      />
      {Number.isFinite(frequencyHz) && writeFrequency(frequencyHz) !== text.trim() ? (
        <p className="-mt-3 mb-3 text-sm text-ink-soft">
          Read as <span className="font-mono">{writeFrequency(frequencyHz)}</span>
        </p>
      ) : null}
    </div>
  );
}
