"use client";

import { ConfirmButton } from "@/components/ui/confirm-button";

type Act = (input: unknown) => Promise<{ ok: true } | { ok: false; message: string }>;

interface EquipmentArchiveButtonProps {
  piece: { id: string; name: string; archived: boolean };
  archive: Act;
  restore: Act;
}

/** Takes a piece of equipment off the list, or puts it back. */
export function EquipmentArchiveButton({ piece, archive, restore }: EquipmentArchiveButtonProps) {
  return piece.archived ? (
    <ConfirmButton
      label="Restore"
      title={`Restore ${piece.name}?`}
      confirmLabel="Restore equipment"
      action={() => restore({ equipmentId: piece.id })}
    >
      <p>It stands on the list again, and its due date counts again.</p>
    </ConfirmButton>
  ) : (
    <ConfirmButton
      label="Archive"
      title={`Archive ${piece.name}?`}
      confirmLabel="Archive equipment"
      action={() => archive({ equipmentId: piece.id })}
    >
      <p>
        It leaves the list and no longer counts as overdue. Its calibrations and certificates stay,
        and it can be restored.
      </p>
    </ConfirmButton>
  );
}
