import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { importMask } from "@/lib/commands/mask/import-mask";
import { maskToJson } from "@/lib/core/mask/mask-json";
import { listMasks } from "@/lib/queries/mask/list-masks";
import { readMask } from "@/lib/queries/mask/read-mask";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { CROSSING, MASK } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const text = maskToJson({ ...MASK, key: "from-elsewhere" });

describe("importMask", () => {
  test("takes what was exported, byte order mark and all, as a mask of the team's own", async () => {
    const ctx = await makeMember(database, "engineer");
    const { maskId } = await importMask(ctx, { text: `\uFEFF${text}` });
    const mask = await readMask(ctx, maskId);
    expect(mask?.origin).toBe("team");
    expect(mask?.revisions[0]?.content).toEqual({ ...MASK, key: "team-wheelhouse-limit" });
    expect((await auditRows(database, ctx.teamId)).map((row) => row.action)).toEqual([
      "mask.import",
    ]);
  });

  test("names every problem of a file with its path, and stores nothing", async () => {
    const ctx = await makeMember(database, "engineer");
    const broken = {
      ...MASK,
      unit: "furlong",
      lines: [{ ...MASK.lines[0], rbwHz: "wide", segments: [{ startHz: "30 MHz" }] }],
    };
    await expect(importMask(ctx, { text: JSON.stringify(broken) })).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: {
        unit: expect.any(String),
        "lines.0.rbwHz": expect.any(String),
        "lines.0.segments.0.startHz": expect.any(String),
        "lines.0.segments.0.stopHz": expect.any(String),
        "lines.0.segments.0.interpolation": expect.any(String),
      },
    });
    await expect(importMask(ctx, { text: maskToJson(CROSSING) })).rejects.toMatchObject({
      fieldErrors: { "lines.0.segments.1": expect.stringContaining("crosses") },
    });
    expect(await listMasks(ctx)).toEqual([]);
  });

  test.each([
    ["no text", undefined, "text"],
    ["no JSON", "{ not json", "text"],
    ["a cut file", text.slice(0, -20), "text"],
    ["more than 1 MB", `"${"x".repeat(1_000_000)}"`, "text"],
    ["more than 1 MB once it is bytes", `"${"µ".repeat(600_000)}"`, "text"],
    ["JSON nested without end", "[".repeat(400_000) + "]".repeat(400_000), "format"],
    ["a list", "[]", "format"],
    ["null", "null", "format"],
    ["an unknown version", JSON.stringify({ ...MASK, version: 2 }), "version"],
    ["lines that are no list", JSON.stringify({ ...MASK, lines: { length: 3 } }), "lines"],
    ["lines of null", JSON.stringify({ ...MASK, lines: [null] }), "lines"],
  ])("refuses %s with a message", async (_, given, field) => {
    const ctx = await makeMember(database, "engineer");
    await expect(importMask(ctx, { text: given })).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { [field]: expect.any(String) },
    });
    expect(await listMasks(ctx)).toEqual([]);
  });

  test("refuses a liaison, stays in its team, and needs its audit row", async () => {
    const engineer = await makeMember(database, "engineer");
    const liaison = await makeMember(database, "liaison", engineer.teamId);
    await expect(importMask(liaison, { text })).rejects.toMatchObject({ code: "denied" });
    await withoutAudit(database, async () => {
      await expect(importMask(engineer, { text })).rejects.toThrow();
    });
    expect(await listMasks(engineer)).toEqual([]);
    const { maskId } = await importMask(engineer, { text });
    const foreign = await makeMember(database, "engineer");
    expect(await readMask(foreign, maskId)).toBeNull();
  });
});
