import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { archiveBench } from "@/lib/commands/bench/archive-bench";
import { restoreBench } from "@/lib/commands/bench/restore-bench";
import { readBench } from "@/lib/queries/bench/read-bench";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { benchOf } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

describe("archiveBench and restoreBench", () => {
  test("put a bench away and bring it back, each with its audit row", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    await archiveBench(ctx, { benchId });
    expect((await readBench(ctx, benchId))?.archivedAt).toBeInstanceOf(Date);
    await expect(archiveBench(ctx, { benchId })).rejects.toMatchObject({ code: "conflict" });
    await restoreBench(ctx, { benchId });
    expect((await readBench(ctx, benchId))?.archivedAt).toBeNull();
    await expect(restoreBench(ctx, { benchId })).rejects.toMatchObject({ code: "conflict" });
    expect((await auditRows(database, ctx.teamId)).map((row) => row.action)).toEqual([
      "bench.create",
      "bench.archive",
      "bench.restore",
    ]);
  });

  test.each([
    ["archiveBench", archiveBench],
    ["restoreBench", restoreBench],
  ])("%s refuses a liaison, another team and a missing bench", async (_, command) => {
    const engineer = await makeMember(database, "engineer");
    const benchId = await benchOf(engineer);
    if (command === restoreBench) await archiveBench(engineer, { benchId });
    const before = (await readBench(engineer, benchId))?.archivedAt;
    const liaison = await makeMember(database, "liaison", engineer.teamId);
    await expect(command(liaison, { benchId })).rejects.toMatchObject({ code: "denied" });
    const foreign = await makeMember(database, "engineer");
    await expect(command(foreign, { benchId })).rejects.toMatchObject({ code: "not-found" });
    await expect(command(engineer, { benchId: "none" })).rejects.toMatchObject({ code: "invalid" });
    expect((await readBench(engineer, benchId))?.archivedAt).toEqual(before);
  });

  test.each([
    ["archiveBench", archiveBench],
    ["restoreBench", restoreBench],
  ])("%s changes nothing when the audit row cannot be written", async (_, command) => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    if (command === restoreBench) await archiveBench(ctx, { benchId });
    const before = (await readBench(ctx, benchId))?.archivedAt;
    await withoutAudit(database, async () => {
      await expect(command(ctx, { benchId })).rejects.toThrow();
    });
    expect((await readBench(ctx, benchId))?.archivedAt).toEqual(before);
  });
});
