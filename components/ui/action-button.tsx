"use client";

import { useState } from "react";
import { Button } from "./button";

interface ActionButtonProps {
  children: string;
  action: () => Promise<{ ok: true } | { ok: false; message: string }>;
  look?: "primary" | "quiet";
}

/** A button that runs a reversible action at once; a refusal stands beside it. */
export function ActionButton({ children, action, look = "quiet" }: ActionButtonProps) {
  const [pending, setPending] = useState(false);
  const [message, setMessage] = useState<string | null>(null);

  async function run() {
    setPending(true);
    setMessage(null);
    try {
      const outcome = await action();
      if (!outcome.ok) setMessage(outcome.message);
    } catch {
      setMessage("Neap could not be reached; nothing was changed. Check the connection.");
    } finally {
      setPending(false);
    }
  }

  return (
    <span className="inline-flex flex-wrap items-center gap-2">
      <Button look={look} disabled={pending} onClick={() => void run()}>
        {children}
      </Button>
      <span role="alert" className="text-sm text-aground">
        {message}
      </span>
    </span>
  );
}
