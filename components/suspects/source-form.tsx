"use client";

import { readFrequency, writeFrequency } from "@/components/programs/read-frequency";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { useActionForm } from "@/components/ui/use-action-form";
import type { Outcome } from "./outcome";

interface SourceFormProps {
  suspectId: string;
  source: string;
  toleranceHz: number;
  action: (input: unknown) => Promise<Outcome>;
}

/** The likely source of a suspect, and how near a peak has to be to be taken for it. */
export function SourceForm({ suspectId, source, toleranceHz, action }: SourceFormProps) {
  const form = useActionForm({
    action,
    read: (data): unknown => ({
      suspectId,
      source: data.get("source"),
      toleranceHz: readFrequency(String(data.get("toleranceHz") ?? "")),
    }),
    onDone: () => undefined,
  });
  return (
    <form onSubmit={form.onSubmit} method="post">
      <ErrorNote message={form.message} />
      <Field
        key={`source ${source}`}
        label="Likely source"
        name="source"
        defaultValue={source}
        error={form.fieldErrors.source}
      />
      <Field
        key={`tolerance ${toleranceHz}`}
        label="Tolerance"
        name="toleranceHz"
        defaultValue={writeFrequency(toleranceHz)}
        hint="A peak this near is taken for this suspect. Sweeps with a wider RBW, a coarser step or a spread clock are given what they need."
        error={form.fieldErrors.toleranceHz}
      />
      <Button type="submit" look="quiet" disabled={form.pending}>
        Save source and tolerance
      </Button>
    </form>
  );
}
