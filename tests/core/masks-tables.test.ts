import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { limitAt } from "../../lib/core/mask/limit-at";
import type { Mask } from "../../lib/core/mask/mask";
import { maskFromJson } from "../../lib/core/mask/mask-json";
import { PUBLISHED_TABLES } from "./masks-published";

interface Band {
  startHz: number;
  stopHz: number;
  startDb: number;
  stopDb: number;
}

const files = readdirSync("masks").filter((file) => file.endsWith(".json"));

function load(key: string): Mask {
  const read = maskFromJson(JSON.parse(readFileSync(`masks/${key}.json`, "utf8")));
  if (!read.ok) throw new Error(`${key}: ${JSON.stringify(read.problems)}`);
  return read.mask;
}

const hzOf = (mhz: string | undefined) => Math.round(Number(mhz) * 1e6);

/** "quasi-peak 9 kHz | 0.15-0.5: 66>56 | 0.5-30: 56" as its name and bands. */
function parseRow(row: string): { name: string; bands: Band[] } {
  const [name = "", ...cells] = row.split(" | ");
  const bands = cells.map((cell) => {
    const [range = "", levels = ""] = cell.split(": ");
    const [start, stop] = range.split("-");
    const [first, last = first] = levels.split(">");
    const band = {
      startHz: hzOf(start),
      stopHz: hzOf(stop),
      startDb: Number(first),
      stopDb: Number(last),
    };
    if (!Object.values(band).every(Number.isFinite)) throw new Error(`Not a band: ${cell}`);
    return band;
  });
  return { name, bands };
}

/** The lowest of all bands at a frequency, straight in log10 f; null outside all. */
function publishedLimit(bands: readonly Band[], hz: number): number | null {
  const limits = bands
    .filter((band) => band.startHz <= hz && hz <= band.stopHz)
    .map((band) => {
      const [a, b, x] = [band.startHz, band.stopHz, hz].map(Math.log10) as [number, number, number];
      return (band.startDb * (b - x) + band.stopDb * (x - a)) / (b - a);
    });
  return limits.length === 0 ? null : Math.min(...limits);
}

/** Every break point, a hair to both sides, the geometric middles, far outside and in between. */
function frequenciesToCheck(bands: readonly Band[]): number[] {
  const breaks = [...new Set(bands.flatMap((band) => [band.startHz, band.stopHz]))].sort(
    (a, b) => a - b,
  );
  const lowest = (breaks[0] ?? 0) / 3;
  const highest = (breaks.at(-1) ?? 0) * 3;
  const middles = breaks.slice(1).map((hz, i) => Math.sqrt(hz * (breaks[i] ?? 0)));
  const hairs = breaks.flatMap((hz) => [hz * (1 - 1e-9), hz, hz * (1 + 1e-9)]);
  const between = Array.from(
    { length: 300 },
    (_, i) => lowest * Math.pow(highest / lowest, i / 299),
  );
  return [...hairs, ...middles, ...between];
}

it("has a published table for every shipped mask, and no table without its mask", () => {
  expect(Object.keys(PUBLISHED_TABLES).sort()).toEqual(files.map((f) => f.slice(0, -5)).sort());
});

describe.each(Object.entries(PUBLISHED_TABLES))("%s", (key, table) => {
  it("names document, clause, port, distance, unit and provenance", () => {
    const mask = load(key);
    const distance = mask.distanceM === null ? "none" : `${mask.distanceM} m`;
    const { document, clause, port, unit, provenance } = mask;
    expect([document, clause, port, distance, unit, provenance].join(" | ")).toBe(table.head);
    // Only what was read says so in its source, and all of it.
    if (provenance === "read") expect(table.source).toMatch(/, read$/);
    else expect(table.source).toMatch(/from memory$/);
    expect(mask.key).toBe(key);
  });

  it("has exactly the published detectors and bandwidths", () => {
    const { lines } = load(key);
    const names = new Set(lines.map((line) => `${line.detector} ${(line.rbwHz ?? 0) / 1e3} kHz`));
    expect([...names].sort()).toEqual(table.rows.map((row) => parseRow(row).name).sort());
    expect(lines.every((line) => line.rbwKind === "6dB")).toBe(true);
  });

  it.each(table.rows)("equals %s", (row) => {
    const { name, bands } = parseRow(row);
    const lines = load(key).lines.filter(
      (line) => `${line.detector} ${(line.rbwHz ?? 0) / 1e3} kHz` === name,
    );
    const segments = lines.flatMap((line) => line.segments);
    const wrong: string[] = [];
    for (const hz of [...frequenciesToCheck(bands), ...frequenciesToCheck(segments)]) {
      const expected = publishedLimit(bands, hz);
      const limits = lines.map((line) => limitAt(line, hz)).filter((db) => db !== null);
      const found = limits.length === 0 ? null : Math.min(...limits);
      const isSame =
        expected === null || found === null
          ? expected === found
          : Math.abs(expected - found) <= 1e-6;
      if (!isSame) wrong.push(`${hz} Hz: ${found} instead of ${expected}`);
    }
    expect(wrong).toEqual([]);
  });
});
