import { describe, expect, test } from "vitest";
import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import { STANDING_LABELS } from "@/lib/core/reading/reading";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import { formatDelta, formatFrequency, formatMargin } from "@/lib/core/units/format";
import { DISTRIBUTION_LABELS, REFERENCE_LABELS } from "@/lib/reports/budget-words";
import { DOUBT_NAMES } from "@/lib/reports/doubt-names";
import {
  BASIS_LABELS,
  CODING_LABELS,
  HOLD_LABELS,
  PAYLOAD_LABELS,
  PORT_LABELS,
  PROVENANCE_LABELS,
  PURPOSE_LABELS,
  SCRAMBLER_LABELS,
  TRANSDUCER_LABELS,
} from "@/lib/reports/report-labels";
import { printReport } from "../support/read-pdf";
import { sampleSnapshot, sampleSweep } from "../support/report-snapshot";

const TABLES = [
  DETECTOR_LABELS,
  STANDING_LABELS,
  LEVEL_UNIT_LABELS,
  BASIS_LABELS,
  CODING_LABELS,
  HOLD_LABELS,
  PAYLOAD_LABELS,
  PORT_LABELS,
  PROVENANCE_LABELS,
  PURPOSE_LABELS,
  SCRAMBLER_LABELS,
  TRANSDUCER_LABELS,
  DOUBT_NAMES,
  DISTRIBUTION_LABELS,
  REFERENCE_LABELS,
];

describe("signs", () => {
  test("each one that labels and formatters can print is found again, in all three fonts", async () => {
    const printed = [...TABLES.flatMap(Object.values), formatMargin(-1), formatDelta(1)].join("");
    const signs = [...new Set([...printed, ..."µΩΔ−≥≤±·…’éü°×√–"])].filter((s) => s.trim() !== "");
    const sample = `signs ${signs.join(" ")} end`;
    const sweep = { ...sampleSweep(), fileName: `file ${signs.join(" ")} end`, name: "One" };
    const { text } = await printReport(
      sampleSnapshot({ title: `Title ${sample}`, summary: sample, sweeps: [sweep], ladder: null }),
    );
    const packed = text.replaceAll(" ", "");
    const all = signs.join("");
    expect(packed).toContain(`Titlesigns${all}end`);
    expect(packed.split(`signs${all}end`).length - 1).toBeGreaterThan(2);
    expect(packed).toContain(`file${all}end`);
  });

  test("one that no font has is spelled, or written out as its code point", async () => {
    const build = { name: "B4 λ/2 試", builtOn: null, notes: "" };
    const { text } = await printReport(sampleSnapshot({ build, sweeps: [], ladder: null }));
    expect(text).toContain("B4 lambda/2 [U+8A66]");
  });
});

describe("suspects", () => {
  test("200 of them flow over pages under a repeated header", async () => {
    const sweep = sampleSweep();
    const reading = sweep.readings[0]?.reading;
    const first = reading?.suspects[0];
    if (!reading || !first) throw new Error("The sample has no suspects.");
    reading.suspects = Array.from({ length: 200 }, (_, i) => ({
      ...first,
      number: i + 1,
      frequencyHz: 31e6 + i * 1e6,
    }));
    const { pages, text } = await printReport(sampleSnapshot({ sweeps: [sweep], ladder: null }));
    for (const { frequencyHz } of reading.suspects)
      expect(text).toContain(formatFrequency(frequencyHz, 50e3));
    const headed = pages.filter((page) => page.includes("PROMINENCE"));
    expect(headed.length).toBeGreaterThan(3);
    // A row of the table never stands on a page without the header.
    const row = /^\s*\d+\s+\d+\.\d+ MHz\s+.*dBµV\/m\s+.*dBµV\/m\s+[+−]/m;
    for (const page of pages.slice(1)) if (row.test(page)) expect(page).toContain("PROMINENCE");
    // A header never stands without a row.
    for (const page of headed) expect(page).toMatch(row);
  });
});

describe("sweeps", () => {
  test("one without readings says that it has no margin", async () => {
    const { pages, text } = await printReport(
      sampleSnapshot({ sweeps: [{ ...sampleSweep(), readings: [] }], ladder: null }),
    );
    expect(pages[0]).toContain("there is no margin to state");
    expect(text).toContain("This sweep was not held against a mask");
    // The only signed level is what the program aims at.
    expect(pages[0]?.match(/[+−]\d+\.\d dB\b/g)).toEqual(["+6.0 dB"]);
  });

  test("an ambient sweep gives no standing of its own", async () => {
    const ambient = { ...sampleSweep(), purpose: "ambient" as const };
    const { pages } = await printReport(sampleSnapshot({ sweeps: [ambient], ladder: null }));
    expect(pages[0]).toContain("there is no margin to state");
  });

  test("a report without sweeps is still a report", async () => {
    const { pages } = await printReport(sampleSnapshot({ sweeps: [], ladder: null }));
    expect(pages.at(-1)).toContain("End of report");
  });

  test("names and files with words longer than any column stay on the paper, unhyphenated", async () => {
    const word = "W".repeat(70);
    const sweep = { ...sampleSweep(), name: word, fileName: `${"f".repeat(150)}.csv` };
    const { text } = await printReport(
      sampleSnapshot({ sweeps: [sweep], title: word, team: word, ladder: null }),
    );
    expect(text.replaceAll(" ", "")).toContain(`${"f".repeat(150)}.csv`);
    expect(text.replaceAll(" ", "")).toContain(word);
    expect(text).not.toMatch(/[Wf]-/);
  });
});
