import type { Provenance } from "@/lib/core/mask/mask";
import { PROVENANCE_LABELS, PROVENANCE_MARKS } from "./mask-words";

/**
 * The provenance in two or three words, the whole of it on hover; one from memory is tinted as
 * well, since nobody has looked it up.
 */
export function ProvenanceMark({ provenance }: { provenance: Provenance }) {
  return (
    <span
      title={PROVENANCE_LABELS[provenance]}
      className={`whitespace-nowrap ${provenance === "from memory" ? "bg-shoal-bed px-1 text-shoal" : ""}`}
    >
      {PROVENANCE_MARKS[provenance]}
    </span>
  );
}
