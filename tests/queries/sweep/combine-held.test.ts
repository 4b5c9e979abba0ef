import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { inTeam } from "@/db/client";
import { combinedReadings } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import { restoreSweep } from "@/lib/commands/sweep/restore-sweep";
import { setOnRecord } from "@/lib/commands/sweep/set-on-record";
import { readProgram } from "@/lib/queries/program/read-program";
import { readBuildReading } from "@/lib/queries/program/read-build-reading";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import type { Place } from "../../support/sweeps";
import { flatMask, importLevels, levelsOf, makePlace, SETTINGS } from "../../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const corrected = { unit: "dBuV/m" };

/** A peak sweep of the whole mask whose 54 dBµV/m at 100 MHz lie 4 dB over a limit of 50. */
const peakSweep = (ctx: Context, place: Place) =>
  importLevels(
    ctx,
    place,
    levelsOf(10, { 7: 54 }),
    { name: "Peak", corrected: true },
    { ...corrected, detector: "peak" },
  );

/** Quasi-peak spots around 100 MHz, in a file of their own. */
const spots = (ctx: Context, place: Place, levelDb: number, settings: object = {}) =>
  importLevels(
    ctx,
    place,
    [levelDb - 3, levelDb],
    {
      name: "Spots",
      corrected: true,
      answers: { kind: "spots" },
      settings: { ...SETTINGS, ...settings },
    },
    { ...corrected, detector: "QP", startMhz: 99, stepMhz: 1 },
  );

const quasiPeakPlace = (ctx: Context) => makePlace(ctx, flatMask(50, { detector: "quasi-peak" }));

/** Where the build stands under its only mask, as program and trend say it. */
async function standing(ctx: Context, { programId }: Place) {
  const program = await readProgram(ctx, programId);
  return program?.trend.builds[0]?.standings[0] ?? null;
}

async function keptRows(teamId: string): Promise<unknown[]> {
  const found = await database.owner.query(
    "select * from combined_readings where team_id = $1 order by key",
    [teamId],
  );
  return found.rows;
}

describe("a peak sweep over a quasi-peak limit and quasi-peak spots in another file", () => {
  test("of the same position: the spots decide, over or clear", async () => {
    for (const [levelDb, expected] of [
      [46, { standing: "clear", marginDb: 4 }],
      [51, { standing: "over", marginDb: -1 }],
    ] as const) {
      const ctx = await makeMember(database, "engineer");
      const place = await quasiPeakPlace(ctx);
      const peak = await peakSweep(ctx, place);
      expect(await standing(ctx, place)).toMatchObject({
        standing: "undecided",
        marginDb: -4,
        sweepId: peak.sweepId,
      });
      const { sweepId } = await spots(ctx, place, levelDb);
      expect(await standing(ctx, place)).toMatchObject({
        ...expected,
        marginAtHz: 100e6,
        sweepId,
        coverage: 1,
      });
    }
  });

  test.each([
    ["another polarization", { polarization: "horizontal" }],
    ["no stated polarization", { polarization: null }],
    ["another height", { heightM: 2 }],
  ])("of %s leave it undecided by the peak", async (_, settings) => {
    const ctx = await makeMember(database, "engineer");
    const place = await quasiPeakPlace(ctx);
    const { sweepId } = await peakSweep(ctx, place);
    await spots(ctx, place, 46, settings);
    expect(await standing(ctx, place)).toMatchObject({
      standing: "undecided",
      marginDb: -4,
      sweepId,
    });
  });

  test("drop out when they are archived or off record, and decide again when they are back", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await quasiPeakPlace(ctx);
    await peakSweep(ctx, place);
    const { sweepId } = await spots(ctx, place, 46);
    await archiveSweep(ctx, { sweepId });
    expect(await standing(ctx, place)).toMatchObject({ standing: "undecided", marginDb: -4 });
    const [combined] = await readBuildReading(ctx, place.buildId);
    expect(combined?.sweeps.map(({ name }) => name)).toEqual(["Peak"]);
    await restoreSweep(ctx, { sweepId });
    expect(await standing(ctx, place)).toMatchObject({ standing: "undecided", marginDb: -4 });
    await setOnRecord(ctx, { sweepId, onRecord: true });
    expect(await standing(ctx, place)).toMatchObject({ standing: "clear", marginDb: 4, sweepId });
  });
});

describe("a reading that was combined", () => {
  test("is kept once and used again, and another one beside it when a sweep comes", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await quasiPeakPlace(ctx);
    await peakSweep(ctx, place);
    await spots(ctx, place, 46);
    expect(await keptRows(ctx.teamId)).toEqual([]);
    const first = await standing(ctx, place);
    const kept = await keptRows(ctx.teamId);
    expect(kept).toHaveLength(1);
    expect(await standing(ctx, place)).toEqual(first);
    await readBuildReading(ctx, place.buildId);
    expect(await keptRows(ctx.teamId)).toEqual(kept);
    await spots(ctx, place, 47);
    expect(await standing(ctx, place)).toMatchObject({ marginDb: 3 });
    const after = await keptRows(ctx.teamId);
    expect(after).toHaveLength(2);
    expect(after).toEqual(expect.arrayContaining(kept));
  });

  test("is made by several readers at once as one row, all with the same answer", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await quasiPeakPlace(ctx);
    await peakSweep(ctx, place);
    await spots(ctx, place, 46);
    const answers = await Promise.all([1, 2, 3, 4].map(() => standing(ctx, place)));
    expect(answers[0]).toMatchObject({ standing: "clear", marginDb: 4 });
    for (const answer of answers) expect(answer).toEqual(answers[0]);
    expect(await keptRows(ctx.teamId)).toHaveLength(1);
  });

  test("cannot be read by another team, nor changed by anyone", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await quasiPeakPlace(ctx);
    await peakSweep(ctx, place);
    await spots(ctx, place, 46);
    await standing(ctx, place);
    const theirs = await makeMember(database, "engineer");
    const seen = (who: Context) =>
      inTeam(who.db, who.teamId, (tx) => tx.select().from(combinedReadings));
    expect(await seen(theirs)).toEqual([]);
    expect(await seen(ctx)).toHaveLength(1);
    expect(await readBuildReading(theirs, place.buildId)).toEqual([]);
    const changing = inTeam(ctx.db, ctx.teamId, (tx) =>
      tx.update(combinedReadings).set({ key: "other" }),
    );
    await expect(changing).rejects.toThrow();
  });
});

describe("two polarizations", () => {
  const swept = (
    ctx: Context,
    place: Place,
    polarization: "horizontal" | "vertical",
    from: number,
    count: number,
  ) =>
    importLevels(
      ctx,
      place,
      new Array<number>(count).fill(30),
      { corrected: true, settings: { ...SETTINGS, polarization } },
      { ...corrected, startMhz: 30 + from * 10 },
    );

  test("cover a mask only where both were swept", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    await swept(ctx, place, "vertical", 0, 28);
    expect(await standing(ctx, place)).toMatchObject({ standing: "clear", coverage: 1 });
    await swept(ctx, place, "horizontal", 0, 7);
    // 30 to 90 MHz in steps of 10, and half a step more, on a log axis.
    expect(await standing(ctx, place)).toMatchObject({
      standing: "undecided",
      marginDb: 20,
      coverage: expect.closeTo(Math.log(95 / 30) / Math.log(10), 9),
    });
    await swept(ctx, place, "horizontal", 7, 21);
    expect(await standing(ctx, place)).toMatchObject({
      standing: "clear",
      marginDb: 20,
      coverage: 1,
    });
  });
});
