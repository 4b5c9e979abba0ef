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

export const INTERPOLATION_LABELS: Record<Interpolation, string> = {
  log: "straight over log frequency",
  linear: "straight over frequency",
};

export const BANDWIDTH_KIND_LABELS: Record<BandwidthKind, string> = {
  "3dB": "between 3 dB points",
  "6dB": "between 6 dB points",
};
