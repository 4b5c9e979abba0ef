import type { Acceptance, MeasuredChange, SweepDelta } from "@/lib/core/delta/delta";
import { shorten } from "./printable";
import { countOf, formatInstant } from "./report-text";

/** "± 1.2", or nothing where no repeats say it. */
export function uncertaintyText({ uncertaintyDb }: MeasuredChange): string {
  return uncertaintyDb === null ? "" : `± ${uncertaintyDb.toFixed(1)}`;
}

/** What the repeats say of a change, for a column; empty when they say nothing. */
export function repeatText({ isWithinRepeatability }: MeasuredChange): string {
  return isWithinRepeatability === true ? "within repeatability" : "";
}

/** The smallest change of margin over lines and sweeps: what a step bought at the least. */
export function leastChange(deltas: readonly SweepDelta[]): MeasuredChange | null {
  const known = deltas
    .flatMap((delta) => delta.changes?.margins ?? [])
    .filter(({ changeDb }) => changeDb !== null);
  const least = known.sort((a, b) => (a.changeDb ?? 0) - (b.changeDb ?? 0))[0];
  return least ?? null;
}

export function acceptedText({ reason, by, at }: Acceptance): string {
  return `Accepted by ${by} on ${formatInstant(at)}: ${reason}`;
}

/**
 * The sentence without its count of suspects, which the report gives by itself, and without its
 * conclusion where that would be cut in the middle.
 */
function movedOnly(sentence: string, longest: number): string {
  const moved = sentence.replace(/ \d+ (new )?suspects? (is|are) [^.]*\./, "");
  if (moved.length <= longest) return moved;
  const [before = moved] = moved.split(": ");
  return before === moved ? moved : `${before}.`;
}

/**
 * One delta in sentences, each shortened by itself: a mismatch is always said, even one that
 * somebody accepted.
 */
export function deltaSentences(
  { mismatches, accepted, changes }: SweepDelta,
  longest: number,
): string {
  const reasons = mismatches.map(({ text }) => text).join(" ");
  if (!changes) return shorten(`Not comparable: ${reasons}`, longest);
  const sentence = shorten(movedOnly(changes.sentence, longest), longest);
  if (reasons === "") return sentence;
  const who = accepted ? ` by ${accepted.by}, "${accepted.reason}"` : "";
  return `${sentence} ${shorten(`Mismatch accepted${who}: ${reasons}`, longest)}`;
}

/** "3 new suspects, 1 gone", or null when nothing came or went. */
export function cameAndWent({ changes }: SweepDelta): string | null {
  const { fresh, gone } = changes?.suspects ?? { fresh: [], gone: [] };
  const parts = [
    fresh.length > 0 ? countOf(fresh.length, "new suspect") : null,
    gone.length > 0 ? `${gone.length} gone` : null,
  ].filter((part) => part !== null);
  return parts.length === 0 ? null : parts.join(", ");
}
