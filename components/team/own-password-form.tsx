"use client";

import { useRef, useState } from "react";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { StatusNote } from "@/components/ui/status-note";
import { useActionForm } from "@/components/ui/use-action-form";

type Outcome =
  { ok: true; data: unknown } | { ok: false; message: string; fieldErrors: Record<string, string> };

interface OwnPasswordFormProps {
  /** For password managers, which keep a password under its address. */
  email: string;
  action: (input: unknown) => Promise<Outcome>;
}

export function OwnPasswordForm({ email, action }: OwnPasswordFormProps) {
  const element = useRef<HTMLFormElement>(null);
  const [done, setDone] = useState<string | null>(null);
  const form = useActionForm({
    action,
    read: (data): unknown => {
      setDone(null);
      return {
        currentPassword: data.get("currentPassword"),
        newPassword: data.get("newPassword"),
        repeated: data.get("repeated"),
      };
    },
    onDone: () => {
      setDone("Your password is changed. Use the new one from the next time you sign in.");
      element.current?.reset();
    },
  });
  const { fieldErrors } = form;
  return (
    <form ref={element} onSubmit={form.onSubmit} method="post" className="max-w-md">
      <ErrorNote message={form.message} />
      <StatusNote message={done} />
      <input type="text" name="username" autoComplete="username" value={email} readOnly hidden />
      <Field
        label="Current password"
        name="currentPassword"
        type="password"
        autoComplete="current-password"
        error={fieldErrors.currentPassword}
      />
      <Field
        label="New password"
        name="newPassword"
        type="password"
        autoComplete="new-password"
        hint="At least 12 characters."
        error={fieldErrors.newPassword}
      />
      <Field
        label="New password again"
        name="repeated"
        type="password"
        autoComplete="new-password"
        error={fieldErrors.repeated}
      />
      <Button type="submit" disabled={form.pending}>
        Change password
      </Button>
    </form>
  );
}
