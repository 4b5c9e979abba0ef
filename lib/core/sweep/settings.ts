export const DETECTORS = [
  "peak",
  "quasi-peak",
  "rms-average",
  "average",
  "sample",
  "negative-peak",
] as const;
export type Detector = (typeof DETECTORS)[number];

export const DETECTOR_LABELS: Record<Detector, string> = {
  peak: "peak",
  "quasi-peak": "quasi-peak",
  "rms-average": "RMS-average",
  average: "average",
  sample: "sample",
  "negative-peak": "negative peak",
};

export const HOLDS = ["none", "max-hold", "min-hold", "average"] as const;
export type Hold = (typeof HOLDS)[number];

export const HOLD_LABELS: Record<Hold, string> = {
  none: "no hold",
  "max-hold": "max hold",
  "min-hold": "min hold",
  average: "trace average",
};

export const TRACE_KINDS = ["scan", "spots"] as const;
export type TraceKind = (typeof TRACE_KINDS)[number];

export const SWEEP_PURPOSES = ["product", "ambient", "floor"] as const;
export type SweepPurpose = (typeof SWEEP_PURPOSES)[number];

export const POLARIZATIONS = ["horizontal", "vertical"] as const;
export type Polarization = (typeof POLARIZATIONS)[number];

/** Which points of the filter curve the bandwidth is counted between. */
export const BANDWIDTH_KINDS = ["3dB", "6dB"] as const;
export type BandwidthKind = (typeof BANDWIDTH_KINDS)[number];

export const PORTS = ["radiated", "mains", "cable", "near-field", "other"] as const;
export type Port = (typeof PORTS)[number];

/** How a sweep was measured. `null` means: not stated, and nothing is assumed. */
export interface MeasurementSettings {
  rbwHz: number | null;
  rbwKind: BandwidthKind | null;
  vbwHz: number | null;
  sweepTimeS: number | null;
  attenuationDb: number | null;
  preamplifier: boolean | null;
  referenceLevelDb: number | null;
  polarization: Polarization | null;
  /** Conductor or cable of a mains, cable or other port, for instance "L1"; missing: not stated. */
  conductor?: string | null;
  heightM: number | null;
  azimuthDeg: number | null;
  distanceM: number | null;
  port: Port;
}
