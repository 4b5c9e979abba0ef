"use client";

import type { FormEvent } from "react";
import { useEffect, useRef, useState } from "react";

interface Refusal {
  ok: false;
  message: string;
  fieldErrors: Record<string, string>;
}
type Outcome<T> = { ok: true; data: T } | Refusal;

/**
 * Sends a form through a server action and keeps what was typed when it is refused.
 * `read` turns the form's values into the command's input.
 */
export function useActionForm<I, T>(options: {
  action: (input: I) => Promise<Outcome<T>>;
  read: (form: FormData) => I;
  onDone: (data: T) => void;
}) {
  const [pending, setPending] = useState(false);
  const [refusal, setRefusal] = useState<Refusal | null>(null);
  const lastFocus = useRef<Element | null>(null);

  // A button that is disabled while it waits loses the focus, which would start over at the top.
  useEffect(() => {
    const was = lastFocus.current;
    if (pending || document.activeElement !== document.body) return;
    if (was instanceof HTMLElement && was.isConnected) was.focus({ preventScroll: true });
  }, [pending]);

  async function onSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    lastFocus.current = document.activeElement;
    setPending(true);
    setRefusal(null);
    try {
      const outcome = await options.action(options.read(new FormData(form)));
      if (outcome.ok) return options.onDone(outcome.data);
      setRefusal(outcome);
      const first = Object.keys(outcome.fieldErrors)[0];
      const field = first ? form.elements.namedItem(first) : null;
      if (field instanceof HTMLElement) field.focus();
    } catch {
      const message = "Neap could not be reached; nothing was stored. Check the connection.";
      setRefusal({ ok: false, message, fieldErrors: {} });
    } finally {
      setPending(false);
    }
  }

  return {
    onSubmit,
    pending,
    message: refusal?.message ?? null,
    fieldErrors: refusal?.fieldErrors ?? {},
  };
}
