import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { createMask } from "@/lib/commands/mask/create-mask";
import { listMasks } from "@/lib/queries/mask/list-masks";
import { readMask } from "@/lib/queries/mask/read-mask";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { CROSSING, flat, MASK } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

describe("createMask", () => {
  test("stores revision 1 as it was given, under a key made from the title", async () => {
    const ctx = await makeMember(database, "engineer");
    const { maskId } = await createMask(ctx, { mask: MASK });
    const mask = await readMask(ctx, maskId);
    expect(mask).toMatchObject({ key: "team-wheelhouse-limit", origin: "team", archivedAt: null });
    expect(mask?.revisions.map((r) => [r.revision, r.content])).toEqual([
      [1, { ...MASK, key: "team-wheelhouse-limit" }],
    ]);
    expect(await auditRows(database, ctx.teamId)).toEqual([
      { actor_id: ctx.userId, action: "mask.create", subject_id: maskId },
    ]);
  });

  test("numbers the keys of masks with one title, also when they arrive at once", async () => {
    const ctx = await makeMember(database, "engineer");
    await createMask(ctx, { mask: MASK });
    await Promise.all([1, 2, 3].map(() => createMask(ctx, { mask: MASK })));
    expect((await listMasks(ctx)).map((row) => row.key).sort()).toEqual([
      "team-wheelhouse-limit",
      "team-wheelhouse-limit-2",
      "team-wheelhouse-limit-3",
      "team-wheelhouse-limit-4",
    ]);
  });

  test("makes a key also from a title without any letter of ours", async () => {
    const ctx = await makeMember(database, "engineer");
    await createMask(ctx, { mask: { ...MASK, title: "潮" } });
    expect((await listMasks(ctx))[0]?.key).toBe("team-mask");
  });

  test.each(["manager", "liaison"] as const)("refuses a %s", async (role) => {
    const ctx = await makeMember(database, role);
    await expect(createMask(ctx, { mask: MASK })).rejects.toMatchObject({ code: "denied" });
    expect(await listMasks(ctx)).toEqual([]);
  });

  test("stays in its team", async () => {
    const ours = await makeMember(database, "engineer");
    const theirs = await makeMember(database, "engineer");
    const { maskId } = await createMask(ours, { mask: MASK });
    expect(await readMask(theirs, maskId)).toBeNull();
    expect(await listMasks(theirs)).toEqual([]);
  });

  test("leaves nothing behind when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    await withoutAudit(database, async () => {
      await expect(createMask(ctx, { mask: MASK })).rejects.toThrow();
    });
    expect(await listMasks(ctx)).toEqual([]);
    const left = await database.owner.query("select 1 from mask_revisions where team_id = $1", [
      ctx.teamId,
    ]);
    expect(left.rows).toEqual([]);
  });

  test("refuses crossing segments at their row and says where they cross", async () => {
    const ctx = await makeMember(database, "engineer");
    await expect(createMask(ctx, { mask: CROSSING })).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { "lines.0.segments.1": expect.stringContaining("crosses segment 1") },
    });
    expect(await listMasks(ctx)).toEqual([]);
  });

  const line = MASK.lines[0]!;
  const withSegments = (...segments: unknown[]) => ({ ...MASK, lines: [{ ...line, segments }] });
  test.each<[string, unknown, string]>([
    ["no mask at all", undefined, "format"],
    ["a blank title", { ...MASK, title: " " }, "title"],
    ["a title that cannot be stored", { ...MASK, title: "a\u0000" }, "title"],
    [
      "half a character in a line's name",
      { ...MASK, lines: [{ ...line, name: "\udc00" }] },
      "lines.0.name",
    ],
    ["a relative unit", { ...MASK, unit: "dB" }, "unit"],
    ["no lines", { ...MASK, lines: [] }, "lines"],
    ["a reversed segment", withSegments(flat(2e6, 1e6, 40)), "lines.0.segments.0.stopHz"],
    [
      "a level that is no number",
      withSegments({ ...flat(1e6, 2e6, 40), stopDb: Number.NaN }),
      "lines.0.segments.0.stopDb",
    ],
    ["a level out of reach", withSegments(flat(1e6, 2e6, 4000)), "lines.0.segments.0.startDb"],
    ["a frequency out of reach", withSegments(flat(1e6, 2e13, 40)), "lines.0.segments.0.stopHz"],
    [
      "too many segments",
      withSegments(...Array.from({ length: 301 }, (_, i) => flat(i + 1, i + 2, 0))),
      "lines.0.segments",
    ],
    ["too many lines", { ...MASK, lines: Array.from({ length: 41 }, () => line) }, "lines"],
    ["limits read in no document", { ...MASK, provenance: "read", document: "" }, "document"],
  ])("refuses %s at its field", async (_, mask, field) => {
    const ctx = await makeMember(database, "engineer");
    await expect(createMask(ctx, { mask })).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { [field]: expect.any(String) },
    });
    expect(await listMasks(ctx)).toEqual([]);
  });
});
