import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { inTeam } from "@/db/client";
import type { Context } from "@/lib/auth/context";
import { reviseSignalPath } from "@/lib/commands/bench/revise-signal-path";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import { holdAmbientBesideReadings } from "@/lib/commands/sweep/hold-ambient";
import { restoreSweep } from "@/lib/commands/sweep/restore-sweep";
import { listBuildSweeps } from "@/lib/queries/sweep/list-sweeps";
import { readSweepDetail } from "@/lib/queries/sweep/read-sweep";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import type { Place } from "../../support/sweeps";
import {
  addedDb,
  importLevels,
  levelsOf,
  makeBench,
  makePlace,
  SETTINGS,
  TRANSDUCERS,
} from "../../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const product = (ctx: Context, place: Place, change: Record<string, unknown> = {}) =>
  importLevels(ctx, place, levelsOf(20, { 7: 40, 15: 30 }), change);

async function ambient(
  ctx: Context,
  place: Place,
  change: Record<string, unknown> = {},
  peakDb = 38,
) {
  const { sweepId } = await importLevels(ctx, place, levelsOf(5, { 7: peakDb }), {
    name: "Ambient",
    purpose: "ambient",
    ...change,
  });
  await inTeam(ctx.db, ctx.teamId, (tx) => holdAmbientBesideReadings(tx, ctx.teamId, sweepId));
  return sweepId;
}

async function firstReading(ctx: Context, sweepId: string) {
  const detail = await readSweepDetail(ctx, sweepId);
  const [reading] = detail?.readings ?? [];
  if (!reading) throw new Error("There is no reading.");
  return reading;
}

async function ambientDoubts(ctx: Context, sweepId: string) {
  const { reading } = await firstReading(ctx, sweepId);
  return reading.doubts.filter(({ code }) => code.startsWith("ambient-"));
}

describe("the ambient beside a reading", () => {
  test("marks the suspect that is likely ambient, with what is left of it", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { sweepId } = await product(ctx, place);
    await ambient(ctx, place);
    const levelDb = 40 + addedDb(100e6);
    expect((await firstReading(ctx, sweepId)).ambient).toEqual([
      {
        number: 1,
        ambientDb: expect.closeTo(38 + addedDb(100e6), 4),
        isLikelyAmbient: true,
        // 2 dB apart: 10 log10(1 − 10^−0.2) = −4.3292 dB.
        withoutAmbientDb: expect.closeTo(levelDb - 4.3292, 3),
      },
      {
        number: 2,
        ambientDb: expect.closeTo(5 + addedDb(190e6), 4),
        isLikelyAmbient: false,
        withoutAmbientDb: expect.closeTo(30 + addedDb(180e6), 1),
      },
    ]);
    const doubts = await ambientDoubts(ctx, sweepId);
    // The worst point and one of two suspects; the line itself is 6.7 dB away.
    expect(doubts.map(({ code, valueDb }) => [code, valueDb])).toEqual([
      ["ambient-near", expect.closeTo(2, 4)],
      ["ambient-near", expect.closeTo(2, 4)],
    ]);
    expect(doubts[1]?.text).toMatch(/^1 of 2 suspects lies within 6 dB of the ambient\. 1 is/);
  });

  test("an archived ambient sweep stops counting, and counts again when it is fetched back", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { sweepId } = await product(ctx, place);
    const ambientId = await ambient(ctx, place);
    const before = await firstReading(ctx, sweepId);
    await archiveSweep(ctx, { sweepId: ambientId });
    expect((await firstReading(ctx, sweepId)).ambient).toEqual([]);
    expect((await ambientDoubts(ctx, sweepId)).map((d) => d.code)).toEqual(["ambient-not-taken"]);
    await restoreSweep(ctx, { sweepId: ambientId });
    expect(await firstReading(ctx, sweepId)).toEqual(before);
  });

  test("the loudest of the day's ambient sweeps counts; another bench, day or port does not", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { sweepId } = await product(ctx, place);
    const elsewhere = await makeBench(ctx, "Another");
    await ambient(ctx, place, { benchId: elsewhere }, 60);
    await ambient(ctx, place, { measuredOn: "2026-06-02" }, 60);
    const mains = { ...SETTINGS, port: "mains", polarization: null, distanceM: null };
    await ambient(ctx, place, { settings: mains }, 60);
    expect((await ambientDoubts(ctx, sweepId)).map((d) => d.code)).toEqual(["ambient-not-taken"]);
    await ambient(ctx, place, {}, 10);
    await ambient(ctx, place, {}, 35);
    await ambient(ctx, place, {}, 20);
    expect((await firstReading(ctx, sweepId)).ambient[0]?.ambientDb).toBeCloseTo(
      35 + addedDb(100e6),
      4,
    );
  });

  test("one of another polarization alone leaves the ambient unknown, and the doubt says why", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { sweepId } = await product(ctx, place);
    const horizontal = { ...SETTINGS, polarization: "horizontal" };
    await ambient(ctx, place, { name: "Night, horizontal", settings: horizontal });
    expect((await firstReading(ctx, sweepId)).ambient).toEqual([]);
    const [doubt, ...more] = await ambientDoubts(ctx, sweepId);
    expect(more).toEqual([]);
    expect(doubt?.code).toBe("ambient-not-comparable");
    expect(doubt?.text).toContain('"Night, horizontal": It was taken with horizontal polarization');
  });

  test("an ambient sweep that was never held beside the reading is not taken for a quiet one", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { sweepId } = await product(ctx, place);
    const ambientId = await ambient(ctx, place);
    await database.owner.query("delete from ambient_checks where ambient_sweep_id = $1", [
      ambientId,
    ]);
    const [doubt] = await ambientDoubts(ctx, sweepId);
    expect(doubt?.code).toBe("ambient-not-comparable");
    expect(doubt?.text).toContain("was not held beside this reading");
  });
});

