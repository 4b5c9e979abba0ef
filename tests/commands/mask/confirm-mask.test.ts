import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { inTeam } from "@/db/client";
import type { Context } from "@/lib/auth/context";
import { addShippedMasks } from "@/lib/commands/mask/add-shipped-masks";
import { archiveMask } from "@/lib/commands/mask/archive-mask";
import { confirmMask } from "@/lib/commands/mask/confirm-mask";
import { copyMask } from "@/lib/commands/mask/copy-mask";
import { listMasks } from "@/lib/queries/mask/list-masks";
import { readMask } from "@/lib/queries/mask/read-mask";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { MASK, maskOf } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const SHIPPED = {
  ...MASK,
  key: "hull-limit",
  edition: "not stated",
  provenance: "from memory" as const,
  note: "Second band unsure.",
};

async function shippedOf(ctx: Context, mask = SHIPPED): Promise<string> {
  await inTeam(ctx.db, ctx.teamId, (tx) => addShippedMasks(tx, ctx.teamId, [mask]));
  return (await listMasks(ctx)).find((row) => row.key === mask.key)!.id;
}

const said = (maskId: string) => ({
  maskId,
  basedOnRevision: 1,
  copy: "Printed copy in the lab's cabinet, licence 4711",
  edition: "Edition 2.1, 2019",
  isCompared: true,
});

describe("confirmMask", () => {
  test("makes a revision with the same lines that is no longer from memory, with who, when and what", async () => {
    const ctx = await makeMember(database, "engineer");
    const maskId = await shippedOf(ctx);
    const done = await confirmMask(ctx, said(maskId));
    expect(done).toMatchObject({ maskId, revision: 2 });
    const mask = await readMask(ctx, maskId);
    expect(mask?.origin).toBe("shipped");
    expect(mask?.pending).toBeNull();
    expect(mask?.current).toMatchObject({
      id: done.maskRevisionId,
      revision: 2,
      source: "confirmation",
      content: { ...SHIPPED, provenance: "team", edition: "Edition 2.1, 2019" },
      confirmation: {
        by: expect.any(String),
        at: expect.any(Date),
        copy: "Printed copy in the lab's cabinet, licence 4711",
      },
    });
    expect(mask?.revisions[1]).toMatchObject({
      source: "shipped",
      confirmation: null,
      content: SHIPPED,
    });
    expect(await listMasks(ctx)).toMatchObject([
      {
        provenance: "team",
        edition: "Edition 2.1, 2019",
        confirmation: { copy: said(maskId).copy, by: mask?.current.confirmation?.by },
        pendingRevision: null,
      },
    ]);
    expect(await auditRows(database, ctx.teamId)).toEqual([
      { actor_id: ctx.userId, action: "mask.confirm", subject_id: maskId },
    ]);
  });

  test("takes the note that is typed, and keeps the mask's when none is given", async () => {
    const ctx = await makeMember(database, "engineer");
    const maskId = await shippedOf(ctx);
    await confirmMask(ctx, { ...said(maskId), note: "  Table 5 " });
    await confirmMask(ctx, { ...said(maskId), basedOnRevision: 2, edition: "Edition 3" });
    const mask = await readMask(ctx, maskId);
    expect(mask?.revisions.map(({ content }) => [content.edition, content.note])).toEqual([
      ["Edition 3", "Table 5"],
      ["Edition 2.1, 2019", "Table 5"],
      ["not stated", "Second band unsure."],
    ]);
  });

  test("works for a team's mask as well, and a copy of a confirmed mask is not a confirmation", async () => {
    const ctx = await makeMember(database, "engineer");
    const maskId = await maskOf(ctx, { ...MASK, provenance: "from memory" });
    await confirmMask(ctx, said(maskId));
    const copy = await copyMask(ctx, { maskId });
    const copied = await readMask(ctx, copy.maskId);
    expect(copied?.current).toMatchObject({ source: "team", confirmation: null });
  });

  test.each([
    ["no copy named", { copy: "  " }, "copy"],
    ["no edition named", { edition: "" }, "edition"],
    ["nothing compared", { isCompared: false }, "isCompared"],
    ["a note that cannot be stored", { note: "a\u0000" }, "note"],
  ])("refuses %s at its field", async (_, change, field) => {
    const ctx = await makeMember(database, "engineer");
    const maskId = await shippedOf(ctx);
    await expect(confirmMask(ctx, { ...said(maskId), ...change })).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { [field]: expect.any(String) },
    });
    expect((await readMask(ctx, maskId))?.revisions).toHaveLength(1);
  });

  test("refuses a revision that is not the newest, one that is not in force yet, and an archived mask", async () => {
    const ctx = await makeMember(database, "engineer");
    const maskId = await shippedOf(ctx);
    await confirmMask(ctx, said(maskId));
    await expect(confirmMask(ctx, said(maskId))).rejects.toMatchObject({
      code: "conflict",
      message: expect.stringContaining("revision 2 is the newest"),
    });
    const pending =
      "update mask_revisions set in_force_at = $2 where mask_id = $1 and revision = 2";
    await database.owner.query(pending, [maskId, null]);
    await expect(confirmMask(ctx, { ...said(maskId), basedOnRevision: 2 })).rejects.toMatchObject({
      code: "conflict",
      message: expect.stringContaining("still being put in force"),
    });
    await database.owner.query(pending, [maskId, new Date()]);
    await archiveMask(ctx, { maskId });
    await expect(confirmMask(ctx, { ...said(maskId), basedOnRevision: 2 })).rejects.toMatchObject({
      code: "conflict",
      message: expect.stringContaining("archived"),
    });
    expect((await readMask(ctx, maskId))?.revisions).toHaveLength(2);
  });

  test("refuses a manager, a liaison and another team, and stores nothing without its audit row", async () => {
    const ctx = await makeMember(database, "engineer");
    const maskId = await shippedOf(ctx);
    for (const role of ["manager", "liaison"] as const) {
      const other = await makeMember(database, role, ctx.teamId);
      await expect(confirmMask(other, said(maskId))).rejects.toMatchObject({ code: "denied" });
    }
    const foreign = await makeMember(database, "engineer");
    await expect(confirmMask(foreign, said(maskId))).rejects.toMatchObject({ code: "not-found" });
    await withoutAudit(database, async () => {
      await expect(confirmMask(ctx, said(maskId))).rejects.toThrow();
    });
    expect((await readMask(ctx, maskId))?.revisions).toHaveLength(1);
  });
});

describe("a confirmed mask that is shipped anew", () => {
  test("stays as it was confirmed, whether its shipped content changed or not", async () => {
    const ctx = await makeMember(database, "engineer");
    const maskId = await shippedOf(ctx);
    await confirmMask(ctx, said(maskId));
    await shippedOf(ctx);
    await shippedOf(ctx, { ...SHIPPED, note: "Corrected." });
    const mask = await readMask(ctx, maskId);
    expect(mask?.revisions.map(({ source }) => source)).toEqual(["confirmation", "shipped"]);
    expect(mask?.current.source).toBe("confirmation");
  });

  test("what nobody confirmed takes the newer shipped revision, in force at once", async () => {
    const ctx = await makeMember(database, "engineer");
    const maskId = await shippedOf(ctx);
    await shippedOf(ctx, { ...SHIPPED, note: "Corrected." });
    const mask = await readMask(ctx, maskId);
    expect(mask?.revisions.map(({ source }) => source)).toEqual(["shipped", "shipped"]);
    expect(mask?.current).toMatchObject({ revision: 2, content: { note: "Corrected." } });
  });
});
