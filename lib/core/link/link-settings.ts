export const PAYLOADS = [
  "constant-zeros",
  "constant-ones",
  "alternating",
  "prbs7",
  "prbs15",
  "prbs23",
  "prbs31",
  "repeating-pattern",
  "video-like",
] as const;
export type Payload = (typeof PAYLOADS)[number];

export const SCRAMBLERS = ["none", "additive", "self-synchronous"] as const;
export type Scrambler = (typeof SCRAMBLERS)[number];

export const CODINGS = ["none", "8b10b", "9b10b", "64b66b", "128b130b", "other"] as const;
export type Coding = (typeof CODINGS)[number];

export const SPREAD_DIRECTIONS = ["down", "centre", "up"] as const;
export type SpreadDirection = (typeof SPREAD_DIRECTIONS)[number];

export const SPREAD_PROFILES = ["triangular", "sinusoidal", "cubic"] as const;
export type SpreadProfile = (typeof SPREAD_PROFILES)[number];

export interface SpreadSpectrum {
  depthPercent: number;
  direction: SpreadDirection;
  modulationHz: number;
  profile: SpreadProfile;
}

/** Settings of the serial link while a sweep was taken; null means not stated. */
export interface LinkSettings {
  bitRateHz: number | null;
  payload: Payload | null;
  patternBits: number | null;
  scrambler: Scrambler | null;
  scramblerPolynomial: string | null;
  scramblerRestartBits: number | null;
  coding: Coding | null;
  /** null: no statement. "off" is said by `spreadOff`. */
  spread: SpreadSpectrum | null;
  spreadOff: boolean | null;
  edgeTimeS: number | null;
  cable: string | null;
}
