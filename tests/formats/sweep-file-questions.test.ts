import { expect, it } from "vitest";
import type { SweepFileAnswers } from "@/lib/formats/sweep-file";
import { hz, levels, preview, traces } from "./bytes";

const fields = (text: string, answers?: SweepFileAnswers) =>
  preview(text, answers).questions.map(({ field, traceIndex, guess }) => [
    field,
    traceIndex,
    guess,
  ]);

it("asks for everything a bare table leaves open, with the best guess", () => {
  const text = "1388.8,-102.08\n1389.0,-97.5\n1389.2,-99.1\n";
  expect(preview(text).outcome).toBe("ask");
  expect(fields(text)).toEqual([
    ["frequencyUnit", null, "1000000"],
    ["unit", 0, "dBm"],
    ["detector", 0, null],
  ]);
  const answers = { frequencyUnitHz: 1e6, unit: "dBm", detector: "average" } as const;
  const [trace] = traces(text, answers);
  expect(hz(trace!)[0]).toBe(1388.8e6);
  expect(trace).toMatchObject({ unit: "dBm", detector: "average", hold: "none" });
});

it("never takes a frequency for Hz because it is large", () => {
  expect(fields("Frequency,Level dBm\n30000000,-40\n31000000,-41\n")[0]).toEqual([
    "frequencyUnit",
    null,
    "1",
  ]);
});

it("takes the unit of the frequencies from a start and stop that state theirs", () => {
  const text =
    "Start,30,MHz\nStop,32,MHz\nDetector,Peak\nFrequency,Level dBuV\n30000000,1\n31000000,2\n32000000,3\n";
  expect(hz(traces(text)[0]!)).toEqual([30e6, 31e6, 32e6]);
});

it("offers the reference level's unit as a guess, and does not take it", () => {
  expect(fields("Ref Level,-20,dBm\nMHz,Level\n30,40\n31,41\n")).toEqual([
    ["unit", 0, "dBm"],
    ["detector", 0, null],
  ]);
});

it("does not fall back on the header when a column names a unit that is not known", () => {
  const shown = preview("Unit,dBm\nFrequency (MHz),PSD (dBm/Hz)\n30,-140\n31,-141\n");
  expect(shown.questions[0]).toMatchObject({ field: "unit", traceIndex: 0 });
  expect(shown.questions[0]?.why).toContain("dBm/Hz");
});

it.each(["RMS", "Auto Peak", "Normal", "2", "Log Average"])(
  "asks for the detector when the header says only %s",
  (word) => {
    const shown = preview(`Detector,${word}\nMHz,dBuV\n30,40\n31,41\n`);
    expect(shown.traces[0]?.detector).toBeNull();
    expect(shown.questions[0]?.why).toContain(`"${word}"`);
  },
);

it.each([
  ["Pos Peak", "peak"],
  ["MAXPEAK", "peak"],
  ["Quasi-Peak", "quasi-peak"],
  ["QPD", null],
  ["CISPR-RMS", "rms-average"],
  ["RMS Average", "rms-average"],
  ["CAVG", "average"],
  ["Sample", "sample"],
  ["Neg Peak", "negative-peak"],
])("reads the detector %s as %s", (word, detector) => {
  expect(preview(`Detector,${word}\nMHz,dBuV\n30,40\n31,41\n`).traces[0]?.detector).toBe(detector);
});

it("asks about an average beside a maximum, which may be of any detector", () => {
  const text = "Frequency (MHz),Maximum (dBuV),Average (dBuV)\n30,40,30\n31,41,31\n";
  expect(fields(text)).toEqual([
    ["detector", 0, null],
    ["detector", 1, "average"],
  ]);
});

it("asks once for a unit that all traces leave open", () => {
  expect(fields("MHz,Trace 1,Trace 2\n30,40,30\n31,41,31\n", { detector: "peak" })).toEqual([
    ["unit", null, "dBuV"],
  ]);
});

it("asks which mark is which when a comma could as well group thousands", () => {
  const text = "Frequency (kHz);Level (dBuV)\n30,000;40\n31,000;41\n";
  expect(fields(text, { detector: "peak" })).toEqual([["decimal", null, ","]]);
  expect(hz(traces(text, { detector: "peak", decimal: "." })[0]!)).toEqual([30e6, 31e6]);
  expect(hz(traces(text, { detector: "peak", decimal: "," })[0]!)).toEqual([30e3, 31e3]);
});

