"use client";

import { useRouter } from "next/navigation";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { useActionForm } from "@/components/ui/use-action-form";

type Outcome =
  | { ok: true; data: { ladderId: string } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

interface LadderFormProps {
  buildId: string;
  action: (input: unknown) => Promise<Outcome>;
}

/** Starts a ladder: its name and the state that all later steps are held against. */
export function LadderForm({ buildId, action }: LadderFormProps) {
  const router = useRouter();
  const form = useActionForm({
    action,
    read: (data): unknown => ({
      buildId,
      name: data.get("name"),
      notes: data.get("notes"),
      startName: data.get("startName"),
      startDescription: data.get("startDescription"),
    }),
    onDone: ({ ladderId }) => router.push(`/ladders/${ladderId}`),
  });
  const { fieldErrors } = form;
  return (
    <form onSubmit={form.onSubmit} method="post" className="max-w-md">
      <ErrorNote message={form.message} />
      <Field label="Ladder" name="name" error={fieldErrors.name} />
      <Field
        label="Step 0, the starting point"
        name="startName"
        hint="For example: link at rest pattern, nothing fitted"
        error={fieldErrors.startName}
      />
      <Field label="What step 0 is" name="startDescription" error={fieldErrors.startDescription} />
      <Field label="Notes on the ladder" name="notes" error={fieldErrors.notes} />
      <Button type="submit" disabled={form.pending}>
        Start ladder
      </Button>
    </form>
  );
}
