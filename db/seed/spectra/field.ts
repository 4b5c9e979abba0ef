import { ambientEmitters } from "./ambient";
import { clockLines } from "./clocks";
import { couplingDb, makeDrift } from "./coupling";
import { fromDb } from "./decibel";
import { noiseBandwidthHz } from "./detector-noise";
import { makeLinkSource } from "./link-source";
import { deriveSeed } from "./random";
import type { ClockSource, Coupling, Leak, SeedDetector, SpectrumSetup } from "./setup";
import { readSweptLine } from "./spread-reduction";

/** Field at the antenna, (µV/m)² per point: steady and swept lines and noise-like power apart. */
export interface Field {
  lines: Float64Array;
  /** Lines of a spread clock. */
  swept: Float64Array;
  noise: Float64Array;
}

const DB_PER_V2 = 120;
/** A Gaussian filter is followed this far out: 24.08·1.8² = 78 dB. */
const SKIRT_B6 = 1.8;

/** Adds one line that fills `lowHz…highHz`, seen through a Gaussian filter of 6 dB width. */
function addLine(
  into: Float64Array,
  setup: SpectrumSetup,
  lowHz: number,
  highHz: number,
  levelDb: number,
  combine: (present: number, added: number, hz: number) => number = (present, added) =>
    present + added,
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
    into[i] = combine(into[i] ?? 0, fromDb(level), hz);
  }
}

/** Adds one source line, widened and lowered by the spread clock when it follows it. */
function addSourceLine(
  field: Field,
  setup: SpectrumSetup,
  hz: number,
  levelDb: number,
  followsSpread: boolean,
): void {
  const spread = followsSpread ? (setup.link?.spread ?? null) : null;
  if (!spread) return addLine(field.lines, setup, hz, hz, levelDb);
  const widthHz = (hz * spread.depthPercent) / 100;
  const below = { down: 1, centre: 0.5, up: 0 }[spread.direction];
  const centreHz = hz + widthHz * (0.5 - below);
  const { reductionDb, rippleDb } = readSweptLine(spread, widthHz, setup.rbwHz, setup.detector);
  const level = levelDb - reductionDb;
  if (setup.detector !== "average") {
    // Neighbouring lines that cover the same frequency come by one after the other: a peak
    // detector keeps the highest of them.
    const ends = [centreHz - widthHz / 2, centreHz + widthHz / 2] as const;
    return addLine(field.swept, setup, ...ends, level, (present, added) =>
      Math.max(present, added),
    );
  }
  // An average detector sees the sum of their times. As wide as keeps the line's power.
  const bandwidthHz = noiseBandwidthHz(setup.rbwHz);
  const filledHz = bandwidthHz * (fromDb(reductionDb) - 1);
  const lowHz = centreHz - filledHz / 2;
  const depth = fromDb(rippleDb) - 1;
  const periodHz = Math.max(4 * setup.rbwHz, widthHz / 9);
  addLine(field.swept, setup, lowHz, lowHz + filledHz, level, (present, added, at) => {
    return present + added * (1 + depth * Math.cos((2 * Math.PI * (at - lowHz)) / periodHz));
  });
}

/** How far a clock that comes in bursts reads under its peak, dB. */
function burstDb({ burst }: ClockSource, detector: SeedDetector): number {
  if (!burst || detector === "peak") return 0;
  return detector === "average" ? burst.averageDb : burst.quasiPeakDb;
}

/** Adds link and clocks; what follows the spread clock is swept. */
export function addProduct(field: Field, setup: SpectrumSetup, frequenciesHz: Float64Array): void {
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
      addSourceLine(field, setup, hz, level - burstDb(clock, setup.detector), clock.followsSpread);
    }
  if (!link) return;
  const source = makeLinkSource(link, product.amplitudeV, stopHz, rbwHz);
  for (const { hz, powerV2 } of source.lines) {
    if (hz < setup.startHz * 0.94 || powerV2 < 1e-18) continue;
    const level =
      10 * Math.log10(powerV2) + DB_PER_V2 + transfer(product.coupling, "link-cable", hz);
    addSourceLine(field, setup, hz, level, true);
  }
  const bandwidthHz = noiseBandwidthHz(rbwHz);
  frequenciesHz.forEach((hz, i) => {
    const density = source.densityV2PerHz(hz);
    if (density === 0) return;
    const gainDb = transfer(product.coupling, "link-cable", hz) + DB_PER_V2;
    field.noise[i] = (field.noise[i] ?? 0) + density * bandwidthHz * fromDb(gainDb);
  });
}

/** Adds the lines of a known source. */
export function addKnownLines(field: Field, setup: SpectrumSetup): void {
  for (const { hz, levelDb } of setup.lines ?? []) addLine(field.lines, setup, hz, hz, levelDb);
}

/** Adds what is on air. */
export function addAmbient(field: Field, setup: SpectrumSetup, frequenciesHz: Float64Array): void {
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