it("asks whether a few uneven frequencies are single-frequency readings", () => {
  const text = "MHz,QP (dBuV)\n31.2,40\n47.9,41\n148.5,38\n151.3,44\n612.7,36\n";
  expect(fields(text)).toEqual([["kind", null, "spots"]]);
  expect(traces(text, { kind: "spots" })[0]?.kind).toBe("spots");
});

it("lets answers for the file fill gaps only, and answers for a trace override", () => {
  const text = "MHz,A (dBuV) peak,B\n30,40,30\n31,41,31\n";
  const answers: SweepFileAnswers = { unit: "dBm", detector: "average" };
  expect(traces(text, answers).map(({ unit, detector }) => [unit, detector])).toEqual([
    ["dBuV", "peak"],
    ["dBm", "average"],
  ]);
  const overridden: SweepFileAnswers = {
    ...answers,
    traces: [{ column: 1, unit: "dBmV", detector: "quasi-peak", hold: "max-hold", name: "bench" }],
  };
  expect(traces(text, overridden)[0]).toMatchObject({
    name: "bench",
    unit: "dBmV",
    detector: "quasi-peak",
    hold: "max-hold",
  });
  expect(preview(text, overridden).warnings.join()).toContain("the file states dBuV");
});

it("leaves a column out, or takes one in, when told to", () => {
  const text = "MHz,A (dBuV),Margin (dB)\n30,40,10\n31,41,9\n";
  const base = { detector: "peak" } as const;
  expect(preview(text, base).leftOut.map(({ column }) => column)).toEqual([2]);
  const both = traces(text, { ...base, traces: [{ column: 2, use: true }] });
  expect(both.map(levels)).toEqual([
    [40, 41],
    [10, 9],
  ]);
  const swapped = {
    ...base,
    traces: [
      { column: 1, use: false },
      { column: 2, use: true },
    ],
  };
  expect(traces(text, swapped).map(({ name }) => name)).toEqual(["Margin"]);
});

it("leaves settings open that carry no unit or contradict each other, and warns", () => {
  const text =
    "RBW,120\nSweep Time,3\nVBW,1 kHz\nVBW,3 kHz\nDate,03/04/2026\nMHz,dBuV\n30,40\n31,41\n";
  const shown = preview(text);
  expect(shown.settings).toEqual({});
  expect(shown.warnings.join()).toMatch(/RBW 120.*VBW is stated twice.*|VBW.*RBW/s);
  expect(shown.warnings.join()).toContain("day and month may swap");
  expect(shown.warnings.join()).toContain("Sweep Time 3");
});

it("previews exactly what is stored", () => {
  const text = "MHz,dBuV peak\n30,40.1\n31,\n32,45.7\n33,41.3\n";
  const [trace] = traces(text);
  expect(preview(text).traces[0]).toEqual({
    index: 0,
    column: 1,
    name: "dBuV peak",
    kind: "scan",
    detector: "peak",
    hold: "none",
    unit: "dBuV",
    points: 4,
    firstHz: 30e6,
    lastHz: 33e6,
    stepHz: 1e6,
    firstLevel: trace!.levelsDb[0],
    lastLevel: trace!.levelsDb[3],
    maxLevel: trace!.levelsDb[2],
    maxAtHz: 32e6,
  });
});

it("reads bare bandwidths in Hz only beside frequencies in Hz, and says so", () => {
  const inHz = preview("RBW,120000\nFrequency (Hz),dBuV\n30e6,40\n31e6,41\n");
  expect(inHz.rbwHz).toBe(120e3);
  expect(inHz.warnings.join()).toContain("carry no unit; they were read in Hz");
});

it("reads bare bandwidths in the unit in which a bare start and stop meet the table", () => {
  const text = "START,30.0\nSTOP,32.0\nRBW,0.12\nMHz,dBuV\n30,40\n31,41\n32,40\n";
  expect(preview(text).rbwHz).toBe(120e3);
});
