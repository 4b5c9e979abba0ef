import { factorAt } from "@/lib/core/bench/apply-signal-path";
import type { SignalPath } from "@/lib/core/bench/signal-path";
import { fromDb } from "./decibel";
import { drawNoiseReading, thermalNoiseDbuv } from "./detector-noise";
import { addAmbient, addKnownLines, addProduct, type Field } from "./field";
import { deriveSeed, drawNormal, makeRandom } from "./random";
import type { Receiver, SpectrumSetup } from "./setup";

export interface Spectrum {
  frequenciesHz: Float64Array;
  /** dBµV at the analyzer's input: the signal path is still to be added. */
  levelsDbuv: Float32Array;
}

/** Standard deviation of repeated readings of a swept line (common practice, no source). */
const SWEPT_SPREAD_DB = 0.25;

/** Factors of the whole path in dB, and those between the preamplifier and the input. */
function pathAt(path: SignalPath, hz: number): { totalDb: number; afterGainDb: number | null } {
  let totalDb = 0;
  let afterGainDb: number | null = null;
  for (const transducer of path.transducers) {
    // A table that ends inside the span is held here; the reading leaves those points uncovered.
    const factor = factorAt(transducer, hz) ?? transducer.factors.at(-1)?.factorDb ?? 0;
    const signed = transducer.kind === "preamplifier" ? -factor : factor;
    totalDb += signed;
    if (transducer.kind === "preamplifier") afterGainDb = signed;
    else if (afterGainDb !== null) afterGainDb += signed;
  }
  return { totalDb, afterGainDb };
}

/** Mean noise power at the input in µV²: the analyzer's own, and that of the preamplifier. */
function receiverNoiseUv2(receiver: Receiver, rbwHz: number, afterGainDb: number | null): number {
  const own = thermalNoiseDbuv(rbwHz, receiver.noiseFigureDb + receiver.attenuationDb);
  if (afterGainDb === null) return fromDb(own);
  const amplified = thermalNoiseDbuv(rbwHz, receiver.preamplifierNoiseFigureDb) - afterGainDb;
  return fromDb(own) + fromDb(amplified);
}

/**
 * One trace of the demo, worked out from the setup alone: link lines and hash, clocks, what is on
 * air, and receiver noise, each as its detector would read it. Fields add as powers.
 */
export function makeSpectrum(setup: SpectrumSetup): Spectrum {
  const { startHz, stopHz, points, detector, receiver } = setup;
  const stepHz = (stopHz - startHz) / (points - 1);
  const frequenciesHz = Float64Array.from({ length: points }, (_, i) => startHz + i * stepHz);
  const empty = () => new Float64Array(points);
  const field: Field = { lines: empty(), swept: empty(), noise: empty() };
  addProduct(field, setup, frequenciesHz);
  addAmbient(field, setup, frequenciesHz);
  addKnownLines(field, setup);
  const random = makeRandom(deriveSeed(setup.seed, `noise ${detector}`));
  const moments = makeRandom(deriveSeed(setup.seed, "modulation"));
  const levelsDbuv = new Float32Array(points);
  frequenciesHz.forEach((hz, i) => {
    const { totalDb, afterGainDb } = pathAt(setup.path, hz);
    const lossless = fromDb(-totalDb);
    const noise =
      (field.noise[i] ?? 0) * lossless + receiverNoiseUv2(receiver, setup.rbwHz, afterGainDb);
    const reading = noise * drawNoiseReading(detector, receiver.looks, random);
    // Each point meets the modulation at another moment, the same for all detectors at once.
    const swept = (field.swept[i] ?? 0) * fromDb(SWEPT_SPREAD_DB * drawNormal(moments));
    const lines = (field.lines[i] ?? 0) + swept;
    levelsDbuv[i] = 10 * Math.log10(lines * lossless + reading);
  });
  return { frequenciesHz, levelsDbuv };
}
