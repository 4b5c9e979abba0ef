import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { createBuild } from "@/lib/commands/program/create-build";
import { editBuild } from "@/lib/commands/program/edit-build";
import { readBuildDetails } from "@/lib/queries/program/read-build-details";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { makeProgram } from "./arrange";

const VALUES = { name: "P1b", builtOn: null, notes: "Reworked shield" };

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

describe("editBuild", () => {
  test("changes name, day and notes and writes one audit row", async () => {
    const ctx = await makeMember(database, "engineer");
    const ids = await makeProgram(ctx);
    await editBuild(ctx, { buildId: ids.buildId, ...VALUES });
    expect(await readBuildDetails(ctx, ids)).toEqual({
      id: ids.buildId,
      ...VALUES,
      archivedAt: null,
      program: { id: ids.programId, name: "Plover", archivedAt: null },
    });
    expect((await auditRows(database, ctx.teamId)).at(-1)).toEqual({
      actor_id: ctx.userId,
      action: "build.edit",
      subject_id: ids.buildId,
    });
  });

  test("refuses a liaison", async () => {
    const ctx = await makeMember(database, "engineer");
    const ids = await makeProgram(ctx);
    const liaison = await makeMember(database, "liaison", ctx.teamId);
    const tried = editBuild(liaison, { buildId: ids.buildId, ...VALUES });
    await expect(tried).rejects.toMatchObject({ code: "denied" });
    expect((await readBuildDetails(liaison, ids))?.name).toBe("Plover 1");
  });

  test("does not find another team's build", async () => {
    const ours = await makeMember(database, "engineer");
    const ids = await makeProgram(ours);
    const theirs = await makeMember(database, "engineer");
    const tried = editBuild(theirs, { buildId: ids.buildId, ...VALUES });
    await expect(tried).rejects.toMatchObject({ code: "not-found" });
    expect(await readBuildDetails(theirs, ids)).toBeNull();
    expect((await readBuildDetails(ours, ids))?.name).toBe("Plover 1");
  });

  test("leaves nothing behind when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    const ids = await makeProgram(ctx);
    await withoutAudit(database, async () => {
      await expect(editBuild(ctx, { buildId: ids.buildId, ...VALUES })).rejects.toThrow();
    });
    expect((await readBuildDetails(ctx, ids))?.name).toBe("Plover 1");
  });

  test("says at the field what is wrong", async () => {
    const ctx = await makeMember(database, "engineer");
    const { programId, buildId } = await makeProgram(ctx);
    await createBuild(ctx, { programId, name: "P2", builtOn: null, notes: "" });
    const bad = editBuild(ctx, { buildId, ...VALUES, builtOn: "2026-02-30" });
    await expect(bad).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { builtOn: expect.stringContaining("year-month-day") },
    });
    const taken = editBuild(ctx, { buildId, ...VALUES, name: "P2" });
    await expect(taken).rejects.toMatchObject({
      code: "conflict",
      fieldErrors: { name: "Choose another name." },
    });
  });
});
