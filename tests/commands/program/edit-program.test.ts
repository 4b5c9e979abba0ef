import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { editProgram } from "@/lib/commands/program/edit-program";
import { archiveProgram } from "@/lib/commands/program/archive-program";
import { readProgram } from "@/lib/queries/program/read-program";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { makeProgram } from "./arrange";

const VALUES = { name: "Plover II", description: "Wheelhouse display", targetMarginDb: 5.5 };

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

describe("editProgram", () => {
  test("changes name, description and target and keeps what they were in the audit trail", async () => {
    const ctx = await makeMember(database, "manager");
    const { programId } = await makeProgram(ctx);
    await editProgram(ctx, { programId, ...VALUES, description: "" });
    expect(await readProgram(ctx, programId)).toMatchObject({ ...VALUES, description: "" });
    const rows = await database.owner.query(
      "select actor_id, subject_id, detail from audit_events where action = 'program.edit' and team_id = $1",
      [ctx.teamId],
    );
    expect(rows.rows).toEqual([
      {
        actor_id: ctx.userId,
        subject_id: programId,
        detail: {
          from: { name: "Plover", targetMarginDb: 4 },
          to: { name: "Plover II", targetMarginDb: 5.5 },
        },
      },
    ]);
  });

  test("refuses a liaison", async () => {
    const ctx = await makeMember(database, "engineer");
    const { programId } = await makeProgram(ctx);
    const liaison = await makeMember(database, "liaison", ctx.teamId);
    const tried = editProgram(liaison, { programId, ...VALUES });
    await expect(tried).rejects.toMatchObject({ code: "denied" });
    expect((await readProgram(ctx, programId))?.name).toBe("Plover");
  });

  test("does not find another team's program", async () => {
    const ours = await makeMember(database, "engineer");
    const { programId } = await makeProgram(ours);
    const theirs = await makeMember(database, "admin");
    const tried = editProgram(theirs, { programId, ...VALUES });
    await expect(tried).rejects.toMatchObject({ code: "not-found" });
    expect((await readProgram(ours, programId))?.name).toBe("Plover");
    expect(await auditRows(database, theirs.teamId)).toEqual([]);
  });

  test("leaves nothing behind when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    const { programId } = await makeProgram(ctx);
    await withoutAudit(database, async () => {
      await expect(editProgram(ctx, { programId, ...VALUES })).rejects.toThrow();
    });
    expect((await readProgram(ctx, programId))?.name).toBe("Plover");
  });

  test("says at the field what is wrong", async () => {
    const ctx = await makeMember(database, "engineer");
    const { programId } = await makeProgram(ctx);
    await makeProgram(ctx, "Tern");
    const bad = editProgram(ctx, { programId, ...VALUES, name: "", targetMarginDb: 41 });
    await expect(bad).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: {
        name: "Give it a name.",
        targetMarginDb: "A target margin above 40 dB cannot be read off a bench.",
      },
    });
    const taken = editProgram(ctx, { programId, ...VALUES, name: "Tern" });
    await expect(taken).rejects.toMatchObject({
      code: "conflict",
      fieldErrors: { name: "Choose another name." },
    });
  });

  test("leaves an archived program alone", async () => {
    const ctx = await makeMember(database, "engineer");
    const { programId } = await makeProgram(ctx);
    await archiveProgram(ctx, { programId });
    const tried = editProgram(ctx, { programId, ...VALUES });
    await expect(tried).rejects.toMatchObject({ code: "not-found" });
    expect((await readProgram(ctx, programId))?.name).toBe("Plover");
  });
});
