import type { TransducerKind } from "@/lib/core/bench/signal-path";
import type { Coding, Payload, Scrambler, SpreadDirection } from "@/lib/core/link/link-settings";
import type { Provenance } from "@/lib/core/mask/mask";
import type { Basis } from "@/lib/core/reading/reading";
import type { Hold, Port, SweepPurpose } from "@/lib/core/sweep/settings";

export const DEFERRAL =
  "Bench pre-compliance data. Only an accredited test lab and the applicable edition of the standard decide.";

export const NOT_STATED = "not stated";

export const BASIS_LABELS: Record<Basis, string> = {
  "like-for-like": "like for like",
  "upper-bound": "upper bound",
  "cannot-decide": "cannot decide",
};

export const HOLD_LABELS: Record<Hold, string> = {
  none: "no hold",
  "max-hold": "max hold",
  "min-hold": "min hold",
  average: "averaged",
};

export const PURPOSE_LABELS: Record<SweepPurpose, string> = {
  product: "product",
  ambient: "ambient (product off)",
  floor: "floor of the instrument",
};

export const PORT_LABELS: Record<Port, string> = {
  radiated: "radiated",
  mains: "mains port",
  cable: "cable",
  "near-field": "near field",
  other: "other",
};

export const PROVENANCE_LABELS: Record<Provenance, string> = {
  read: "read from the document",
  "from memory": "FROM MEMORY",
  team: "entered by the team",
};

export const TRANSDUCER_LABELS: Record<TransducerKind, string> = {
  antenna: "antenna",
  "magnetic-loop": "magnetic loop",
  lisn: "LISN",
  "current-probe": "current probe",
  "near-field-probe": "near-field probe",
  cable: "cable",
  attenuator: "attenuator",
  preamplifier: "preamplifier",
};

export const PAYLOAD_LABELS: Record<Payload, string> = {
  "constant-zeros": "constant zeros",
  "constant-ones": "constant ones",
  alternating: "alternating bits",
  prbs7: "PRBS7",
  prbs15: "PRBS15",
  prbs23: "PRBS23",
  prbs31: "PRBS31",
  "repeating-pattern": "repeating pattern",
  "video-like": "video-like",
};

export const SCRAMBLER_LABELS: Record<Scrambler, string> = {
  none: "off",
  additive: "additive",
  "self-synchronous": "self-synchronous",
};

export const CODING_LABELS: Record<Coding, string> = {
  none: "none",
  "8b10b": "8b/10b",
  "9b10b": "9b/10b",
  "64b66b": "64b/66b",
  "128b130b": "128b/130b",
  other: "other",
};

export const SPREAD_DIRECTION_LABELS: Record<SpreadDirection, string> = {
  down: "down",
  centre: "centre",
  up: "up",
};
