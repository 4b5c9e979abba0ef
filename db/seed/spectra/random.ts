/**
 * Seeded generator of numbers in [0, 1): mulberry32, a published public-domain method
 * (32-bit Weyl sequence with a mixing function; from memory). The demo has to come out the same
 * on every machine, so neither the clock nor Math.random is used anywhere below this folder.
 */
export function makeRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
}

/** Seed of a named stream, so that one draw more in one part leaves the others as they were. */
export function deriveSeed(seed: number, name: string): number {
  let hash = (2166136261 ^ seed) >>> 0;
  // FNV-1a, 32 bit (published constants, from memory).
  for (const char of name) hash = Math.imul(hash ^ char.charCodeAt(0), 16777619) >>> 0;
  return hash;
}

/** Standard normal draw, Box–Muller. */
export function drawNormal(random: () => number): number {
  return Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random());
}
