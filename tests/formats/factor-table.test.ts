import { expect, it } from "vitest";
import { parseFactorTable } from "@/lib/formats/parse-factor-table";

const KNOWN = {
  ok: true,
  factors: [
    { frequencyHz: 30e6, factorDb: 18.25 },
    { frequencyHz: 87.5e6, factorDb: -9.5 },
    { frequencyHz: 1000e6, factorDb: 24 },
  ],
};

/** Sentences by line; fails when the table was read. */
function problems(text: string, frequencyUnitHz?: number): [number, string][] {
  const table = parseFactorTable(text, frequencyUnitHz);
  if (table.ok) throw new Error("the table was read");
  return table.problems.map(({ line, text: words }) => [line, words]);
}

it.each([
  ["comma", "Frequency (MHz),Factor (dB/m)\n30,18.25\n87.5,-9.5\n1000,24\n"],
  ["semicolon, decimal comma", "Frequenz [MHz];AF\r\n30,0;18,25\r\n87,5;-9,5\r\n1000,0;24,0\r\n"],
  ["tab of a spreadsheet", "MHz\tdB\n30\t18.25\n87.5\t-9.5\n1000\t24"],
  ["tab, decimal comma", "f in MHz\tdB\n30,0\t18,25\n87,5\t\u22129,5\n1000,0\t24"],
  ["spaces", "MHz dB\n30   18.25\n87.5 -9.5\n1000 24\n"],
  ["spaces, decimal comma", "MHz dB\n30,0 18,25\n87,5 -9,5\n1000,0 24,0\n"],
  ["comma and space", "# Loop, 2026\n# MHz, dB\n30, 18.25\n87.5, -9.5\n1000, 24\n"],
  ["quoted decimal comma", '"MHz","dB"\n"30,0","18,25"\n"87,5","-9,5"\n"1000,0","24,0"\n'],
  ["empty rows and a byte order mark", "\ufeffMHz,dB\n30,18.25\n\n87.5,-9.5\n1000,24\n"],
  ["GHz", "GHz;dB\n0.03;18.25\n0.0875;-9.5\n1;24\n"],
])("reads a table by %s", (_, text) => {
  expect(parseFactorTable(text)).toEqual(KNOWN);
});

it("names each row that lies below the one before it instead of sorting the table", () => {
  expect(problems("MHz,dB\n1000,24\n30,18.25\n87.5,-9.5\n")).toEqual([
    [3, expect.stringMatching(/30 lies below 1000 in line 2.*must rise/)],
  ]);
  expect(problems("MHz,dB\n1000,24\n87.5,-9.5\n30,18.25\n").map(([line]) => line)).toEqual([3, 4]);
});

it("asks for the unit of frequency when neither the header nor the caller names it", () => {
  const text = "30,18.25\n87.5,-9.5\n1000,24\n";
  expect(problems(text)).toEqual([[1, expect.stringContaining("in what unit")]]);
  expect(parseFactorTable(text, 1e6)).toEqual(KNOWN);
});

it("lets the unit in the header count before the caller's", () => {
  expect(parseFactorTable("MHz,dB\n30,18.25\n87.5,-9.5\n1000,24\n", 1e3)).toEqual(KNOWN);
});

it("names every line that is wrong", () => {
  expect(problems("MHz,dB\n30,1\n30.0,2\nabc,3\n40,x\n50,1,2\n60\n-1,3\n")).toEqual([
    [3, expect.stringContaining("repeats the frequency 30.0 of line 2")],
    [4, expect.stringContaining('frequency reads "abc"')],
    [5, expect.stringContaining('factor reads "x"')],
    [6, expect.stringContaining("3 values")],
    [7, expect.stringContaining("1 value;")],
    [8, expect.stringContaining('frequency reads "-1"')],
  ]);
});

it("refuses infinite factors, a single row, an empty text, and open thousands", () => {
  expect(problems("MHz,dB\n30,1e999\n40,2\n")[0]?.[1]).toContain("1e999");
  expect(problems("MHz,dB\n30,1\n")[0]?.[1]).toContain("at least two");
  expect(
    problems("", 1)
      .map(([, words]) => words)
      .join(),
  ).toContain("at least two");
  expect(problems("kHz;dB\n30,000;1\n40,000;2\n")[0]?.[1]).toContain("group thousands");
});
