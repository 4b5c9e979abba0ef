import { describe, expect, test } from "vitest";
import type { PastedLine } from "@/components/masks/read-pasted-table";
import { readPastedTable } from "@/components/masks/read-pasted-table";

function read(text: string, unit = "MHz") {
  const table = readPastedTable(text, unit);
  if (!table.ok) throw new Error(table.problems.join(" "));
  return table;
}
function problems(text: string): string[] {
  const table = readPastedTable(text, "MHz");
  return table.ok ? [] : table.problems;
}
/** "30 MHz..230 MHz 40/40 log" for each row. */
const told = ({ rows }: PastedLine) =>
  rows.map((r) => `${r.start}..${r.stop} ${r.startDb}/${r.stopDb} ${r.interpolation}`);

describe("one line pasted from a spreadsheet", () => {
  test.each([
    [
      "with a unit in the head",
      "Start (kHz)\tEnd (kHz)\tLimit\n150\t500\t66\n",
      "150 kHz..500 kHz 66/66 log",
    ],
    [
      "with decimal commas and a slope",
      "0,15\t0,5\t66\t56\tlinear",
      "150 kHz..500 kHz 66/56 linear",
    ],
    ["with semicolons", "30;230;40,5\r\n", "30 MHz..230 MHz 40.5/40.5 log"],
    ["with commas", "30,230,40\n", "30 MHz..230 MHz 40/40 log"],
    ["with spaces", "0,15 0,5 66\n", "150 kHz..500 kHz 66/66 log"],
    [
      "with a band in one cell",
      "Frequency range (MHz)\tLimit (dBµV)\n0.15 – 0.50\t66 to 56\n",
      "150 kHz..500 kHz 66/56 log",
    ],
    ["with units in the cells", "150 - 500 kHz\t-12 dBm\n", "150 kHz..500 kHz -12/-12 log"],
    [
      "with one head over both ends",
      "Frequency (MHz)\t\tLimit\n30\t230\t40\n",
      "30 MHz..230 MHz 40/40 log",
    ],
    [
      "with two units in the head",
      "from (kHz)\tto (MHz)\tlimit at start\tlimit at end\n150\t0.5\t66\t56",
      "150 kHz..500 kHz 66/56 log",
    ],
    [
      "with a unit above the head",
      "Band in kHz\t\t\nstart\tstop\tlevel\n150\t500\t66",
      "150 kHz..500 kHz 66/66 log",
    ],
  ])("%s", (_, text, row) => {
    const { lines } = read(text);
    expect(lines).toHaveLength(1);
    expect(told(lines[0]!)).toEqual([row]);
    expect(lines[0]?.detector).toBeNull();
  });

  test("keeps the unit of the limit that its head names", () => {
    expect(read("start\tstop\tlimit (dBuV/m)\n30\t88\t40").unit).toBe("dBuV/m");
    expect(read("30\t88\t40").unit).toBeNull();
  });
});

