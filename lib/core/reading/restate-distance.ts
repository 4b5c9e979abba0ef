/** At and above this frequency in Hz a field is taken to fall with 20 dB a decade of distance. */
export const RESTATEMENT_EDGE_HZ = 30e6;

/** Speed of light in m/s, exact by definition of the metre. */
const LIGHT_M_PER_S = 299_792_458;

/**
 * What is added to a field level in dB to restate it from one distance to another, both in m and
 * above 0: 20 log10(from/to) at and above 30 MHz, so exactly −10.4576 dB from 3 m to 10 m, and
 * 40 log10(from/to) below (47 CFR 15.31(f)(1) read, (f)(2) from memory).
 */
export function restatementDb(fromM: number, toM: number, frequencyHz: number): number {
  const perDecade = frequencyHz >= RESTATEMENT_EDGE_HZ ? 20 : 40;
  return perDecade * Math.log10(fromM / toM);
}

/**
 * Distances in m that say whether an antenna stands in the far field at a frequency in Hz: λ/2π,
 * where the near field ends for a small source, and 3λ (Paul, Introduction to EMC, quoted).
 */
export function fieldDistances(frequencyHz: number): { reactiveM: number; farM: number } {
  const wavelengthM = LIGHT_M_PER_S / frequencyHz;
  return { reactiveM: wavelengthM / (2 * Math.PI), farM: 3 * wavelengthM };
}
