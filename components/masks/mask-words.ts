import type { Interpolation, Provenance } from "@/lib/core/mask/mask";
import type { BandwidthKind, Port } from "@/lib/core/sweep/settings";

export const PORT_LABELS: Record<Port, string> = {
  radiated: "Radiated",
  mains: "Mains",
  cable: "Cable",
  "near-field": "Near field",
  other: "Other",
};

/** Where the numbers of a mask come from, as it is said wherever the mask stands. */
export const PROVENANCE_LABELS: Record<Provenance, string> = {
  read: "read in the document named",
  "from memory": "from memory: confirm it against your own copy",
  team: "the team's own",
};

/** The same beside a mask in a table, where the line has little room. */
export const PROVENANCE_MARKS: Record<Provenance, string> = {
  read: "read in document",
  "from memory": "from memory",
  team: "the team's own",
};

/** Who compared a mask with their own copy of the document, when, and with which copy. */
export interface Confirmation {
  by: string;
  at: Date;
  copy: string;
}

/** "Confirmed by Ida Rask on 2026-12-01 against: printed copy, licence 4711" */
export function confirmationWords({ by, at, copy }: Confirmation): string {
  return `Confirmed by ${by} on ${at.toISOString().slice(0, 10)} against: ${copy}`;
}

/** Shipped masks say "not stated" where their document does not say it. */
const isStated = (text: string) => text !== "" && text !== "not stated";

/** "CISPR 32 / EN 55032, Annex A": the document with the clause when it is known. */
export function sourceWords({ document, clause }: { document: string; clause: string }): string {
  if (!isStated(document)) return "document not stated";
  return isStated(clause) ? `${document}, ${clause}` : document;
}

/** The edition, or that nobody stated it. */
export function editionWords({ edition }: { edition: string }): string {
  return isStated(edition) ? edition : "not stated";
}

export const INTERPOLATION_LABELS: Record<Interpolation, string> = {
  log: "straight over log frequency",
  linear: "straight over frequency",
};

export const BANDWIDTH_KIND_LABELS: Record<BandwidthKind, string> = {
  "3dB": "between 3 dB points",
  "6dB": "between 6 dB points",
};
