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

describe("readMask", () => {
  test("finds nothing under an address that is no id", async () => {
    const ctx = await makeMember(database, "engineer");
    for (const id of ["new", "' or 1", "-".repeat(36)]) expect(await readMask(ctx, id)).toBeNull();
  });
});
