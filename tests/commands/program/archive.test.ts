import { afterAll, beforeAll, describe, expect, test } from "vitest";
import type { Context } from "@/lib/auth/context";
import { archiveBuild } from "@/lib/commands/program/archive-build";
import { archiveProgram } from "@/lib/commands/program/archive-program";
import { editBuild } from "@/lib/commands/program/edit-build";
import { restoreBuild } from "@/lib/commands/program/restore-build";
import { restoreProgram } from "@/lib/commands/program/restore-program";
import { listArchivedBuilds, listArchivedPrograms } from "@/lib/queries/program/list-archived";
import { listPrograms } from "@/lib/queries/program/list-programs";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { makeProgram } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

type Ids = { programId: string; buildId: string };
const programsOf = (ctx: Context) => () => listArchivedPrograms(ctx);
const buildsOf = (ctx: Context, ids: Ids) => () => listArchivedBuilds(ctx, ids.programId);

const PAIRS = [
  {
    subject: "program",
    archive: archiveProgram,
    restore: restoreProgram,
    idOf: (ids: Ids) => ids.programId,
    archived: (ctx: Context) => programsOf(ctx),
  },
  {
    subject: "build",
    archive: archiveBuild,
    restore: restoreBuild,
    idOf: (ids: Ids) => ids.buildId,
    archived: (ctx: Context, ids: Ids) => buildsOf(ctx, ids),
  },
];

describe.each(PAIRS)("archiving and restoring a $subject", (pair) => {
  test("goes there and back with an audit row each, and each only once", async () => {
    const ctx = await makeMember(database, "manager");
    const ids = await makeProgram(ctx);
    const archived = pair.archived(ctx, ids);
    await pair.archive(ctx, ids);
    expect((await archived()).map((row) => row.id)).toEqual([pair.idOf(ids)]);
    await expect(pair.archive(ctx, ids)).rejects.toThrow(/archived already/);
    await pair.restore(ctx, ids);
    expect(await archived()).toEqual([]);
    await expect(pair.restore(ctx, ids)).rejects.toThrow(/not archived/);
    const id = pair.idOf(ids);
    expect((await auditRows(database, ctx.teamId)).slice(-2)).toEqual([
      { actor_id: ctx.userId, action: `${pair.subject}.archive`, subject_id: id },
      { actor_id: ctx.userId, action: `${pair.subject}.restore`, subject_id: id },
    ]);
  });

  test("refuses a liaison", async () => {
    const ctx = await makeMember(database, "engineer");
    const ids = await makeProgram(ctx);
    const liaison = await makeMember(database, "liaison", ctx.teamId);
    await expect(pair.archive(liaison, ids)).rejects.toMatchObject({ code: "denied" });
    await pair.archive(ctx, ids);
    await expect(pair.restore(liaison, ids)).rejects.toMatchObject({ code: "denied" });
    expect(await pair.archived(ctx, ids)()).toHaveLength(1);
  });

  test("does not reach another team", async () => {
    const ours = await makeMember(database, "engineer");
    const ids = await makeProgram(ours);
    const theirs = await makeMember(database, "admin");
    await expect(pair.archive(theirs, ids)).rejects.toMatchObject({ code: "not-found" });
    await pair.archive(ours, ids);
    await expect(pair.restore(theirs, ids)).rejects.toMatchObject({ code: "not-found" });
    expect(await pair.archived(theirs, ids)()).toEqual([]);
    expect(await pair.archived(ours, ids)()).toHaveLength(1);
  });

  test("leaves nothing behind when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    const ids = await makeProgram(ctx);
    await withoutAudit(database, async () => {
      await expect(pair.archive(ctx, ids)).rejects.toThrow();
    });
    expect(await pair.archived(ctx, ids)()).toEqual([]);
    await pair.archive(ctx, ids);
    await withoutAudit(database, async () => {
      await expect(pair.restore(ctx, ids)).rejects.toThrow();
    });
    expect(await pair.archived(ctx, ids)()).toHaveLength(1);
  });

  test("asks for an id that is one", async () => {
    const ctx = await makeMember(database, "engineer");
    const none = { programId: "none", buildId: "none" };
    const refusal = { code: "invalid", fieldErrors: { [`${pair.subject}Id`]: expect.any(String) } };
    await expect(pair.archive(ctx, none)).rejects.toMatchObject(refusal);
    await expect(pair.restore(ctx, none)).rejects.toMatchObject(refusal);
  });
});

describe("an archived program", () => {
  test("leaves the list of programs and keeps its builds from being changed", async () => {
    const ctx = await makeMember(database, "engineer");
    const ids = await makeProgram(ctx);
    await archiveProgram(ctx, ids);
    expect(await listPrograms(ctx, "2026-12-01")).toEqual([]);
    const edit = editBuild(ctx, { buildId: ids.buildId, name: "P9", builtOn: null, notes: "" });
    await expect(edit).rejects.toMatchObject({ code: "not-found" });
    await expect(archiveBuild(ctx, ids)).rejects.toMatchObject({ code: "not-found" });
  });
});
