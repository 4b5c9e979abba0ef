import { expect, it } from "vitest";
import { previewSweepFile } from "@/lib/formats/preview-sweep-file";
import { parseSweepFile } from "@/lib/formats/parse-sweep-file";
import { encode, preview } from "./bytes";

const STATED = { detector: "peak", hold: "none", unit: "dBuV", frequencyUnitHz: 1e6 } as const;

/** A refusal's line and sentence; fails when the file was not refused. */
function refusal(text: string): [number | null, string] {
  const shown = preview(text, STATED);
  expect(shown.outcome).toBe("refused");
  expect(parseSweepFile(encode(text), "x.csv", STATED).ok).toBe(false);
  return [shown.line, shown.reason ?? ""];
}

const NAMES = "MHz,dBuV\n";

it.each([
  ["a level that is text", `${NAMES}30,40\n31,abc\n32,41\n`, 3, /column 2.*"abc"/],
  ["text in the first row", `${NAMES}30,abc\n31,40\n32,41\n33,42\n`, 2, /"abc"/],
  ["text in the last row", `${NAMES}30,40\n31,41\n32,abc\n`, 4, /"abc"/],
  ["an infinite level", `${NAMES}30,40\n31,-inf\n32,41\n`, 3, /"-inf"/],
  ["an overflowing level", `${NAMES}30,40\n31,1e999\n32,41\n`, 3, /1e999/],
  ["a frequency that is missing", `${NAMES}30,40\n,41\n32,41\n`, 3, /frequency is empty/],
  ["a frequency that is text", `${NAMES}30,40\nx31,41\n32,41\n`, 3, /"x31"/],
  ["a row with a column too many", `${NAMES}30,40\n31,41,42\n32,41\n`, 3, /no row of 2 columns/],
  ["a row that is cut short", `${NAMES}30,40\n31\n32,41\n`, 3, /no row of 2 columns/],
  ["an order that changes", `${NAMES}30,40\n32,41\n31,42\n33,43\n`, 4, /31 comes after 32/],
  ["a repeat with another level", `${NAMES}30,40\n31,41\n31,42\n32,43\n`, 4, /repeated.*line 3/],
  ["a negative frequency", `${NAMES}-1,40\n0,41\n1,42\n`, 2, /negative/],
  ["a single point", `${NAMES}30,40\n`, 2, /only row of numbers/],
  ["a unit that changes", "30,MHz,40\n900,kHz,41\n31,MHz,42\n", 2, /unit changes/],
])("refuses %s and names the line", (_, text, line, words) => {
  const [at, reason] = refusal(text);
  expect(at).toBe(line);
  expect(reason).toMatch(words);
  expect(reason).toContain(`ine ${line}`);
});

it.each([
  ["an empty file", "", /empty/],
  ["a file of blanks", " \r\n\t\n", /empty/],
  ["a header without data", "Instrument,bench analyzer\nRBW,120,kHz\nDetector,Peak\n", /no data/],
  ["a wavelength axis", "Wave;Sample\n[nm];[counts]\n515,95;1152,0\n516,03;1296,0\n", /wavelength/],
  ["a time axis", "Time (s),Level (dBm)\n0.1,-40\n0.2,-41\n0.3,-40\n", /a time/],
  ["a table in no order", "7,1\n3,9\n8,2\n1,8\n5,0\n2,7\n", /no column that runs/],
  ["frequencies as names of columns", "Time,30 MHz,31 MHz\n1,-4,-5\n2,-6,-7\n", /names of columns/],
  ["traces that are all off", `${NAMES}30,0\n31,0\n32,0\n`, /No trace is left/],
  [
    "points that cannot be placed",
    "#Start: 0 Hz\n#Stop: 4 kHz\n#Points: 6\n-10\n-20\n-15\n",
    /declares 6 points but 3/,
  ],
])("refuses %s with a plain sentence", (_, text, words) => {
  expect(refusal(text)[1]).toMatch(words);
});

it("refuses binary bytes and files above 64 MB", () => {
  const picture = Uint8Array.from([
    0x89, 0x50, 0x4e, 0x47, 13, 10, 26, 10, 0, 0, 0, 13, 73, 72, 68, 82, 0, 0, 1,
  ]);
  expect(previewSweepFile(picture, "p.csv").reason).toContain("no text file");
  const large = previewSweepFile(new Uint8Array(64 * 1024 * 1024 + 1), "l.csv");
  expect(large.reason).toContain("up to 64 MB");
});

it("refuses commas that are both delimiter and decimal mark", () => {
  const text = "Frequency (MHz),Level (dBuV)\n30,50,41,25\n31,00,42,75\n31,50,43,00\n";
  expect(refusal(text)[1]).toMatch(/decimal/);
});

it("refuses a file of endless small tables instead of searching it for ever", () => {
  const text = Array.from({ length: 2100 }, (_, i) => `Part ${i} of many\n1,2\n2,1\n`).join("");
  expect(refusal(text)[1]).toContain("small tables");
});

it("a unit of frequency that no sweep can have been taken in is told, not stored", () => {
  const text = "f,level\n30000000,40\n30100000,41\n30200000,42\n";
  const answers = { frequencyUnitHz: 1e6, unit: "dBuV" as const, detector: "peak" as const };
  const preview = previewSweepFile(new TextEncoder().encode(text), "a.csv", answers);
  expect(preview.outcome).toBe("refused");
  expect(preview.reason).toContain("Check the unit of the frequencies");
});
