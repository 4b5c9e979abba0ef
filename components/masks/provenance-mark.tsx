import type { Provenance } from "@/lib/core/mask/mask";
import { PROVENANCE_LABELS } from "./mask-words";

/** The provenance in words; one from memory is tinted as well, since nobody has looked it up. */
export function ProvenanceMark({ provenance }: { provenance: Provenance }) {
  return (
    <span className={provenance === "from memory" ? "bg-shoal-bed px-1 text-shoal" : ""}>
      {PROVENANCE_LABELS[provenance]}
    </span>
  );
}
