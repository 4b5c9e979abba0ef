import type { MeasurementSettings } from "@/lib/core/sweep/settings";
import type { SeedDetector } from "./setup";

export const CSV_LAYOUTS = ["plain", "header-block", "semicolon-decimal-comma"] as const;
export type CsvLayout = (typeof CSV_LAYOUTS)[number];

export interface CsvTrace {
  name: string;
  detector: SeedDetector;
  /** Unit of the file; levels are given in it. */
  unit: "dBuV" | "dBm";
  levels: Float32Array;
}

export interface SweepCsv {
  layout: CsvLayout;
  traces: readonly CsvTrace[];
  frequenciesHz: Float64Array;
  settings: MeasurementSettings;
  /** ISO date. */
  measuredOn: string;
}

const DETECTOR_WORDS: Record<SeedDetector, string> = {
  peak: "Peak",
  "quasi-peak": "Quasi-peak",
  average: "Average",
};

/** 120000 → "120 kHz", as an instrument's screen has it. */
function inWords(hz: number): string {
  return hz >= 1e6 ? `${hz / 1e6} MHz` : `${hz / 1e3} kHz`;
}

type Header = [key: string, value: string][];

function headerOf(sweep: SweepCsv, frequency: (hz: number) => string): Header {
  const { settings, traces, frequenciesHz } = sweep;
  const header: Header = [["Date", sweep.measuredOn]];
  const add = (key: string, value: number | string | null) => {
    if (value !== null) header.push([key, String(value)]);
  };
  add("Start", frequency(frequenciesHz[0] ?? 0));
  add("Stop", frequency(frequenciesHz.at(-1) ?? 0));
  add("RBW", settings.rbwHz === null ? null : inWords(settings.rbwHz));
  add("RBW filter", settings.rbwKind === null ? null : settings.rbwKind.replace("dB", " dB"));
  add("VBW", settings.vbwHz === null ? null : inWords(settings.vbwHz));
  add("Sweep time", settings.sweepTimeS === null ? null : `${settings.sweepTimeS} s`);
  add("Attenuation", settings.attenuationDb === null ? null : `${settings.attenuationDb} dB`);
  add("Detector", traces.map((trace) => DETECTOR_WORDS[trace.detector]).join(" + "));
  add("Points", frequenciesHz.length);
  return header;
}

/** The file an analyzer would have written. Frequencies are exact to 1 Hz, levels to 0.01 dB. */
export function writeSweepCsv(sweep: SweepCsv): string {
  const decimalComma = sweep.layout === "semicolon-decimal-comma";
  const inMhz = sweep.layout !== "plain";
  const separator = decimalComma ? ";" : ",";
  const local = (text: string) => (decimalComma ? text.replace(".", ",") : text);
  const frequency = (hz: number) => (inMhz ? local((hz / 1e6).toFixed(6)) : hz.toFixed(0));
  const header = headerOf(sweep, (hz) => `${inMhz ? hz / 1e6 : hz} ${inMhz ? "MHz" : "Hz"}`);
  const lines: string[] = [];
  if (sweep.layout === "header-block") lines.push("[Settings]");
  for (const [key, value] of header) lines.push(`${key}${separator}${local(value)}`);
  if (sweep.layout === "header-block") lines.push("", "[Traces]");
  const columns = sweep.traces.map((trace) => `${trace.name} (${trace.unit})`);
  lines.push([`Frequency (${inMhz ? "MHz" : "Hz"})`, ...columns].join(separator));
  sweep.frequenciesHz.forEach((hz, i) => {
    const cells = sweep.traces.map((trace) => local((trace.levels[i] ?? 0).toFixed(2)));
    lines.push([frequency(hz), ...cells].join(separator));
  });
  // Bench analyzers write the line ends of their own operating system.
  return lines.join("\r\n") + "\r\n";
}
