import type { BandwidthKind, Detector, Port } from "../sweep/settings";
import type { LevelUnit } from "../units/level-units";

export const INTERPOLATIONS = ["log", "linear"] as const;
export type Interpolation = (typeof INTERPOLATIONS)[number];

export const PROVENANCES = ["read", "from memory", "team"] as const;
export type Provenance = (typeof PROVENANCES)[number];

/** Straight piece of a limit, inclusive at both ends; linear in log f ("log") or in f. */
export interface MaskSegment {
  startHz: number;
  stopHz: number;
  startDb: number;
  stopDb: number;
  interpolation: Interpolation;
}

/** The limit for one detector. Where segments meet or overlap the lower limit applies. */
export interface MaskLine {
  name: string;
  detector: Detector;
  rbwHz: number | null;
  rbwKind: BandwidthKind | null;
  segments: MaskSegment[];
}

/** Content of one mask revision; also the shape of the JSON files in `masks/`. */
export interface Mask {
  format: "neap-mask";
  version: 1;
  key: string;
  title: string;
  port: Port;
  unit: LevelUnit;
  /** Measuring distance in m for radiated masks, otherwise null. */
  distanceM: number | null;
  document: string;
  clause: string;
  edition: string;
  provenance: Provenance;
  note: string;
  lines: MaskLine[];
}
