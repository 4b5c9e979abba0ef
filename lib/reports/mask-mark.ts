import type { Provenance } from "@/lib/core/mask/mask";
import type { SnapshotConfirmation } from "./report-content";

/** "confirmed by A on 2026-12-01 against …". */
function confirmedWords({ by, at, copy }: SnapshotConfirmation): string {
  const against = copy.trim() === "" ? "" : ` against ${copy.trim()}`;
  return `confirmed by ${by} on ${at.slice(0, 10)}${against}`;
}

/** What stands beside a mask wherever a margin under it is shown; null when nothing has to. */
export function markOfMask(
  provenance: Provenance,
  confirmation: SnapshotConfirmation | null,
): string | null {
  if (confirmation) return confirmedWords(confirmation);
  return provenance === "from memory" ? "from memory, not confirmed" : null;
}
