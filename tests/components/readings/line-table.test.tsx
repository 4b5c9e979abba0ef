import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, test } from "vitest";
import { BenchSheet } from "@/components/readings/bench-sheet";
import { LineTable } from "@/components/readings/line-table";
import { readTogether } from "@/lib/core/reading/read-together";
import { remeasureRows } from "@/lib/core/reading/remeasure-rows";
import { maskLine, maskOf, scan, segment, SETTINGS } from "../../core/hand-worked/case";

/** Peak under a quasi-peak limit of 40: 44 at 30.5 MHz vertical, 38 at 31 MHz horizontal. */
const SWEEPS = (["vertical", "horizontal"] as const).map((polarization, i) => ({
  id: `sweep-${polarization}`,
  name: `Scan ${polarization}`,
  traces: [scan([30e6, 32e6, 50e3], 20, [i ? [31e6, 38] : [30.5e6, 44]], { detector: "peak" })],
  settings: { ...SETTINGS, polarization, heightM: 1.5, azimuthDeg: i ? null : 90 },
  guardDb: 0,
}));
const MASK = maskOf([maskLine("quasi-peak", [segment(30e6, 32e6, 40)], { name: "House line" })]);
const READING = readTogether(SWEEPS, MASK);

describe("LineTable", () => {
  test("says standing, margin, place and basis, and links the sweep that decided", () => {
    const html = renderToStaticMarkup(<LineTable reading={READING} sweeps={SWEEPS} />);
    for (const said of ["House line", "undecided", "−4.0 dB", "30.50 MHz", "44.0", "40.0"])
      expect(html).toContain(said);
    expect(html).toContain('href="/sweeps/sweep-vertical"');
    expect(html).not.toContain("sweep-horizontal");
    expect(html).toContain("Decided by");
    expect(html).toContain("100 %");
  });

  test("of one sweep names no sweep", () => {
    const html = renderToStaticMarkup(<LineTable reading={READING} />);
    expect(html).not.toContain("Decided by");
    expect(html).not.toContain("/sweeps/");
  });

  test("names up to two gaps at once and more behind a click, and never rounds up to 100 %", () => {
    const gap = (i: number) => ({ startHz: 30e6 + i * 1e5, stopHz: 30e6 + i * 1e5 + 5e4 });
    const withGaps = (count: number) => ({
      ...READING,
      lines: READING.lines.map((line) => ({
        ...line,
        coverage: { fraction: 0.9999, gaps: Array.from({ length: count }, (_, i) => gap(i)) },
      })),
    });
    const two = renderToStaticMarkup(<LineTable reading={withGaps(2)} />);
    expect(two).toContain("99 %");
    expect(two).not.toContain("<details");
    expect(two.match(/<li/g)).toHaveLength(2);
    const three = renderToStaticMarkup(<LineTable reading={withGaps(3)} />);
    expect(three).toContain("3 gaps</summary>");
    expect(three.match(/<li/g)).toHaveLength(3);
  });
});

describe("BenchSheet", () => {
  test("is one table, a row per spot with its position and an empty place for the result", () => {
    const rows = remeasureRows(READING, SWEEPS);
    const html = renderToStaticMarkup(<BenchSheet rows={rows} unit={READING.unit} />);
    expect(html.match(/<table/g)).toHaveLength(1);
    expect(html.match(/<tr/g)).toHaveLength(1 + rows.length);
    for (const said of ["30.50 MHz", "quasi-peak", "120.0 kHz", "vertical", "1.5 m, 90°"])
      expect(html).toContain(said);
    expect(html).toMatch(/<td class="[^"]*"><\/td><\/tr>/);
  });

  test("says what the sweep does not state", () => {
    const rows = remeasureRows(READING, SWEEPS).map((row) => ({
      ...row,
      polarization: null,
      heightM: null,
      azimuthDeg: null,
    }));
    const html = renderToStaticMarkup(<BenchSheet rows={rows} unit={READING.unit} />);
    expect(html.match(/not stated/g)).toHaveLength(2 * rows.length);
  });
});
