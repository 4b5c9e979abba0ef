import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { archiveBench } from "@/lib/commands/bench/archive-bench";
import { editBench } from "@/lib/commands/bench/edit-bench";
import { readBench } from "@/lib/queries/bench/read-bench";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { BENCH, benchOf } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const edit = (benchId: string, change: object = {}) => ({
  ...BENCH,
  benchId,
  name: "Cellar",
  distanceM: null,
  guardDb: 0,
  ...change,
});

describe("editBench", () => {
  test("changes the bench, leaves its signal path alone, and keeps what stood before", async () => {
    const ctx = await makeMember(database, "admin");
    const benchId = await benchOf(ctx);
    await editBench(ctx, edit(benchId));
    const bench = await readBench(ctx, benchId);
    expect(bench).toMatchObject({ name: "Cellar", distanceM: null, guardDb: 0 });
    expect(bench?.revisions).toHaveLength(1);
    expect((await auditRows(database, ctx.teamId)).at(-1)).toEqual({
      actor_id: ctx.userId,
      action: "bench.edit",
      subject_id: benchId,
    });
    const detail = await database.owner.query(
      "select detail from audit_events where team_id = $1 and action = 'bench.edit'",
      [ctx.teamId],
    );
    expect(detail.rows[0].detail.before).toMatchObject({ name: "Loft", guardDb: 2.5 });
  });

  test("refuses a manager and another team", async () => {
    const engineer = await makeMember(database, "engineer");
    const benchId = await benchOf(engineer);
    const manager = await makeMember(database, "manager", engineer.teamId);
    await expect(editBench(manager, edit(benchId))).rejects.toMatchObject({ code: "denied" });
    const foreign = await makeMember(database, "engineer");
    await expect(editBench(foreign, edit(benchId))).rejects.toMatchObject({ code: "not-found" });
    expect((await readBench(engineer, benchId))?.name).toBe("Loft");
  });

  test("undoes the change when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    await withoutAudit(database, async () => {
      await expect(editBench(ctx, edit(benchId))).rejects.toThrow();
    });
    expect((await readBench(ctx, benchId))?.name).toBe("Loft");
  });

  test("refuses another bench's name, a negative guard and an archived bench", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    await benchOf(ctx, "Cellar");
    await expect(editBench(ctx, edit(benchId))).rejects.toMatchObject({
      code: "conflict",
      fieldErrors: { name: "Choose another name." },
    });
    await expect(editBench(ctx, edit(benchId, { guardDb: -1 }))).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { guardDb: expect.stringContaining("0 dB") },
    });
    await archiveBench(ctx, { benchId });
    await expect(editBench(ctx, edit(benchId, { name: "Attic" }))).rejects.toMatchObject({
      code: "conflict",
    });
    expect((await readBench(ctx, benchId))?.name).toBe("Loft");
  });
});
