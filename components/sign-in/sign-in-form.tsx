"use client";

import { signIn } from "next-auth/react";
import { useRouter } from "next/navigation";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { useActionForm } from "@/components/ui/use-action-form";

async function trySignIn(input: { email: string; password: string }) {
  const answer = await signIn("credentials", { ...input, redirect: false });
  if (answer?.ok) return { ok: true as const, data: null };
  const message =
    answer?.error === "too-many-tries"
      ? "Too many tries. Wait some minutes and try again."
      : "The address or the password is not right, or the account is no longer active.";
  return { ok: false as const, message, fieldErrors: {} };
}

export function SignInForm() {
  const router = useRouter();
  const form = useActionForm({
    action: trySignIn,
    read: (data) => ({ email: String(data.get("email")), password: String(data.get("password")) }),
    onDone: () => {
      router.push("/");
      router.refresh();
    },
  });
  return (
    <form onSubmit={form.onSubmit} method="post">
      <ErrorNote message={form.message} />
      <Field label="E-mail" name="email" type="email" autoComplete="username" required />
      <Field
        label="Password"
        name="password"
        type="password"
        autoComplete="current-password"
        required
      />
      <Button type="submit" disabled={form.pending}>
        Sign in
      </Button>
    </form>
  );
}
