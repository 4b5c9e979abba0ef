import type { LinkSettings } from "@/lib/core/link/link-settings";
import { linkPeriod, regularShare } from "./link-bits";

/** A spectral line at the source; power in V² r.m.s. */
export interface SourceLine {
  hz: number;
  powerV2: number;
}

export interface LinkSource {
  lines: SourceLine[];
  /** Noise-like part in V²/Hz, one-sided. */
  densityV2PerHz: (hz: number) => number;
}

function sinc(x: number): number {
  return x === 0 ? 1 : Math.sin(Math.PI * x) / (Math.PI * x);
}

/** sinc² of an NRZ bit (nulls at multiples of the bit rate) times that of a linear edge. */
function bitShape(hz: number, bitRateHz: number, edgeTimeS: number): number {
  // A linear ramp lasts 1/0.6 of its 20–80 % time.
  return sinc(hz / bitRateHz) ** 2 * sinc((hz * edgeTimeS) / 0.6) ** 2;
}

/** |Fourier coefficient|² of a period of ±1 for k = 0 … P/2. */
function coefficientPowers(bits: Int8Array): Float64Array {
  const count = bits.length;
  const cos = Float64Array.from(bits, (_, i) => Math.cos((2 * Math.PI * i) / count));
  const sin = Float64Array.from(bits, (_, i) => Math.sin((2 * Math.PI * i) / count));
  const powers = new Float64Array((count >> 1) + 1);
  for (let k = 0; k < powers.length; k += 1) {
    let real = 0;
    let imaginary = 0;
    let turn = 0;
    for (let i = 0; i < count; i += 1) {
      const bit = bits[i] ?? 0;
      real += bit * (cos[turn] ?? 0);
      imaginary += bit * (sin[turn] ?? 0);
      turn += k;
      if (turn >= count) turn -= count;
    }
    powers[k] = (real * real + imaginary * imaginary) / count ** 2;
  }
  return powers;
}

/**
 * Spectrum of the link data at the transmitter, for a peak-to-peak swing in V, up to `stopHz`.
 * A period of P bits makes lines at k·f_b/P with one-sided power 2|c_k|²·(V/2)²·shape, so a 1 V
 * square wave has its fundamental at 113.07 dBµV (computed). What never repeats within a sweep is
 * a density 2/f_b·shape, plus the lines that the regular share of the frames leaves at f_b/2 and its odd multiples. The
 * power is the same in every case: coding and scrambling only move it.
 */
export function makeLinkSource(
  link: LinkSettings,
  amplitudeV: number,
  stopHz: number,
  resolutionHz: number,
): LinkSource {
  const silent: LinkSource = { lines: [], densityV2PerHz: () => 0 };
  const bitRateHz = link.bitRateHz;
  if (bitRateHz === null) return silent;
  const edgeTimeS = link.edgeTimeS ?? 0.3 / bitRateHz;
  const bitPower = (amplitudeV / 2) ** 2;
  const shape = (hz: number) => bitPower * bitShape(hz, bitRateHz, edgeTimeS);
  const bits = linkPeriod(link);
  if (bits && bitRateHz / bits.length > resolutionHz) {
    const powers = coefficientPowers(bits);
    const lines: SourceLine[] = [];
    for (let k = 1; (k * bitRateHz) / bits.length <= stopHz; k += 1) {
      const folded = k % bits.length;
      const power = powers[Math.min(folded, bits.length - folded)] ?? 0;
      const hz = (k * bitRateHz) / bits.length;
      if (power > 1e-12) lines.push({ hz, powerV2: 2 * power * shape(hz) });
    }
    return { ...silent, lines };
  }
  // A bare test sequence has no sync words that could stay regular.
  const regular = link.payload?.startsWith("prbs") ? 0 : regularShare(link) ** 2;
  const lines: SourceLine[] = [];
  for (let hz = bitRateHz / 2; hz <= stopHz; hz += bitRateHz)
    lines.push({ hz, powerV2: 2 * regular * shape(hz) });
  return { lines, densityV2PerHz: (hz) => ((1 - regular) * 2 * shape(hz)) / bitRateHz };
}
