import { readFileSync } from "node:fs";
import { join } from "node:path";
import { expect, it } from "vitest";
import Papa from "papaparse";
import { encode, hz, levels, preview, traces } from "./bytes";

const PEAK = { detector: "peak", hold: "none" } as const;
const STATED = { ...PEAK, unit: "dBuV", frequencyUnitHz: 1e6 } as const;
const fixture = (name: string) =>
  new Uint8Array(readFileSync(join(import.meta.dirname, "../fixtures/sweeps", name)));

it("reads settings, trace name, unit, detector and hold from a key and value header", () => {
  const [trace] = traces(fixture("key-value-unit.csv"));
  expect(trace).toMatchObject({
    name: "Trace 2",
    unit: "dBuV",
    detector: "peak",
    hold: "max-hold",
    axis: { kind: "regular", startHz: 30e6, stepHz: 60e3, count: 6 },
  });
  const shown = preview(new TextDecoder().decode(fixture("key-value-unit.csv")));
  expect(shown).toMatchObject({ outcome: "ready", rbwHz: 120e3, vbwHz: 1e6, warnings: [] });
  expect(shown.settings).toEqual({
    rbwHz: 120e3,
    vbwHz: 1e6,
    sweepTimeS: 0.25,
    attenuationDb: 10,
    preamplifier: false,
    referenceLevelDb: 80,
    measuredOn: "2026-03-18",
  });
});

it("reads sections, a level column that stands first, and a unit beside the trace's name", () => {
  const [trace] = traces(fixture("sections-level-first.txt"));
  expect(trace).toMatchObject({ unit: "dBuV/m", detector: "quasi-peak", hold: "max-hold" });
  expect(hz(trace!)).toEqual([10e6, 10.5e6, 11e6, 11.5e6]);
  expect(levels(trace!)).toEqual([20.5, 16.25, 15, 27.75]);
});

it("reads labels, a column of units, and settings in the unit of the table", () => {
  const file = fixture("labels-and-unit-column.csv");
  const [trace] = traces(file, { detector: "peak", unit: "dBm" });
  expect(hz(trace!)).toEqual([434e6, 434.01e6, 434.02e6, 434.03e6]);
  expect(levels(trace!)).toEqual([-86.5, -84.25, -29.875, -93]);
  expect(preview(new TextDecoder().decode(file)).rbwHz).toBe(1000);
});

it("reads a comment header with names, units and an end mark", () => {
  const text =
    "! DATA Freq,Bench A,Bench B\n! FREQ UNIT Hz\n! DATA UNIT dBm\nBEGIN\n100,-1,-2\n200,-3,-4\nEND\n";
  const read = traces(text, PEAK);
  expect(read.map(({ name, unit }) => [name, unit])).toEqual([
    ["Bench A", "dBm"],
    ["Bench B", "dBm"],
  ]);
  expect(read.map(levels)).toEqual([
    [-1, -3],
    [-2, -4],
  ]);
});

it("tells the detectors of several columns apart by their names", () => {
  const text =
    "Frequency (MHz);Peak (dBµV);QP (dBµV);CISPR-AV (dBµV)\n1;50,5;48;40\n2;51;47,5;41\n";
  expect(traces(text).map((trace) => trace.detector)).toEqual(["peak", "quasi-peak", "average"]);
});

it("passes over smaller tables of markers and bands, and says so", () => {
  const bands = [1, 2, 3, 4, 5, 6].map((n) => `${n},${n * 30}.0,${n * 30 + 20}.0,120`);
  const rows = [1, 2, 3, 4, 5, 6, 7].map((n) => `${n},${29 + n}.0,4${n},3${n}`);
  const text = `Band,Start (MHz),Stop (MHz),RBW\n${bands.join("\n")}\n\nNo.,Frequency (MHz),Peak (dBuV),AV (dBuV)\n${rows.join("\n")}\n`;
  const [peak, average] = traces(text);
  expect(hz(peak!)).toEqual([30e6, 31e6, 32e6, 33e6, 34e6, 35e6, 36e6]);
  expect(levels(average!)).toEqual([31, 32, 33, 34, 35, 36, 37]);
  expect(preview(text).warnings.join()).toContain("lines 2 to 7 was not read");
});

it("reads one table after another as further traces, each with its own header", () => {
  const block = (n: number, detector: string, add: number) =>
    `Trace;${n}\nDetector;${detector}\ny-Unit;dBm\nx-Unit;Hz\n100;${-50 + add}\n200;${-60 + add}\n300;${-70 + add}\n`;
  const read = traces(block(1, "Peak", 0) + block(2, "Average", -9));
  expect(read.map(({ name, detector }) => [name, detector])).toEqual([
    ["Trace 1", "peak"],
    ["Trace 2", "average"],
  ]);
  expect(read.map(levels)).toEqual([
    [-50, -60, -70],
    [-59, -69, -79],
  ]);
});

