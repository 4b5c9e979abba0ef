import { describe, expect, test } from "vitest";
import { readTogether } from "@/lib/core/reading/read-together";
import { remeasureRows } from "@/lib/core/reading/remeasure-rows";
import type { MeasurementSettings } from "@/lib/core/sweep/settings";
import { maskLine, maskOf, scan, segment, SETTINGS, spots } from "./hand-worked/case";

const SPAN = [30e6, 32e6, 50e3] as const;
const MASK = maskOf([maskLine("quasi-peak", [segment(30e6, 32e6, 40)])]);

function peakSweep(
  name: string,
  at: readonly (readonly [number, number])[],
  change: Partial<MeasurementSettings>,
) {
  const traces = [scan(SPAN, 20, at, { detector: "peak" })];
  return { name, traces, settings: { ...SETTINGS, ...change }, guardDb: 0 };
}

describe("remeasureRows", () => {
  test("names the position of the sweep whose bound lies over the line", () => {
    const sweeps = [
      peakSweep("Vertical", [[30.5e6, 44]], { polarization: "vertical", heightM: 1 }),
      peakSweep("Horizontal", [[31.5e6, 47]], {
        polarization: "horizontal",
        heightM: 2.5,
        azimuthDeg: 135,
      }),
    ];
    const rows = remeasureRows(readTogether(sweeps, MASK), sweeps);
    expect(rows).toHaveLength(2);
    expect(rows.find((row) => row.frequencyHz === 30.5e6)).toMatchObject({
      sweepName: "Vertical",
      polarization: "vertical",
      heightM: 1,
      azimuthDeg: 0,
      detector: "quasi-peak",
      rbwHz: 120e3,
      boundDb: 44,
      limitDb: 40,
    });
    expect(rows.find((row) => row.frequencyHz === 31.5e6)).toMatchObject({
      sweepName: "Horizontal",
      polarization: "horizontal",
      heightM: 2.5,
      azimuthDeg: 135,
      boundDb: 47,
    });
  });

  test("keeps one of two positions when a spot decided the other at the same frequency", () => {
    const at = [[30.5e6, 44]] as const;
    const vertical = { polarization: "vertical" as const };
    const sweeps = [
      peakSweep("Vertical", at, vertical),
      peakSweep("Horizontal", at, { polarization: "horizontal" }),
      {
        name: "Spots",
        traces: [spots([[30.5e6, 38]])],
        settings: { ...SETTINGS, ...vertical },
        guardDb: 0,
      },
    ];
    const rows = remeasureRows(readTogether(sweeps, MASK), sweeps);
    expect(rows.map((row) => [row.frequencyHz, row.sweepName])).toEqual([[30.5e6, "Horizontal"]]);
  });

  test("says nothing of a position that the sweep does not state", () => {
    const unstated = { polarization: null, heightM: null, azimuthDeg: null };
    const sweeps = [peakSweep("Alone", [[31e6, 41]], unstated)];
    const [row] = remeasureRows(readTogether(sweeps, MASK), sweeps);
    expect(row).toMatchObject({ sweepName: "Alone", ...unstated });
  });
});
