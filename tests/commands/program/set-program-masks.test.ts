import { afterAll, beforeAll, describe, expect, test } from "vitest";
import type { Context } from "@/lib/auth/context";
import { setProgramMasks } from "@/lib/commands/program/set-program-masks";
import { listMaskChoices } from "@/lib/queries/program/list-mask-choices";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { makeMask, makeProgram } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

async function chosen(ctx: Context, programId: string): Promise<string[]> {
  const choices = await listMaskChoices(ctx, programId);
  return choices.filter((choice) => choice.isChosen).map((choice) => choice.id);
}

describe("setProgramMasks", () => {
  test("holds exactly the given masks, says which are new and which gone, and audits it", async () => {
    const ctx = await makeMember(database, "manager");
    const { programId } = await makeProgram(ctx);
    const a = await makeMask(database, ctx.teamId, "a");
    const b = await makeMask(database, ctx.teamId, "b");
    expect(await setProgramMasks(ctx, { programId, maskIds: [a, a] })).toEqual({
      added: [a],
      removed: [],
    });
    expect(await chosen(ctx, programId)).toEqual([a]);
    expect(await setProgramMasks(ctx, { programId, maskIds: [b] })).toEqual({
      added: [b],
      removed: [a],
    });
    expect(await chosen(ctx, programId)).toEqual([b]);
    await setProgramMasks(ctx, { programId, maskIds: [] });
    expect(await chosen(ctx, programId)).toEqual([]);
    const row = { actor_id: ctx.userId, action: "program.set-masks", subject_id: programId };
    expect((await auditRows(database, ctx.teamId)).slice(-3)).toEqual([row, row, row]);
    const details = await database.owner.query(
      "select detail from audit_events where subject_id = $1 and action = 'program.set-masks' order by at",
      [programId],
    );
    expect(details.rows.map((event) => event.detail)).toEqual([
      { added: ["a"], removed: [] },
      { added: ["b"], removed: ["a"] },
      { added: [], removed: ["b"] },
    ]);
  });

  test("refuses a liaison", async () => {
    const ctx = await makeMember(database, "engineer");
    const { programId } = await makeProgram(ctx);
    const maskId = await makeMask(database, ctx.teamId, "a");
    const liaison = await makeMember(database, "liaison", ctx.teamId);
    const tried = setProgramMasks(liaison, { programId, maskIds: [maskId] });
    await expect(tried).rejects.toMatchObject({ code: "denied" });
    expect(await chosen(ctx, programId)).toEqual([]);
  });

  test("reaches neither another team's program nor another team's mask", async () => {
    const ours = await makeMember(database, "engineer");
    const { programId } = await makeProgram(ours);
    const theirs = await makeMember(database, "engineer");
    const theirMask = await makeMask(database, theirs.teamId, "a");
    const intruding = setProgramMasks(theirs, { programId, maskIds: [theirMask] });
    await expect(intruding).rejects.toMatchObject({ code: "not-found" });
    const borrowing = setProgramMasks(ours, { programId, maskIds: [theirMask] });
    await expect(borrowing).rejects.toMatchObject({
      code: "not-found",
      fieldErrors: { maskIds: expect.stringContaining("not there any more") },
    });
    expect(await chosen(ours, programId)).toEqual([]);
  });

  test("keeps the old masks when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    const { programId } = await makeProgram(ctx);
    const a = await makeMask(database, ctx.teamId, "a");
    const b = await makeMask(database, ctx.teamId, "b");
    await setProgramMasks(ctx, { programId, maskIds: [a] });
    await withoutAudit(database, async () => {
      await expect(setProgramMasks(ctx, { programId, maskIds: [b] })).rejects.toThrow();
    });
    expect(await chosen(ctx, programId)).toEqual([a]);
  });

  test("refuses an archived mask at the list, though the program holds it from before", async () => {
    const ctx = await makeMember(database, "engineer");
    const { programId } = await makeProgram(ctx);
    const maskId = await makeMask(database, ctx.teamId, "old-mask");
    await setProgramMasks(ctx, { programId, maskIds: [maskId] });
    await database.owner.query("update masks set archived_at = now() where id = $1", [maskId]);
    const tried = setProgramMasks(ctx, { programId, maskIds: [maskId] });
    await expect(tried).rejects.toMatchObject({
      code: "conflict",
      fieldErrors: { maskIds: "Archived, so take off or restore: old-mask." },
    });
    const [choice] = await listMaskChoices(ctx, programId);
    expect(choice).toMatchObject({ id: maskId, isChosen: true, isArchived: true });
    await setProgramMasks(ctx, { programId, maskIds: [] });
    expect(await listMaskChoices(ctx, programId)).toEqual([]);
  });

  test("offers each mask once, as its newest revision names it", async () => {
    const ctx = await makeMember(database, "liaison");
    const engineer = await makeMember(database, "engineer", ctx.teamId);
    const { programId } = await makeProgram(engineer);
    const id = await makeMask(database, ctx.teamId, "a", ["First title", "Second title"]);
    expect(await listMaskChoices(ctx, programId)).toEqual([
      {
        id,
        title: "Second title",
        document: "Bench note 4",
        clause: "2",
        edition: "1",
        provenance: "team",
        isChosen: false,
        isArchived: false,
      },
    ]);
  });
});
