import type { FactorPoint, SignalPath } from "@/lib/core/bench/signal-path";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import type { Polarization } from "@/lib/core/sweep/settings";

/** Detectors that the generator can work out. */
export type SeedDetector = "peak" | "quasi-peak" | "average";

/** Where a source gets out of the product; a treatment acts on some of them. */
export type Leak = "link-cable" | "seam" | "supply-cable";

/**
 * Field strength per source voltage at the measuring distance, in dB(1/m): dBµV/m = dBµV + this.
 * The values are invented; the shape (a slope, cable resonances, a seam) is common practice.
 */
export interface Coupling {
  atOneGhzDb: number;
  slopeDbPerDecade: number;
  resonances: { hz: number; gainDb: number; q: number }[];
  /** Half-wave spacing of the attached cable and the depth of its ripple. */
  cableHz: number;
  rippleDb: number;
  /** Added when the antenna is vertical. */
  verticalDb: number;
}

/** A periodic source besides the link data: trapezoid of peak-to-peak amplitude and duty. */
export interface ClockSource {
  name: string;
  fundamentalHz: number;
  offsetPpm: number;
  amplitudeV: number;
  duty: number;
  edgeTimeS: number;
  leak: Leak;
  coupling: Coupling;
  /** Set for a source that comes in short bursts: how far other detectors read under the peak, dB. */
  burst?: { quasiPeakDb: number; averageDb: number };
  /** True for clocks made by the link's own spread clock generator. */
  followsSpread: boolean;
}

export interface ProductModel {
  /** Peak-to-peak swing of the transmitter in V. */
  amplitudeV: number;
  coupling: Coupling;
  clocks: ClockSource[];
}

/** Something fitted to the product that really takes energy away over its band. */
export interface Treatment {
  name: string;
  leaks: Leak[];
  /** Attenuation in dB, linear in log f, held at its ends. */
  attenuation: FactorPoint[];
}

export interface Receiver {
  noiseFigureDb: number;
  attenuationDb: number;
  /** Noise figure of the preamplifier in the signal path, if there is one. */
  preamplifierNoiseFigureDb: number;
  /** Independent looks at each point: dwell times bandwidth, over all repeats of a max hold. */
  looks: number;
}

/** Broadcast and radio services around an open bench; `siteSeed` fixes who is on air there. */
export interface AmbientSite {
  siteSeed: number;
  gainDb: number;
}

/** Everything that one trace depends on. */
export interface SpectrumSetup {
  seed: number;
  startHz: number;
  stopHz: number;
  points: number;
  /** 6 dB bandwidth. */
  rbwHz: number;
  detector: SeedDetector;
  polarization: Polarization;
  path: SignalPath;
  receiver: Receiver;
  /** null: product switched off, as for an ambient sweep. */
  product: ProductModel | null;
  link: LinkSettings | null;
  treatments: Treatment[];
  /** null: screened, or the input terminated. */
  ambient: AmbientSite | null;
  /** Steady lines of a known source, their level in dBµV/m at the antenna; left out: none. */
  lines?: { hz: number; levelDb: number }[];
  /** Slow level drift between sweeps (cable dress, turntable), about one standard deviation. */
  driftDb: number;
}
