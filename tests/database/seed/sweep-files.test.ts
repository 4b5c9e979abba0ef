import { describe, expect, it } from "vitest";
import {
  BICONICAL_LOG_ANTENNA,
  HORN_ANTENNA,
  INPUT_ATTENUATOR,
  LONG_CABLE,
  PATH_ABOVE_1_GHZ,
  PATH_BELOW_1_GHZ,
  PREAMPLIFIER,
  SHORT_CABLE,
} from "@/db/seed/spectra/transducers";
import { CSV_LAYOUTS, writeSweepCsv, type SweepCsv } from "@/db/seed/spectra/write-csv";
import { factorAt } from "@/lib/core/bench/apply-signal-path";
import { makeAxis } from "@/lib/core/sweep/axis";

const frequenciesHz = Float64Array.from({ length: 19_401 }, (_, i) => 30e6 + i * 50e3);
const peak = frequenciesHz.map((hz) => 12 + 20 * Math.sin(hz / 7e6));

const sweep: Omit<SweepCsv, "layout"> = {
  traces: [
    { name: "Peak", detector: "peak", unit: "dBuV", levels: Float32Array.from(peak) },
    {
      name: "Quasi-peak",
      detector: "quasi-peak",
      unit: "dBuV",
      levels: Float32Array.from(peak, (level) => level - 4),
    },
  ],
  frequenciesHz,
  settings: {
    rbwHz: 120e3,
    rbwKind: "6dB",
    vbwHz: 1.2e6,
    sweepTimeS: 20.5,
    attenuationDb: 0,
    preamplifier: false,
    referenceLevelDb: null,
    polarization: "vertical",
    heightM: 1.5,
    azimuthDeg: null,
    distanceM: 3,
    port: "radiated",
  },
  measuredOn: "2026-05-18",
};

describe("a sweep's file", () => {
  it.each(CSV_LAYOUTS)("can be read back in the layout %s", (layout) => {
    const decimalComma = layout === "semicolon-decimal-comma";
    const lines = writeSweepCsv({ ...sweep, layout })
      .trimEnd()
      .split("\r\n");
    const cells = lines.map((line) => line.split(decimalComma ? ";" : ","));
    const top = cells.findIndex(([first]) => first?.startsWith("Frequency ("));
    const unit = layout === "plain" ? "Hz" : "MHz";
    expect(cells[top]).toEqual([`Frequency (${unit})`, "Peak (dBuV)", "Quasi-peak (dBuV)"]);
    const header = new Map(cells.slice(0, top).map(([key = "", value = ""]) => [key, value]));
    expect(header.get("Date")).toBe("2026-05-18");
    expect(header.get("RBW")).toBe("120 kHz");
    expect(header.get("RBW filter")).toBe("6 dB");
    expect(header.get("VBW")).toBe(decimalComma ? "1,2 MHz" : "1.2 MHz");
    expect(header.get("Sweep time")).toBe(decimalComma ? "20,5 s" : "20.5 s");
    expect(header.get("Attenuation")).toBe("0 dB");
    expect(header.get("Detector")).toBe("Peak + Quasi-peak");
    const numbers = cells
      .slice(top + 1)
      .map((row) => row.map((cell) => Number(decimalComma ? cell.replace(",", ".") : cell)));
    const scale = unit === "Hz" ? 1 : 1e6;
    const axis = makeAxis(
      Float64Array.from(numbers, ([f = 0]) => Math.round(f * scale)),
      1,
    );
    expect(axis).toEqual({ kind: "regular", startHz: 30e6, stepHz: 50e3, count: 19_401 });
    numbers.forEach(([, first = 0, second = 0], i) => {
      if (Math.abs(first - (peak[i] ?? 0)) > 0.0051) throw new Error(`Level ${i} is ${first}.`);
      if (Math.abs(second + 4 - (peak[i] ?? 0)) > 0.0051) throw new Error(`Level ${i}: ${second}.`);
    });
  });
});

describe("transducers of the demo", () => {
  it.each([
    ["biconical-log antenna", BICONICAL_LOG_ANTENNA, 30e6, 1e9],
    ["horn antenna", HORN_ANTENNA, 1e9, 6e9],
    ["long cable", LONG_CABLE, 30e6, 1e9],
    ["short cable", SHORT_CABLE, 1e9, 6e9],
    ["attenuator", INPUT_ATTENUATOR, 30e6, 6e9],
    ["preamplifier", PREAMPLIFIER, 1e9, 6e9],
  ] as const)("%s ascends and covers its span", (_, { factors }, startHz, stopHz) => {
    expect(factors[0]?.frequencyHz).toBeLessThanOrEqual(startHz);
    expect(factors.at(-1)?.frequencyHz).toBeGreaterThanOrEqual(stopHz);
    factors.slice(1).forEach((point, i) => {
      expect(point.frequencyHz).toBeGreaterThan(factors[i]?.frequencyHz ?? Infinity);
    });
  });

  it("antennas follow AF = 20 log f(MHz) − G − 29.77", () => {
    // 1 GHz and 6.5 dBi; 200 MHz and 5.5 dBi: by hand.
    expect(factorAt(HORN_ANTENNA, 1e9)).toBe(23.73);
    expect(factorAt(BICONICAL_LOG_ANTENNA, 200e6)).toBe(10.75);
  });

  it("cables lose about √f", () => {
    const ratio = (factorAt(LONG_CABLE, 1e9) ?? 0) / (factorAt(LONG_CABLE, 100e6) ?? 1);
    expect(ratio).toBeGreaterThan(Math.sqrt(10));
    expect(ratio).toBeLessThan(1.15 * Math.sqrt(10));
  });

  it("stand in the path from the field to the instrument", () => {
    expect(PATH_BELOW_1_GHZ.transducers.map((t) => t.kind)).toEqual(["antenna", "cable"]);
    const above = PATH_ABOVE_1_GHZ.transducers.map((t) => t.kind);
    expect(above).toEqual(["antenna", "preamplifier", "cable"]);
  });
});
