import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { editBench } from "@/lib/commands/bench/edit-bench";
import { createMask } from "@/lib/commands/mask/create-mask";
import { reviseMask } from "@/lib/commands/mask/revise-mask";
import { setProgramMasks } from "@/lib/commands/program/set-program-masks";
import type { Context } from "@/lib/auth/context";
import type { DoubtCode } from "@/lib/core/reading/reading";
import { readSweepDetail } from "@/lib/queries/sweep/read-sweep";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { runJobs, waitingJobs } from "../../support/jobs";
import type { Place } from "../../support/sweeps";
import {
  addedDb,
  flatMask,
  importLevels,
  levelsOf,
  makePlace,
  SETTINGS,
} from "../../support/sweeps";
import { calibrationOf, equipmentOf } from "../equipment/arrange";
import { heldTogether, readingRows } from "./rows";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

async function doubtsOf(ctx: Context, sweepId: string, ...codes: DoubtCode[]) {
  const detail = await readSweepDetail(ctx, sweepId);
  const doubts = detail?.readings[0]?.reading.doubts;
  if (!doubts) throw new Error("There is no reading.");
  return doubts.filter(({ code }) => codes.includes(code));
}

describe("a sweep imported while a revision is on its way into force", () => {
  /** 100 MHz stands at 40 + 5.2745 dBµV/m: 4.7255 dB under 50 and 5.2745 dB over 40. */
  const LEVELS = levelsOf(20, { 7: 40 });

  async function pending(ctx: Context) {
    const place = await makePlace(ctx);
    await importLevels(ctx, place, LEVELS, { name: "Before" });
    await reviseMask(ctx, { maskId: place.maskId, mask: flatMask(40) });
    expect(await waitingJobs(database, ctx.teamId)).toHaveLength(1);
    return place;
  }

  test("is held against both, and shows at once under the one in force", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await pending(ctx);
    const { sweepId, readings } = await importLevels(ctx, place, LEVELS, { name: "Meanwhile" });
    expect(readings).toEqual([
      { maskTitle: "Loft limit", standing: "clear", marginDb: expect.closeTo(4.7255, 3) },
    ]);
    const detail = await readSweepDetail(ctx, sweepId);
    expect(detail?.readings.map((reading) => reading.maskRevision)).toEqual([1]);
    const own = (await readingRows(database, ctx.teamId)).filter((r) => r.sweep_id === sweepId);
    expect(own).toMatchObject([
      { revision: 1, standing: "clear", margin_db: expect.closeTo(4.7255, 3) },
      { revision: 2, standing: "over", margin_db: expect.closeTo(-5.2745, 3) },
    ]);
  });

  test("needs nothing more once the job has run", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await pending(ctx);
    const { sweepId } = await importLevels(ctx, place, LEVELS, { name: "Meanwhile" });
    const kept = async () =>
      (
        await database.owner.query("select id from readings where sweep_id = $1 order by id", [
          sweepId,
        ])
      ).rows;
    const before = await kept();
    await runJobs(database);
    expect(await kept()).toEqual(before);
    const detail = await readSweepDetail(ctx, sweepId);
    expect(detail?.readings).toMatchObject([{ maskRevision: 2, reading: { standing: "over" } }]);
    expect(await readingRows(database, ctx.teamId)).toHaveLength(4);
  });
});

describe("the calibrations behind a sweep", () => {
  /** A place whose bench names an instrument that is due on 2025-02-01. */
  async function withInstrument(ctx: Context) {
    const place = await makePlace(ctx);
    const instrumentId = await equipmentOf(ctx, { name: "Loft analyzer" });
    await calibrationOf(ctx, instrumentId, { calibratedOn: "2024-02-01", dueOn: "2025-02-01" });
    const bench = { name: `Loft ${place.benchId}`, site: "", instrument: "", notes: "" };
    const edited = { ...bench, benchId: place.benchId, distanceM: 3, guardDb: 2, instrumentId };
    await editBench(ctx, edited);
    return { place, instrumentId };
  }
  const sweptOn = async (ctx: Context, place: Place, measuredOn: string | null) =>
    (await importLevels(ctx, place, levelsOf(20), { measuredOn })).sweepId;

  test("are those of the sweep's day: the instrument is kept with its dates", async () => {
    const ctx = await makeMember(database, "engineer");
    const { place, instrumentId } = await withInstrument(ctx);
    const last = await sweptOn(ctx, place, "2025-02-01");
    const late = await sweptOn(ctx, place, "2025-02-02");
    expect(await doubtsOf(ctx, last, "calibration-overdue")).toEqual([]);
    // The path was calibrated a year after this sweep, which says nothing about its day.
    const [unchecked] = await doubtsOf(ctx, last, "calibration-unchecked");
    expect(unchecked?.text).toContain("Calibrated only after the sweep");
    expect(unchecked?.text).toContain("Mast antenna");
    const [overdue, ...rest] = await doubtsOf(ctx, late, "calibration-overdue");
    expect(overdue?.text).toContain("Loft analyzer");
    expect(overdue?.text).not.toContain("Mast antenna");
    expect(rest).toEqual([]);
    expect((await readSweepDetail(ctx, late))?.instrument).toEqual({
      equipmentId: instrumentId,
      name: "Loft analyzer",
      calibratedOn: "2024-02-01",
      dueOn: "2025-02-01",
    });
  });

  test("stay overdue when the instrument is calibrated afterwards, however late it is read", async () => {
    const ctx = await makeMember(database, "engineer");
    const { place, instrumentId } = await withInstrument(ctx);
    const before = await sweptOn(ctx, place, "2025-06-01");
    await calibrationOf(ctx, instrumentId, { calibratedOn: "2025-06-15", dueOn: "2026-06-15" });
    const importedAfter = await sweptOn(ctx, place, "2025-06-01");
    const sweptAfter = await sweptOn(ctx, place, "2025-06-16");
    const second = await createMask(ctx, { mask: flatMask(60, { title: "Second" }) });
    await setProgramMasks(ctx, { programId: place.programId, maskIds: [second.maskId] });
    for (const sweepId of [before, importedAfter])
      expect(await doubtsOf(ctx, sweepId, "calibration-overdue")).toHaveLength(1);
    expect(await doubtsOf(ctx, sweptAfter, "calibration-overdue")).toEqual([]);
  });

  test("cannot be checked without a day, which is said", async () => {
    const ctx = await makeMember(database, "engineer");
    const { place } = await withInstrument(ctx);
    const sweepId = await sweptOn(ctx, place, null);
    expect(await doubtsOf(ctx, sweepId, "calibration-overdue")).toEqual([]);
    const [unchecked] = await doubtsOf(ctx, sweepId, "calibration-unchecked");
    expect(unchecked?.text).toContain("date of the sweep is not stated");
  });

  test("of the path are none of a file that the instrument corrected", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    // The path's transducers are due on 2027-02-01.
    const day = { measuredOn: "2027-02-02" };
    const raw = await importLevels(ctx, place, levelsOf(20), day);
    const corrected = await importLevels(
      ctx,
      place,
      levelsOf(20),
      { ...day, corrected: true },
      { unit: "dBuV/m" },
    );
    const [overdue] = await doubtsOf(ctx, raw.sweepId, "calibration-overdue");
    expect(overdue?.text).toContain("Mast antenna, Loft cable, Preamplifier");
    expect(await doubtsOf(ctx, corrected.sweepId, "calibration-overdue")).toEqual([]);
    const [unchecked] = await doubtsOf(ctx, corrected.sweepId, "calibration-unchecked");
    expect(unchecked?.text).toContain("The instrument applied the factors itself");
  });
});

