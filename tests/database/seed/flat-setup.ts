import { linkAtRest } from "@/db/seed/spectra/demo-story";
import type { Coupling, ProductModel, SpectrumSetup } from "@/db/seed/spectra/setup";

/** The same at every frequency, so that a level in the output is the level at the source. */
export const FLAT: Coupling = {
  atOneGhzDb: 0,
  slopeDbPerDecade: 0,
  resonances: [],
  cableHz: 1e9,
  rippleDb: 0,
  verticalDb: 0,
};

export const FLAT_PRODUCT: ProductModel = { amplitudeV: 1, coupling: FLAT, clocks: [] };

/** 3.2 Gb/s at rest, edges too fast to matter. */
export const AT_REST = linkAtRest(3.2e9, 32, 1e-15, "");

/** No signal path, nothing on air, no drift: 20 kHz steps around half of 3.2 Gb/s. */
export const FLAT_SETUP: SpectrumSetup = {
  seed: 1,
  startHz: 1.5e9,
  stopHz: 1.7e9,
  points: 10_001,
  rbwHz: 120e3,
  detector: "peak",
  polarization: "horizontal",
  path: { version: 1, impedanceOhm: 50, transducers: [] },
  receiver: { noiseFigureDb: 10, attenuationDb: 0, preamplifierNoiseFigureDb: 0, looks: 3000 },
  product: FLAT_PRODUCT,
  link: AT_REST,
  treatments: [],
  ambient: null,
  driftDb: 0,
};

export function highest(levels: Float32Array): number {
  return levels.reduce((top, level) => Math.max(top, level), Number.NEGATIVE_INFINITY);
}
