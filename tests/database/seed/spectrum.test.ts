import { describe, expect, it } from "vitest";
import { scrambled, spreadBy } from "@/db/seed/spectra/demo-story";
import { drawNoiseReading, thermalNoiseDbuv } from "@/db/seed/spectra/detector-noise";
import { makeRandom } from "@/db/seed/spectra/random";
import type { SeedDetector, SpectrumSetup, Treatment } from "@/db/seed/spectra/setup";
import { makeSpectrum } from "@/db/seed/spectra/spectrum";
import { INPUT_ATTENUATOR, PREAMPLIFIER, SHORT_CABLE } from "@/db/seed/spectra/transducers";
import { prominentPeaks } from "@/lib/core/sweep/prominent-peaks";
import { AT_REST, FLAT_SETUP, highest } from "./flat-setup";

const scrambling = scrambled(AT_REST, 1600);
const coded = { ...scrambling, coding: "8b10b" as const };

function levels(change: Partial<SpectrumSetup>): Float32Array {
  return makeSpectrum({ ...FLAT_SETUP, ...change }).levelsDbuv;
}

function meanPowerDb(values: Float32Array): number {
  return 10 * Math.log10(values.reduce((sum, db) => sum + 10 ** (db / 10), 0) / values.length);
}

describe("receiver noise", () => {
  const off = { product: null, link: null };

  it("is kTB with the noise figure, raised for a peak detector and lowered for an average one", () => {
    // −173.98 dBm/Hz + 10·log10(0.753·120 kHz) + 106.99 dB = −17.43 dBµV, by hand.
    expect(thermalNoiseDbuv(120e3, 0)).toBeCloseTo(-17.43, 1);
    const meanDb = -17.43 + 10;
    // Peak of N looks over mean power: ln N + 0.577; envelope average: −1.05 dB (published).
    expect(meanPowerDb(levels(off)) - meanDb).toBeCloseTo(
      10 * Math.log10(Math.log(3000) + 0.577),
      1,
    );
    expect(meanPowerDb(levels({ ...off, detector: "average" })) - meanDb).toBeCloseTo(-1.05, 1);
  });

  it("rises by 10 dB with 10 dB of attenuation and by the ratio of bandwidths", () => {
    const floor = meanPowerDb(levels(off));
    const receiver = { ...FLAT_SETUP.receiver, attenuationDb: 10 };
    expect(meanPowerDb(levels({ ...off, receiver })) - floor).toBeCloseTo(10, 1);
    expect(meanPowerDb(levels({ ...off, rbwHz: 1e6 })) - floor).toBeCloseTo(9.21, 1);
  });

  it("is that of the preamplifier less the cable behind it, when there is one", () => {
    const receiver = { ...FLAT_SETUP.receiver, noiseFigureDb: -200, preamplifierNoiseFigureDb: 3 };
    const path = { ...FLAT_SETUP.path, transducers: [PREAMPLIFIER, SHORT_CABLE] };
    const floor = meanPowerDb(levels({ ...off, receiver, path, detector: "average" }));
    // Gain near 29.4 dB and loss near 1 dB at 1.6 GHz in the tables.
    expect(Math.abs(floor - (-17.43 + 3 - 1.05 + 29.4 - 1.05))).toBeLessThan(0.3);
  });

  it.each([100, 3000])("has the mean of the largest of %i looks", (looks) => {
    const random = makeRandom(7);
    const draws = Array.from({ length: 20_000 }, () => drawNoiseReading("peak", looks, random));
    const mean = draws.reduce((sum, draw) => sum + draw, 0) / draws.length;
    expect(mean).toBeCloseTo(Math.log(looks) + 0.577, 1);
  });
});

