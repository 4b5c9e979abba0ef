"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import { ConfirmButton } from "@/components/ui/confirm-button";
import { ErrorNote } from "@/components/ui/error-note";

type Outcome = { ok: true; data: { maskId: string } } | { ok: false; message: string };

interface CopyMaskButtonProps {
  maskId: string;
  copy: (input: unknown) => Promise<Outcome>;
}

/** Copies a mask into one of the team's own and opens it for editing. */
export function CopyMaskButton({ maskId, copy }: CopyMaskButtonProps) {
  const router = useRouter();
  const [pending, setPending] = useState(false);
  const [message, setMessage] = useState<string | null>(null);

  async function run() {
    setPending(true);
    setMessage(null);
    try {
      const outcome = await copy({ maskId });
      if (outcome.ok) router.push(`/masks/${outcome.data.maskId}/edit`);
      else setMessage(outcome.message);
    } catch {
      setMessage("Neap could not be reached; nothing was copied. Check the connection.");
    } finally {
      setPending(false);
    }
  }

  return (
    <>
      <Button look="quiet" disabled={pending} onClick={() => void run()}>
        Copy
      </Button>
      <ErrorNote message={message} />
    </>
  );
}

interface MaskArchiveButtonProps {
  mask: { id: string; title: string; archived: boolean };
  archive: (input: unknown) => Promise<Outcome>;
  restore: (input: unknown) => Promise<Outcome>;
}

/** Takes a mask off the library, or puts it back; both can be undone by the other. */
export function MaskArchiveButton({ mask, archive, restore }: MaskArchiveButtonProps) {
  return mask.archived ? (
    <ConfirmButton
      label="Restore"
      title={`Restore ${mask.title}?`}
      confirmLabel="Restore mask"
      action={() => restore({ maskId: mask.id })}
    >
      <p>The mask stands in the library again.</p>
    </ConfirmButton>
  ) : (
    <ConfirmButton
      label="Archive"
      title={`Archive ${mask.title}?`}
      confirmLabel="Archive mask"
      action={() => archive({ maskId: mask.id })}
    >
      <p>
        The mask leaves the library. Its revisions and the readings made with them stay as they are,
        and it can be restored.
      </p>
    </ConfirmButton>
  );
}
