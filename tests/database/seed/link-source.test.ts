import { describe, expect, it } from "vitest";
import { clockLines } from "@/db/seed/spectra/clocks";
import { scrambled } from "@/db/seed/spectra/demo-story";
import { makeLinkSource, type SourceLine } from "@/db/seed/spectra/link-source";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import { AT_REST, FLAT } from "./flat-setup";

const BIT_RATE_HZ = 3.2e9;

function linesOf(link: LinkSettings, stopHz = 7e9): SourceLine[] {
  return makeLinkSource(link, 1, stopHz, 100e3).lines;
}

function levelAt(lines: SourceLine[], hz: number): number {
  const line = lines.find((candidate) => Math.abs(candidate.hz - hz) < 1);
  return line ? 10 * Math.log10(line.powerV2) + 120 : Number.NEGATIVE_INFINITY;
}

const scrambling = scrambled(AT_REST, 1600);

describe("lines of the link", () => {
  it("gives 1 V of alternating bits the levels of a square wave", () => {
    const lines = linesOf({ ...AT_REST, payload: "alternating" }, 15e9);
    // 113.07 dBµV r.m.s. and −9.54/−13.98/−16.90/−19.08 dB: Fourier series, computed.
    const drops = [1, 3, 5, 7, 9].map((n) => levelAt(lines, (n * BIT_RATE_HZ) / 2) - 113.07);
    [0, -9.54, -13.98, -16.9, -19.08].forEach((drop, i) => expect(drops[i]).toBeCloseTo(drop, 1));
  });

  it("spaces the lines of an idle word by bit rate over word length, the highest at half the bit rate", () => {
    const lines = linesOf(AT_REST, 3e9);
    expect(lines.length).toBeGreaterThan(10);
    for (const { hz } of lines) expect(hz % (BIT_RATE_HZ / 32)).toBeCloseTo(0, 3);
    const top = lines.reduce((best, line) => (line.powerV2 > best.powerV2 ? line : best));
    expect(top.hz).toBe(BIT_RATE_HZ / 2);
    expect(levelAt(lines, BIT_RATE_HZ / 4)).toBeGreaterThan(levelAt(lines, top.hz) - 15);
  });

  it("has nulls at the multiples of the bit rate", () => {
    for (const link of [AT_REST, scrambling]) {
      expect(levelAt(linesOf(link), BIT_RATE_HZ)).toBeLessThan(-100);
      expect(levelAt(linesOf(link), 2 * BIT_RATE_HZ)).toBeLessThan(-100);
    }
  });

  it("follows the published line powers of a maximal-length sequence", () => {
    const lines = linesOf({ ...AT_REST, payload: "prbs7" });
    // Two-sided (N+1)/N²·sinc²(k/N) for ±1, N = 127; here 1 V peak to peak, one-sided.
    for (const k of [1, 7, 50, 63, 100, 200]) {
      const x = (Math.PI * k) / 127;
      const power = 2 * 0.25 * (128 / 127 ** 2) * (Math.sin(x) / x) ** 2;
      expect(levelAt(lines, (k * BIT_RATE_HZ) / 127)).toBeCloseTo(10 * Math.log10(power) + 120, 6);
    }
  });

  it("makes a 2 MHz comb of a scrambler that restarts every 1600 bits", () => {
    const lines = linesOf(scrambling, 3e9);
    expect(lines.length).toBeGreaterThan(1400);
    for (const { hz } of lines) expect(hz % 2e6).toBe(0);
  });

  it("brings the line at half the bit rate down about 10 dB by scrambling, about 6 dB more by coding", () => {
    // Common practice, no source.
    const rest = levelAt(linesOf(AT_REST), BIT_RATE_HZ / 2);
    const mixed = levelAt(linesOf(scrambling), BIT_RATE_HZ / 2);
    const coded = levelAt(linesOf({ ...scrambling, coding: "8b10b" }), BIT_RATE_HZ / 2);
    expect(Math.abs(rest - mixed - 10)).toBeLessThan(3);
    expect(Math.abs(mixed - coded - 6)).toBeLessThan(2);
  });

  it("moves power without removing any", () => {
    // ±0.5 V of bits has 0.25 V²; sinc² beyond 40 bit rates holds about 0.3 % of it. The constant
    // part is no line, and an uneven count of ones keeps a little in it.
    for (const link of [AT_REST, scrambling, { ...scrambling, coding: "8b10b" as const }]) {
      const total = linesOf(link, 40 * BIT_RATE_HZ).reduce((sum, line) => sum + line.powerV2, 0);
      expect(total).toBeGreaterThan(0.25 * 0.98);
      expect(total).toBeLessThan(0.25);
    }
  });

  it("turns into a density with the same power when nothing repeats", () => {
    const link = { ...scrambling, scramblerRestartBits: null };
    const { lines, densityV2PerHz } = makeLinkSource(link, 1, 40 * BIT_RATE_HZ, 100e3);
    let total = lines.reduce((sum, line) => sum + line.powerV2, 0);
    for (let hz = 5e6; hz < 40 * BIT_RATE_HZ; hz += 10e6) total += densityV2PerHz(hz) * 10e6;
    expect(total / 0.25).toBeCloseTo(1, 1.5);
    expect(lines[0]?.hz).toBe(BIT_RATE_HZ / 2);
  });

  it("names a polynomial without powers", () => {
    const link = { ...scrambling, scramblerPolynomial: "sixteen" };
    expect(() => linesOf(link)).toThrow('No powers in the polynomial "sixteen".');
  });
});

describe("lines of a clock", () => {
  it("are those of a trapezoid, moved by its tolerance", () => {
    const lines = clockLines(
      {
        name: "",
        fundamentalHz: 10e6,
        offsetPpm: 20,
        amplitudeV: 1,
        duty: 0.5,
        edgeTimeS: 5e-9,
        leak: "seam",
        coupling: FLAT,
        followsSpread: false,
      },
      100e6,
    );
    expect(lines[0]?.hz).toBeCloseTo(10_000_200, 3);
    // Amplitudes 116.04/106.21/101.19/97.35/93.88 dBµV, computed; r.m.s. is 3.01 dB less.
    [116.04, 106.21, 101.19, 97.35, 93.88].forEach((amplitude, i) => {
      const line = lines[2 * i];
      expect(10 * Math.log10(line?.powerV2 ?? 0) + 123.01).toBeCloseTo(amplitude, 1);
    });
  });
});
