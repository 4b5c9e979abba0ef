/** What the mark means, for whoever meets it first in a table. */
const MEANING =
  "The limits of this mask were written down from memory, and nobody of the team has compared them with the document yet. A reading under them is no firmer than that.";

/**
 * Stands beside everything that was read under a mask from memory, and is nothing beside another.
 * It says so in words, so that it is not told by the tint alone.
 */
export function UnconfirmedMark({ provenance }: { provenance: string }) {
  if (provenance !== "from memory") return null;
  return (
    <span
      title={MEANING}
      className="bg-shoal-bed box-decoration-clone px-1 text-sm font-normal text-shoal"
    >
      from memory, not confirmed
    </span>
  );
}
