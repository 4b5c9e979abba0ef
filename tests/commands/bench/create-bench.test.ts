import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { createBench } from "@/lib/commands/bench/create-bench";
import { listBenches } from "@/lib/queries/bench/list-benches";
import { readBench } from "@/lib/queries/bench/read-bench";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { BENCH } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const TODAY = "2026-12-01";

describe("createBench", () => {
  test("stores the bench with revision 1 of its signal path, and says who did it", async () => {
    const ctx = await makeMember(database, "engineer");
    const { benchId } = await createBench(ctx, { ...BENCH, impedanceOhm: 75 });
    const bench = await readBench(ctx, benchId);
    expect(bench).toMatchObject({ name: "Loft", distanceM: 3, guardDb: 2.5, archivedAt: null });
    expect(bench?.revisions.map((r) => [r.revision, r.content])).toEqual([
      [1, { version: 1, impedanceOhm: 75, transducers: [] }],
    ]);
    expect(await auditRows(database, ctx.teamId)).toEqual([
      { actor_id: ctx.userId, action: "bench.create", subject_id: benchId },
    ]);
  });

  test.each(["manager", "liaison"] as const)("refuses a %s", async (role) => {
    const ctx = await makeMember(database, role);
    await expect(createBench(ctx, BENCH)).rejects.toMatchObject({ code: "denied" });
    expect(await listBenches(ctx, TODAY)).toEqual([]);
  });

  test("stays in its team, where another may use the same name", async () => {
    const ours = await makeMember(database, "engineer");
    const theirs = await makeMember(database, "engineer");
    const { benchId } = await createBench(ours, BENCH);
    await createBench(theirs, BENCH);
    expect(await listBenches(theirs, TODAY)).toHaveLength(1);
    expect(await readBench(theirs, benchId)).toBeNull();
  });

  test("leaves nothing behind when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    await withoutAudit(database, async () => {
      await expect(createBench(ctx, BENCH)).rejects.toThrow();
    });
    expect(await listBenches(ctx, TODAY)).toEqual([]);
    const left = await database.owner.query(
      "select 1 from signal_path_revisions where team_id = $1",
      [ctx.teamId],
    );
    expect(left.rows).toEqual([]);
  });

  test("refuses a name that is taken", async () => {
    const ctx = await makeMember(database, "engineer");
    await createBench(ctx, BENCH);
    await expect(createBench(ctx, BENCH)).rejects.toMatchObject({
      code: "conflict",
      fieldErrors: { name: "Choose another name." },
    });
  });

  test.each([
    ["name", " "],
    ["name", "a\u0000b"],
    ["site", "half a pair \ud800"],
    ["distanceM", 0],
    ["distanceM", Number.NaN],
    ["guardDb", -0.1],
    ["guardDb", Number.NaN],
    ["impedanceOhm", 0],
    ["impedanceOhm", undefined],
  ])("refuses %s of %j at its field", async (field, value) => {
    const ctx = await makeMember(database, "engineer");
    await expect(createBench(ctx, { ...BENCH, [field]: value })).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { [field]: expect.any(String) },
    });
    expect(await listBenches(ctx, TODAY)).toEqual([]);
  });
});
