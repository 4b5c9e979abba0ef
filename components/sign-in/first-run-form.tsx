"use client";

import { useRouter } from "next/navigation";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { useActionForm } from "@/components/ui/use-action-form";

type Outcome =
  | { ok: true; data: { teamId: string } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

export function FirstRunForm({ action }: { action: (input: unknown) => Promise<Outcome> }) {
  const router = useRouter();
  const form = useActionForm({
    action,
    read: (data): unknown => Object.fromEntries(data),
    onDone: () => router.push("/sign-in"),
  });
  const { fieldErrors } = form;
  return (
    <form onSubmit={form.onSubmit} method="post">
      <ErrorNote message={form.message} />
      <Field label="Team" name="teamName" error={fieldErrors.teamName} required />
      <Field label="Your name" name="name" autoComplete="name" error={fieldErrors.name} required />
      <Field
        label="E-mail"
        name="email"
        type="email"
        autoComplete="username"
        error={fieldErrors.email}
        required
      />
      <Field
        label="Password"
        name="password"
        type="password"
        autoComplete="new-password"
        hint="At least 10 characters."
        error={fieldErrors.password}
        required
      />
      <Button type="submit" disabled={form.pending}>
        Make the team
      </Button>
    </form>
  );
}
