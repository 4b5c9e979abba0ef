import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { limitAt } from "../../lib/core/mask/limit-at";
import { maskFromJson } from "../../lib/core/mask/mask-json";

function load(file: string) {
  const read = maskFromJson(JSON.parse(readFileSync(`masks/${file}`, "utf8")));
  if (!read.ok) throw new Error(`${file}: ${JSON.stringify(read.problems)}`);
  return read.mask;
}

function limit(key: string, lineIndex: number, hz: number) {
  const line = load(`${key}.json`).lines[lineIndex];
  if (!line) throw new Error(`${key} has no line ${lineIndex}`);
  return limitAt(line, hz);
}

describe("shipped masks", () => {
  it.each(readdirSync("masks").filter((f) => f.endsWith(".json")))("%s is valid", (file) => {
    expect(load(file).key).toBe(file.replace(/\.json$/, ""));
  });

  it.each([
    // 47 CFR 15.109, read: the lower limit applies at the edges.
    ["fcc-15-109-class-b-3m", 0, 88e6, 40],
    ["fcc-15-109-class-b-3m", 0, 216e6, 43.5],
    ["fcc-15-109-class-b-3m", 0, 960e6, 46],
    ["fcc-15-109-class-a-10m", 0, 30e6, 39.1],
    // 47 CFR 15.107 class B, read; between the break points computed in log f.
    ["fcc-15-107-class-b", 0, 0.15e6, 66],
    ["fcc-15-107-class-b", 0, 0.2e6, 63.61],
    ["fcc-15-107-class-b", 0, 0.25e6, 61.76],
    ["fcc-15-107-class-b", 0, 0.3e6, 60.24],
    ["fcc-15-107-class-b", 0, 0.4e6, 57.85],
    ["fcc-15-107-class-b", 0, 5e6, 56],
    ["fcc-15-107-class-a", 1, 0.5e6, 60],
    // CISPR 32, read.
    ["cispr-32-radiated-class-b-3m", 0, 230e6, 40],
    ["cispr-32-radiated-class-a-10m", 0, 500e6, 47],
    ["cispr-32-above-1ghz-class-b-3m", 1, 3e9, 70],
    // UNECE R10, computed from the formula from memory.
    ["unece-r10-component-broadband", 0, 50e6, 56.42],
    ["unece-r10-component-broadband", 0, 100e6, 53.89],
    ["unece-r10-component-broadband", 0, 200e6, 58.44],
    // CISPR 25 class 5 and MIL-STD-461G, from memory.
    ["cispr-25-component-class-5", 0, 0.15e6, 46],
    ["cispr-25-component-class-1", 0, 0.2e6, 86],
    ["mil-std-461g-ce102-28v", 1, 500e3, 60],
  ])("%s line %i at %f Hz is %f dB", (key, line, hz, db) => {
    expect(limit(key, line, hz)).toBeCloseTo(db, 2);
  });

  it("has no limit between bands", () => {
    expect(limit("cispr-25-component-class-5", 0, 0.4e6)).toBeNull();
  });
});
