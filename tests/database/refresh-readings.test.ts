import { drizzle } from "drizzle-orm/node-postgres";
import { afterAll, beforeAll, expect, test } from "vitest";
import { refreshReadings } from "@/db/refresh-readings";
import * as schema from "@/db/schema";
import { ENGINE_VERSION } from "@/lib/core/reading/read-together";
import { readSweepDetail } from "@/lib/queries/sweep/read-sweep";
import type { TestDatabase } from "../support/database";
import { makeMember, openTestDatabase } from "../support/database";
import { importLevels, levelsOf, makePlace } from "../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

test("readings of an older engine are made anew, those of this one are left alone", async () => {
  const ctx = await makeMember(database, "engineer");
  const other = await makeMember(database, "engineer");
  const { sweepId } = await importLevels(ctx, await makePlace(ctx), levelsOf(20, { 7: 40 }));
  const theirs = await importLevels(other, await makePlace(other), levelsOf(20, { 7: 40 }));
  const before = await readSweepDetail(ctx, sweepId);
  const untouched = await readSweepDetail(other, theirs.sweepId);
  await database.owner.query(
    `update readings set engine_version = $1, margin_db = 99,
       content = jsonb_set(content, '{standing}', '"over"') where team_id = $2`,
    [ENGINE_VERSION - 1, ctx.teamId],
  );
  await refreshReadings(drizzle(database.owner, { schema }));
  const after = await readSweepDetail(ctx, sweepId);
  expect(after?.readings.map((r) => r.reading)).toEqual(before?.readings.map((r) => r.reading));
  expect(after?.readings[0]?.id).not.toBe(before?.readings[0]?.id);
  const rows = await database.owner.query(
    "select engine_version, margin_db from readings where team_id = $1",
    [ctx.teamId],
  );
  expect(rows.rows).toEqual([
    { engine_version: ENGINE_VERSION, margin_db: expect.closeTo(4.7255, 3) },
  ]);
  expect(await readSweepDetail(other, theirs.sweepId)).toEqual(untouched);
});
