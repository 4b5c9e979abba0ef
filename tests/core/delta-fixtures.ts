import type { ComparedSweep, ComparedTrace } from "@/lib/core/delta/compared-sweep";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import type { Detector, MeasurementSettings } from "@/lib/core/sweep/settings";
import type { Trace } from "@/lib/core/sweep/trace";

const SETTINGS: MeasurementSettings = {
  rbwHz: 120e3,
  rbwKind: "6dB",
  vbwHz: null,
  sweepTimeS: 1,
  attenuationDb: 10,
  preamplifier: false,
  referenceLevelDb: null,
  polarization: "horizontal",
  heightM: 1,
  azimuthDeg: 0,
  distanceM: 3,
  port: "radiated",
};

export const NO_LINK: LinkSettings = {
  bitRateHz: null,
  payload: null,
  patternBits: null,
  scrambler: null,
  scramblerPolynomial: null,
  scramblerRestartBits: null,
  coding: null,
  spread: null,
  spreadOff: null,
  edgeTimeS: null,
  cable: null,
};

export const TRACE: ComparedTrace = {
  name: "Peak",
  kind: "scan",
  detector: "peak",
  hold: "max-hold",
  unit: "dBuV/m",
  firstHz: 30e6,
  lastHz: 1e9,
  stepHz: 60e3,
  maxDb: 50,
  floorDb: 20,
  powerSumDb: 120,
};

export function sweep(
  part: Partial<Omit<ComparedSweep, "settings">> & { settings?: Partial<MeasurementSettings> } = {},
): ComparedSweep {
  return {
    id: "a",
    name: "Step 0",
    purpose: "product",
    benchId: "bench",
    benchName: "Bench",
    signalPathRevisionId: "path",
    signalPathRevision: 1,
    corrected: false,
    link: NO_LINK,
    traces: [TRACE],
    readings: [],
    ...part,
    settings: { ...SETTINGS, ...part.settings },
  };
}

export const reading = (marginDb: number, decidedBy: Detector = "peak") => ({
  maskRevisionId: "mask-1",
  maskTitle: "A mask",
  guardDb: 2,
  lines: [{ name: "Quasi-peak", standing: "clear" as const, marginDb, decidedBy, bands: [] }],
  suspects: [],
});

/** Levels over a regular axis from 100 MHz in steps of 60 kHz: a floor and some peaks by index. */
export function levelsOf(floorDb: number, peaks: Record<number, number>, count = 1000): Trace {
  const levelsDb = new Float32Array(count).fill(floorDb);
  for (const [i, level] of Object.entries(peaks)) levelsDb[Number(i)] = level;
  return {
    name: "Peak",
    kind: "scan",
    detector: "peak",
    hold: "max-hold",
    unit: "dBuV/m",
    axis: { kind: "regular", startHz: 100e6, stepHz: 60e3, count },
    levelsDb,
  };
}

/** Frequency of a sample of that axis in Hz. */
export const hzOf = (i: number) => 100e6 + i * 60e3;
