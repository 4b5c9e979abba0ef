import type { SuspectRow } from "@/components/suspects/suspect-list";
import type { SuspectSummary } from "@/lib/queries/suspect/list-suspects";

function changeNote({ change, firstSeen, lastSeen, newest }: SuspectSummary): string {
  if (firstSeen === null) return "never seen on record";
  if (newest?.kind === "not-seen") return `last seen in ${lastSeen?.buildName ?? ""}`;
  if (change === null) return "seen in one build";
  if (change.marginDb !== null) return `since ${change.fromBuild}`;
  return "not comparable";
}

/** Followed suspects as lines of a list, with the newest build that was swept there. */
export function suspectRows(suspects: SuspectSummary[]): SuspectRow[] {
  return suspects.map((suspect) => {
    const { id, number, frequencyHz, toleranceHz, source, ownerName, state, newest } = suspect;
    const best = newest?.best ?? null;
    return {
      id,
      number,
      frequencyHz,
      toleranceHz,
      source,
      ownerName,
      state,
      buildName: newest?.buildName ?? null,
      isSeen: newest?.kind === "seen",
      marginDb: best?.marginDb ?? null,
      standing: best?.standing ?? null,
      levelDb: best?.levelDb ?? null,
      unit: best?.unit ?? null,
      changeDb: newest?.kind === "seen" ? (suspect.change?.marginDb ?? null) : null,
      changeNote: changeNote(suspect),
    };
  });
}
