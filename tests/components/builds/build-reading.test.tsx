import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, test } from "vitest";
import { BuildReading } from "@/components/builds/build-reading";
import { readTogether } from "@/lib/core/reading/read-together";
import { maskLine, maskOf, scan, segment, SETTINGS } from "../../core/hand-worked/case";

const MASK = maskOf([maskLine("quasi-peak", [segment(30e6, 32e6, 40)])], {
  title: "House limit",
  provenance: "from memory",
});

function show(peakDb: number, count: number): string {
  const sweeps = Array.from({ length: count }, (_, i) => ({
    id: `sweep-${i}`,
    name: `Scan ${i}`,
    traces: [scan([30e6, 32e6, 50e3], 20, [[30.5e6, peakDb - i]], { detector: "peak" })],
    settings: SETTINGS,
    guardDb: 0,
  }));
  const notHeld = [{ sweepId: "far", name: "Far scan", reason: "It was taken at 10 m." }];
  const reading = readTogether(sweeps, MASK);
  const combined = { maskId: "mask-1", mask: MASK, reading, sweeps, notHeld };
  return renderToStaticMarkup(<BuildReading href="/here" combined={combined} />);
}

describe("BuildReading", () => {
  test("links the mask, the sweep that decided and the sheet of spots, and counts the sweeps", () => {
    const html = show(44, 2);
    expect(html).toContain('href="/masks/mask-1"');
    expect(html).toContain('href="/sweeps/sweep-0"');
    expect(html).toContain('href="/here/remeasure?mask=mask-1"');
    expect(html).toContain("2 sweeps, taken together");
    expect(html).toContain('href="/sweeps/far?mask=mask-1"');
    expect(html).toContain("It was taken at 10 m.");
  });

  test("offers no sheet where nothing is to be measured again", () => {
    const html = show(30, 1);
    expect(html).toContain("One sweep");
    expect(html).not.toContain("remeasure");
  });

  test("keeps a mask from memory marked, and says how many doubts there are", () => {
    const html = show(30, 1);
    expect(html).toMatch(/unconfirmed|from memory/);
    expect(html).toMatch(/\d+ doubts?<\/summary>/);
    expect(html).toContain("confirm it against your own copy");
  });
});