describe("the doubts of a build's sweeps", () => {
  test("are those of the readings, stored and derived, each once and in one order", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { sweepId } = await product(ctx, place, { name: "Near" });
    await product(ctx, place, { name: "Alone", measuredOn: "2026-06-03" });
    await ambient(ctx, place);
    const rows = await listBuildSweeps(ctx, place.buildId);
    const of = (name: string) => rows.find((row) => row.name === name)?.doubts;
    expect(of("Near")).toEqual(expect.arrayContaining(["step-coarse", "ambient-near"]));
    expect(of("Near")).not.toContain("ambient-not-taken");
    expect(of("Alone")).toEqual(expect.arrayContaining(["step-coarse", "ambient-not-taken"]));
    expect(of("Alone")).not.toContain("ambient-near");
    expect(of("Ambient")).toEqual([]);
    const { reading } = await firstReading(ctx, sweepId);
    expect(new Set(of("Near"))).toEqual(new Set(reading.doubts.map(({ code }) => code)));
    expect(of("Near")).toHaveLength(new Set(of("Near")).size);
  });
});

describe("the bench check of the day", () => {
  async function check(ctx: Context, place: Place, driftDb: number, measuredOn: string) {
    await database.owner.query(
      `insert into bench_checks (team_id, bench_id, signal_path_revision_id, file_id, file_name,
         source, measured_on, is_reference, content, drift_mean_db, drift_worst_db, checked_by)
       select team_id, bench_id, signal_path_revision_id, file_id, 'comb.csv', 'Comb', $2, false,
         '{"version":1,"unit":"dBuV","detector":"peak","rbwHz":120000,"lines":[],"missingHz":[]}',
         $3, $3, imported_by
       from sweeps where team_id = $1 and bench_id = $4 limit 1`,
      [ctx.teamId, measuredOn, driftDb, place.benchId],
    );
  }

  test("is a doubt of the day's sweeps when it drifted beyond the bench's tolerance of 2 dB", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { sweepId } = await product(ctx, place);
    const drifted = async () =>
      (await firstReading(ctx, sweepId)).reading.doubts.filter(
        ({ code }) => code === "bench-check-drifted",
      );
    await check(ctx, place, -5, "2026-06-02");
    await check(ctx, place, 1.9, "2026-06-01");
    expect(await drifted()).toEqual([]);
    await check(ctx, place, -2.6, "2026-06-01");
    expect(await drifted()).toMatchObject([{ valueDb: -2.6 }]);
    expect((await drifted())[0]?.text).toContain("\u22122.6 dB off its reference at worst");
    const [row] = await listBuildSweeps(ctx, place.buildId);
    expect(row?.doubts).toContain("bench-check-drifted");
  });
});

describe("readSweepDetail", () => {
  test("names the bench's floor sweeps of the newest day up to the sweep's own", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { sweepId } = await product(ctx, place);
    const floorOf = async () => (await readSweepDetail(ctx, sweepId))?.floor;
    const floor = (change: Record<string, unknown>, detector = "peak") =>
      importLevels(ctx, place, levelsOf(2), { purpose: "floor", ...change }, { detector });
    const elsewhere = await makeBench(ctx, "Another");
    await floor({ name: "Later", measuredOn: "2026-06-02" });
    await floor({ name: "Undated", measuredOn: null });
    await floor({ name: "Elsewhere", benchId: elsewhere });
    expect(await floorOf()).toEqual([]);
    const old = await floor({ name: "Old", measuredOn: "2026-05-01" });
    expect(await floorOf()).toEqual([
      {
        id: old.sweepId,
        name: "Old",
        measuredOn: "2026-05-01",
        sameRbw: true,
        sameDetector: true,
      },
    ]);
    await floor({ name: "A narrow one", settings: { ...SETTINGS, rbwHz: 9e3 } });
    const average = await floor({ name: "Average" }, "average");
    expect(await floorOf()).toMatchObject([
      { name: "A narrow one", sameRbw: false, sameDetector: true },
      { name: "Average", sameRbw: true, sameDetector: false },
    ]);
    await archiveSweep(ctx, { sweepId: average.sweepId });
    expect((await floorOf())?.map(({ name }) => name)).toEqual(["A narrow one"]);
  });

  test("a floor of an earlier signal path is not the sweep's", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    await importLevels(ctx, place, levelsOf(2), { purpose: "floor" });
    await reviseSignalPath(ctx, {
      benchId: place.benchId,
      impedanceOhm: 50,
      transducers: TRANSDUCERS.slice(0, 2),
    });
    const { sweepId } = await product(ctx, place);
    expect((await readSweepDetail(ctx, sweepId))?.floor).toEqual([]);
  });

  test("says the budget that was in force at the import, and null without one", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { sweepId } = await product(ctx, place);
    expect(await readSweepDetail(ctx, sweepId)).toMatchObject({ budget: null, instrument: null });
    const budget = { version: 1, title: "Loft, 3 m", lines: [], reference: null };
    const instrument = {
      equipmentId: "7c9e6679-7425-40de-944b-e07fc1f90ae7",
      name: "An analyzer",
      calibratedOn: "2026-01-05",
      dueOn: null,
    };
    await database.owner.query(
      `with made as (
         insert into uncertainty_budgets (team_id, bench_id, revision, content, created_by)
         values ($1, $2, 1, $3, $4) returning id)
       update sweeps set budget_id = made.id, instrument = $5 from made where sweeps.id = $6`,
      [ctx.teamId, place.benchId, budget, ctx.userId, instrument, sweepId],
    );
    expect(await readSweepDetail(ctx, sweepId)).toMatchObject({ budget, instrument });
  });
});
