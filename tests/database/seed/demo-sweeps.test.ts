import { createHash } from "node:crypto";
import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { DEMO_TEAMS } from "@/db/seed/demo-teams";
import { DEMO_BENCHES } from "@/db/seed/spectra/demo-benches";
import { makeDemoCsv, type DemoSweep } from "@/db/seed/spectra/demo-sweep";
import { demoLadders } from "@/db/seed/spectra/demo-sweeps";
import { makeSpectrum } from "@/db/seed/spectra/spectrum";
import { applySignalPath } from "@/lib/core/bench/apply-signal-path";
import type { Mask } from "@/lib/core/mask/mask";
import { maskFromJson } from "@/lib/core/mask/mask-json";
import type { Reading } from "@/lib/core/reading/reading";
import { readSweep } from "@/lib/core/reading/read-sweep";
import { makeAxis } from "@/lib/core/sweep/axis";
import type { Trace } from "@/lib/core/sweep/trace";

const ladders = demoLadders();
const allSweeps = ladders.flatMap((l) => [...l.background, ...l.steps.flatMap((s) => s.sweeps)]);

function shippedMask(key: string): Mask {
  const read = maskFromJson(JSON.parse(readFileSync(`masks/${key}.json`, "utf8")));
  if (!read.ok) throw new Error(`The mask ${key} does not read.`);
  return read.mask;
}

const MASKS = {
  "below-1-ghz": shippedMask("cispr-32-radiated-class-b-3m"),
  "above-1-ghz": shippedMask("cispr-32-above-1ghz-class-b-3m"),
};

function tracesOf(sweep: DemoSweep): Trace[] {
  return sweep.detectors.map((detector) => {
    const { frequenciesHz, levelsDbuv } = makeSpectrum({ ...sweep.setup, detector });
    return {
      name: detector,
      kind: "scan",
      detector,
      hold: "none",
      unit: "dBuV",
      axis: makeAxis(frequenciesHz),
      levelsDb: levelsDbuv,
    };
  });
}

function readingOf(sweep: DemoSweep): Reading {
  const traces = tracesOf(sweep).map((trace) => applySignalPath(trace, sweep.setup.path) ?? trace);
  const mask = MASKS[sweep.benchKey];
  return readSweep({ traces, settings: sweep.settings, mask, guardDb: 0 });
}

function worstMarginDb(sweeps: DemoSweep[]): number {
  const margins = sweeps.flatMap((s) => readingOf(s).lines.map((l) => l.worst?.marginDb ?? NaN));
  return Math.min(...margins);
}

function ladderOf(buildName: string) {
  const ladder = ladders.find((candidate) => candidate.buildName === buildName);
  if (!ladder) throw new Error(`No ladder for ${buildName}.`);
  const first = ladder.steps[0]?.sweeps ?? [];
  const last = ladder.steps.at(-1)?.sweeps ?? [];
  return { first, last };
}

describe("the demo's ladders", () => {
  it("stand on builds of the demo team, after the day each was built", () => {
    const programs = DEMO_TEAMS.flatMap((team) => team.programs);
    for (const ladder of ladders) {
      const builds = programs.find((p) => p.name === ladder.programName)?.builds;
      const build = builds?.find((b) => b.name === ladder.buildName);
      expect(build, ladder.buildName).toBeDefined();
      const days = [build?.builtOn ?? "", ...ladder.steps.map((step) => step.measuredOn)];
      expect(days).toEqual(days.toSorted());
    }
  });

  it("have four to six steps, each swept on both benches, and an ambient sweep for most days", () => {
    for (const { steps, background } of ladders) {
      expect(steps.length).toBeGreaterThanOrEqual(4);
      expect(steps.length).toBeLessThanOrEqual(6);
      const both = DEMO_BENCHES.map((bench) => bench.key);
      for (const step of steps) expect(step.sweeps.map((s) => s.benchKey)).toEqual(both);
      const ambient = background.filter((sweep) => sweep.purpose === "ambient");
      const days = steps.map((step) => step.measuredOn);
      for (const key of both) {
        const looked = ambient.filter((sweep) => sweep.benchKey === key).map((s) => s.measuredOn);
        expect(new Set(looked).size).toBe(looked.length);
        expect(looked).toEqual(expect.arrayContaining([days[0], days.at(-1)]));
        expect(days.filter((day) => !looked.includes(day)).length).toBeLessThanOrEqual(1);
      }
    }
  });

  it("have distinct sweep and file names", () => {
    expect(allSweeps.length).toBeGreaterThanOrEqual(50);
    expect(allSweeps.length).toBeLessThanOrEqual(110);
    expect(new Set(allSweeps.map((sweep) => sweep.fileName)).size).toBe(allSweeps.length);
    expect(new Set(allSweeps.map((sweep) => sweep.setup.seed)).size).toBe(allSweeps.length);
    for (const { fileName } of allSweeps) expect(fileName).toMatch(/^[a-z0-9-]+\.csv$/);
  });

  it("step finer than half the RBW", () => {
    for (const { startHz, stopHz, points, rbwHz } of DEMO_BENCHES)
      expect((stopHz - startHz) / (points - 1)).toBeLessThanOrEqual(rbwHz / 2);
  });
});

