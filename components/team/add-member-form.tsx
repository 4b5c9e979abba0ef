"use client";

import { useRef, useState } from "react";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { SelectField } from "@/components/ui/select-field";
import { StatusNote } from "@/components/ui/status-note";
import { useActionForm } from "@/components/ui/use-action-form";
import { ROLE_OPTIONS } from "./role-options";

type Outcome =
  | { ok: true; data: { name: string; hadAccount: boolean } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

export function AddMemberForm({ action }: { action: (input: unknown) => Promise<Outcome> }) {
  const element = useRef<HTMLFormElement>(null);
  const [done, setDone] = useState<string | null>(null);
  const form = useActionForm({
    action,
    read: (data): unknown => {
      setDone(null);
      return Object.fromEntries(data);
    },
    onDone: ({ name, hadAccount }) => {
      setDone(
        hadAccount
          ? `${name} is a member now. There was an account for this address already: its name and password stay as they were, and the one you wrote was not used.`
          : `${name} is a member now. Hand over the first password; Neap sends no e-mail.`,
      );
      element.current?.reset();
    },
  });
  const { fieldErrors } = form;
  return (
    <form ref={element} onSubmit={form.onSubmit} method="post" className="max-w-3xl">
      <ErrorNote message={form.message} />
      <StatusNote message={done} />
      <div className="grid gap-x-5 sm:grid-cols-2">
        <Field label="Name" name="name" autoComplete="off" error={fieldErrors.name} />
        <Field
          label="E-mail"
          name="email"
          type="email"
          autoComplete="off"
          hint="Used to sign in. Neap sends no e-mail to it."
          error={fieldErrors.email}
        />
        <SelectField
          label="Role"
          name="role"
          defaultValue="engineer"
          options={ROLE_OPTIONS}
          error={fieldErrors.role}
        />
        <Field
          label="First password"
          name="password"
          autoComplete="off"
          spellCheck={false}
          className="font-mono"
          hint="At least 12 characters. You hand it over yourself, and the person changes it under Account."
          error={fieldErrors.password}
        />
      </div>
      <Button type="submit" disabled={form.pending}>
        Add member
      </Button>
    </form>
  );
}
