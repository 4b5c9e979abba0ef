"use client";

import type { ReactNode } from "react";
import { useId, useRef, useState } from "react";
import { Button } from "./button";
import { ErrorNote } from "./error-note";

interface ConfirmButtonProps {
  label: string;
  title: string;
  children: ReactNode;
  confirmLabel: string;
  action: () => Promise<{ ok: true } | { ok: false; message: string }>;
  onDone?: () => void;
}

/** A button that asks once more in a dialog, says what will happen, and shows the server's refusal. */
export function ConfirmButton(props: ConfirmButtonProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const titleId = useId();
  const [pending, setPending] = useState(false);
  const [message, setMessage] = useState<string | null>(null);

  async function confirm() {
    setPending(true);
    setMessage(null);
    try {
      const outcome = await props.action();
      if (!outcome.ok) return setMessage(outcome.message);
      dialog.current?.close();
      props.onDone?.();
    } catch {
      setMessage("Neap could not be reached; nothing was changed. Check the connection.");
    } finally {
      setPending(false);
    }
  }

  return (
    <>
      <Button look="quiet" onClick={() => dialog.current?.showModal()}>
        {props.label}
      </Button>
      <dialog
        ref={dialog}
        aria-labelledby={titleId}
        className="m-auto max-w-lg border border-rule bg-sheet p-6 text-ink backdrop:bg-black/50"
      >
        <h2 id={titleId} className="mb-3 text-xl">
          {props.title}
        </h2>
        <ErrorNote message={message} />
        <div className="mb-5">{props.children}</div>
        <div className="flex justify-end gap-2">
          <Button look="quiet" onClick={() => dialog.current?.close()}>
            Keep as it is
          </Button>
          <Button disabled={pending} onClick={confirm}>
            {props.confirmLabel}
          </Button>
        </div>
      </dialog>
    </>
  );
}
