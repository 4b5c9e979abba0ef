import { afterAll, beforeAll, describe, expect, test } from "vitest";
import type { Context } from "@/lib/auth/context";
import { createBuild } from "@/lib/commands/program/create-build";
import { createProgram } from "@/lib/commands/program/create-program";
import { readProgram } from "@/lib/queries/program/read-program";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

async function programOf(ctx: Context): Promise<string> {
  const input = { name: "Plover", description: "", targetMarginDb: 4 };
  return (await createProgram(ctx, input)).programId;
}

const build = (programId: string, name: string) => ({
  programId,
  name,
  builtOn: "2026-05-04",
  notes: "",
});

describe("createBuild", () => {
  test("adds builds in order, also when two arrive at once", async () => {
    const ctx = await makeMember(database, "engineer");
    const programId = await programOf(ctx);
    await createBuild(ctx, build(programId, "P1"));
    await Promise.all([
      createBuild(ctx, build(programId, "P2")),
      createBuild(ctx, build(programId, "P3")),
    ]);
    const program = await readProgram(ctx, programId);
    const numbered = await database.owner.query(
      "select sequence from builds where program_id = $1 order by sequence",
      [programId],
    );
    expect(numbered.rows.map((row) => row.sequence)).toEqual([1, 2, 3]);
    expect(program?.trend.builds.map((b) => b.name).sort()).toEqual(["P1", "P2", "P3"]);
    const actions = (await auditRows(database, ctx.teamId)).map((row) => row.action);
    expect(actions.filter((action) => action === "build.create")).toHaveLength(3);
  });

  test("refuses a liaison", async () => {
    const engineer = await makeMember(database, "engineer");
    const programId = await programOf(engineer);
    const liaison = await makeMember(database, "liaison", engineer.teamId);
    await expect(createBuild(liaison, build(programId, "P1"))).rejects.toMatchObject({
      code: "denied",
    });
    expect((await readProgram(liaison, programId))?.trend.builds).toEqual([]);
  });

  test("does not find another team's program", async () => {
    const ours = await makeMember(database, "engineer");
    const programId = await programOf(ours);
    const theirs = await makeMember(database, "engineer");
    await expect(createBuild(theirs, build(programId, "P1"))).rejects.toMatchObject({
      code: "not-found",
    });
    expect(await readProgram(theirs, programId)).toBeNull();
    expect((await readProgram(ours, programId))?.trend.builds).toEqual([]);
  });

  test("leaves nothing behind when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    const programId = await programOf(ctx);
    await withoutAudit(database, async () => {
      await expect(createBuild(ctx, build(programId, "P1"))).rejects.toThrow();
    });
    expect((await readProgram(ctx, programId))?.trend.builds).toEqual([]);
  });

  test("refuses a name that is taken and a date that does not exist", async () => {
    const ctx = await makeMember(database, "engineer");
    const programId = await programOf(ctx);
    await createBuild(ctx, build(programId, "P1"));
    await expect(createBuild(ctx, build(programId, "P1"))).rejects.toMatchObject({
      code: "conflict",
      fieldErrors: { name: "Choose another name." },
    });
    const noDay = { ...build(programId, "P2"), builtOn: "2026-02-30" };
    await expect(createBuild(ctx, noDay)).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { builtOn: expect.stringContaining("year-month-day") },
    });
    expect((await readProgram(ctx, programId))?.trend.builds).toHaveLength(1);
  });
});
