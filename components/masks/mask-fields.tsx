"use client";

import { Field } from "@/components/ui/field";
import { SelectField } from "@/components/ui/select-field";
import { TextArea } from "@/components/ui/text-area";
import { PROVENANCES } from "@/lib/core/mask/mask";
import { PORTS } from "@/lib/core/sweep/settings";
import { LEVEL_UNIT_LABELS, LEVEL_UNITS } from "@/lib/core/units/level-units";
import type { MaskDraft } from "./mask-draft";
import { FREQUENCY_UNITS } from "./mask-draft";
import { PORT_LABELS, PROVENANCE_LABELS } from "./mask-words";

const CHOOSE = { value: "", label: "Choose…" };
const PORT_OPTIONS = [CHOOSE, ...PORTS.map((value) => ({ value, label: PORT_LABELS[value] }))];
// Relative dB is no unit for a limit.
const UNITS = LEVEL_UNITS.filter((unit) => unit !== "dB");
const UNIT_OPTIONS = [
  CHOOSE,
  ...UNITS.map((value) => ({ value, label: LEVEL_UNIT_LABELS[value] })),
];
const PROVENANCE_OPTIONS = PROVENANCES.map((value) => ({
  value,
  label: PROVENANCE_LABELS[value],
}));
const FREQUENCY_OPTIONS = FREQUENCY_UNITS.map((value) => ({ value, label: value }));

interface MaskFieldsProps {
  draft: MaskDraft;
  errorAt: (path: string) => string | undefined;
  onPatch: (change: Partial<Omit<MaskDraft, "lines">>) => void;
}

/** What a mask is and where its numbers come from. */
export function MaskFields({ draft, errorAt, onPatch }: MaskFieldsProps) {
  return (
    <div className="grid gap-x-4 sm:grid-cols-2 lg:grid-cols-4">
      <Field
        label="Title"
        name="title"
        value={draft.title}
        onChange={(event) => onPatch({ title: event.target.value })}
        error={errorAt("title")}
      />
      <SelectField
        label="Port"
        name="port"
        options={PORT_OPTIONS}
        value={draft.port}
        onChange={(event) =>
          onPatch({ port: PORTS.find((port) => port === event.target.value) ?? "" })
        }
        error={errorAt("port")}
      />
      <SelectField
        label="Unit of the limit"
        name="unit"
        options={UNIT_OPTIONS}
        value={draft.unit}
        onChange={(event) =>
          onPatch({ unit: UNITS.find((unit) => unit === event.target.value) ?? "" })
        }
        error={errorAt("unit")}
      />
      <Field
        label="Measuring distance in m"
        name="distanceM"
        inputMode="decimal"
        hint="For radiated limits; empty otherwise."
        value={draft.distance}
        onChange={(event) => onPatch({ distance: event.target.value })}
        error={errorAt("distanceM")}
      />
      <Field
        label="Document"
        name="document"
        value={draft.document}
        onChange={(event) => onPatch({ document: event.target.value })}
        error={errorAt("document")}
      />
      <Field
        label="Clause"
        name="clause"
        value={draft.clause}
        onChange={(event) => onPatch({ clause: event.target.value })}
        error={errorAt("clause")}
      />
      <Field
        label="Edition"
        name="edition"
        value={draft.edition}
        onChange={(event) => onPatch({ edition: event.target.value })}
        error={errorAt("edition")}
      />
      <SelectField
        label="Where the numbers come from"
        name="provenance"
        options={PROVENANCE_OPTIONS}
        value={draft.provenance}
        onChange={(event) =>
          onPatch({ provenance: PROVENANCES.find((p) => p === event.target.value) ?? "team" })
        }
        error={errorAt("provenance")}
      />
      <div className="sm:col-span-2 lg:col-span-3">
        <TextArea
          label="Note"
          rows={2}
          name="note"
          value={draft.note}
          onChange={(event) => onPatch({ note: event.target.value })}
          error={errorAt("note")}
        />
      </div>
      <SelectField
        label="Plain numbers are in"
        name="frequencyUnit"
        hint="For frequencies typed without a unit; each is shown with its unit when you leave it."
        options={FREQUENCY_OPTIONS}
        value={draft.frequencyUnit}
        onChange={(event) => onPatch({ frequencyUnit: event.target.value })}
      />
    </div>
  );
}
