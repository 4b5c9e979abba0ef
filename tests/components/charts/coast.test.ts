import { describe, expect, it } from "vitest";
import type { CoastTrace } from "@/components/charts/coast-trace";
import { prepareCoast, type CoastInput } from "@/components/charts/prepare-coast";
import {
  nearestColumn,
  readAt,
  readoutRows,
  stepSample,
} from "@/components/charts/prepare-readout";
import { EXTENT, readMask, suspect, traceView } from "./fixtures";

const mask = readMask("cispr-32-radiated-class-b-10m");
const HZ = [50e6, 88.32e6, 150e6, 300e6, 900e6];

function trace(more: Partial<CoastTrace> = {}): CoastTrace {
  const view = traceView(HZ, [20, 33.2, null, 25, 22]);
  return { id: "a", name: "Quasi-peak H", role: "main", view, ...more };
}

function input(more: Partial<CoastInput> = {}): CoastInput {
  return {
    traces: [trace()],
    mask,
    suspects: [],
    view: EXTENT,
    extent: EXTENT,
    scale: "log",
    guardDb: 3,
    clocks: [],
    label: "Sweep 12",
    width: 1000,
    height: 400,
    margin: { top: 20, right: 10, bottom: 24, left: 40 },
    ...more,
  };
}

describe("the coast chart", () => {
  it("has a level axis that holds trace and mask", () => {
    const { levels } = prepareCoast(input()).plane;
    expect(levels.fromDb).toBeLessThan(20);
    expect(levels.toDb).toBeGreaterThan(37);
  });

  it("keeps its level axis while zooming into a gap", () => {
    const overview = traceView(HZ, [20, 33.2, null, 25, 60]);
    const whole = prepareCoast(input({ traces: [trace({ overview })] }));
    const gap = prepareCoast(
      input({
        traces: [trace({ overview, view: traceView([150e6], [null]) })],
        view: { fromHz: 140e6, toHz: 160e6 },
      }),
    );
    expect(gap.empty).toBe(true);
    expect(gap.plane.levels).toEqual(whole.plane.levels);
  });

  it("does not draw a mask in another unit, and says so", () => {
    const view = traceView(HZ, [-60, -50, -55, -70, -65], { unit: "dBm" });
    const drawn = prepareCoast(input({ traces: [trace({ view })] }));
    expect(drawn.coastline).toBeNull();
    expect(drawn.unit).toBe("dBm");
    expect(drawn.plane.levels.toDb).toBeLessThan(0);
    expect(drawn.notes).toEqual(["Mask not drawn: it is in dBµV/m, the trace in dBm."]);
    expect(drawn.summary).toContain("without a mask");
  });

  it("does not draw a second trace in another unit, and says so", () => {
    const view = traceView(HZ, [1, 2, 3, 4, 5], { unit: "dBuV" });
    const drawn = prepareCoast(
      input({ traces: [trace(), trace({ id: "b", name: "Peak V", role: "outline", view })] }),
    );
    expect(drawn.traces.map((one) => one.id)).toEqual(["a"]);
    expect(drawn.notes).toEqual(["Peak V not drawn: it is in dBµV, not dBµV/m."]);
  });

  it("says when there is no mask, and when the mask has no limit here", () => {
    expect(prepareCoast(input({ mask: null })).notes[0]).toContain("No mask");
    const above = readMask("cispr-32-above-1ghz-class-b-3m");
    const low = { fromHz: 30e6, toHz: 900e6 };
    expect(prepareCoast(input({ mask: above, extent: low, view: low })).notes).toContain(
      "The mask has no limit in these frequencies.",
    );
  });

  it("marks water over the coast only when the trace's own detector decides that line", () => {
    const aground = (more: Partial<CoastTrace>) =>
      prepareCoast(input({ traces: [trace(more)] })).traces[0]?.agroundIn;
    expect(aground({ detector: "quasi-peak", hold: "max-hold" })).not.toBe("");
    expect(aground({ detector: "peak", hold: "max-hold" })).toBe("");
    expect(aground({ detector: "quasi-peak", hold: "min-hold" })).toBe("");
    expect(aground({})).toBe("");
    expect(aground({ detector: "quasi-peak", hold: "none", role: "ambient" })).toBe("");
  });

  it("tells outlines apart by their dashes", () => {
    const outlines = ["b", "c"].map((id) => trace({ id, role: "outline" }));
    const [, one, other] = prepareCoast(input({ traces: [trace(), ...outlines] })).traces;
    expect(one?.dash).not.toEqual(other?.dash);
  });

  it("describes itself in a sentence", () => {
    const suspects = [suspect(1, 88.32e6, { marginDb: -3.2 }), suspect(2, 300e6, { marginDb: 12 })];
    expect(prepareCoast(input({ suspects })).summary).toBe(
      "Sweep 12: Quasi-peak H, 30.00 MHz to 1.000 GHz, against CISPR 32 class B, 10 m; 2 suspects in view, lowest margin \u22123.2 dB at 88.32 MHz.",
    );
  });

  it("is empty without traces, but still has its axes and its coast", () => {
    const drawn = prepareCoast(input({ traces: [], suspects: [suspect(1, 100e6)] }));
    expect(drawn.empty).toBe(true);
    expect(drawn.buoys).toEqual([]);
    expect(drawn.coastline?.lines).toHaveLength(1);
    expect(drawn.frequencyTicks.length).toBeGreaterThan(3);
  });
});

