/** The ambient's level beside one suspect; dB of the reading's unit. */
export interface AmbientAtSuspect {
  /** Number of the suspect in its reading. */
  number: number;
  ambientDb: number;
}

/** Where the ambient comes nearest to one mask line. */
export interface AmbientAtLine {
  lineIndex: number;
  frequencyHz: number;
  ambientDb: number;
  /** limit minus ambient, dB. */
  marginDb: number;
}

/** One ambient sweep held beside one reading. */
export interface AmbientCheck {
  version: 1;
  /** Why the ambient sweep cannot be held beside the reading (unit, detector, polarization …). */
  notComparable: string | null;
  suspects: AmbientAtSuspect[];
  lines: AmbientAtLine[];
}

/** What the ambient sweeps of the day say together about one suspect; dB of the reading's unit. */
export interface SuspectAmbient {
  number: number;
  ambientDb: number;
  /** The ambient lies within 3 dB of the suspect (common practice, no source). */
  isLikelyAmbient: boolean;
  /** 10 log10(10^(T/10) − 10^(A/10)), an estimate for noise-like signals; null when A ≥ T. */
  withoutAmbientDb: number | null;
}