describe("several lines pasted at once", () => {
  const WIDE = [
    "Service\tStart (MHz)\tStop (MHz)\tPK (dBµV/m)\tQP (dBµV/m)\tAverage (dBµV/m)",
    "Long wave\t0.15\t0.30\t46\t33\t26",
    "Medium wave\t0.53\t1.8\t40\t-\t20",
    "Short wave\t5.9\t6.2\t40\t27\t",
  ].join("\n");

  test("one per detector of the head, each with the gaps between its bands", () => {
    const { lines, unit, unused } = read(WIDE);
    expect(lines.map(({ name, detector }) => [name, detector])).toEqual([
      ["Peak", "peak"],
      ["Quasi-peak", "quasi-peak"],
      ["Average", "average"],
    ]);
    expect(lines.map(told)).toEqual([
      ["150 kHz..300 kHz 46/46 log", "530 kHz..1.8 MHz 40/40 log", "5.9 MHz..6.2 MHz 40/40 log"],
      ["150 kHz..300 kHz 33/33 log", "5.9 MHz..6.2 MHz 27/27 log"],
      ["150 kHz..300 kHz 26/26 log", "530 kHz..1.8 MHz 20/20 log"],
    ]);
    expect(unit).toBe("dBuV/m");
    expect(unused).toEqual(["Service"]);
  });

  test("split where the bandwidth changes, and named after it", () => {
    const { lines } = read(
      "start (MHz)\tstop (MHz)\tRBW (kHz)\tPeak\tAverage\n0.15\t30\t9\t46\t26\n30\t54\t120\t40\t20",
    );
    expect(lines.map(({ name, rbw, rows }) => [name, rbw, rows.length])).toEqual([
      ["Peak, 9 kHz", "9 kHz", 1],
      ["Average, 9 kHz", "9 kHz", 1],
      ["Peak, 120 kHz", "120 kHz", 1],
      ["Average, 120 kHz", "120 kHz", 1],
    ]);
  });

  test("by a column that names the detector, and slopes in columns of their own", () => {
    const { lines } = read(
      [
        "Detector\tStart (MHz)\tStop (MHz)\tLimit at start\tLimit at end",
        "QP\t0.15\t0.5\t66\t56",
        "AV\t0.15\t0.5\t56\t46",
        "QP\t0.5\t5\t56\t56",
      ].join("\n"),
    );
    expect(lines.map((line) => [line.detector, told(line).length])).toEqual([
      ["quasi-peak", 2],
      ["average", 1],
    ]);
    const pairs = read(
      "start\tstop\tQP start\tAV start\tQP end\tAV end\n0.15\t0.5\t66\t56\t56\t46",
    );
    expect(pairs.lines.map(told)).toEqual([
      ["150 kHz..500 kHz 66/56 log"],
      ["150 kHz..500 kHz 56/46 log"],
    ]);
  });

  test("with heads over two rows and line ends inside a quoted head", () => {
    const { lines } = read(
      'Table 5\t\t\t\nFrequency\t\tQP\tAV\n"start\n(MHz)"\t"stop\n(MHz)"\tdBµV\tdBµV\n0.15\t0.5\t66\t56',
    );
    expect(lines.map(({ detector }) => detector)).toEqual(["quasi-peak", "average"]);
    expect(lines.map(told)).toEqual([
      ["150 kHz..500 kHz 66/66 log"],
      ["150 kHz..500 kHz 56/56 log"],
    ]);
  });
});

describe("a table that cannot be read", () => {
  test.each([
    [
      "a cell that is no frequency",
      "30\t230\t40\n230\tlots\t47",
      ['Row 2: "lots" is no frequency.'],
    ],
    ["thousands with a comma", "30\t1,000\t40", ['Row 1: "1,000" is no frequency.']],
    ["a limit that is none", "30\t230\thigh", ['Row 1: "high" is no level in dB.']],
    [
      "a limit that is missing",
      "30\t230\t40\n230\t1000\t",
      ["Row 2: the limit is missing; leave a band without a limit out."],
    ],
    [
      "a limit that is not in dB",
      "30\t88\t100 µV/m",
      ['Row 1: "µV/m" is no unit of a limit: limits are stated in dB.'],
    ],
    [
      "a word for the interpolation",
      "30\t88\t40\t40\tcurved",
      ['Row 1: "curved" is neither log nor linear.'],
    ],
    [
      "a bandwidth without a unit",
      "start\tstop\tRBW\tlimit\n30\t88\t120\t40",
      ['Row 2: "120" is no bandwidth with a unit.'],
    ],
    [
      "an unknown detector",
      "detector\tstart\tstop\tlimit\near\t30\t88\t40",
      ['Row 2: "ear" is no detector.'],
    ],
    [
      "a head without the ends",
      "colour\tsize\tlimit\n30\t88\t40",
      ["The head names no columns for the start and the end of a band."],
    ],
    [
      "two units of the limit",
      "30\t88\t40 dBm\n88\t216\t43 dBµV",
      ["The limits are in 2 units: paste one at a time."],
    ],
    ["no numbers", "nothing here", ["No row has the two ends of a band and a limit beside them."]],
  ])("says so for %s", (_, text, expected) => {
    expect(problems(text)).toEqual(expected);
  });

  test("names every row that is wrong, and gives none of the others", () => {
    expect(problems("30\t230\t40\n230\tlots\t47\n1\tx\ty\n")).toEqual([
      expect.stringMatching(/^Row 2/),
      expect.stringMatching(/^Row 3/),
      expect.stringMatching(/^Row 3/),
    ]);
  });
});
