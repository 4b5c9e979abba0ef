"use client";

import { useRef, useState } from "react";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { StatusNote } from "@/components/ui/status-note";
import { TextArea } from "@/components/ui/text-area";
import { useActionForm } from "@/components/ui/use-action-form";
import type { Outcome } from "./outcome";

interface BuildFormProps {
  programId: string;
  action: (input: unknown) => Promise<Outcome<{ buildId: string }>>;
  /** The build that is edited; without it a new one is added to the program. */
  build?: { id: string; name: string; builtOn: string | null; notes: string };
}

export function BuildForm({ programId, action, build }: BuildFormProps) {
  const element = useRef<HTMLFormElement>(null);
  const [done, setDone] = useState<string | null>(null);
  const form = useActionForm({
    action,
    read: (data): unknown => {
      setDone(null);
      return {
        ...(build ? { buildId: build.id } : { programId }),
        name: data.get("name"),
        builtOn: data.get("builtOn") || null,
        notes: data.get("notes"),
      };
    },
    onDone: () => {
      if (build) setDone("Details stored.");
      else element.current?.reset();
    },
  });
  const { fieldErrors } = form;
  return (
    <form ref={element} onSubmit={form.onSubmit} method="post" className="max-w-md">
      <ErrorNote message={form.message} />
      <StatusNote message={done} />
      <Field label="Build" name="name" defaultValue={build?.name} error={fieldErrors.name} />
      <Field
        label="Built on"
        name="builtOn"
        type="date"
        defaultValue={build?.builtOn ?? ""}
        error={fieldErrors.builtOn}
      />
      <TextArea label="Notes" name="notes" defaultValue={build?.notes} error={fieldErrors.notes} />
      <Button type="submit" disabled={form.pending}>
        {build ? "Store details" : "Add build"}
      </Button>
    </form>
  );
}
