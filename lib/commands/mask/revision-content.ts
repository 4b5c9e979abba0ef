import { isDeepStrictEqual } from "node:util";
import type { Mask } from "@/lib/core/mask/mask";
import { CommandError } from "../result";

interface RevisedMask {
  mask: { key: string; origin: "shipped" | "team"; archivedAt: Date | null };
  current: { revision: number; content: Mask };
}

/** What the next revision of a mask would hold, or the reason why there can be none. */
export function revisionContent(
  { mask, current }: RevisedMask,
  typed: Mask,
  basedOnRevision: number | undefined,
): Mask {
  if (mask.origin === "shipped") {
    throw new CommandError(
      "conflict",
      "Masks shipped with Neap are never edited. Copy it first, and edit the copy.",
    );
  }
  if (mask.archivedAt !== null) {
    throw new CommandError("conflict", "This mask is archived: restore it before changing it.");
  }
  if (basedOnRevision !== undefined && current.revision !== basedOnRevision) {
    throw new CommandError(
      "conflict",
      `Revision ${current.revision} was saved while you were editing revision ${basedOnRevision}. Open the mask in another tab, compare, and carry your change over.`,
    );
  }
  const content = { ...typed, key: mask.key };
  if (isDeepStrictEqual(current.content, content)) {
    throw new CommandError("conflict", "Nothing differs from the current revision.");
  }
  const wasFromMemory = current.content.provenance === "from memory";
  if (wasFromMemory && content.provenance !== "from memory") {
    throw new CommandError("invalid", "Limits from memory are not made firm by an edit.", {
      provenance:
        "Save it as from memory, and confirm it against your own copy then: who, when and which copy are kept.",
    });
  }
  return content;
}
