"use client";

import { useRouter } from "next/navigation";
import { ConfirmButton } from "@/components/ui/confirm-button";

interface ArchiveCheckButtonProps {
  check: { id: string; benchId: string; isReference: boolean };
  archive: (input: unknown) => Promise<{ ok: true } | { ok: false; message: string }>;
}

/** Puts a check aside for good; says what that means before. */
export function ArchiveCheckButton({ check, archive }: ArchiveCheckButtonProps) {
  const router = useRouter();
  return (
    <ConfirmButton
      label="Archive"
      title={check.isReference ? "Archive this reference?" : "Archive this check?"}
      confirmLabel={check.isReference ? "Archive reference" : "Archive check"}
      action={() => archive({ checkId: check.id })}
      onDone={() => router.push(`/benches/${check.benchId}/checks`)}
    >
      <p>
        {check.isReference
          ? "Later checks are no longer compared with it. Checks that were keep the drift they found, and say that their reference was archived."
          : "It leaves the drift chart and says nothing about its day any more."}{" "}
        It stays readable under the archived checks and cannot be brought back; the file can be
        recorded again.
      </p>
    </ConfirmButton>
  );
}