it("spreads levels without a frequency column from start to stop of the header", () => {
  const text = "#Start: 0 Hz\n#Stop: 4 kHz\n#Points: 5\n\n-10\n-20\n-15\n-30\n-25\n";
  const [trace] = traces(text, { ...PEAK, unit: "dB" });
  expect(hz(trace!)).toEqual([0, 1e3, 2e3, 3e3, 4e3]);
  expect(preview(text).warnings.join()).toContain("no frequency column");
});

it("turns linear units into dB, and zero into a gap that is counted", () => {
  const [trace] = traces("Frequency (MHz),Field (µV/m)\n30,100\n31,0\n32,10\n", PEAK);
  expect(trace?.unit).toBe("dBuV/m");
  expect(Array.from(trace!.levelsDb)).toEqual([40, NaN, 20]);
  expect(preview("Frequency (MHz),Field (µV/m)\n30,100\n31,0\n32,10\n").warnings.join()).toContain(
    "1 point at or below zero uV/m",
  );
  expect(levels(traces("Freq (Hz),Power (mW)\n1,1\n2,0.001\n", PEAK)[0]!)).toEqual([0, -30]);
});

it("makes gaps of missing levels and counts them", () => {
  const text = "MHz;dBuV\n30;40\n31;---\n32;nan\n33;\n34;41\n";
  expect(Array.from(traces(text, PEAK)[0]!.levelsDb)).toEqual([40, NaN, NaN, NaN, 41]);
  expect(preview(text).warnings.join()).toContain("3 points without a level");
});

it("leaves out traces that are off, and names them", () => {
  const text =
    "Hz,A (dBm),B (dBm),C (dBm),D (dBm)\n1,-40,-2147.48,0,\n2,-41,-2147.48,0,\n3,-42,-2147.48,0,\n";
  const shown = preview(text, PEAK);
  expect(shown.traces.map(({ name }) => name)).toEqual(["A"]);
  expect(shown.leftOut.map(({ name }) => name)).toEqual(["B", "C", "D"]);
});

it("reads thousands, the true minus sign and quoted decimal commas", () => {
  expect(
    hz(
      traces(
        "Hz;dBm\n30\u00a0000\u00a0000;\u221240,5\n30\u00a0010\u00a0000;\u221241,5\n",
        PEAK,
      )[0]!,
    ),
  ).toEqual([30e6, 30.01e6]);
  expect(levels(traces('MHz,dBm\n"30,5","-40,25"\n"31,5","-41,75"\n', PEAK)[0]!)).toEqual([
    -40.25, -41.75,
  ]);
  expect(hz(traces("Hz;dBm\n1,000,000;-40.5\n1,100,000;-41.5\n", PEAK)[0]!)).toEqual([1e6, 1.1e6]);
});

it("turns descending rows round, drops exact repeats, and warns of both", () => {
  const text = "MHz,dBuV\n32,43\n31,42\n31,42\n30,41\n";
  expect(hz(traces(text, PEAK)[0]!)).toEqual([30e6, 31e6, 32e6]);
  expect(levels(traces(text, PEAK)[0]!)).toEqual([41, 42, 43]);
  expect(preview(text).warnings.join()).toMatch(/descend.*Line 4 repeats/s);
});

it("reads mixed line ends, a block prefix, a delimiter line and a closing control-Z", () => {
  const body = "MHz,dBuV\r\n30,1\r31,2\n32,3\r\n\u001a";
  expect(levels(traces(body, PEAK)[0]!)).toEqual([1, 2, 3]);
  expect(levels(traces(`#220${body}`, PEAK)[0]!)).toEqual([1, 2, 3]);
  expect(levels(traces("sep=^\nMHz^dBuV\n30^1\n31^2\n", PEAK)[0]!)).toEqual([1, 2]);
});

it("keeps blank lines and comments within a table from ending it", () => {
  expect(levels(traces("MHz,dBuV\n30,1\n\n31,2\n# note\n32,3\n", PEAK)[0]!)).toEqual([1, 2, 3]);
});

it("reads declared points that are not all there, and warns", () => {
  const text = "Points,5\nMHz,dBuV\n30,1\n31,2\n32,3\n";
  expect(preview(text, PEAK).warnings.join()).toContain("declares 5 points, the table has 3");
});