describe("overload", () => {
  const taken = async (ctx: Context, referenceLevelDb: number | null, peakDb: number) => {
    const place = await makePlace(ctx);
    const settings = { ...SETTINGS, referenceLevelDb };
    // 300 MHz, where the path adds 11 dB.
    const made = await importLevels(ctx, place, levelsOf(10, { 27: peakDb }), { settings });
    return made.sweepId;
  };
  const found = (ctx: Context, sweepId: string) =>
    doubtsOf(ctx, sweepId, "overload-suspected", "overload-unchecked");

  test("is suspected from the level at the instrument, before the path", async () => {
    const ctx = await makeMember(database, "engineer");
    const near = await taken(ctx, 40, 37.5);
    expect(await found(ctx, near)).toEqual([
      { code: "overload-suspected", valueDb: 2.5, text: expect.stringContaining("2.5 dB below") },
    ]);
    const levels = await database.owner.query(
      "select file_max_db, max_db from traces where sweep_id = $1",
      [near],
    );
    expect(levels.rows[0].file_max_db).toBe(37.5);
    expect(levels.rows[0].max_db).toBeCloseTo(37.5 + addedDb(300e6), 4);
  });

  test("is not suspected of a level that only the path raised over the reference level", async () => {
    const ctx = await makeMember(database, "engineer");
    // 36.5 dBµV at the instrument, 47.5 dBµV/m after the path.
    expect(await found(ctx, await taken(ctx, 40, 36.5))).toEqual([]);
  });

  test("cannot be checked without a reference level, also when the mask comes later", async () => {
    const ctx = await makeMember(database, "engineer");
    const unstated = await taken(ctx, null, 30);
    expect((await found(ctx, unstated)).map(({ code }) => code)).toEqual(["overload-unchecked"]);
    const place = await makePlace(ctx);
    const { programId, maskId } = place;
    await setProgramMasks(ctx, { programId, maskIds: [] });
    const settings = { ...SETTINGS, referenceLevelDb: 40 };
    const { sweepId } = await importLevels(ctx, place, levelsOf(10, { 27: 39 }), { settings });
    await setProgramMasks(ctx, { programId, maskIds: [maskId] });
    expect(await found(ctx, sweepId)).toMatchObject([{ code: "overload-suspected", valueDb: 1 }]);
  });
});

test.each(["ambient first", "product first"])(
  "an ambient and a product sweep of one bench and day that are stored at once see each other: %s",
  async (order) => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const product = () => importLevels(ctx, place, levelsOf(20, { 7: 40 }), { name: "Product" });
    const ambient = () =>
      importLevels(ctx, place, levelsOf(5, { 7: 38 }), { name: "Ambient", purpose: "ambient" });
    const works = order === "ambient first" ? [ambient, product] : [product, ambient];
    const done = await heldTogether(database, works);
    const stored = done.flatMap((result) => (result.status === "fulfilled" ? [result.value] : []));
    expect(stored).toHaveLength(2);
    const { sweepId } = stored.find(({ name }) => name === "Product") ?? { sweepId: "" };
    expect(await doubtsOf(ctx, sweepId, "ambient-not-taken")).toEqual([]);
    const checks = await database.owner.query(
      "select count(*)::int as n from ambient_checks where team_id = $1",
      [ctx.teamId],
    );
    expect(checks.rows[0].n).toBe(1);
  },
);
