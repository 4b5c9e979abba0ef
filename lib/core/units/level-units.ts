/** Logarithmic level units a trace can carry. Ids are plain ASCII; labels carry the µ. */
export const LEVEL_UNITS = [
  "dBm",
  "dBW",
  "dBuV",
  "dBmV",
  "dBV",
  "dBuA",
  "dBuV/m",
  "dBuA/m",
  "dBpT",
  "dB",
] as const;
export type LevelUnit = (typeof LEVEL_UNITS)[number];

/** Linear units that files may state; they become a LevelUnit while a file is read. */
export const LINEAR_UNITS = ["W", "mW", "uV", "mV", "V", "uV/m"] as const;
export type LinearUnit = (typeof LINEAR_UNITS)[number];

export type FileUnit = LevelUnit | LinearUnit;

export const LEVEL_UNIT_LABELS: Record<LevelUnit, string> = {
  dBm: "dBm",
  dBW: "dBW",
  dBuV: "dBµV",
  dBmV: "dBmV",
  dBV: "dBV",
  dBuA: "dBµA",
  "dBuV/m": "dBµV/m",
  "dBuA/m": "dBµA/m",
  dBpT: "dBpT",
  dB: "dB (relative)",
};
