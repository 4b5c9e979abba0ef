import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { archiveBench } from "@/lib/commands/bench/archive-bench";
import { recordBenchCheck } from "@/lib/commands/bench-check/record-bench-check";
import { withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { makeBench } from "../../support/sweeps";
import { referenceInput } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

async function makeLoft(role: "engineer" | "admin" = "engineer") {
  const ctx = await makeMember(database, role);
  return { ctx, benchId: await makeBench(ctx, "Loft") };
}

async function counts(teamId: string) {
  const count = async (table: string) =>
    Number(
      (await database.owner.query(`select count(*) from ${table} where team_id = $1`, [teamId]))
        .rows[0].count,
    );
  return { checks: await count("bench_checks"), files: await count("stored_files") };
}

describe("recordBenchCheck, who may and what is left behind", () => {
  test("refuses a manager, another team's bench and an archived one, and stores nothing", async () => {
    const { ctx, benchId } = await makeLoft();
    for (const role of ["manager", "liaison"] as const) {
      const member = await makeMember(database, role, ctx.teamId);
      await expect(recordBenchCheck(member, referenceInput(benchId))).rejects.toMatchObject({
        code: "denied",
      });
    }
    const foreign = await makeMember(database, "engineer");
    await expect(recordBenchCheck(foreign, referenceInput(benchId))).rejects.toMatchObject({
      code: "not-found",
    });
    await archiveBench(ctx, { benchId });
    await expect(recordBenchCheck(ctx, referenceInput(benchId))).rejects.toMatchObject({
      code: "conflict",
    });
    expect(await counts(ctx.teamId)).toEqual({ checks: 0, files: 0 });
    expect(await counts(foreign.teamId)).toEqual({ checks: 0, files: 0 });
  });

  test("stores nothing when the audit row cannot be written", async () => {
    const { ctx, benchId } = await makeLoft();
    await withoutAudit(database, async () => {
      await expect(recordBenchCheck(ctx, referenceInput(benchId))).rejects.toThrow();
    });
    expect(await counts(ctx.teamId)).toEqual({ checks: 0, files: 0 });
  });
});
