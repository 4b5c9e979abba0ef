"use client";

import { useRouter } from "next/navigation";
import { Button, ButtonLink } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { SelectField } from "@/components/ui/select-field";
import { TextArea } from "@/components/ui/text-area";
import { useActionForm } from "@/components/ui/use-action-form";
import type { EquipmentKind } from "@/lib/core/bench/equipment";
import { EQUIPMENT_KINDS } from "@/lib/core/bench/equipment";
import { EQUIPMENT_KIND_LABELS } from "./equipment-words";

type Outcome =
  | { ok: true; data: { equipmentId: string } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

interface EquipmentFormProps {
  action: (input: unknown) => Promise<Outcome>;
  /** What is edited; without it a new piece is made. */
  piece?: {
    id: string;
    kind: EquipmentKind;
    name: string;
    inventoryNumber: string;
    notes: string;
  };
}

const KIND_OPTIONS = [
  { value: "", label: "Choose…" },
  ...EQUIPMENT_KINDS.map((kind) => ({ value: kind, label: EQUIPMENT_KIND_LABELS[kind] })),
];

export function EquipmentForm({ action, piece }: EquipmentFormProps) {
  const router = useRouter();
  const form = useActionForm({
    action,
    read: (data): unknown => ({
      ...(piece ? { equipmentId: piece.id } : {}),
      kind: data.get("kind"),
      name: data.get("name"),
      inventoryNumber: data.get("inventoryNumber"),
      notes: data.get("notes"),
    }),
    onDone: ({ equipmentId }) => router.push(`/benches/equipment/${equipmentId}`),
  });
  const { fieldErrors } = form;
  return (
    <form onSubmit={form.onSubmit} method="post" className="max-w-3xl">
      <ErrorNote message={form.message} />
      <div className="grid gap-x-5 sm:grid-cols-2">
        <Field label="Name" name="name" defaultValue={piece?.name} error={fieldErrors.name} />
        <SelectField
          label="Kind"
          name="kind"
          options={KIND_OPTIONS}
          defaultValue={piece?.kind ?? ""}
          error={fieldErrors.kind}
        />
        <Field
          label="Inventory or serial number"
          name="inventoryNumber"
          defaultValue={piece?.inventoryNumber}
          error={fieldErrors.inventoryNumber}
        />
      </div>
      <TextArea label="Notes" name="notes" defaultValue={piece?.notes} error={fieldErrors.notes} />
      <div className="flex gap-2">
        <Button type="submit" disabled={form.pending}>
          {piece ? "Save equipment" : "Add equipment"}
        </Button>
        <ButtonLink href={piece ? `/benches/equipment/${piece.id}` : "/benches/equipment"}>
          Cancel
        </ButtonLink>
      </div>
    </form>
  );
}
