import fc from "fast-check";
import type { Mask, MaskLine, MaskSegment } from "@/lib/core/mask/mask";
import type { ReadSweepInput } from "@/lib/core/reading/read-sweep";
import { DETECTORS, HOLDS, type Detector } from "@/lib/core/sweep/settings";
import type { FrequencyAxis, Trace } from "@/lib/core/sweep/trace";
import type { LevelUnit } from "@/lib/core/units/level-units";
import { SETTINGS } from "./hand-worked/case";

const ORDERED: Detector[] = ["peak", "quasi-peak", "rms-average", "average"];

/** Whole kilohertz throughout, so that samples, edges and the reach of spots often coincide. */
const kilohertz = (from: number, to: number) =>
  fc.integer({ min: from, max: to }).map((khz) => khz * 1000);

/** Eighths of a decibel: exact as float32, and equal ones come up. */
const eighths = (fromDb: number, toDb: number) =>
  fc.integer({ min: 8 * fromDb, max: 8 * toDb }).map((n) => n / 8);

const regularAxis = fc
  .tuple(kilohertz(100, 400), kilohertz(1, 20), fc.integer({ min: 1, max: 90 }))
  .map(([startHz, stepHz, count]): FrequencyAxis => ({ kind: "regular", startHz, stepHz, count }));

/** Steps of one to two units, and now and then one so wide that it is a gap. */
const stepUnits = fc.oneof(
  { weight: 12, arbitrary: fc.integer({ min: 1, max: 2 }) },
  { weight: 1, arbitrary: fc.integer({ min: 3, max: 30 }) },
);

const listedAxis = fc
  .tuple(kilohertz(100, 400), kilohertz(1, 20), fc.array(stepUnits, { maxLength: 90 }))
  .map(([startHz, unitHz, steps]): FrequencyAxis => {
    const frequenciesHz = new Float64Array(steps.length + 1).fill(startHz);
    steps.forEach((units, i) => {
      frequenciesHz[i + 1] = (frequenciesHz[i] ?? 0) + units * unitHz;
    });
    return { kind: "listed", frequenciesHz };
  });

export const anyAxis = fc.oneof(regularAxis, listedAxis);

const countOf = (axis: FrequencyAxis) =>
  axis.kind === "regular" ? axis.count : axis.frequenciesHz.length;

const level = fc.oneof(
  { weight: 20, arbitrary: eighths(0, 60) },
  { weight: 1, arbitrary: fc.constant(Number.NaN) },
);

interface TraceRules {
  unit: LevelUnit;
  offsetDb: number;
  detector: fc.Arbitrary<Detector | null>;
  hold: fc.Arbitrary<Trace["hold"]>;
}

function traceOn(axis: FrequencyAxis, { unit, offsetDb, detector, hold }: TraceRules) {
  const count = countOf(axis);
  return fc
    .record({
      levels: fc.array(level, { minLength: count, maxLength: count, size: "max" }),
      isSpots: axis.kind === "listed" ? fc.nat({ max: 2 }) : fc.constant(1),
      detector,
      hold,
    })
    .map(({ levels, isSpots, ...said }): Trace => ({
      name: "A trace",
      kind: isSpots === 0 ? "spots" : "scan",
      unit,
      axis,
      levelsDb: Float32Array.from(levels, (db) => db + offsetDb),
      ...said,
    }));
}

/** Segments that touch, overlap, lie apart or lie in one another, in any order. */
export const segments = fc
  .tuple(
    kilohertz(80, 500),
    fc.array(
      fc.record({
        widthHz: kilohertz(5, 600),
        startDb: eighths(30, 90),
        changeDb: fc.oneof(fc.constant(0), eighths(-30, 30)),
        interpolation: fc.constantFrom("log" as const, "linear" as const),
        next: fc.constantFrom("touching", "apart", "overlapping"),
        moveHz: kilohertz(1, 300),
      }),
      { minLength: 1, maxLength: 5 },
    ),
    fc.boolean(),
  )
  .map(([firstHz, made, isReversed]) => {
    let startHz = firstHz;
    const list = made.map(
      ({ widthHz, startDb, changeDb, interpolation, next, moveHz }): MaskSegment => {
        const stopHz = startHz + widthHz;
        const segment = { startHz, stopHz, startDb, stopDb: startDb + changeDb, interpolation };
        if (next === "touching") startHz = stopHz;
        else startHz = next === "apart" ? stopHz + moveHz : startHz + moveHz;
        return segment;
      },
    );
    return isReversed ? list.reverse() : list;
  });

