import type { LinkSettings } from "@/lib/core/link/link-settings";

/** x¹⁶+x⁵+x⁴+x³+1, a published 16-bit additive scrambler. */
const DEFAULT_POLYNOMIAL = "x^16+x^5+x^4+x^3+1";
/** Share of an idle word that alternates; the rest runs at half that rate. */
const IDLE_ALTERNATING = 0.75;

/**
 * Share of each frame that stays regular although the scrambler runs (sync word and fill). A
 * third of the idle word's share brings the line at half the bit rate down by 9.5 dB, half of
 * that by 6 dB more: about what is seen on benches (common practice, no source).
 */
export function regularShare(link: LinkSettings): number {
  const coded = link.coding !== null && link.coding !== "none";
  return coded ? IDLE_ALTERNATING / 6 : IDLE_ALTERNATING / 3;
}

/** Idle word of a link at rest as ±1: mostly 1010…, with a stretch of 1100…. */
function idleWord(bits: number): Int8Array {
  const alternating = Math.floor((IDLE_ALTERNATING * bits) / 4) * 4;
  return Int8Array.from({ length: bits }, (_, i) =>
    (i < alternating ? i % 2 === 0 : i % 4 < 2) ? 1 : -1,
  );
}

/** Bits of a shift register that starts with all ones, as ±1. */
function registerBits(polynomial: string, count: number): Int8Array {
  const taps = [...polynomial.matchAll(/x\^(\d+)/g)].map((match) => Number(match[1]));
  const length = Math.max(...taps);
  if (!Number.isFinite(length)) throw new Error(`No powers in the polynomial "${polynomial}".`);
  const register = new Uint8Array(length).fill(1);
  return Int8Array.from({ length: count }, () => {
    const out = register[length - 1] ?? 0;
    const feedback = taps.reduce((sum, tap) => sum ^ (register[tap - 1] ?? 0), 0);
    register.copyWithin(1, 0);
    register[0] = feedback;
    return out === 1 ? 1 : -1;
  });
}

/** One period of what is on the line, as ±1; null when nothing repeats within a sweep. */
export function linkPeriod(link: LinkSettings): Int8Array | null {
  const scrambled = link.scrambler !== null && link.scrambler !== "none";
  if (scrambled) {
    const frame = link.scramblerRestartBits;
    if (frame === null) return null;
    const regular = 2 * Math.round((regularShare(link) * frame) / 2);
    const bits = registerBits(link.scramblerPolynomial ?? DEFAULT_POLYNOMIAL, frame);
    for (let i = 0; i < regular; i += 1) bits[i] = i % 2 === 0 ? 1 : -1;
    return bits;
  }
  if (link.payload === "alternating") return Int8Array.of(1, -1);
  if (link.payload === "constant-ones" || link.payload === "constant-zeros") return Int8Array.of(1);
  if (link.payload === "repeating-pattern" && link.patternBits) return idleWord(link.patternBits);
  if (link.payload === "prbs7") return registerBits("x^7+x^6+1", 127);
  return null;
}
