"use client";

import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { useActionForm } from "@/components/ui/use-action-form";
import { useRef } from "react";

type Outcome =
  | { ok: true; data: { buildId: string } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

interface BuildFormProps {
  programId: string;
  action: (input: unknown) => Promise<Outcome>;
}

export function BuildForm({ programId, action }: BuildFormProps) {
  const element = useRef<HTMLFormElement>(null);
  const form = useActionForm({
    action,
    read: (data): unknown => ({
      programId,
      name: data.get("name"),
      builtOn: data.get("builtOn") || null,
      notes: data.get("notes"),
    }),
    onDone: () => element.current?.reset(),
  });
  const { fieldErrors } = form;
  return (
    <form ref={element} onSubmit={form.onSubmit} method="post" className="max-w-md">
      <ErrorNote message={form.message} />
      <Field label="Build" name="name" error={fieldErrors.name} />
      <Field label="Built on" name="builtOn" type="date" error={fieldErrors.builtOn} />
      <Field label="Notes" name="notes" error={fieldErrors.notes} />
      <Button type="submit" disabled={form.pending}>
        Add build
      </Button>
    </form>
  );
}
