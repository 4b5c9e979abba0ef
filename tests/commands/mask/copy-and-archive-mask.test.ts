import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { inTeam } from "@/db/client";
import type { Context } from "@/lib/auth/context";
import { addShippedMasks } from "@/lib/commands/mask/add-shipped-masks";
import { archiveMask } from "@/lib/commands/mask/archive-mask";
import { copyMask } from "@/lib/commands/mask/copy-mask";
import { restoreMask } from "@/lib/commands/mask/restore-mask";
import { reviseMask } from "@/lib/commands/mask/revise-mask";
import { listMasks } from "@/lib/queries/mask/list-masks";
import { readMask } from "@/lib/queries/mask/read-mask";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { MASK } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

async function shippedOf(ctx: Context): Promise<string> {
  const shipped = { ...MASK, key: "shipped-limit", provenance: "from memory" as const };
  await inTeam(ctx.db, ctx.teamId, (tx) => addShippedMasks(tx, ctx.teamId, [shipped]));
  return (await listMasks(ctx))[0]!.id;
}

describe("copyMask", () => {
  test("makes a shipped mask the team's own, which can be edited and is still from memory", async () => {
    const ctx = await makeMember(database, "engineer");
    const shippedId = await shippedOf(ctx);
    const { maskId } = await copyMask(ctx, { maskId: shippedId });
    const copy = await readMask(ctx, maskId);
    expect(copy).toMatchObject({ origin: "team", key: "team-wheelhouse-limit-copy" });
    expect(copy?.revisions[0]?.content).toMatchObject({
      title: "Wheelhouse limit (copy)",
      provenance: "from memory",
      lines: MASK.lines,
    });
    const content = copy!.revisions[0]!.content;
    // Only confirming makes the same limits firm; an edit that says so by itself does not.
    await expect(
      reviseMask(ctx, { maskId, mask: { ...content, provenance: "read" } }),
    ).rejects.toMatchObject({
      fieldErrors: { provenance: expect.stringContaining("confirm it against your own copy") },
    });
    const edited = { ...content, title: "Wheelhouse limit, ours" };
    expect((await reviseMask(ctx, { maskId, mask: edited })).revision).toBe(2);
    expect((await readMask(ctx, shippedId))?.revisions).toHaveLength(1);
    expect((await auditRows(database, ctx.teamId)).map((row) => row.action)).toEqual([
      "mask.copy",
      "mask.revise",
    ]);
  });

  test("refuses a liaison and another team, and copies nothing without its audit row", async () => {
    const engineer = await makeMember(database, "engineer");
    const maskId = await shippedOf(engineer);
    const liaison = await makeMember(database, "liaison", engineer.teamId);
    await expect(copyMask(liaison, { maskId })).rejects.toMatchObject({ code: "denied" });
    const foreign = await makeMember(database, "engineer");
    await expect(copyMask(foreign, { maskId })).rejects.toMatchObject({ code: "not-found" });
    await withoutAudit(database, async () => {
      await expect(copyMask(engineer, { maskId })).rejects.toThrow();
    });
    expect(await listMasks(engineer)).toHaveLength(1);
  });
});

describe("archiveMask and restoreMask", () => {
  test("put a mask away, shipped or not, and bring it back, each with its audit row", async () => {
    const ctx = await makeMember(database, "engineer");
    const maskId = await shippedOf(ctx);
    await archiveMask(ctx, { maskId });
    expect((await listMasks(ctx))[0]?.archived).toBe(true);
    await expect(archiveMask(ctx, { maskId })).rejects.toMatchObject({ code: "conflict" });
    await restoreMask(ctx, { maskId });
    expect((await readMask(ctx, maskId))?.archivedAt).toBeNull();
    await expect(restoreMask(ctx, { maskId })).rejects.toMatchObject({ code: "conflict" });
    expect((await auditRows(database, ctx.teamId)).map((row) => row.action)).toEqual([
      "mask.archive",
      "mask.restore",
    ]);
  });

  test.each([
    ["archiveMask", archiveMask],
    ["restoreMask", restoreMask],
  ])("%s refuses a manager and another team, and needs its audit row", async (_, command) => {
    const engineer = await makeMember(database, "engineer");
    const maskId = await shippedOf(engineer);
    if (command === restoreMask) await archiveMask(engineer, { maskId });
    const before = (await readMask(engineer, maskId))?.archivedAt;
    const manager = await makeMember(database, "manager", engineer.teamId);
    await expect(command(manager, { maskId })).rejects.toMatchObject({ code: "denied" });
    const foreign = await makeMember(database, "engineer");
    await expect(command(foreign, { maskId })).rejects.toMatchObject({ code: "not-found" });
    await withoutAudit(database, async () => {
      await expect(command(engineer, { maskId })).rejects.toThrow();
    });
    expect((await readMask(engineer, maskId))?.archivedAt).toEqual(before);
  });
});
