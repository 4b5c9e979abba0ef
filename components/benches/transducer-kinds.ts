import type { TransducerKind } from "@/lib/core/bench/signal-path";

export const TRANSDUCER_KIND_LABELS: Record<TransducerKind, string> = {
  antenna: "antenna",
  "magnetic-loop": "magnetic loop",
  lisn: "LISN",
  "current-probe": "current probe",
  "near-field-probe": "near-field probe",
  cable: "cable",
  attenuator: "attenuator",
  preamplifier: "preamplifier",
};

/** What a factor of this kind does to a level, and in which unit it is read off a certificate. */
export const FACTOR_MEANINGS: Record<TransducerKind, string> = {
  antenna: "antenna factor in dB/m, added",
  "magnetic-loop": "loop factor in dB, added",
  lisn: "insertion loss in dB, added",
  "current-probe": "transducer factor in dB, added",
  "near-field-probe": "probe factor in dB, added",
  cable: "loss in dB, added",
  attenuator: "attenuation in dB, added",
  preamplifier: "gain in dB, subtracted",
};
