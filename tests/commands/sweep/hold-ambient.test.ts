import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { inTeam } from "@/db/client";
import type { Context } from "@/lib/auth/context";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import {
  holdAmbientBesideReadings,
  holdReadingBesideAmbients,
  loadAmbients,
} from "@/lib/commands/sweep/hold-ambient";
import type { AmbientCheck } from "@/lib/core/reading/ambient-check";
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
} from "../../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

interface CheckRow {
  reading_id: string;
  ambient_sweep_id: string;
  content: AmbientCheck;
}

/** All checks of a team as the owner sees them. */
async function checkRows(teamId: string): Promise<CheckRow[]> {
  const found = await database.owner.query<CheckRow>(
    "select reading_id, ambient_sweep_id, content from ambient_checks where team_id = $1",
    [teamId],
  );
  return found.rows;
}

async function readingIds(sweepId: string): Promise<string[]> {
  const found = await database.owner.query<{ id: string }>(
    "select id from readings where sweep_id = $1 order by created_at",
    [sweepId],
  );
  return found.rows.map((row) => row.id);
}

/** 40 dBµV at 100 MHz and 30 at 180 MHz on a floor of 20. */
async function product(ctx: Context, place: Place, change: Record<string, unknown> = {}) {
  const levels = levelsOf(20, { 7: 40, 15: 30 });
  const { sweepId } = await importLevels(ctx, place, levels, change);
  await inTeam(ctx.db, ctx.teamId, async (tx) => {
    for (const id of await readingIds(sweepId)) await holdReadingBesideAmbients(tx, ctx.teamId, id);
  });
  return sweepId;
}

/** 38 dBµV at 100 MHz on a floor of 5. */
async function ambient(ctx: Context, place: Place, change: Record<string, unknown> = {}) {
  const { sweepId } = await importLevels(ctx, place, levelsOf(5, { 7: 38 }), {
    name: "Ambient",
    purpose: "ambient",
    ...change,
  });
  await inTeam(ctx.db, ctx.teamId, (tx) => holdAmbientBesideReadings(tx, ctx.teamId, sweepId));
  return sweepId;
}

const BY_HAND = {
  notComparable: null,
  caveat: null,
  suspects: [
    { number: 1, ambientDb: expect.closeTo(38 + addedDb(100e6), 4) },
    // 180 MHz has 170 to 190 MHz in reach: the floor is highest at 190 MHz, where factors add most.
    { number: 2, ambientDb: expect.closeTo(5 + addedDb(190e6), 4) },
  ],
  lines: [
    {
      lineIndex: 0,
      frequencyHz: 100e6,
      ambientDb: expect.closeTo(38 + addedDb(100e6), 4),
      marginDb: expect.closeTo(50 - 38 - addedDb(100e6), 4),
    },
  ],
  worst: [{ lineIndex: 0, ambientDb: expect.closeTo(38 + addedDb(100e6), 4) }],
};

