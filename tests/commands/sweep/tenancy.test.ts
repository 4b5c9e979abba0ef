import { sql } from "drizzle-orm";
import { afterAll, beforeAll, expect, test } from "vitest";
import { inTeam } from "@/db/client";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { importLevels, levelsOf, makeLadder, makePlace } from "../../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const TABLES = [
  "stored_files",
  "sweeps",
  "traces",
  "trace_blocks",
  "readings",
  "suspects",
  "ladders",
  "ladder_steps",
];

test("a query that forgets its team sees no measured row of another team", async () => {
  const ours = await makeMember(database, "engineer");
  const place = await makePlace(ours);
  await makeLadder(ours, place.buildId);
  await importLevels(ours, place, levelsOf(20, { 7: 40 }));
  const theirs = await makeMember(database, "engineer");
  const count = (teamId: string, table: string) =>
    inTeam(database.app, teamId, async (tx) => {
      const found = await tx.execute(sql.raw(`select count(*)::int as n from ${table}`));
      return found.rows[0]?.n;
    });
  for (const table of TABLES) {
    expect(await count(ours.teamId, table), table).toBeGreaterThan(0);
    expect(await count(theirs.teamId, table), table).toBe(0);
  }
});

test.each([
  "update sweeps set settings = '{}'",
  "update sweeps set guard_db = 0",
  "update sweeps set file_name = 'x'",
  "delete from sweeps",
  "update traces set max_db = 0",
  "delete from traces",
  "update trace_blocks set bytes = ''",
  "delete from trace_blocks",
  "update readings set margin_db = 99",
  "delete from readings",
  "update suspects set margin_db = 99",
  "delete from suspects",
  "update stored_files set sha256 = 'x'",
  "delete from stored_files",
])("the app may not: %s", async (statement) => {
  const ctx = await makeMember(database, "engineer");
  const tried = inTeam(database.app, ctx.teamId, (tx) => tx.execute(sql.raw(statement)));
  await expect(tried).rejects.toMatchObject({ cause: { code: "42501" } });
});
