import { describe, expect, test } from "vitest";
import { changeSinceFirst } from "@/lib/queries/suspect/change-since-first";
import type { BuildSighting, Sighting } from "@/lib/queries/suspect/sighting";
import { coversFrequency, rankSightings } from "@/lib/queries/suspect/sighting";
import { flatMask } from "../../support/sweeps";

const SEEN: Sighting = {
  sweepId: "s",
  sweepName: "vertical",
  measuredOn: null,
  maskId: "m",
  maskTitle: "Loft limit",
  lineName: "Quasi-peak",
  number: 1,
  frequencyHz: 148.5e6,
  levelDb: 44,
  unit: "dBuV/m",
  marginDb: 6,
  standing: "clear",
  basis: "like-for-like",
  detector: "quasi-peak",
  rbwHz: 120e3,
  rbwKind: "6dB",
  benchId: "loft",
  benchName: "Loft",
  signalPathRevisionId: "1",
  distanceM: 3,
  polarization: "vertical",
  heightM: 1,
};
const seen = (change: Partial<Sighting> = {}): Sighting => ({ ...SEEN, ...change });
const build = (name: string, ...sightings: Sighting[]): BuildSighting => ({
  buildId: name,
  buildName: name,
  builtOn: null,
  kind: sightings.length > 0 ? "seen" : "not-seen",
  best: sightings[0] ?? null,
  sightings,
  sweptBy: [],
});

describe("what counts of a build", () => {
  const bound = seen({ basis: "upper-bound", detector: "peak", marginDb: -3, sweepId: "p" });

  test("is the lowest margin, then the highest level; without a limit it comes last", () => {
    const ranked = rankSightings([
      seen({ sweepId: "a", marginDb: null, levelDb: 80 }),
      seen({ sweepId: "b", marginDb: 2 }),
      seen({ sweepId: "c", marginDb: 1, levelDb: 40 }),
      seen({ sweepId: "d", marginDb: 1, levelDb: 41 }),
    ]);
    expect(ranked.map((one) => one.sweepId)).toEqual(["d", "c", "b", "a"]);
  });

  test("an upper bound gives way to the line's own detector in the same position only", () => {
    expect(rankSightings([bound, seen()]).map((one) => one.sweepId)).toEqual(["s"]);
    for (const other of [
      seen({ polarization: "horizontal" }),
      seen({ heightM: 2 }),
      seen({ lineName: "Average" }),
      seen({ maskId: "n" }),
    ]) {
      expect(rankSightings([bound, other]).map((one) => one.sweepId)).toEqual(["p", "s"]);
    }
  });
});

describe("change since first seen", () => {
  test("is margin and level of the newest against the first, on the same line and detector", () => {
    const first = build(
      "G1",
      seen({ marginDb: -9, lineName: "Average", detector: "average" }),
      seen({ marginDb: -2, levelDb: 52 }),
    );
    const builds = [build("G0"), first, build("G2", seen({ marginDb: 1 })), build("G3", seen())];
    expect(changeSinceFirst([...builds, build("G4")])).toEqual({
      fromBuild: "G1",
      toBuild: "G3",
      marginDb: 8,
      levelDb: -8,
      reasons: [],
      cautions: [],
    });
  });

  test("is nothing while one build alone saw it", () => {
    expect(changeSinceFirst([build("G1", seen()), build("G2")])).toBeNull();
    expect(changeSinceFirst([build("G1")])).toBeNull();
  });

  test.each([
    [{ detector: "peak" }, "detector: peak, then quasi-peak"],
    [{ lineName: "Average" }, "mask line: Average, then Quasi-peak"],
    [{ unit: "dBuV" }, "unit: dBuV, then dBuV/m"],
    [{ rbwHz: 9e3 }, "RBW: 9 kHz (6dB), then 120 kHz (6dB)"],
    [{ rbwKind: "3dB" }, "RBW: 120 kHz (3dB), then 120 kHz (6dB)"],
    [{ rbwHz: null }, "RBW: not stated (6dB), then 120 kHz (6dB)"],
    [{ distanceM: 10 }, "distance in m: 10, then 3"],
    [{ benchId: "yard", benchName: "Yard" }, "bench: Yard, then Loft"],
  ] as const)("gives no number across %o, and says why", (different, reason) => {
    const change = changeSinceFirst([build("G1", seen(different)), build("G2", seen())]);
    expect(change).toMatchObject({ marginDb: null, levelDb: null, reasons: [reason] });
  });

  test("says what differs without forbidding it", () => {
    const change = changeSinceFirst([
      build("G1", seen({ polarization: "horizontal", heightM: null, signalPathRevisionId: "0" })),
      build("G2", seen()),
    ]);
    expect(change).toMatchObject({ marginDb: 0 });
    expect(change?.cautions).toEqual([
      "The signal path was revised in between.",
      "Polarization horizontal, then vertical.",
      "Antenna height not stated, then 1 m.",
    ]);
  });
});

describe("whether a reading covers a frequency", () => {
  const mask = flatMask(50);
  const line = (fraction: number, gaps: { startHz: number; stopHz: number }[] = []) => ({
    lineIndex: 0,
    coverage: { fraction, gaps },
  });

  test("asks for a line of the mask there and no gap", () => {
    expect(coversFrequency(mask, [line(1)], 148.5e6)).toBe(true);
    expect(coversFrequency(mask, [line(1)], 400e6)).toBe(false);
    expect(coversFrequency(mask, [line(0)], 148.5e6)).toBe(false);
    const gaps = [{ startHz: 140e6, stopHz: 160e6 }];
    expect(coversFrequency(mask, [line(0.8, gaps)], 148.5e6)).toBe(false);
    expect(coversFrequency(mask, [line(0.8, gaps)], 170e6)).toBe(true);
    expect(coversFrequency(mask, [], 148.5e6)).toBe(false);
  });
});
