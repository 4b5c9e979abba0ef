import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { maskFromJson, maskToJson } from "@/lib/core/mask/mask-json";
import { maskToCsv } from "@/lib/formats/mask-csv";
import { maskFromCsv, type MaskCsvAnswers } from "@/lib/formats/read-mask-csv";
import { readShippedMasks } from "@/lib/formats/shipped-masks";
import { arbitraryMask } from "./masks-arbitrary";

function read(text: string, answers?: MaskCsvAnswers) {
  const found = maskFromCsv(text, answers);
  if (!found.ok) throw new Error(JSON.stringify(found.problems));
  return found.mask;
}

function problems(text: string, answers?: MaskCsvAnswers): string[] {
  const found = maskFromCsv(text, answers);
  if (found.ok) throw new Error("Nothing was refused.");
  return found.problems.map(({ line, field, text: what }) => `${line ?? field}: ${what}`);
}

const HEAD = [
  "Neap mask,1",
  "title,Wheelhouse limit",
  "port,radiated",
  "provenance,team",
  "distance (m),3",
  "",
].join("\n");
const table = (...rows: string[]) => `${HEAD}\n${rows.join("\n")}\n`;
const COLUMNS = "detector,start (MHz),stop (MHz),level start (dBuV/m)";

describe("a mask in and out", () => {
  test("as CSV is the same mask, to the last digit", () => {
    fc.assert(
      fc.property(arbitraryMask, (mask) => {
        expect(read(maskToCsv(mask))).toEqual(mask);
        expect(read(`\uFEFF${maskToCsv(mask)}`)).toEqual(mask);
      }),
    );
  });

  test("as JSON is the same mask, to the last digit", () => {
    fc.assert(
      fc.property(arbitraryMask, (mask) => {
        expect(maskFromJson(JSON.parse(maskToJson(mask)))).toEqual({ ok: true, mask });
      }),
    );
  });

  test("holds for every mask that is shipped", async () => {
    for (const mask of await readShippedMasks()) expect(read(maskToCsv(mask))).toEqual(mask);
  });
});

