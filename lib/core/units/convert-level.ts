import type { LevelUnit, LinearUnit } from "./level-units";

/** dB of a power ratio: 10 log10. */
export function powerRatioDb(ratio: number): number {
  return 10 * Math.log10(ratio);
}

/** dB of a voltage, current or field ratio: 20 log10. */
export function fieldRatioDb(ratio: number): number {
  return 20 * Math.log10(ratio);
}

/** Impedance of free space: dBµV/m minus dBµA/m, 20 log10(119.9169832 π Ω). */
const FREE_SPACE_DB = fieldRatioDb(119.9169832 * Math.PI);
/** dBpT minus dBµA/m, 20 log10(0.4 π). */
const TESLA_DB = fieldRatioDb(0.4 * Math.PI);

type Quantity = "terminal" | "field" | "relative";

/** Every unit of a quantity is reached through one base unit: dBµV, dBµV/m or dB. */
function toBase(unit: LevelUnit, ohm: number): { quantity: Quantity; addDb: number } {
  switch (unit) {
    case "dBuV":
      return { quantity: "terminal", addDb: 0 };
    case "dBmV":
      return { quantity: "terminal", addDb: 60 };
    case "dBV":
      return { quantity: "terminal", addDb: 120 };
    case "dBm":
      return { quantity: "terminal", addDb: 90 + powerRatioDb(ohm) };
    case "dBW":
      return { quantity: "terminal", addDb: 120 + powerRatioDb(ohm) };
    case "dBuA":
      return { quantity: "terminal", addDb: fieldRatioDb(ohm) };
    case "dBuV/m":
      return { quantity: "field", addDb: 0 };
    case "dBuA/m":
      return { quantity: "field", addDb: FREE_SPACE_DB };
    case "dBpT":
      return { quantity: "field", addDb: FREE_SPACE_DB - TESLA_DB };
    case "dB":
      return { quantity: "relative", addDb: 0 };
  }
}

/**
 * Restates a level in another unit of the same quantity; null when the units are of different
 * quantities (a field strength never follows from a voltage without an antenna factor).
 * `impedanceOhm` is the instrument's. Field units convert as in a plane wave (51.52 dB).
 */
export function convertLevel(
  levelDb: number,
  from: LevelUnit,
  to: LevelUnit,
  impedanceOhm = 50,
): number | null {
  if (from === to) return levelDb;
  const source = toBase(from, impedanceOhm);
  const target = toBase(to, impedanceOhm);
  if (source.quantity !== target.quantity) return null;
  return levelDb + (source.addDb - target.addDb);
}

/** Restates a linear value from a file; zero and negative values become NaN (not covered). */
export function fromLinear(value: number, unit: LinearUnit): { unit: LevelUnit; levelDb: number } {
  const positive = value > 0 ? value : Number.NaN;
  switch (unit) {
    case "W":
      return { unit: "dBW", levelDb: powerRatioDb(positive) };
    case "mW":
      return { unit: "dBm", levelDb: powerRatioDb(positive) };
    case "uV":
      return { unit: "dBuV", levelDb: fieldRatioDb(positive) };
    case "mV":
      return { unit: "dBmV", levelDb: fieldRatioDb(positive) };
    case "V":
      return { unit: "dBV", levelDb: fieldRatioDb(positive) };
    case "uV/m":
      return { unit: "dBuV/m", levelDb: fieldRatioDb(positive) };
  }
}

/** Field strength in dBµV/m of a radiator with the given EIRP in dBm at a distance in m. */
export function fieldFromEirp(eirpDbm: number, distanceM: number): number {
  return eirpDbm + 90 + powerRatioDb(30) - fieldRatioDb(distanceM);
}

/** EIRP in dBm from a field strength in dBµV/m at a distance in m. */
export function eirpFromField(levelDbuvm: number, distanceM: number): number {
  return levelDbuvm - 90 - powerRatioDb(30) + fieldRatioDb(distanceM);
}