describe("a link's spectrum", () => {
  it("depends on the seed alone", () => {
    expect(levels({})).toEqual(levels({}));
    expect(levels({ seed: 2 })).not.toEqual(levels({}));
  });

  it("shows a line at the level of its source, less the path", () => {
    // Idle word: ¾ of it alternates, so 113.07 dBµV − 2.50 dB at half the bit rate.
    expect(highest(levels({}))).toBeCloseTo(110.57, 1);
    const path = { ...FLAT_SETUP.path, transducers: [INPUT_ATTENUATOR] };
    expect(highest(levels({ path }))).toBeCloseTo(110.57 - 10.06, 1);
  });

  it("falls off beside a line as a Gaussian filter does", () => {
    const { frequenciesHz, levelsDbuv } = makeSpectrum(FLAT_SETUP);
    const at = (hz: number) =>
      levelsDbuv[frequenciesHz.findIndex((f) => Math.abs(f - hz) < 1)] ?? 0;
    expect(at(1.6e9) - at(1.6e9 + 60e3)).toBeCloseTo(6.02, 1);
    expect(at(1.6e9) - at(1.6e9 - 120e3)).toBeCloseTo(24.08, 1);
  });

  it("has a comb every 2 MHz when the scrambler restarts every 1600 bits", () => {
    const { frequenciesHz, levelsDbuv } = makeSpectrum({ ...FLAT_SETUP, link: scrambling });
    const peaks = prominentPeaks(levelsDbuv, 6).map(({ index }) => frequenciesHz[index] ?? 0);
    expect(peaks.length).toBeGreaterThan(80);
    for (const hz of peaks) expect(Math.abs(hz / 2e6 - Math.round(hz / 2e6))).toBeLessThan(0.011);
  });

  it("has its peak lowered by scrambling and again by coding", () => {
    const steps = [AT_REST, scrambling, coded].map((link) => highest(levels({ link })));
    const [rest = 0, mixed = 0, quiet = 0] = steps;
    expect(rest - mixed).toBeGreaterThan(5);
    expect(rest - mixed).toBeLessThan(15);
    expect(mixed - quiet).toBeGreaterThan(4);
    expect(mixed - quiet).toBeLessThan(8);
  });

  it("reads as noise when the scrambler never restarts", () => {
    const link = { ...scrambling, scramblerRestartBits: null };
    const [peak, average] = (["peak", "average"] as const).map((detector) =>
      meanPowerDb(levels({ link, detector, startHz: 1.61e9 })),
    );
    expect((peak ?? 0) - (average ?? 0)).toBeCloseTo(10 * Math.log10(8.58) + 1.05, 1);
  });

  const quietReceiver = { ...FLAT_SETUP.receiver, noiseFigureDb: -150 };
  const single = { ...AT_REST, bitRateHz: 3e9, payload: "alternating" as const };

  // Simulated single line, 0.5 % of 1.5 GHz at 31.5 kHz, triangular; RBW is the 3 dB one.
  it.each([
    ["peak", 10e3, 20.7],
    ["peak", 100e3, 8.3],
    ["peak", 1e6, 0],
    ["average", 100e3, 16.1],
    ["average", 1e6, 8.5],
  ] as [SeedDetector, number, number][])(
    "is lowered by spreading: %s, %d Hz, %d dB",
    (detector, b3Hz, reductionDb) => {
      const setup = {
        detector,
        rbwHz: b3Hz * Math.SQRT2,
        startHz: 1.48e9,
        stopHz: 1.51e9,
        receiver: quietReceiver,
      };
      const before = highest(levels({ ...setup, link: single }));
      const spread = levels({ ...setup, link: { ...single, ...spreadBy(0.5) } });
      const middle = spread.subarray(5200, 6200);
      expect(Math.abs(before - highest(middle) - reductionDb)).toBeLessThan(2);
      expect(highest(spread)).toBeLessThan(before - reductionDb + 2);
    },
  );

  it("fills 0.5 % below a line that is spread downwards", () => {
    const link = { ...single, ...spreadBy(0.5) };
    const setup = { ...FLAT_SETUP, startHz: 1.48e9, stopHz: 1.51e9, receiver: quietReceiver, link };
    const { frequenciesHz, levelsDbuv } = makeSpectrum(setup);
    const top = highest(levelsDbuv);
    const filled = frequenciesHz.filter((_, i) => (levelsDbuv[i] ?? 0) > top - 6);
    expect(Math.abs((filled[0] ?? 0) - 1.4925e9)).toBeLessThan(120e3);
    expect(Math.abs((filled.at(-1) ?? 0) - 1.5e9)).toBeLessThan(120e3);
  });

  it("has peaks lowered and gaps filled by spreading, and keeps its power", () => {
    const wide = {
      startHz: 1.2e9,
      stopHz: 2e9,
      points: 16_001,
      rbwHz: 120e3,
      receiver: quietReceiver,
    };
    const before = levels({ ...wide, link: coded });
    const after = levels({ ...wide, link: { ...coded, ...spreadBy(0.5) } });
    const low = (values: Float32Array) => values.toSorted()[Math.floor(values.length / 5)] ?? 0;
    expect(highest(after)).toBeLessThan(highest(before) - 3);
    expect(low(after)).toBeGreaterThan(low(before) + 10);
    const power = (link: typeof coded) =>
      meanPowerDb(levels({ ...wide, detector: "average", link }));
    expect(Math.abs(power({ ...coded, ...spreadBy(0.5) }) - power(coded))).toBeLessThan(0.2);
  });

  it("really loses what a ferrite takes", () => {
    const ferrite: Treatment = {
      name: "",
      leaks: ["link-cable"],
      attenuation: [
        { frequencyHz: 1e9, factorDb: 8 },
        { frequencyHz: 2e9, factorDb: 8 },
      ],
    };
    expect(highest(levels({})) - highest(levels({ treatments: [ferrite] }))).toBeCloseTo(8, 1);
    const elsewhere: Treatment = { ...ferrite, leaks: ["supply-cable"] };
    expect(levels({ treatments: [elsewhere] })).toEqual(levels({}));
  });
});
