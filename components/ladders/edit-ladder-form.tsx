"use client";

import { useRouter } from "next/navigation";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { TextArea } from "@/components/ui/text-area";
import { useActionForm } from "@/components/ui/use-action-form";

type Outcome =
  | { ok: true; data: { ladderId: string } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

interface EditLadderFormProps {
  ladder: { id: string; name: string; notes: string };
  action: (input: unknown) => Promise<Outcome>;
}

export function EditLadderForm({ ladder, action }: EditLadderFormProps) {
  const router = useRouter();
  const form = useActionForm({
    action,
    read: (data): unknown => ({
      ladderId: ladder.id,
      name: data.get("name"),
      notes: data.get("notes"),
    }),
    onDone: () => router.push(`/ladders/${ladder.id}`),
  });
  const { fieldErrors } = form;
  return (
    <form onSubmit={form.onSubmit} method="post" className="max-w-md">
      <ErrorNote message={form.message} />
      <Field label="Ladder" name="name" defaultValue={ladder.name} error={fieldErrors.name} />
      <TextArea label="Notes" name="notes" defaultValue={ladder.notes} error={fieldErrors.notes} />
      <Button type="submit" disabled={form.pending}>
        Save ladder
      </Button>
    </form>
  );
}
