"use client";

import { Field } from "@/components/ui/field";
import { SelectField } from "@/components/ui/select-field";
import { PROVENANCES } from "@/lib/core/mask/mask";
import { PORTS } from "@/lib/core/sweep/settings";
import { LEVEL_UNIT_LABELS, LEVEL_UNITS } from "@/lib/core/units/level-units";
import { FREQUENCY_UNITS } from "./mask-draft";
import { PORT_LABELS, PROVENANCE_LABELS } from "./mask-words";

/** What a CSV may leave open, as the command names it. */
export const ANSWERS = ["title", "port", "unit", "frequencyUnit", "provenance"] as const;

const OPEN = { value: "", label: "as the file says" };
const SELECTS = [
  {
    name: "port",
    label: "Port",
    options: PORTS.map((value) => ({ value, label: PORT_LABELS[value] })),
  },
  {
    name: "unit",
    label: "Unit of the limit",
    options: LEVEL_UNITS.filter((unit) => unit !== "dB").map((value) => ({
      value,
      label: LEVEL_UNIT_LABELS[value],
    })),
  },
  {
    name: "frequencyUnit",
    label: "Unit of the frequencies",
    options: FREQUENCY_UNITS.map((value) => ({ value, label: value })),
  },
  {
    name: "provenance",
    label: "Where the numbers come from",
    options: PROVENANCES.map((value) => ({ value, label: PROVENANCE_LABELS[value] })),
  },
] as const;

/** Asked beside a CSV; what the file itself says counts before it. */
export function MaskFileAnswers({ fieldErrors }: { fieldErrors: Record<string, string> }) {
  return (
    <fieldset className="mb-4 min-w-0 border border-rule bg-sheet px-4 pt-2">
      <legend className="px-2">Where the table does not say it itself</legend>
      <div className="grid gap-x-4 sm:grid-cols-2">
        <Field label="Title" name="title" error={fieldErrors["title"]} />
        {SELECTS.map(({ name, label, options }) => (
          <SelectField
            key={name}
            label={label}
            name={name}
            options={[OPEN, ...options]}
            error={fieldErrors[name]}
          />
        ))}
      </div>
    </fieldset>
  );
}
