import {
  CODINGS,
  PAYLOADS,
  SCRAMBLERS,
  SPREAD_DIRECTIONS,
  SPREAD_PROFILES,
} from "@/lib/core/link/link-settings";
import { BANDWIDTH_KINDS, POLARIZATIONS, PORTS } from "@/lib/core/sweep/settings";

export type TagKind = "frequency" | "bit-rate" | "time" | "number" | "choice" | "flag" | "text";

export interface TagField {
  /** Path in the command's input, "rbwHz" or "spread.depthPercent". */
  path: string;
  label: string;
  kind: TagKind;
  hint?: string;
  options?: readonly { value: string; label: string }[];
}

const choices = (values: readonly string[], labels: Record<string, string> = {}) =>
  values.map((value) => ({ value, label: labels[value] ?? value.replaceAll("-", " ") }));

/** How a sweep was measured. */
export const MEASUREMENT_FIELDS: TagField[] = [
  { path: "port", label: "Port", kind: "choice", options: choices(PORTS) },
  { path: "distanceM", label: "Distance in m", kind: "number" },
  {
    path: "polarization",
    label: "Polarization",
    kind: "choice",
    options: choices(POLARIZATIONS),
  },
  {
    path: "conductor",
    label: "Conductor or cable",
    kind: "text",
    hint: "At a mains or cable port, for example L1",
  },
  { path: "heightM", label: "Antenna height in m", kind: "number" },
  { path: "azimuthDeg", label: "Azimuth in degrees", kind: "number" },
  { path: "rbwHz", label: "RBW", kind: "frequency", hint: "With its unit, for example 120 kHz" },
  {
    path: "rbwKind",
    label: "RBW counted at",
    kind: "choice",
    options: choices(BANDWIDTH_KINDS, { "3dB": "3 dB", "6dB": "6 dB" }),
  },
  { path: "vbwHz", label: "VBW", kind: "frequency" },
  { path: "sweepTimeS", label: "Sweep time", kind: "time" },
  { path: "attenuationDb", label: "Attenuation in dB", kind: "number" },
  { path: "preamplifier", label: "Instrument's preamplifier", kind: "flag" },
  { path: "referenceLevelDb", label: "Reference level in the file's unit", kind: "number" },
];

/** Settings of the link while the sweep was taken. */
export const LINK_FIELDS: TagField[] = [
  { path: "bitRateHz", label: "Bit rate", kind: "bit-rate", hint: "For example 3.2 Gb/s" },
  {
    path: "coding",
    label: "Coding",
    kind: "choice",
    options: choices(CODINGS, {
      "8b10b": "8b/10b",
      "9b10b": "9b/10b",
      "64b66b": "64b/66b",
      "128b130b": "128b/130b",
    }),
  },
  { path: "scrambler", label: "Scrambler", kind: "choice", options: choices(SCRAMBLERS) },
  { path: "scramblerPolynomial", label: "Scrambler polynomial", kind: "text" },
  { path: "scramblerRestartBits", label: "Scrambler restart in bits", kind: "number" },
  {
    path: "spreadOff",
    label: "Spread spectrum",
    kind: "choice",
    options: [
      { value: "false", label: "on" },
      { value: "true", label: "off" },
    ],
  },
  { path: "spread.depthPercent", label: "Spread depth in %", kind: "number" },
  {
    path: "spread.direction",
    label: "Spread direction",
    kind: "choice",
    options: choices(SPREAD_DIRECTIONS),
  },
  { path: "spread.modulationHz", label: "Spread modulation rate", kind: "frequency" },
  {
    path: "spread.profile",
    label: "Spread profile",
    kind: "choice",
    options: choices(SPREAD_PROFILES),
  },
  {
    path: "payload",
    label: "Payload",
    kind: "choice",
    options: choices(PAYLOADS, {
      prbs7: "PRBS7",
      prbs15: "PRBS15",
      prbs23: "PRBS23",
      prbs31: "PRBS31",
    }),
  },
  { path: "patternBits", label: "Pattern length in bits", kind: "number" },
  { path: "edgeTimeS", label: "Edge time, 20–80 %", kind: "time", hint: "For example 80 ps" },
  { path: "cable", label: "Cable", kind: "text" },
];