describe("ambient checks", () => {
  test("are the same whether the ambient was imported after the product's sweep or before", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const before = await product(ctx, place, { name: "Before" });
    expect(await checkRows(ctx.teamId)).toEqual([]);
    const ambientId = await ambient(ctx, place);
    const after = await product(ctx, place, { name: "After" });
    const rows = await checkRows(ctx.teamId);
    const expected = [...(await readingIds(before)), ...(await readingIds(after))];
    expect(rows.map((row) => row.reading_id).sort()).toEqual(expected.sort());
    for (const row of rows) {
      expect(row.ambient_sweep_id).toBe(ambientId);
      expect(row.content).toMatchObject(BY_HAND);
    }
    expect(rows[0]?.content).toEqual(rows[1]?.content);
  });

  test("are made once, however often it is asked for", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const sweepId = await product(ctx, place);
    const ambientId = await ambient(ctx, place);
    const first = await checkRows(ctx.teamId);
    await inTeam(ctx.db, ctx.teamId, async (tx) => {
      await holdAmbientBesideReadings(tx, ctx.teamId, ambientId);
      for (const id of await readingIds(sweepId))
        await holdReadingBesideAmbients(tx, ctx.teamId, id);
    });
    expect(first).toHaveLength(1);
    expect(await checkRows(ctx.teamId)).toEqual(first);
  });

  test("are not made for another bench, another day, an undated sweep or a floor sweep", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const elsewhere = await makeBench(ctx, "Another");
    await ambient(ctx, place, { benchId: elsewhere });
    await ambient(ctx, place, { measuredOn: "2026-06-02" });
    await ambient(ctx, place, { measuredOn: null });
    await ambient(ctx, place, { purpose: "floor" });
    await product(ctx, place);
    await product(ctx, place, { measuredOn: null });
    await ambient(ctx, place, { measuredOn: null });
    expect(await checkRows(ctx.teamId)).toEqual([]);
  });

  test("of another polarization say why nothing follows", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    await ambient(ctx, place, { settings: { ...SETTINGS, polarization: "horizontal" } });
    await product(ctx, place);
    const [row] = await checkRows(ctx.teamId);
    expect(row?.content).toMatchObject({
      notComparable: expect.stringContaining("horizontal polarization"),
      suspects: [],
      lines: [],
    });
  });

  test("an archived ambient sweep is not held beside a new reading", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const sweepId = await ambient(ctx, place);
    await archiveSweep(ctx, { sweepId });
    await product(ctx, place);
    expect(await checkRows(ctx.teamId)).toEqual([]);
  });

  test("an archived product sweep is held too, since it may be fetched back", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const sweepId = await product(ctx, place);
    await archiveSweep(ctx, { sweepId });
    await ambient(ctx, place);
    expect((await checkRows(ctx.teamId)).map((row) => row.reading_id)).toEqual(
      await readingIds(sweepId),
    );
  });

  test("ambient sweeps loaded once serve several readings", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const ambientId = await ambient(ctx, place);
    const { sweepId } = await importLevels(ctx, place, levelsOf(20, { 7: 40, 15: 30 }));
    await inTeam(ctx.db, ctx.teamId, async (tx) => {
      const day = { benchId: place.benchId, measuredOn: "2026-06-01" };
      const loaded = await loadAmbients(tx, ctx.teamId, day);
      expect(loaded.map((one) => [one.sweepId, one.impedanceOhm])).toEqual([[ambientId, 50]]);
      for (const id of await readingIds(sweepId))
        await holdReadingBesideAmbients(tx, ctx.teamId, id, loaded);
    });
    expect((await checkRows(ctx.teamId))[0]?.content).toMatchObject(BY_HAND);
  });

  test("cannot be made across teams, and no other team sees them", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const theirs = await makeMember(database, "engineer");
    const { sweepId } = await importLevels(ctx, place, levelsOf(20, { 7: 40 }));
    const ambientId = await ambient(ctx, place);
    const [readingId] = await readingIds(sweepId);
    const before = await checkRows(ctx.teamId);
    await inTeam(theirs.db, theirs.teamId, async (tx) => {
      await holdAmbientBesideReadings(tx, theirs.teamId, ambientId);
      await holdAmbientBesideReadings(tx, ctx.teamId, ambientId);
      expect(
        await loadAmbients(tx, ctx.teamId, { benchId: place.benchId, measuredOn: "2026-06-01" }),
      ).toEqual([]);
    });
    await expect(
      inTeam(theirs.db, theirs.teamId, (tx) =>
        holdReadingBesideAmbients(tx, theirs.teamId, readingId ?? ""),
      ),
    ).rejects.toThrow("no such reading");
    expect(await checkRows(theirs.teamId)).toEqual([]);
    expect(await checkRows(ctx.teamId)).toEqual(before);
  });

  test("two at once: the reading's transaction and the ambient's wait for each other", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { sweepId: ambientId } = await importLevels(ctx, place, levelsOf(5, { 7: 38 }), {
      purpose: "ambient",
    });
    const order: string[] = [];
    const day = { benchId: place.benchId, measuredOn: "2026-06-01" };
    let waiting: Promise<void> | undefined;
    await inTeam(ctx.db, ctx.teamId, async (tx) => {
      await loadAmbients(tx, ctx.teamId, day);
      waiting = inTeam(ctx.db, ctx.teamId, async (other) => {
        await holdAmbientBesideReadings(other, ctx.teamId, ambientId);
        order.push("ambient");
      });
      let held = 0;
      while (held === 0) {
        const found = await database.owner.query(
          "select count(*)::int as n from pg_locks where locktype = 'advisory' and not granted and database = (select oid from pg_database where datname = current_database())",
        );
        held = found.rows[0].n;
      }
      order.push("reading");
    });
    await waiting;
    expect(order).toEqual(["reading", "ambient"]);
  });
});