describe("a mask's CSV", () => {
  test("says its units in the head and keeps formulas from being run", () => {
    const mask = read(table(COLUMNS, "quasi-peak,30,230,40"));
    const text = maskToCsv({ ...mask, note: "=SUM(A1)" });
    expect(text).toContain(
      "line,detector,rbw (kHz),rbw kind,start (MHz),stop (MHz),level start (dBµV/m),level stop (dBµV/m),interpolation\r\n",
    );
    expect(text).toContain("quasi-peak,quasi-peak,,,30,230,40,40,log\r\n");
    expect(text).toContain("note,'=SUM(A1)\r\n");
  });

  test("is read with the semicolons and decimal commas of another country's spreadsheet", () => {
    const text = [
      "sep=;",
      "Neap mask;1;;;;;;;",
      "title;Shore supply;;;;;;;",
      "port;mains;;;;;;;",
      "unit;dBµV;;;;;;;",
      "provenance;from memory;;;;;;;",
      ";;;;;;;;",
      "line;detector;rbw (kHz);rbw kind;start (MHz);stop (MHz);level start (dBµV);level stop (dBµV);interpolation",
      "QP;quasi-peak;9;6 dB;0,15;0,5;66,5;56,5;log",
      "QP;quasi-peak;9;6 dB;0,5;5;56,5;;",
    ].join("\r\n");
    expect(read(text)).toMatchObject({
      title: "Shore supply",
      port: "mains",
      unit: "dBuV",
      distanceM: null,
      provenance: "from memory",
      lines: [
        {
          name: "QP",
          rbwHz: 9e3,
          rbwKind: "6dB",
          segments: [
            { startHz: 150e3, stopHz: 500e3, startDb: 66.5, stopDb: 56.5 },
            { startHz: 500e3, stopHz: 5e6, startDb: 56.5, stopDb: 56.5 },
          ],
        },
      ],
    });
  });

  test("is read as pasted with tabs, with its units in the cells", () => {
    const rows = table("detector,start,stop,level", "QP,30 MHz,0.23 GHz,40 dBuV/m").replaceAll(
      ",",
      "\t",
    );
    expect(read(rows, { unit: "dBuV/m" }).lines[0]).toMatchObject({
      name: "quasi-peak",
      detector: "quasi-peak",
      segments: [{ startHz: 30e6, stopHz: 230e6, startDb: 40, stopDb: 40, interpolation: "log" }],
    });
  });

  test("keeps bands with gaps and several detectors apart, whatever the order of the rows", () => {
    const mask = read(
      table(COLUMNS, "peak,0.15,0.3,46", "average,0.15,0.3,26", "peak,0.53,1.8,40"),
    );
    expect(mask.lines.map((line) => [line.name, line.segments.length])).toEqual([
      ["peak", 2],
      ["average", 1],
    ]);
  });

  test("asks for what the file leaves open, and takes the answer", () => {
    const bare = "detector,start,stop,level\npeak,30,230,40\n";
    expect(problems(bare)).toEqual([
      expect.stringMatching(/^frequencyUnit: /),
      expect.stringMatching(/^unit: /),
      expect.stringMatching(/^title: /),
      expect.stringMatching(/^port: /),
      expect.stringMatching(/^provenance: /),
    ]);
    const mask = read(bare, {
      title: "Hull limit",
      port: "cable",
      unit: "dBuA",
      provenance: "from memory",
      frequencyUnit: "kHz",
    });
    expect(mask).toMatchObject({ title: "Hull limit", port: "cable", unit: "dBuA" });
    expect(mask.lines[0]?.segments[0]?.startHz).toBe(30e3);
  });

  test("what the file says counts before the answer", () => {
    const mask = read(table(COLUMNS, "peak,30,230,40"), {
      title: "Other",
      port: "mains",
      unit: "dBm",
      frequencyUnit: "Hz",
    });
    expect(mask).toMatchObject({ title: "Wheelhouse limit", port: "radiated", unit: "dBuV/m" });
    expect(mask.lines[0]?.segments[0]?.startHz).toBe(30e6);
  });

  test("tells the line of each part of the mask", () => {
    const found = maskFromCsv(table(COLUMNS, "peak,30,230,40", "", "peak,230,1000,47"));
    expect(found.ok && found.lineOf("lines.0.segments.0.stopHz")).toBe(8);
    expect(found.ok && found.lineOf("lines.0.segments.1")).toBe(10);
    expect(found.ok && found.lineOf("lines.0.name")).toBe(8);
    expect(found.ok && found.lineOf("distanceM")).toBe(5);
    expect(found.ok && found.lineOf("document")).toBeNull();
  });

  test.each([
    ["a frequency that is none", [COLUMNS, "peak,thirty,230,40"], /^8: .*"thirty" is no frequency/],
    ["a cell that is missing", [COLUMNS, "peak,30,,40"], /^8: the stop is missing/],
    ["an unknown detector", [COLUMNS, "ear,30,230,40"], /^8: "ear" is no detector/],
    ["a level that is none", [COLUMNS, "peak,30,230,high"], /^8: .*"high" is no level/],
    ["a level in another unit", [COLUMNS, "peak,30,230,40 dBm"], /^8: the level is in dBm/],
    ["an unknown unit", [COLUMNS, "peak,30 miles,230,40"], /^8: .*"miles" is no unit/],
    [
      "more cells than columns",
      [COLUMNS, "peak,0,15,0,5,66"],
      /^8: there are more cells than columns/,
    ],
    ["no segments", [COLUMNS], /^7: no segments/],
    ["no detector", ["start (MHz),stop (MHz),level (dBm)", "1,2,3"], /^7: .*"detector" is missing/],
    [
      "a column nobody knows",
      [`${COLUMNS},colour`, "peak,30,230,40,red"],
      /^7: "colour" is no column/,
    ],
    ["two columns of one name", [`${COLUMNS},stop`, "peak,30,230,40,5"], /^7: two columns/],
    [
      "limits that are not in dB",
      ["detector,start (MHz),stop (MHz),level (uV/m)", "peak,30,88,100"],
      /^7: limits are stated in dB/,
    ],
    [
      "one name with two detectors",
      [`line,${COLUMNS}`, "A,peak,30,88,40", "A,average,88,216,40"],
      /^9: "A" has another detector here than in line 8/,
    ],
    [
      "thousands that may be decimals",
      [`${COLUMNS}`, '"peak","1,000","2,000",40', "average,30.125,88,40"],
      /^7: it cannot be told whether the commas/,
    ],
  ])("names %s with its line", (_, rows, expected) => {
    expect(problems(table(...rows))).toContainEqual(expect.stringMatching(expected));
  });

  test.each([
    ["port,sea", /^2: the port must be one of/],
    ["unit,furlong", /^2: "furlong" is no unit/],
    ["unit,dBuV", /^3: the levels are in dBµV\/m, and line 2 says dBµV/],
    ["distance (ft),10", /^2: the distance is read in m/],
    ["distance,far", /^2: "far" is no distance/],
    ["colour,red", /^2: "colour" is no field/],
    ["title,a,b", /^2: "title" has more than one value/],
    ["Neap mask,2", /^2: this layout has the version "2"/],
  ])("refuses the field %j", (row, expected) => {
    const text = `title,T\n${row}\n${COLUMNS}\npeak,30,230,40\n`;
    expect(problems(text)).toContainEqual(expect.stringMatching(expected));
  });

  test("never throws, whatever the text", () => {
    fc.assert(
      fc.property(
        fc.array(
          fc.oneof(
            fc.string({ maxLength: 8 }),
            fc.constantFrom("start", "stop", "level", "detector", "\n", ",", ";", "\t", '"', "30"),
          ),
          { maxLength: 60 },
        ),
        (parts) => {
          expect(typeof maskFromCsv(parts.join("")).ok).toBe("boolean");
        },
      ),
    );
    expect(problems("no table at all")).toEqual([expect.stringMatching(/^text: No line is/)]);
  });
});
