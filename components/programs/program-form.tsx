"use client";

import { useRouter } from "next/navigation";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { readNumber } from "@/components/ui/read-number";
import { useActionForm } from "@/components/ui/use-action-form";

type Outcome =
  | { ok: true; data: { programId: string } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

export function ProgramForm({ action }: { action: (input: unknown) => Promise<Outcome> }) {
  const router = useRouter();
  const form = useActionForm({
    action,
    read: (data): unknown => ({
      name: data.get("name"),
      description: data.get("description"),
      targetMarginDb: readNumber(data.get("targetMarginDb")),
    }),
    onDone: ({ programId }) => router.push(`/programs/${programId}`),
  });
  const { fieldErrors } = form;
  return (
    <form onSubmit={form.onSubmit} method="post" className="max-w-md">
      <ErrorNote message={form.message} />
      <Field label="Name" name="name" error={fieldErrors.name} />
      <Field label="Description" name="description" error={fieldErrors.description} />
      <Field
        label="Target margin in dB"
        name="targetMarginDb"
        inputMode="decimal"
        hint="How far under its masks the product has to stay on the bench."
        error={fieldErrors.targetMarginDb}
      />
      <Button type="submit" disabled={form.pending}>
        Create program
      </Button>
    </form>
  );
}
