"use client";

import { useRef } from "react";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { TextArea } from "@/components/ui/text-area";
import { useActionForm } from "@/components/ui/use-action-form";
import type { Outcome } from "./outcome";

interface NoteFormProps {
  suspectId: string;
  action: (input: unknown) => Promise<Outcome>;
}

/** Adds a remark; remarks stay as they were written. */
export function NoteForm({ suspectId, action }: NoteFormProps) {
  const element = useRef<HTMLFormElement>(null);
  const form = useActionForm({
    action,
    read: (data): unknown => ({ suspectId, text: data.get("text") }),
    onDone: () => element.current?.reset(),
  });
  return (
    <form ref={element} onSubmit={form.onSubmit} method="post" className="mt-4 max-w-2xl">
      <ErrorNote message={form.message} />
      <TextArea label="Add a note" name="text" error={form.fieldErrors.text} />
      <Button type="submit" look="quiet" disabled={form.pending}>
        Add the note
      </Button>
    </form>
  );
}
