import { readFrequency } from "@/components/programs/read-frequency";
import type { SuspectAmbient } from "@/lib/core/reading/ambient-check";
import type { Suspect } from "@/lib/core/reading/reading";
import type { SuspectState } from "@/lib/core/reading/suspect-state";
import { formatFrequency } from "@/lib/core/units/format";

/** The followed suspect that a row of a reading is, or beside which it lies. */
export interface SuspectFollowMark {
  /** Of the suspect in its reading. */
  number: number;
  suspectId: string;
  followedNumber: number;
  state: SuspectState;
  /** false: within the tolerance of a followed one that is another row. */
  isSame: boolean;
}

export interface ShownSuspect extends Suspect {
  ambient: SuspectAmbient | null;
  followed: SuspectFollowMark | null;
}

export interface SuspectTableFilter {
  /** Words that a row holds all of, or a range of frequency like "30 to 80 MHz". */
  text: string;
  hidesAmbient: boolean;
}

/** Suspects with what is known beside them, by their numbers. */
export function joinSuspects(
  suspects: readonly Suspect[],
  ambient: readonly SuspectAmbient[] = [],
  followed: readonly SuspectFollowMark[] = [],
): ShownSuspect[] {
  const ambientBy = new Map(ambient.map((one) => [one.number, one]));
  const followedBy = new Map(followed.map((one) => [one.number, one]));
  return suspects.map((suspect) => ({
    ...suspect,
    ambient: ambientBy.get(suspect.number) ?? null,
    followed: followedBy.get(suspect.number) ?? null,
  }));
}

/** "30 to 80 MHz" or "30 MHz to 1 GHz" in Hz; null when the text is no range. */
function readRange(text: string): { fromHz: number; toHz: number } | null {
  const parts = /^(.+?)\s*(?:to|-|–|…)\s*(.+)$/i.exec(text);
  const to = parts?.[2]?.trim() ?? "";
  const unit = /[a-z]+$/i.exec(to)?.[0] ?? "";
  const from = parts?.[1]?.trim() ?? "";
  const fromHz = readFrequency(/[a-z]$/i.test(from) ? from : `${from} ${unit}`);
  const toHz = readFrequency(to);
  return Number.isNaN(fromHz) || Number.isNaN(toHz) ? null : { fromHz, toHz };
}

function haystack(suspect: ShownSuspect, stepHz: number | null): string {
  const { followed, ambient } = suspect;
  return [
    `no. ${suspect.number}`,
    formatFrequency(suspect.frequencyHz, stepHz ?? undefined),
    suspect.lineName ?? "",
    suspect.basis.replaceAll("-", " "),
    ambient?.isLikelyAmbient ? "likely ambient" : "",
    followed?.isSame ? `followed ${followed.followedNumber} ${followed.state}` : "",
  ]
    .join(" ")
    .toLowerCase();
}

/** The rows that a filter leaves, in their order and with their numbers. */
export function filterSuspects(
  suspects: readonly ShownSuspect[],
  filter: SuspectTableFilter,
  stepHz: number | null,
): ShownSuspect[] {
  const text = filter.text.trim().toLowerCase();
  const range = readRange(text);
  const words = text.split(/\s+/).filter(Boolean);
  return suspects.filter((suspect) => {
    if (filter.hidesAmbient && suspect.ambient?.isLikelyAmbient) return false;
    if (range) return suspect.frequencyHz >= range.fromHz && suspect.frequencyHz <= range.toHz;
    const told = haystack(suspect, stepHz);
    return words.every((word) => told.includes(word));
  });
}
