"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button, ButtonLink } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { readNumber } from "@/components/ui/read-number";
import { StatusNote } from "@/components/ui/status-note";
import { TextArea } from "@/components/ui/text-area";
import { useActionForm } from "@/components/ui/use-action-form";
import type { Outcome } from "./outcome";

interface ProgramFormProps {
  action: (input: unknown) => Promise<Outcome<{ programId: string }>>;
  /** The program that is edited; without it a new one is made. */
  program?: { id: string; name: string; description: string; targetMarginDb: number };
}

export function ProgramForm({ action, program }: ProgramFormProps) {
  const router = useRouter();
  const [done, setDone] = useState<string | null>(null);
  const form = useActionForm({
    action,
    read: (data): unknown => {
      setDone(null);
      return {
        ...(program ? { programId: program.id } : {}),
        name: data.get("name"),
        description: data.get("description"),
        targetMarginDb: readNumber(data.get("targetMarginDb")),
      };
    },
    onDone: ({ programId }) => {
      if (program) setDone("Details stored.");
      else router.push(`/programs/${programId}`);
    },
  });
  const { fieldErrors } = form;
  return (
    <form onSubmit={form.onSubmit} method="post" className="max-w-md">
      <ErrorNote message={form.message} />
      <StatusNote message={done} />
      <Field label="Name" name="name" defaultValue={program?.name} error={fieldErrors.name} />
      <TextArea
        label="Description"
        name="description"
        defaultValue={program?.description}
        error={fieldErrors.description}
      />
      <Field
        label="Target margin in dB"
        name="targetMarginDb"
        inputMode="decimal"
        hint="How far under its masks the product has to stay on the bench."
        defaultValue={program?.targetMarginDb}
        error={fieldErrors.targetMarginDb}
      />
      <div className="flex gap-2">
        <Button type="submit" disabled={form.pending}>
          {program ? "Store details" : "Create program"}
        </Button>
        {program ? null : <ButtonLink href="/programs">Cancel</ButtonLink>}
      </div>
    </form>
  );
}
