"use client";

import { useRef } from "react";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { SelectField } from "@/components/ui/select-field";
import { useActionForm } from "@/components/ui/use-action-form";

type Outcome =
  | { ok: true; data: { stepId: string } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

interface StepFormProps {
  action: (input: unknown) => Promise<Outcome>;
  /** What goes with the typed values: the ladder of a new step, or the step that is edited. */
  about: { ladderId: string } | { stepId: string };
  values?: { name: string; description: string; branchOfId: string | null };
  /** Steps that this one may start from; none for step 0. */
  earlier: readonly { id: string; position: number; name: string }[];
  label: string;
  onDone?: () => void;
}

export function StepForm({ action, about, values, earlier, label, onDone }: StepFormProps) {
  const element = useRef<HTMLFormElement>(null);
  const form = useActionForm({
    action,
    read: (data): unknown => ({
      ...about,
      name: data.get("name"),
      description: data.get("description"),
      ...(earlier.length > 0 ? { branchOfId: data.get("branchOfId") || null } : {}),
    }),
    onDone: () => {
      if (!values) element.current?.reset();
      onDone?.();
    },
  });
  const { fieldErrors } = form;
  return (
    <form ref={element} onSubmit={form.onSubmit} method="post" className="max-w-md">
      <ErrorNote message={form.message} />
      <Field
        label="What changes"
        name="name"
        hint="For example: scrambler on"
        defaultValue={values?.name}
        error={fieldErrors.name}
      />
      <Field
        label="In detail"
        name="description"
        defaultValue={values?.description}
        error={fieldErrors.description}
      />
      {earlier.length > 0 ? (
        <SelectField
          label="Starts from"
          name="branchOfId"
          hint="Choose a step for a branch, for example without the ferrite. Its delta is held against that step."
          defaultValue={values?.branchOfId ?? ""}
          error={fieldErrors.branchOfId}
          options={[
            { value: "", label: "The last kept step before it" },
            ...earlier.map((step) => ({
              value: step.id,
              label: `Step ${step.position}: ${step.name}`,
            })),
          ]}
        />
      ) : null}
      <Button type="submit" disabled={form.pending}>
        {label}
      </Button>
    </form>
  );
}
