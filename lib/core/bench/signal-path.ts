export const TRANSDUCER_KINDS = [
  "antenna",
  "magnetic-loop",
  "lisn",
  "current-probe",
  "near-field-probe",
  "cable",
  "attenuator",
  "preamplifier",
] as const;
export type TransducerKind = (typeof TRANSDUCER_KINDS)[number];

/** Kinds that turn a field, a current or a line's voltage into a level; a path has one of them. */
export const PICK_UPS: readonly TransducerKind[] = [
  "antenna",
  "magnetic-loop",
  "lisn",
  "current-probe",
  "near-field-probe",
];

/** Factor of a transducer in dB (dB/m for an antenna) at a frequency in Hz. */
export interface FactorPoint {
  frequencyHz: number;
  factorDb: number;
}

export interface Transducer {
  name: string;
  kind: TransducerKind;
  /** Ascending frequency, at least two points; linear in log f between them, nothing outside. */
  factors: FactorPoint[];
  /** ISO dates or null. */
  calibratedOn: string | null;
  dueOn: string | null;
  /** The piece of equipment that this is; null or left out: none is named. */
  equipmentId?: string | null;
}

/** Ordered from the field to the instrument. A revision of it never changes. */
export interface SignalPath {
  version: 1;
  impedanceOhm: number;
  transducers: Transducer[];
}
