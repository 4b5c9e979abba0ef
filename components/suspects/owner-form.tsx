"use client";

import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { SelectField } from "@/components/ui/select-field";
import { useActionForm } from "@/components/ui/use-action-form";
import type { Outcome } from "./outcome";

interface OwnerFormProps {
  suspectId: string;
  ownerId: string | null;
  ownerName: string | null;
  /** Active members of the team. */
  owners: { id: string; name: string }[];
  action: (input: unknown) => Promise<Outcome>;
}

/** Gives a suspect to a member of the team. */
export function OwnerForm({ suspectId, ownerId, ownerName, owners, action }: OwnerFormProps) {
  const form = useActionForm({
    action,
    read: (data): unknown => ({ suspectId, ownerId: data.get("ownerId") || null }),
    onDone: () => undefined,
  });
  const gone =
    ownerId !== null && owners.every((owner) => owner.id !== ownerId)
      ? [{ value: ownerId, label: `${ownerName ?? "somebody"} (not active)` }]
      : [];
  return (
    <form onSubmit={form.onSubmit} method="post">
      <ErrorNote message={form.message} />
      <SelectField
        key={ownerId ?? ""}
        label="Owner"
        name="ownerId"
        defaultValue={ownerId ?? ""}
        options={[
          { value: "", label: "Nobody" },
          ...gone,
          ...owners.map(({ id, name }) => ({ value: id, label: name })),
        ]}
        error={form.fieldErrors.ownerId}
      />
      <Button type="submit" look="quiet" disabled={form.pending}>
        Assign
      </Button>
    </form>
  );
}
