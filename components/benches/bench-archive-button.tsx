"use client";

import { ConfirmButton } from "@/components/ui/confirm-button";

interface BenchArchiveButtonProps {
  bench: { id: string; name: string; archived: boolean };
  archive: (input: unknown) => Promise<{ ok: true } | { ok: false; message: string }>;
  restore: (input: unknown) => Promise<{ ok: true } | { ok: false; message: string }>;
}

/** Takes a bench off the list, or puts it back; both can be undone by the other. */
export function BenchArchiveButton({ bench, archive, restore }: BenchArchiveButtonProps) {
  return bench.archived ? (
    <ConfirmButton
      label="Restore"
      title={`Restore ${bench.name}?`}
      confirmLabel="Restore bench"
      action={() => restore({ benchId: bench.id })}
    >
      <p>The bench stands on the list again and may be used for new sweeps.</p>
    </ConfirmButton>
  ) : (
    <ConfirmButton
      label="Archive"
      title={`Archive ${bench.name}?`}
      confirmLabel="Archive bench"
      action={() => archive({ benchId: bench.id })}
    >
      <p>
        The bench leaves the list. Its sweeps and the revisions of its signal path stay as they are,
        and it can be restored.
      </p>
    </ConfirmButton>
  );
}