describe("the crosshair", () => {
  const at = (hz: number, traces = [trace({ detector: "quasi-peak", hold: "none" })]) =>
    readAt(traces, mask, hz, EXTENT, "log");

  it("snaps to a real sample and reads level, limit and margin there", () => {
    const readout = at(90e6);
    expect(readout?.hz).toBe(88.32e6);
    expect(readout?.frequency).toBe("88.32 MHz");
    expect(readout?.traces).toEqual([{ name: "Quasi-peak H", level: "33.2 dBµV/m" }]);
    expect(readout?.limits).toEqual([
      {
        name: "Quasi-peak",
        limit: "30.0 dBµV/m",
        margin: "\u22123.2 dB",
        over: true,
        caveat: null,
      },
    ]);
  });

  it("does not call a looser detector over, and says that it is a bound", () => {
    const [limit] = at(90e6, [trace({ detector: "peak", hold: "none" })])?.limits ?? [];
    expect(limit).toMatchObject({ over: false, caveat: "upper bound" });
    const [unstated] = at(90e6, [trace({ detector: null, hold: "none" })])?.limits ?? [];
    expect(unstated).toMatchObject({ over: false, caveat: "detector not stated" });
    const [unknown] = at(90e6, [trace()])?.limits ?? [];
    expect(unknown).toMatchObject({ over: false, margin: "\u22123.2 dB" });
  });

  it("reads nothing in a gap and nothing without a trace", () => {
    expect(at(150e6)).toBeNull();
    expect(at(150e6, [])).toBeNull();
  });

  it("reads no limit in another unit", () => {
    const view = traceView(HZ, [-60, -50, -55, -70, -65], { unit: "dBm" });
    expect(at(90e6, [trace({ view })])?.limits).toEqual([]);
  });

  it("reads other traces at their own samples and not beyond their ends", () => {
    const short = traceView([80e6, 100e6], [11, 12]);
    const second = trace({ id: "b", name: "After", role: "outline", view: short });
    expect(at(90e6, [trace(), second])?.traces[1]).toEqual({ name: "After", level: "11.0 dBµV/m" });
    expect(at(300e6, [trace(), second])?.traces[1]).toEqual({ name: "After", level: "no level" });
  });

  it("finds the nearest column on the axis as drawn", () => {
    const view = traceView([100e6, 1000e6], [1, 2]);
    expect(nearestColumn(view, 400e6, Math.log)).toBe(1);
    expect(nearestColumn(view, 400e6, (hz) => hz)).toBe(0);
    expect(nearestColumn(view, 5e9, Math.log)).toBe(1);
    expect(nearestColumn(traceView([], []), 1e6, Math.log)).toBe(-1);
  });

  it("steps from sample to sample over gaps, and stops at the end", () => {
    const view = traceView(HZ, [20, 33.2, null, 25, 22]);
    expect(stepSample(view, 88.32e6, 1)).toBe(300e6);
    expect(stepSample(view, 300e6, -1)).toBe(88.32e6);
    expect(stepSample(view, 900e6, 1)).toBeNull();
  });

  it("gets more rows on a narrow chart", () => {
    const names = [{ name: "Quasi-peak H" }];
    expect(readoutRows(names, mask, 1200)).toBe(1);
    expect(readoutRows(names, mask, 360)).toBeGreaterThan(1);
  });
});
