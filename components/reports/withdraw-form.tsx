"use client";

import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { useActionForm } from "@/components/ui/use-action-form";

type Outcome =
  | { ok: true; data: { reportId: string } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

interface WithdrawFormProps {
  reportId: string;
  action: (input: unknown) => Promise<Outcome>;
}

/** Withdrawing cannot be undone, so it asks for the reason that the PDF will print. */
export function WithdrawForm({ reportId, action }: WithdrawFormProps) {
  const form = useActionForm({
    action,
    read: (data): unknown => ({ reportId, reason: data.get("reason") }),
    onDone: () => undefined,
  });
  return (
    <form onSubmit={form.onSubmit} method="post" className="max-w-md">
      <ErrorNote message={form.message} />
      <Field
        label="Reason"
        name="reason"
        hint="Every page of the PDF will say it. Withdrawing cannot be undone."
        error={form.fieldErrors.reason}
      />
      <Button type="submit" look="quiet" disabled={form.pending}>
        Withdraw report
      </Button>
    </form>
  );
}
