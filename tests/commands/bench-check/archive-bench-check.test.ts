import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { archiveBenchCheck } from "@/lib/commands/bench-check/archive-bench-check";
import { recordBenchCheck } from "@/lib/commands/bench-check/record-bench-check";
import { readBenchCheck } from "@/lib/queries/bench-check/read-bench-check";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { makeBench } from "../../support/sweeps";
import { referenceInput } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

async function makeCheck() {
  const ctx = await makeMember(database, "engineer");
  const benchId = await makeBench(ctx, "Loft");
  const { checkId } = await recordBenchCheck(ctx, referenceInput(benchId));
  const archivedAt = async () => (await readBenchCheck(ctx, benchId, checkId))?.archivedAt;
  return { ctx, benchId, checkId, archivedAt };
}

describe("archiveBenchCheck", () => {
  test("puts a check aside once, with its audit row", async () => {
    const { ctx, benchId, checkId, archivedAt } = await makeCheck();
    expect(await archiveBenchCheck(ctx, { checkId })).toEqual({ checkId, benchId });
    expect(await archivedAt()).toBeInstanceOf(Date);
    await expect(archiveBenchCheck(ctx, { checkId })).rejects.toMatchObject({ code: "conflict" });
    expect((await auditRows(database, ctx.teamId)).at(-1)).toEqual({
      actor_id: ctx.userId,
      action: "bench-check.archive",
      subject_id: checkId,
    });
  });

  test("refuses a manager, another team and what is no check", async () => {
    const { ctx, checkId, archivedAt } = await makeCheck();
    const manager = await makeMember(database, "manager", ctx.teamId);
    await expect(archiveBenchCheck(manager, { checkId })).rejects.toMatchObject({ code: "denied" });
    const foreign = await makeMember(database, "admin");
    await expect(archiveBenchCheck(foreign, { checkId })).rejects.toMatchObject({
      code: "not-found",
    });
    await expect(archiveBenchCheck(ctx, { checkId: "x" })).rejects.toMatchObject({
      code: "invalid",
    });
    expect(await archivedAt()).toBeNull();
  });

  test("changes nothing when the audit row cannot be written", async () => {
    const { ctx, checkId, archivedAt } = await makeCheck();
    await withoutAudit(database, async () => {
      await expect(archiveBenchCheck(ctx, { checkId })).rejects.toThrow();
    });
    expect(await archivedAt()).toBeNull();
  });
});
