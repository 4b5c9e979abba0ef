import { Button, ButtonLink } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { SelectField } from "@/components/ui/select-field";
import { SUSPECT_STATES } from "@/lib/core/reading/suspect-state";

interface SuspectFilterFormProps {
  programId: string;
  owners: { id: string; name: string }[];
  /** As typed. */
  state: string;
  owner: string;
  from: string;
  to: string;
  errors: { from?: string | undefined; to?: string | undefined };
  isFiltered: boolean;
}

/** A plain form that goes to the same page with the filter in its address. */
export function SuspectFilterForm(props: SuspectFilterFormProps) {
  const { programId, owners, state, owner, from, to, errors, isFiltered } = props;
  return (
    <form
      method="get"
      action="/suspects"
      role="search"
      aria-label="Suspects"
      className="mb-2 grid grid-cols-2 items-start gap-x-4 lg:grid-cols-[12rem_14rem_1fr_1fr_auto]"
    >
      <input type="hidden" name="program" value={programId} />
      <SelectField
        label="State"
        name="state"
        defaultValue={state}
        options={[
          { value: "", label: "Every state" },
          ...SUSPECT_STATES.map((value) => ({ value, label: value })),
        ]}
      />
      <SelectField
        label="Owner"
        name="owner"
        defaultValue={owner}
        options={[
          { value: "", label: "Everybody" },
          { value: "nobody", label: "Nobody yet" },
          ...owners.map(({ id, name }) => ({ value: id, label: name })),
        ]}
      />
      <Field
        label="From"
        name="from"
        placeholder="30 MHz"
        defaultValue={from}
        error={errors.from}
      />
      <Field label="To" name="to" placeholder="300 MHz" defaultValue={to} error={errors.to} />
      <div className="col-span-2 mb-4 flex gap-2 lg:col-span-1 lg:mt-7">
        <Button type="submit" look="quiet">
          Filter
        </Button>
        {isFiltered ? (
          <ButtonLink href={`/suspects?program=${programId}`}>Clear filters</ButtonLink>
        ) : null}
      </div>
    </form>
  );
}
