import { formatFrequency } from "@/lib/core/units/format";

export type NoteChange = Record<string, { from: string | null; to: string | null }>;

const frequency = (text: string | null) => (text === null ? "none" : formatFrequency(Number(text)));

/** What a note changed, one sentence each, in the order in which it was kept. */
export function describeNoteChange(change: NoteChange | null): string[] {
  return Object.entries(change ?? {}).map(([field, { from, to }]) => {
    if (field === "state") {
      return from === null ? "began to follow it" : `moved it from ${from} to ${to ?? "nothing"}`;
    }
    if (field === "sweep") return `seen first in ${to ?? "a sweep"}`;
    if (field === "owner") {
      if (to === null) return `took it from ${from ?? "its owner"}`;
      return from === null ? `gave it to ${to}` : `gave it to ${to}, before that ${from}`;
    }
    if (field === "source") {
      if (to === null) return `took the likely source “${from ?? ""}” away`;
      return `wrote the likely source “${to}”${from === null ? "" : `, before that “${from}”`}`;
    }
    if (field === "toleranceHz") {
      return `set the tolerance to ${frequency(to)}, before that ${frequency(from)}`;
    }
    return `${field}: ${from ?? "not stated"}, then ${to ?? "not stated"}`;
  });
}