const lineOf = (detector: Detector, list: MaskSegment[], i = 0): MaskLine => ({
  name: `Line ${i + 1}`,
  detector,
  rbwHz: 9e3,
  rbwKind: "6dB",
  segments: list,
});

const PAIRS: [trace: LevelUnit, mask: LevelUnit, roughDb: number][] = [
  ["dBuV", "dBuV", 0],
  ["dBm", "dBuV", 107],
  ["dBmV", "dBuV", 60],
  ["dBuV", "dBm", -107],
];

interface CaseRules {
  /** One detector for every trace and line, so that nothing is a bound. */
  isOneDetector?: boolean;
  /** Traces in the mask's own unit. */
  isOneUnit?: boolean;
}

/** A sweep and a mask; some lie low enough to be clear, others far over. */
export function anyCase(rules: CaseRules = {}): fc.Arbitrary<ReadSweepInput> {
  return fc
    .record({
      pair: rules.isOneUnit ? fc.constant(PAIRS[0]!) : fc.constantFrom(...PAIRS),
      impedanceOhm: fc.constantFrom(50, 75),
      liftDb: fc.integer({ min: -30, max: 30 }),
      rbwHz: fc.oneof({ weight: 4, arbitrary: kilohertz(1, 30) }, fc.constant(null)),
      only: fc.constantFrom(...ORDERED),
      lines: fc.array(fc.tuple(fc.constantFrom(...ORDERED), segments), {
        minLength: 1,
        maxLength: 3,
      }),
      axes: fc.array(anyAxis, { minLength: 1, maxLength: 3 }),
      shared: fc.boolean(),
      guardDb: fc.constantFrom(0, 2, 12, 40),
    })
    .chain(({ pair: [unit, maskUnit, roughDb], axes, shared, ...made }) => {
      const detector = rules.isOneDetector
        ? fc.constant(made.only)
        : fc.oneof(
            { weight: 6, arbitrary: fc.constantFrom(...ORDERED) },
            fc.constantFrom(...DETECTORS, null),
          );
      const hold = rules.isOneDetector
        ? fc.constant("none" as const)
        : fc.oneof(
            { weight: 4, arbitrary: fc.constant("none" as const) },
            fc.constantFrom(...HOLDS),
          );
      const limitDb = maskUnit === "dBm" ? -107 : 0;
      const offsetDb = made.liftDb - roughDb + limitDb;
      const traces = axes.map((axis) =>
        traceOn(shared ? axes[0]! : axis, { unit, offsetDb, detector, hold }),
      );
      const mask: Mask = {
        format: "neap-mask",
        version: 1,
        key: "any",
        title: "Any",
        port: "other",
        unit: maskUnit,
        distanceM: null,
        document: "",
        clause: "",
        edition: "",
        provenance: "team",
        note: "",
        lines: made.lines.map(([lineDetector, list], i) => {
          // A thirty-second off the levels' eighths: no margin of a flat limit is exactly zero.
          const off = (db: number) => db + limitDb + 1 / 32;
          const moved = list.map((s) => ({ ...s, startDb: off(s.startDb), stopDb: off(s.stopDb) }));
          return lineOf(rules.isOneDetector ? made.only : lineDetector, moved, i);
        }),
      };
      return fc.tuple(...traces).map((list) => ({
        traces: list,
        settings: {
          ...SETTINGS,
          rbwHz: made.rbwHz,
          port: "other" as const,
          polarization: null,
          distanceM: null,
        },
        mask,
        guardDb: made.guardDb,
        impedanceOhm: made.impedanceOhm,
      }));
    });
}
