import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { inTeam } from "@/db/client";
import { addShippedMasks } from "@/lib/commands/mask/add-shipped-masks";
import { archiveMask } from "@/lib/commands/mask/archive-mask";
import { reviseMask } from "@/lib/commands/mask/revise-mask";
import { listMasks } from "@/lib/queries/mask/list-masks";
import { readMask } from "@/lib/queries/mask/read-mask";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { CROSSING, MASK, maskOf } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const noted = (note: string) => ({ ...MASK, note });

describe("reviseMask", () => {
  test("adds revisions and leaves the earlier ones as they were, also when two arrive at once", async () => {
    const ctx = await makeMember(database, "engineer");
    const maskId = await maskOf(ctx);
    const made = await Promise.all([
      reviseMask(ctx, { maskId, mask: noted("one") }),
      reviseMask(ctx, { maskId, mask: noted("two") }),
    ]);
    expect(made.map((m) => m.revision).sort()).toEqual([2, 3]);
    const revisions = (await readMask(ctx, maskId))?.revisions ?? [];
    expect(revisions.map((r) => r.revision)).toEqual([3, 2, 1]);
    expect(revisions.map((r) => r.content.note).sort()).toEqual(["", "one", "two"]);
    const last = made.find((m) => m.revision === 3);
    expect(revisions[0]?.id).toBe(last?.maskRevisionId);
    const actions = (await auditRows(database, ctx.teamId)).map((row) => row.action);
    expect(actions.filter((action) => action === "mask.revise")).toHaveLength(2);
  });

  test("keeps the mask's key when its title changes", async () => {
    const ctx = await makeMember(database, "engineer");
    const maskId = await maskOf(ctx);
    await reviseMask(ctx, { maskId, mask: { ...MASK, title: "Bridge limit", key: "other" } });
    const mask = await readMask(ctx, maskId);
    expect(mask?.revisions[0]?.content).toMatchObject({
      title: "Bridge limit",
      key: "team-wheelhouse-limit",
    });
    expect((await listMasks(ctx))[0]).toMatchObject({ title: "Bridge limit", revision: 2 });
  });

  test("never edits a mask shipped with Neap", async () => {
    const ctx = await makeMember(database, "engineer");
    await inTeam(ctx.db, ctx.teamId, (tx) =>
      addShippedMasks(tx, ctx.teamId, [{ ...MASK, key: "shipped-limit" }]),
    );
    const maskId = (await listMasks(ctx))[0]!.id;
    await expect(reviseMask(ctx, { maskId, mask: noted("x") })).rejects.toMatchObject({
      code: "conflict",
      message: expect.stringContaining("Copy it first"),
    });
    expect((await readMask(ctx, maskId))?.revisions).toHaveLength(1);
  });

  test("does not write over a revision that somebody saved meanwhile, nor repeat the current one", async () => {
    const ctx = await makeMember(database, "engineer");
    const maskId = await maskOf(ctx);
    await reviseMask(ctx, { maskId, basedOnRevision: 1, mask: noted("first") });
    await expect(
      reviseMask(ctx, { maskId, basedOnRevision: 1, mask: noted("second") }),
    ).rejects.toMatchObject({ code: "conflict", message: expect.stringContaining("Revision 2") });
    await expect(reviseMask(ctx, { maskId, mask: noted("first") })).rejects.toMatchObject({
      code: "conflict",
      message: "Nothing differs from the current revision.",
    });
    expect((await readMask(ctx, maskId))?.revisions).toHaveLength(2);
  });

  test("refuses crossing segments and stores nothing", async () => {
    const ctx = await makeMember(database, "engineer");
    const maskId = await maskOf(ctx);
    await expect(reviseMask(ctx, { maskId, mask: CROSSING })).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { "lines.0.segments.1": expect.stringContaining("crosses segment 1") },
    });
    expect((await readMask(ctx, maskId))?.revisions).toHaveLength(1);
  });

  test("refuses a manager, another team and an archived mask", async () => {
    const engineer = await makeMember(database, "engineer");
    const maskId = await maskOf(engineer);
    const input = { maskId, mask: noted("x") };
    const manager = await makeMember(database, "manager", engineer.teamId);
    await expect(reviseMask(manager, input)).rejects.toMatchObject({ code: "denied" });
    const foreign = await makeMember(database, "engineer");
    await expect(reviseMask(foreign, input)).rejects.toMatchObject({ code: "not-found" });
    await archiveMask(engineer, { maskId });
    await expect(reviseMask(engineer, input)).rejects.toMatchObject({ code: "conflict" });
    expect((await readMask(engineer, maskId))?.revisions).toHaveLength(1);
  });

  test("leaves nothing behind when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    const maskId = await maskOf(ctx);
    await withoutAudit(database, async () => {
      await expect(reviseMask(ctx, { maskId, mask: noted("x") })).rejects.toThrow();
    });
    expect((await readMask(ctx, maskId))?.revisions).toHaveLength(1);
  });
});
