import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { SelectField } from "@/components/ui/select-field";
import { PROVENANCES } from "@/lib/core/mask/mask";
import { PORTS } from "@/lib/core/sweep/settings";
import type { MaskFilter } from "./filter-masks";
import { PORT_LABELS, PROVENANCE_LABELS } from "./mask-words";

const PORT_OPTIONS = [
  { value: "", label: "Every port" },
  ...PORTS.map((port) => ({ value: port, label: PORT_LABELS[port] })),
];
const PROVENANCE_OPTIONS = [
  { value: "", label: "Every provenance" },
  ...PROVENANCES.map((value) => ({
    value,
    // A mask that was confirmed is the team's word from then on.
    label: value === "team" ? "the team's own, or confirmed by it" : PROVENANCE_LABELS[value],
  })),
];

/** A plain form that asks by its address, so that a filtered library can be linked to. */
export function MaskFilterForm({ filter }: { filter: MaskFilter }) {
  return (
    <form
      method="get"
      action="/masks"
      role="search"
      aria-label="Masks"
      className="mb-2 grid items-end gap-x-4 sm:grid-cols-2 lg:grid-cols-[1fr_12rem_16rem_auto]"
    >
      <Field label="Search" name="text" type="search" defaultValue={filter.text} />
      <SelectField
        label="Port"
        name="port"
        options={PORT_OPTIONS}
        defaultValue={filter.port ?? ""}
      />
      <SelectField
        label="Provenance"
        name="provenance"
        options={PROVENANCE_OPTIONS}
        defaultValue={filter.provenance ?? ""}
      />
      {filter.archived ? <input type="hidden" name="archived" value="1" /> : null}
      <div className="mb-4">
        <Button type="submit" look="quiet">
          Filter
        </Button>
      </div>
    </form>
  );
}
