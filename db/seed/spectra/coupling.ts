import type { FactorPoint } from "@/lib/core/bench/signal-path";
import type { Polarization } from "@/lib/core/sweep/settings";
import { makeRandom } from "./random";
import type { Coupling, Leak, Treatment } from "./setup";

/** Level of a table at a frequency, linear in log f, held at its ends. */
function heldAt(points: readonly FactorPoint[], hz: number): number {
  const after = points.findIndex((point) => point.frequencyHz >= hz);
  const high = points[after];
  const low = points[after - 1];
  if (!high) return points.at(-1)?.factorDb ?? 0;
  if (!low) return high.factorDb;
  const share = Math.log(hz / low.frequencyHz) / Math.log(high.frequencyHz / low.frequencyHz);
  return low.factorDb + (high.factorDb - low.factorDb) * share;
}

/** What the fitted treatments take away from one leak, in dB. */
function treatmentDb(treatments: readonly Treatment[], leak: Leak, hz: number): number {
  return treatments
    .filter((treatment) => treatment.leaks.includes(leak))
    .reduce((sum, treatment) => sum + heldAt(treatment.attenuation, hz), 0);
}

/** Field strength over source voltage in dB(1/m) at a frequency in Hz. */
export function couplingDb(
  coupling: Coupling,
  leak: Leak,
  treatments: readonly Treatment[],
  polarization: Polarization,
  hz: number,
): number {
  const vertical = polarization === "vertical";
  let level = coupling.atOneGhzDb + coupling.slopeDbPerDecade * Math.log10(hz / 1e9);
  for (const { hz: centreHz, gainDb, q } of coupling.resonances) {
    const detuning = q * (hz / centreHz - centreHz / hz);
    level += gainDb / (1 + detuning ** 2);
  }
  const turn = (hz / coupling.cableHz) * Math.PI + (vertical ? 0.9 : 0);
  level += coupling.rippleDb * Math.cos(turn) + (vertical ? coupling.verticalDb : 0);
  return level - treatmentDb(treatments, leak, hz);
}

/** Slow drift in dB over frequency: three seeded waves over log f. */
export function makeDrift(seed: number, driftDb: number): (hz: number) => number {
  const random = makeRandom(seed);
  const waves = [2, 5, 11].map((perDecade) => ({ perDecade, phase: 2 * Math.PI * random() }));
  const scale = driftDb * Math.sqrt(2 / waves.length);
  return (hz) =>
    waves.reduce(
      (sum, { perDecade, phase }) =>
        sum + scale * Math.cos(perDecade * Math.PI * Math.log10(hz / 1e6) + phase),
      0,
    );
}
