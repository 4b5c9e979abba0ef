import { factorAt } from "@/lib/core/bench/apply-signal-path";
import type { SignalPath } from "@/lib/core/bench/signal-path";
import { ambientEmitters } from "./ambient";
import { clockLines } from "./clocks";
import { couplingDb, makeDrift } from "./coupling";
import { drawNoiseReading, noiseBandwidthHz, thermalNoiseDbuv } from "./detector-noise";
import { makeLinkSource } from "./link-source";
import { deriveSeed, makeRandom } from "./random";
import type { Coupling, Leak, Receiver, SpectrumSetup } from "./setup";
import { spreadReductionDb } from "./spread-reduction";

export interface Spectrum {
  frequenciesHz: Float64Array;
  /** dBµV at the analyzer's input: the signal path is still to be added. */
  levelsDbuv: Float32Array;
}

/** Field at the antenna, (µV/m)² per point: steady lines and noise-like power apart. */
interface Field {
  lines: Float64Array;
  noise: Float64Array;
}

const DB_PER_V2 = 120;
/** A Gaussian filter is followed this far out: 24.08·1.8² = 78 dB. */
const SKIRT_B6 = 1.8;

function fromDb(db: number): number {
  return 10 ** (db / 10);
}

/** Adds one line that fills `lowHz…highHz`, seen through a Gaussian filter of 6 dB width. */
function addLine(
  into: Float64Array,
  setup: SpectrumSetup,
  lowHz: number,
  highHz: number,
  levelDb: number,
): void {
  const stepHz = (setup.stopHz - setup.startHz) / (setup.points - 1);
  const reachHz = SKIRT_B6 * setup.rbwHz;
  const first = Math.max(0, Math.ceil((lowHz - reachHz - setup.startHz) / stepHz));
  const last = Math.min(setup.points - 1, Math.floor((highHz + reachHz - setup.startHz) / stepHz));
  for (let i = first; i <= last; i += 1) {
    const hz = setup.startHz + i * stepHz;
    const outsideHz = Math.max(0, lowHz - hz, hz - highHz);
    // 6.02 dB at half the 6 dB width.
    const level = levelDb - 24.08 * (outsideHz / setup.rbwHz) ** 2;
    into[i] = (into[i] ?? 0) + fromDb(level);
  }
}

/** Adds one source line, widened and lowered by the spread clock when it follows it. */
function addSourceLine(
  into: Float64Array,
  setup: SpectrumSetup,
  hz: number,
  levelDb: number,
  followsSpread: boolean,
): void {
  const spread = followsSpread ? (setup.link?.spread ?? null) : null;
  if (!spread) return addLine(into, setup, hz, hz, levelDb);
  const widthHz = (hz * spread.depthPercent) / 100;
  const below = { down: 1, centre: 0.5, up: 0 }[spread.direction];
  const lowHz = hz - widthHz * below;
  const reduction = spreadReductionDb(spread, widthHz, setup.rbwHz, setup.detector);
  addLine(into, setup, lowHz, lowHz + widthHz, levelDb - reduction);
}

function addProduct(field: Field, setup: SpectrumSetup, frequenciesHz: Float64Array): void {
  const { product, link, treatments, polarization, rbwHz } = setup;
  if (!product) return;
  const drift = makeDrift(deriveSeed(setup.seed, "drift"), setup.driftDb);
  const transfer = (coupling: Coupling, leak: Leak, hz: number) =>
    couplingDb(coupling, leak, treatments, polarization, hz) + drift(hz);
  const stopHz = setup.stopHz * 1.06;
  for (const clock of product.clocks)
    for (const { hz, powerV2 } of clockLines(clock, stopHz)) {
      if (hz < setup.startHz * 0.94 || powerV2 < 1e-18) continue;
      const level = 10 * Math.log10(powerV2) + DB_PER_V2 + transfer(clock.coupling, clock.leak, hz);
      addSourceLine(field.lines, setup, hz, level, clock.followsSpread);
    }
  if (!link) return;
  const source = makeLinkSource(link, product.amplitudeV, stopHz, rbwHz);
  for (const { hz, powerV2 } of source.lines) {
    if (hz < setup.startHz * 0.94 || powerV2 < 1e-18) continue;
    const level =
      10 * Math.log10(powerV2) + DB_PER_V2 + transfer(product.coupling, "link-cable", hz);
    addSourceLine(field.lines, setup, hz, level, true);
  }
  const bandwidthHz = noiseBandwidthHz(rbwHz);
  frequenciesHz.forEach((hz, i) => {
    const density = source.densityV2PerHz(hz);
    if (density === 0) return;
    const gainDb = transfer(product.coupling, "link-cable", hz) + DB_PER_V2;
    field.noise[i] = (field.noise[i] ?? 0) + density * bandwidthHz * fromDb(gainDb);
  });
}

function addAmbient(field: Field, setup: SpectrumSetup, frequenciesHz: Float64Array): void {
  if (!setup.ambient) return;
  const average = setup.detector === "average";
  for (const emitter of ambientEmitters(setup.ambient, setup.seed)) {
    const offDb = average ? 20 * Math.log10(emitter.duty) : 0;
    const [lowHz, highHz] = [-0.5, 0.5].map((side) => emitter.centreHz + side * emitter.widthHz);
    if (lowHz === undefined || highHz === undefined) continue;
    if (emitter.kind === "carrier") {
      addLine(field.lines, setup, lowHz, highHz, emitter.levelDb + offDb);
      continue;
    }
    const share = noiseBandwidthHz(Math.min(setup.rbwHz, emitter.widthHz)) / emitter.widthHz;
    if (highHz + 2 * setup.rbwHz < setup.startHz || lowHz - 2 * setup.rbwHz > setup.stopHz)
      continue;
    const block = new Float64Array(frequenciesHz.length);
    addLine(block, setup, lowHz, highHz, emitter.levelDb + offDb);
    block.forEach((power, i) => {
      field.noise[i] = (field.noise[i] ?? 0) + power * share;
    });
  }
}

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
  const field: Field = { lines: new Float64Array(points), noise: new Float64Array(points) };
  addProduct(field, setup, frequenciesHz);
  addAmbient(field, setup, frequenciesHz);
  const random = makeRandom(deriveSeed(setup.seed, `noise ${detector}`));
  const levelsDbuv = new Float32Array(points);
  frequenciesHz.forEach((hz, i) => {
    const { totalDb, afterGainDb } = pathAt(setup.path, hz);
    const lossless = fromDb(-totalDb);
    const noise =
      (field.noise[i] ?? 0) * lossless + receiverNoiseUv2(receiver, setup.rbwHz, afterGainDb);
    const reading = noise * drawNoiseReading(detector, receiver.looks, random);
    levelsDbuv[i] = 10 * Math.log10((field.lines[i] ?? 0) * lossless + reading);
  });
  return { frequenciesHz, levelsDbuv };
}
