import type { Provenance } from "@/lib/core/mask/mask";
import type { Confirmation } from "./mask-words";
import { confirmationWords, PROVENANCE_LABELS, PROVENANCE_MARKS } from "./mask-words";
import { UnconfirmedMark } from "./unconfirmed-mark";

interface ProvenanceMarkProps {
  provenance: Provenance;
  confirmation?: Confirmation | null;
}

/** Where the limits come from in a few words, and the whole of it on hover. */
export function ProvenanceMark({ provenance, confirmation }: ProvenanceMarkProps) {
  if (provenance === "from memory") return <UnconfirmedMark provenance={provenance} />;
  if (confirmation)
    return (
      <span title={confirmationWords(confirmation)}>
        confirmed by {confirmation.by}, {confirmation.at.toISOString().slice(0, 10)}
      </span>
    );
  return <span title={PROVENANCE_LABELS[provenance]}>{PROVENANCE_MARKS[provenance]}</span>;
}