describe("the demo's sweeps", () => {
  it("hold finite levels, peak at or above quasi-peak and average at every point", () => {
    const rank = { peak: 0, "quasi-peak": 1, average: 2 };
    for (const sweep of allSweeps) {
      const traces = tracesOf(sweep).toSorted(
        (a, b) => rank[a.detector as keyof typeof rank] - rank[b.detector as keyof typeof rank],
      );
      for (const { levelsDb } of traces) {
        expect(levelsDb.every(Number.isFinite), sweep.name).toBe(true);
        expect(levelsDb.length).toBe(sweep.setup.points);
      }
      const [upper, lower] = traces;
      if (!upper || !lower) continue;
      const above = upper.levelsDb.map((level, i) => level - (lower.levelsDb[i] ?? NaN));
      expect(Math.min(...above), sweep.name).toBeGreaterThanOrEqual(0);
    }
  });

  it("write the same bytes each time, with no two files alike", () => {
    const hash = (sweep: DemoSweep) =>
      createHash("sha256").update(makeDemoCsv(sweep)).digest("hex");
    const some = allSweeps.filter((_, i) => i % 9 === 0);
    const first = some.map(hash);
    expect(demoLadders().flatMap((l) => l.steps).length).toBe(
      ladders.flatMap((l) => l.steps).length,
    );
    expect(some.map(hash)).toEqual(first);
    expect(new Set(first).size).toBe(some.length);
  });

  it("state the unit of the file: dBm reads 106.99 dB lower", () => {
    const tern = allSweeps.find((sweep) => sweep.csvUnit === "dBm");
    if (!tern) throw new Error("No sweep in dBm.");
    const last = (text: string) => Number(text.trimEnd().split("\r\n").at(-1)?.split(",")[1]);
    const inDbm = makeDemoCsv(tern);
    expect(inDbm).toContain("Peak (dBm)");
    const inDbuv = makeDemoCsv({ ...tern, csvUnit: "dBuV" });
    expect(last(inDbuv) - last(inDbm)).toBeCloseTo(106.99, 1);
  });
});

describe("the demo's story", () => {
  it.each(["G1", "G2", "G3", "P1", "P2", "T1"])("%s starts over", (build) => {
    const { first } = ladderOf(build);
    expect(first.map((sweep) => readingOf(sweep).standing)).toContain("over");
  });

  it.each([
    ["G1", -4, -1],
    ["G2", 0, 3],
    ["G3", 6, 8],
    ["P1", -7, -4],
    ["P2", 1, 3.5],
    ["T1", -6, -2],
  ])("%s ends between %d and %d dB", (build, leastDb, mostDb) => {
    const marginDb = worstMarginDb(ladderOf(build).last);
    expect(marginDb).toBeGreaterThan(leastDb);
    expect(marginDb).toBeLessThan(mostDb);
  });

  it.each(["G2", "G3", "P2"])("%s ends clear, decided like for like", (build) => {
    for (const sweep of ladderOf(build).last) {
      const reading = readingOf(sweep);
      expect(reading.standing).toBe("clear");
      expect(reading.lines.map((line) => line.basis)).not.toContain("cannot-decide");
      expect(reading.lines[0]?.basis).toBe("like-for-like");
    }
  });

  it("has nothing on air that would decide a reading, except with the door open", () => {
    for (const { buildName, background } of ladders) {
      const ambient = background.filter((sweep) => sweep.purpose === "ambient");
      const marginDb = worstMarginDb(ambient);
      if (buildName === "T1") expect(marginDb).toBeLessThan(10);
      else expect(marginDb).toBeGreaterThan(10);
    }
  });
});