it("reads the same numbers as a general CSV reader", () => {
  const text = Array.from(
    { length: 3000 },
    (_, i) => `${(30 + i * 0.0371).toFixed(4)},${(Math.sin(i) * 1e3).toExponential(i % 9)}`,
  ).join("\n");
  const rows = Papa.parse<string[]>(text).data;
  const [trace] = traces(encode(text), STATED);
  expect(Array.from(trace!.levelsDb)).toEqual(rows.map((row) => Math.fround(Number(row[1]))));
  hz(trace!).forEach((value, i) => expect(value).toBeCloseTo(Number(rows[i]?.[0]) * 1e6, 0));
});

it("puts rows of bins in order, keeps the highest of several passes, and says both", () => {
  const row = (time: string, low: number, levels: string) =>
    `2026-03-18, ${time}, ${low}, ${low + 300}, 100.00, 12, ${levels}`;
  const text = [
    row("10:00:00", 1300, "-53, -54, -55"),
    row("10:00:00", 1000, "-50, -51, -52"),
    row("10:00:01", 1300, "-63, -44, -65"),
    row("10:00:01", 1000, "-40, -61, -62"),
  ].join("\n");
  const answers = { unit: "dB", detector: "average", frequencyUnitHz: 1 } as const;
  const [trace, ...others] = traces(text, answers);
  expect(others).toEqual([]);
  expect(hz(trace!)).toEqual([1050, 1150, 1250, 1350, 1450, 1550]);
  expect(levels(trace!)).toEqual([-40, -51, -52, -53, -44, -55]);
  expect(trace).toMatchObject({ hold: "max-hold", axis: { kind: "regular" } });
  expect(preview(text, answers).warnings.join()).toMatch(/middle of its bin.*2 passes/s);
  const repeated = text.replaceAll(/$/gm, ", -1");
  expect(levels(traces(repeated, answers)[0]!)).toEqual(levels(trace!));
});

it("reads a list of final readings, and leaves out what is no level", () => {
  const text = [
    "Final readings",
    "Frequency (MHz);QuasiPeak (dBµV/m);Limit (dBµV/m);Margin (dB);Meas. Time (ms);Bandwidth (kHz);Height (cm);Pol;Azimuth (deg);Corr. (dB)",
    "31,2;33,4;40,00;6,6;1000;120,000;100,0;V;12,0;18,2",
    "87,5;30,4;40,00;9,6;1000;120,000;150,0;V;14,0;12,2",
    "243,9;39,4;47,00;7,6;1000;120,000;100,0;V;-12,0;14,2",
    "612,4;38,0;47,00;9,0;1000;120,000;100,0;V;-12,0;15,9",
  ].join("\n");
  const read = traces(text, { kind: "spots" });
  expect(read.map(({ unit, detector, kind }) => [unit, detector, kind])).toEqual([
    ["dBuV/m", "quasi-peak", "spots"],
  ]);
  expect(hz(read[0]!)).toEqual([31.2e6, 87.5e6, 243.9e6, 612.4e6]);
  expect(preview(text).leftOut.map(({ column }) => column)).toEqual([2, 3, 4, 5, 6, 8, 9]);
});

it("reads settings that stand below the table", () => {
  expect(preview("MHz,dBuV\n30,40\n31,41\n\nRBW,120 kHz\n").rbwHz).toBe(120e3);
});

it("leaves out phases that stand beside levels without a name, unless they are asked for", () => {
  const header = "#Trace: A\n#Trace: B\n#Start: 0 Hz\n#Stop: 3 kHz\n";
  const text = `${header}-50,180,-60,12\n-51,-179,-61,170\n-52,4,-62,-90\n-53,95,-63,0\n`;
  const answers = { ...PEAK, unit: "dB" } as const;
  expect(traces(text, answers).map(({ name }) => name)).toEqual(["A", "B"]);
  expect(traces(text, answers).map(levels)).toEqual([
    [-50, -51, -52, -53],
    [-60, -61, -62, -63],
  ]);
  expect(preview(text, answers).leftOut.map(({ column }) => column)).toEqual([1, 3]);
  expect(traces(text, { ...answers, traces: [{ column: 1, use: true }] })).toHaveLength(3);
});

it("reads settings that stand beside the data on the same lines", () => {
  const text =
    "RBW,120 kHz,,30,40\nDetector,Peak,,31,41\ny-Unit,dBuV,,32,42\nx-Unit,MHz,,33,41\n,,,34,40\n,,,35,39\n";
  const [trace, ...others] = traces(text);
  expect(others).toEqual([]);
  expect(hz(trace!)).toEqual([30e6, 31e6, 32e6, 33e6, 34e6, 35e6]);
  expect(trace).toMatchObject({ unit: "dBuV", detector: "peak" });
  expect(preview(text).rbwHz).toBe(120e3);
});
