import { describe, expect, it } from "vitest";
import type { SignalPath, Transducer } from "@/lib/core/bench/signal-path";
import { validateSignalPath } from "@/lib/core/bench/validate-signal-path";

const antenna = (change: Partial<Transducer> = {}): Transducer => ({
  name: "Mast antenna",
  kind: "antenna",
  factors: [
    { frequencyHz: 30e6, factorDb: 18.5 },
    { frequencyHz: 1e9, factorDb: 24.1 },
  ],
  calibratedOn: "2026-02-01",
  dueOn: "2027-02-01",
  ...change,
});
const path = (...transducers: Transducer[]): SignalPath => ({
  version: 1,
  impedanceOhm: 50,
  transducers,
});
const paths = (of: SignalPath) => validateSignalPath(of).map((problem) => problem.path);

describe("validateSignalPath", () => {
  it("finds nothing wrong with a sound path, nor with one that has no transducers", () => {
    expect(validateSignalPath(path(antenna()))).toEqual([]);
    expect(validateSignalPath(path())).toEqual([]);
    expect(validateSignalPath({ ...path(), impedanceOhm: 75 })).toEqual([]);
  });

  it.each([0, -50, Number.NaN, Number.POSITIVE_INFINITY])("refuses an impedance of %s Ω", (ohm) => {
    expect(paths({ ...path(), impedanceOhm: ohm })).toEqual(["impedanceOhm"]);
  });

  it("wants names that are there and differ", () => {
    expect(paths(path(antenna({ name: "  " })))).toEqual(["transducers.0.name"]);
    expect(paths(path(antenna(), antenna({ name: "Mast antenna ", kind: "cable" })))).toEqual([
      "transducers.1.name",
    ]);
  });

  it.each<[string, [number, number][], string]>([
    ["an empty table", [], "empty"],
    ["one row", [[30e6, 18]], "one row"],
    [
      "a frequency of zero",
      [
        [0, 18],
        [1e6, 18],
      ],
      "Row 1",
    ],
    [
      "a frequency that is no number",
      [
        [1e6, 18],
        [Number.NaN, 18],
      ],
      "Row 2",
    ],
    [
      "a frequency twice",
      [
        [1e6, 18],
        [1e6, 19],
      ],
      "stands twice",
    ],
    [
      "descending frequencies",
      [
        [1e6, 18],
        [2e6, 18],
        [1.5e6, 18],
      ],
      "Row 3",
    ],
    [
      "a factor that is no number",
      [
        [1e6, Number.NaN],
        [2e6, 18],
      ],
      "Row 1",
    ],
    [
      "a factor beyond 200 dB",
      [
        [1e6, 18],
        [2e6, -200.1],
      ],
      "200 dB",
    ],
  ])("refuses %s, naming the row", (_, rows, word) => {
    const factors = rows.map(([frequencyHz, factorDb]) => ({ frequencyHz, factorDb }));
    const problems = validateSignalPath(
      path(antenna(), antenna({ name: "Cable", kind: "cable", factors })),
    );
    expect(problems.map((p) => p.path)).toEqual(["transducers.1.factors"]);
    expect(problems[0]?.text).toContain(word);
  });

  it("takes a factor of exactly 200 dB", () => {
    const factors = [
      { frequencyHz: 1, factorDb: -200 },
      { frequencyHz: 2, factorDb: 200 },
    ];
    expect(validateSignalPath(path(antenna({ factors })))).toEqual([]);
  });

  it("wants dates of the calendar, and the due date not before the calibration", () => {
    expect(paths(path(antenna({ calibratedOn: "2026-02-30" })))).toEqual([
      "transducers.0.calibratedOn",
    ]);
    expect(paths(path(antenna({ dueOn: "soon" })))).toEqual(["transducers.0.dueOn"]);
    expect(paths(path(antenna({ calibratedOn: "2026-02-01", dueOn: "2026-01-31" })))).toEqual([
      "transducers.0.dueOn",
    ]);
    expect(paths(path(antenna({ calibratedOn: "2026-02-01", dueOn: "2026-02-01" })))).toEqual([]);
    expect(paths(path(antenna({ calibratedOn: null, dueOn: null })))).toEqual([]);
  });

  it("takes a calibration of today and refuses one of tomorrow, where today is known", () => {
    const tomorrow = path(antenna({ calibratedOn: "2026-12-02", dueOn: "2027-12-02" }));
    expect(validateSignalPath(tomorrow, "2026-12-02")).toEqual([]);
    expect(validateSignalPath(tomorrow)).toEqual([]);
    const problems = validateSignalPath(tomorrow, "2026-12-01");
    expect(problems.map((p) => p.path)).toEqual(["transducers.0.calibratedOn"]);
    expect(problems[0]?.text).toContain("future");
  });

  it("refuses a second pick-up, and takes one with cables and amplifiers around it", () => {
    const named = (kind: Transducer["kind"]) => antenna({ name: kind, kind });
    expect(
      paths(path(named("attenuator"), named("lisn"), named("cable"), named("preamplifier"))),
    ).toEqual([]);
    for (const kind of ["antenna", "magnetic-loop", "lisn", "current-probe"] as const) {
      const twice = path(named(kind), named("cable"), named("near-field-probe"));
      expect(paths(twice)).toEqual(["transducers.2.kind"]);
    }
    const three = path(named("antenna"), named("lisn"), named("current-probe"));
    expect(paths(three)).toEqual(["transducers.1.kind", "transducers.2.kind"]);
  });
});
