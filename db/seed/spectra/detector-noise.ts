import { drawNormal } from "./random";
import type { SeedDetector } from "./setup";

/** Noise bandwidth of a Gaussian filter over its 6 dB bandwidth: 0.753 (computed). */
const NOISE_PER_B6 = 0.753;
/** Envelope average of Gaussian noise under its power: 1.05 dB (published noise theory). */
const ENVELOPE_AVERAGE_DB = -1.05;
/** Relative standard deviation of a Rayleigh envelope, √(4/π − 1). */
const RAYLEIGH_SPREAD = 0.523;
/**
 * Quasi-peak of Gaussian noise over its power. Charge 1 ms, discharge 550 ms (30–1000 MHz, from
 * memory): the level V at which √(2π)·Q(V)/1 ms = V/550 ms is 2.87σ, 6.1 dB above the r.m.s.
 */
const QUASI_PEAK_DB = 6.1;
/** Thermal noise at 290 K, k·T in dBm/Hz. */
const THERMAL_DBM_PER_HZ = -173.975;
const DBUV_PER_DBM_50_OHM = 106.9897;

export function noiseBandwidthHz(rbwHz: number): number {
  return NOISE_PER_B6 * rbwHz;
}

/** Mean noise power of a source of the given noise figure, as dBµV in 50 Ω. */
export function thermalNoiseDbuv(rbwHz: number, noiseFigureDb: number): number {
  const bandwidthDb = 10 * Math.log10(noiseBandwidthHz(rbwHz));
  return THERMAL_DBM_PER_HZ + bandwidthDb + noiseFigureDb + DBUV_PER_DBM_50_OHM;
}

/**
 * One reading of Gaussian noise, as a power ratio to the mean noise power. Peak: the largest of
 * `looks` exponential draws, whose mean is ln N + 0.577. Average: the mean of as many envelopes.
 */
export function drawNoiseReading(
  detector: SeedDetector,
  looks: number,
  random: () => number,
): number {
  if (detector === "peak") {
    const draw = Math.max(random(), 1e-12);
    return -Math.log(-Math.expm1(Math.log(draw) / looks));
  }
  if (detector === "quasi-peak") return 10 ** ((QUASI_PEAK_DB + 0.3 * drawNormal(random)) / 10);
  const envelope = 1 + (RAYLEIGH_SPREAD * drawNormal(random)) / Math.sqrt(looks);
  return 10 ** (ENVELOPE_AVERAGE_DB / 10) * envelope ** 2;
}
