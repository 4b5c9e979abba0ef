import type { Mask, MaskLine, MaskSegment } from "@/lib/core/mask/mask";
import type { Basis, DoubtCode, Standing } from "@/lib/core/reading/reading";
import type { ReadSweepInput } from "@/lib/core/reading/read-sweep";
import type { Detector, MeasurementSettings } from "@/lib/core/sweep/settings";
import type { FrequencyAxis, Trace } from "@/lib/core/sweep/trace";

/** What one line of the mask has to read; margins are worked out to 0.0001 dB. */
export interface ExpectedLine {
  standing: Standing;
  basis: Basis;
  /** Worst margin and its frequency, or null when nothing can be held against the line. */
  worst: [marginDb: number, frequencyHz: number] | null;
  /** Share of the line, 0…1; left out where the case is not about it. */
  coverage?: number;
}

export interface HandWorkedCase {
  name: string;
  mask: Mask;
  traces: Trace[];
  settings?: Partial<MeasurementSettings>;
  guardDb?: number;
  impedanceOhm?: number | null;
  restateDistance?: boolean;
  expected:
    | { notComparable: RegExp }
    | {
        standing: Standing;
        lines: ExpectedLine[];
        /** Every doubt among `JUDGED_DOUBTS`, and no other of them. */
        doubts?: DoubtCode[];
        /** The number that a doubt has to carry; its sign is not looked at. */
        doubtDb?: number;
        /** What the only doubt has to say. */
        doubtText?: RegExp;
        remeasureHz?: number[];
      };
}

/** The doubts that these cases decide; others depend on what is not part of a case. */
export const JUDGED_DOUBTS: ReadonlySet<DoubtCode> = new Set<DoubtCode>([
  "rbw-differs",
  "rbw-unstated",
  "rbw-kind-differs",
  "step-coarse",
  "not-covered",
  "sweep-time-short",
  "distance-restated",
  "mask-from-memory",
  "plane-wave-assumed",
]);

/** A radiated sweep at 3 m with everything stated that a reading looks at. */
export const SETTINGS: MeasurementSettings = {
  rbwHz: 120e3,
  rbwKind: "6dB",
  vbwHz: 1e6,
  sweepTimeS: 100,
  attenuationDb: 10,
  preamplifier: false,
  referenceLevelDb: 100,
  polarization: "vertical",
  heightM: 1,
  azimuthDeg: 0,
  distanceM: 3,
  port: "radiated",
};

/** A segment from one frequency to another, flat unless an end level is given. */
export function segment(
  startHz: number,
  stopHz: number,
  startDb: number,
  stopDb = startDb,
): MaskSegment {
  return { startHz, stopHz, startDb, stopDb, interpolation: "log" };
}

export function maskLine(
  detector: Detector,
  segments: MaskSegment[],
  part: Partial<MaskLine> = {},
): MaskLine {
  return { name: detector, detector, rbwHz: 120e3, rbwKind: "6dB", segments, ...part };
}

/** A radiated mask at 3 m in dBµV/m. */
export function maskOf(lines: MaskLine[], part: Partial<Mask> = {}): Mask {
  return {
    format: "neap-mask",
    version: 1,
    key: "hand-worked",
    title: "Hand-worked",
    port: "radiated",
    unit: "dBuV/m",
    distanceM: 3,
    document: "",
    clause: "",
    edition: "",
    provenance: "team",
    note: "",
    lines,
    ...part,
  };
}

function traceOf(axis: FrequencyAxis, levels: number[], part: Partial<Trace>): Trace {
  return {
    name: part.detector ?? "unstated",
    kind: "scan",
    detector: "quasi-peak",
    hold: "none",
    unit: "dBuV/m",
    axis,
    levelsDb: Float32Array.from(levels),
    ...part,
  };
}

/** A regular scan at one level, with other levels at some of its own frequencies. */
export function scan(
  [startHz, stopHz, stepHz]: readonly [number, number, number],
  floorDb: number,
  at: readonly (readonly [hz: number, db: number])[],
  part: Partial<Trace> = {},
): Trace {
  const count = Math.round((stopHz - startHz) / stepHz) + 1;
  const levels = new Array<number>(count).fill(floorDb);
  for (const [hz, db] of at) {
    const i = (hz - startHz) / stepHz;
    if (levels[i] === undefined) throw new Error(`${hz} Hz is no frequency of the scan`);
    levels[i] = db;
  }
  return traceOf({ kind: "regular", startHz, stepHz, count }, levels, part);
}

/** A trace with listed frequencies: a scan unless `kind` says spots. */
export function listed(
  points: readonly (readonly [hz: number, db: number])[],
  part: Partial<Trace> = {},
): Trace {
  const sorted = [...points].sort((a, b) => a[0] - b[0]);
  const frequenciesHz = Float64Array.from(sorted, ([hz]) => hz);
  return traceOf(
    { kind: "listed", frequenciesHz },
    sorted.map(([, db]) => db),
    part,
  );
}

/** Frequencies in even steps at one level, to be mixed with others into a listed trace. */
export function evenly(
  startHz: number,
  stopHz: number,
  stepHz: number,
  db: number,
): [number, number][] {
  const count = Math.round((stopHz - startHz) / stepHz) + 1;
  return Array.from({ length: count }, (_, i) => [startHz + i * stepHz, db]);
}

/** Final readings at single frequencies, quasi-peak unless said. */
export function spots(
  points: readonly (readonly [hz: number, db: number])[],
  part: Partial<Trace> = {},
): Trace {
  return listed(points, { kind: "spots", ...part });
}

/** The whole input of a case. */
export function inputOf(one: HandWorkedCase): ReadSweepInput & { restateDistance?: boolean } {
  return {
    traces: one.traces,
    settings: { ...SETTINGS, ...one.settings },
    mask: one.mask,
    guardDb: one.guardDb ?? 0,
    ...(one.impedanceOhm === undefined ? {} : { impedanceOhm: one.impedanceOhm }),
    ...(one.restateDistance === undefined ? {} : { restateDistance: one.restateDistance }),
  };
}
