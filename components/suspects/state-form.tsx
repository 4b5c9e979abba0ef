"use client";

import { useRef } from "react";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { SelectField } from "@/components/ui/select-field";
import { TextArea } from "@/components/ui/text-area";
import { useActionForm } from "@/components/ui/use-action-form";
import type { SuspectState } from "@/lib/core/reading/suspect-state";
import { SUSPECT_STATES } from "@/lib/core/reading/suspect-state";
import type { Outcome } from "./outcome";

interface StateFormProps {
  suspectId: string;
  state: SuspectState;
  action: (input: unknown) => Promise<Outcome>;
}

/** Moves a suspect to another state, with its reason. */
export function StateForm({ suspectId, state, action }: StateFormProps) {
  const element = useRef<HTMLFormElement>(null);
  const form = useActionForm({
    action,
    read: (data): unknown => ({ suspectId, state: data.get("state"), note: data.get("note") }),
    onDone: () => element.current?.reset(),
  });
  const { fieldErrors } = form;
  const others = SUSPECT_STATES.filter((one) => one !== state);
  return (
    <form key={state} ref={element} onSubmit={form.onSubmit} method="post">
      <ErrorNote message={form.message} />
      <SelectField
        label={`State: ${state} now`}
        name="state"
        options={others.map((value) => ({ value, label: value }))}
        error={fieldErrors.state}
      />
      <TextArea
        label="Why"
        name="note"
        rows={2}
        hint="Needed for explained and accepted."
        error={fieldErrors.note}
      />
      <Button type="submit" look="quiet" disabled={form.pending}>
        Change the state
      </Button>
    </form>
  );
}
