import { expect, it } from "vitest";
import type { Mask } from "../../lib/core/mask/mask";
import { readSweep } from "../../lib/core/reading/read-sweep";
import type { Detector, MeasurementSettings } from "../../lib/core/sweep/settings";
import type { Trace } from "../../lib/core/sweep/trace";

const mask: Mask = {
  format: "neap-mask",
  version: 1,
  key: "t",
  title: "t",
  port: "radiated",
  unit: "dBuV/m",
  distanceM: 3,
  document: "",
  clause: "",
  edition: "",
  provenance: "team",
  note: "",
  lines: [
    {
      name: "QP",
      detector: "quasi-peak",
      rbwHz: 120e3,
      rbwKind: "6dB",
      segments: [
        { startHz: 30e6, stopHz: 31e6, startDb: 40, stopDb: 40, interpolation: "log" },
        { startHz: 31e6, stopHz: 32e6, startDb: 47, stopDb: 47, interpolation: "log" },
      ],
    },
  ],
};
const settings: MeasurementSettings = {
  rbwHz: 120e3,
  rbwKind: "6dB",
  vbwHz: null,
  sweepTimeS: null,
  attenuationDb: null,
  preamplifier: null,
  referenceLevelDb: null,
  polarization: null,
  heightM: null,
  azimuthDeg: null,
  distanceM: 3,
  port: "radiated",
};

function scan(detector: Detector, at: (i: number) => number, count = 41): Trace {
  return {
    name: detector,
    kind: "scan",
    detector,
    hold: "none",
    unit: "dBuV/m",
    axis: { kind: "regular", startHz: 30e6, stepHz: 50e3, count },
    levelsDb: Float32Array.from({ length: count }, (_, i) => at(i)),
  };
}

function spot(hz: number, levelDb: number): Trace {
  const axis = { kind: "listed" as const, frequenciesHz: Float64Array.of(hz) };
  return {
    ...scan("quasi-peak", () => 0),
    kind: "spots",
    axis,
    levelsDb: Float32Array.of(levelDb),
  };
}

function read(traces: Trace[], guardDb = 0) {
  return readSweep({ traces, settings, mask, guardDb });
}

it("gives each standing where it is due", () => {
  expect(read([scan("quasi-peak", () => 30)], 10).standing).toBe("clear");
  expect(read([scan("quasi-peak", () => 30)], 10.1).standing).toBe("inside-guard");
  expect(read([scan("quasi-peak", (i) => (i === 20 ? 40.5 : 30))]).standing).toBe("over");
  expect(read([scan("quasi-peak", (i) => (i === 21 ? 46 : 30))]).standing).toBe("clear");
  expect(read([scan("average", () => 10)]).standing).toBe("undecided");
  expect(read([]).standing).toBe("undecided");
});

it("asks for a measurement where a peak trace is over, and believes it", () => {
  const peak = scan("peak", (i) => (i === 10 ? 44 : 20));
  const before = read([peak]);
  expect(before.standing).toBe("undecided");
  expect(before.remeasure.map((r) => r.frequencyHz)).toEqual([30.5e6]);
  expect(before.suspects[0]?.marginDb).toBe(-4);
  expect(read([peak, spot(30.5e6, 38)]).standing).toBe("clear");
  expect(read([peak, spot(30.5e6, 41)]).standing).toBe("over");
});

it("never calls a gap clear", () => {
  const short = read([scan("quasi-peak", () => 30, 40)]);
  expect(short.standing).toBe("undecided");
  expect(short.lines[0]?.explanation).toMatch(/^Clear on 9\d % of the mask/);
  expect(read([scan("quasi-peak", (i) => (i === 7 ? NaN : 30))]).standing).toBe("undecided");
});

it("never restates a distance or makes a field of a voltage", () => {
  const traces = [scan("quasi-peak", () => 30)];
  const far = readSweep({ traces, settings: { ...settings, distanceM: 10 }, mask, guardDb: 0 });
  expect(far.notComparable).toContain("10 m");
  expect(read(traces.map((t) => ({ ...t, unit: "dBuV" }))).notComparable).toContain("signal path");
});

it("takes the higher of two peak traces on one grid as the bound, in either order", () => {
  const low = scan("peak", () => 20);
  const high = scan("peak", (i) => (i === 5 ? 44 : 20));
  for (const traces of [
    [low, high],
    [high, low],
  ]) {
    const reading = readSweep({ traces, settings, mask, guardDb: 0 });
    expect(reading.standing).toBe("undecided");
    expect(reading.lines[0]?.worst?.marginDb).toBe(-4);
    expect(reading.remeasure.map((point) => point.frequencyHz)).toEqual([30.25e6]);
  }
});

it("is over by its own detector's margin, not by a lower bound where that detector was not swept", () => {
  const own = scan("quasi-peak", (i) => (i < 10 ? 41 : Number.NaN));
  const bound = scan("peak", (i) => (i > 20 ? 60 : Number.NaN));
  const reading = read([own, bound]);
  expect(reading.standing).toBe("over");
  expect(reading.lines[0]).toMatchObject({ basis: "like-for-like", standing: "over" });
  expect(reading.lines[0]?.worst?.marginDb).toBe(-1);
  expect(reading.remeasure.length).toBeGreaterThan(0);
});
