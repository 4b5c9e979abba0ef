import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { archiveMask } from "@/lib/commands/mask/archive-mask";
import { reviseMask } from "@/lib/commands/mask/revise-mask";
import { listMasks } from "@/lib/queries/mask/list-masks";
import { readMask } from "@/lib/queries/mask/read-mask";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { MASK, maskOf } from "../../commands/mask/arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

describe("listMasks", () => {
  test("shows each mask once with its current revision, by title, to every role", async () => {
    const ctx = await makeMember(database, "engineer");
    const line = MASK.lines[0]!;
    const lines = [
      line,
      { ...line, name: "Second" },
      { ...line, name: "Average", detector: "average" as const },
    ];
    const maskId = await maskOf(ctx);
    const otherId = await maskOf(ctx, { ...MASK, title: "Anchor limit" });
    const made = await reviseMask(ctx, { maskId, mask: { ...MASK, lines } });
    await archiveMask(ctx, { maskId: otherId });
    const liaison = await makeMember(database, "liaison", ctx.teamId);
    expect(await listMasks(liaison)).toMatchObject([
      { title: "Anchor limit", revision: 1, archived: true },
      {
        id: maskId,
        key: "team-wheelhouse-limit",
        title: "Wheelhouse limit",
        revision: 2,
        revisionId: made.maskRevisionId,
        detectors: ["quasi-peak", "average"],
        archived: false,
      },
    ]);
    const foreign = await makeMember(database, "engineer");
    expect(await listMasks(foreign)).toEqual([]);
  });
});

describe("a revision that is not in force yet", () => {
  test("is told as pending, while the one before it stays the current one", async () => {
    const ctx = await makeMember(database, "engineer");
    const maskId = await maskOf(ctx);
    await reviseMask(ctx, { maskId, mask: { ...MASK, title: "Newer limit" } });
    await database.owner.query(
      "update mask_revisions set in_force_at = null where mask_id = $1 and revision = 2",
      [maskId],
    );
    expect(await listMasks(ctx)).toMatchObject([
      { title: "Wheelhouse limit", revision: 1, pendingRevision: 2, confirmation: null },
    ]);
    const mask = await readMask(ctx, maskId);
    expect(mask?.current).toMatchObject({ revision: 1, source: "team" });
    expect(mask?.current.inForceAt).toBeInstanceOf(Date);
    expect(mask?.pending).toMatchObject({ revision: 2, inForceAt: null });
    expect(mask?.revisions).toHaveLength(2);
  });
});

describe("readMask", () => {
  test("finds nothing under an address that is no id", async () => {
    const ctx = await makeMember(database, "engineer");
    for (const id of ["new", "' or 1", "-".repeat(36)]) expect(await readMask(ctx, id)).toBeNull();
  });
});
