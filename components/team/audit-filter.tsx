import { Button, ButtonLink } from "@/components/ui/button";
import { SelectField } from "@/components/ui/select-field";
import { describeAction } from "./describe-event";

interface AuditFilterProps {
  choices: { actions: string[]; people: { id: string; name: string }[] };
  action: string | undefined;
  actorId: string | undefined;
}

/** A plain form that goes to the same page with the filter in its address. */
export function AuditFilter({ choices, action, actorId }: AuditFilterProps) {
  return (
    <form method="get" action="/team/audit" className="mb-2 flex flex-wrap items-end gap-x-4">
      <div className="w-64">
        <SelectField
          key={action ?? ""}
          label="Action"
          name="action"
          defaultValue={action ?? ""}
          options={[
            { value: "", label: "Every action" },
            ...choices.actions.map((value) => ({ value, label: describeAction(value) })),
          ]}
        />
      </div>
      <div className="w-64">
        <SelectField
          key={actorId ?? ""}
          label="Person"
          name="person"
          defaultValue={actorId ?? ""}
          options={[
            { value: "", label: "Everybody" },
            ...choices.people.map(({ id, name }) => ({ value: id, label: name })),
          ]}
        />
      </div>
      <div className="mb-4 flex gap-2">
        <Button type="submit" look="quiet">
          Filter
        </Button>
        {(action ?? actorId) ? <ButtonLink href="/team/audit">Clear filters</ButtonLink> : null}
      </div>
    </form>
  );
}
