"use client";

import { useState } from "react";
import { ActionButton } from "@/components/ui/action-button";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { TextArea } from "@/components/ui/text-area";
import { useActionForm } from "@/components/ui/use-action-form";
import type { Acceptance } from "@/lib/core/delta/delta";
import { NEVER_ACCEPTED } from "@/lib/core/delta/find-mismatches";
import type { AcceptanceActions, RungDelta } from "./rung-types";

interface AcceptanceProps {
  delta: RungDelta;
  /** null for who may only read. */
  actions: AcceptanceActions | null;
}

/** What forbids a delta or was accepted, with the reason, and the way to accept it. */
export function MismatchNote({ delta, actions }: AcceptanceProps) {
  const { mismatches, accepted } = delta;
  if (mismatches.length === 0) return null;
  return (
    <div className="border-l-4 border-shoal bg-shoal-bed px-3 py-2">
      <p className="font-medium">
        {accepted ? "Compared although something differs" : "Not comparable"}: {delta.beforeName}{" "}
        and {delta.afterName}
      </p>
      <ul className="list-disc pl-5 text-sm">
        {mismatches.map((mismatch) => (
          <li key={mismatch.text}>{mismatch.text}</li>
        ))}
      </ul>
      {accepted ? (
        <Accepted accepted={accepted} actions={actions} />
      ) : actions ? (
        <Accept delta={delta} accept={actions.accept} />
      ) : null}
    </div>
  );
}

function Accepted(props: { accepted: Acceptance; actions: AcceptanceActions | null }) {
  const { accepted, actions } = props;
  return (
    <>
      <p className="mt-2 text-sm">
        Accepted by {accepted.by} on{" "}
        <time dateTime={accepted.at} title={accepted.at}>
          {accepted.at.slice(0, 10)}
        </time>
        : {accepted.reason}
      </p>
      {actions ? (
        <div className="mt-2 print:hidden">
          <ActionButton action={() => actions.withdraw(accepted.id)}>
            Take the acceptance back
          </ActionButton>
        </div>
      ) : null}
    </>
  );
}

function Accept({ delta, accept }: { delta: RungDelta; accept: AcceptanceActions["accept"] }) {
  const [isOpen, setOpen] = useState(false);
  const form = useActionForm({
    action: accept,
    read: (data): unknown => ({
      beforeSweepId: delta.beforeId,
      afterSweepId: delta.afterId,
      fields: [...new Set(delta.mismatches.map((mismatch) => mismatch.field))],
      reason: data.get("reason"),
    }),
    onDone: () => setOpen(false),
  });
  if (delta.mismatches.some(({ field }) => NEVER_ACCEPTED.has(field)))
    return (
      <p className="mt-2 text-sm">
        No reason makes these comparable: the difference would mean nothing.
      </p>
    );
  if (!isOpen)
    return (
      <div className="mt-2 print:hidden">
        <Button look="quiet" onClick={() => setOpen(true)}>
          Accept with a reason
        </Button>
      </div>
    );
  return (
    <form onSubmit={form.onSubmit} method="post" className="mt-3 max-w-md print:hidden">
      <ErrorNote message={form.message} />
      <TextArea
        label="Why they may be compared all the same"
        name="reason"
        hint="It stands beside the delta wherever it shows, with your name. What differs later is not accepted by it."
        error={form.fieldErrors.reason}
      />
      <div className="flex flex-wrap gap-2">
        <Button type="submit" disabled={form.pending}>
          Accept
        </Button>
        <Button look="quiet" onClick={() => setOpen(false)}>
          Leave it
        </Button>
      </div>
    </form>
  );
}
