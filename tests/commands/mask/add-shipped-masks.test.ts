import { mkdtemp, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { inTeam } from "@/db/client";
import type { Context } from "@/lib/auth/context";
import { addShippedMasks } from "@/lib/commands/mask/add-shipped-masks";
import type { Mask } from "@/lib/core/mask/mask";
import { maskToJson } from "@/lib/core/mask/mask-json";
import { readShippedMasks } from "@/lib/formats/shipped-masks";
import { listMasks } from "@/lib/queries/mask/list-masks";
import { readMask } from "@/lib/queries/mask/read-mask";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { CROSSING, MASK } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const add = (ctx: Context, shipped: Mask[]) =>
  inTeam(ctx.db, ctx.teamId, (tx) => addShippedMasks(tx, ctx.teamId, shipped));
const one = { ...MASK, key: "one" };
const two = { ...MASK, key: "two" };

describe("addShippedMasks", () => {
  test("adds every mask of the folder once, however often it runs", async () => {
    const ctx = await makeMember(database, "engineer");
    const shipped = await readShippedMasks();
    expect(shipped.length).toBeGreaterThan(20);
    await add(ctx, shipped);
    await add(ctx, shipped);
    const rows = await listMasks(ctx);
    expect(rows.map((row) => row.key).sort()).toEqual(shipped.map((mask) => mask.key).sort());
    expect(new Set(rows.map((row) => `${row.origin} ${row.revision}`))).toEqual(
      new Set(["shipped 1"]),
    );
  });

  test("adds what is new, a revision to what changed, and keeps what is no longer shipped", async () => {
    const ctx = await makeMember(database, "engineer");
    await add(ctx, [one, two]);
    const changed = { ...two, note: "Corrected." };
    await add(ctx, [changed, { ...MASK, key: "three" }]);
    const rows = await listMasks(ctx);
    expect(rows.map((row) => [row.key, row.revision]).sort()).toEqual([
      ["one", 1],
      ["three", 1],
      ["two", 2],
    ]);
    const twoNow = await readMask(ctx, rows.find((row) => row.key === "two")!.id);
    expect(twoNow?.revisions.map((r) => r.content.note)).toEqual(["Corrected.", ""]);
  });

  test("numbers in turn when two processes start at once", async () => {
    const ctx = await makeMember(database, "engineer");
    await Promise.all([add(ctx, [one, two]), add(ctx, [two, one])]);
    await Promise.all([add(ctx, [{ ...one, note: "n" }]), add(ctx, [{ ...one, note: "n" }])]);
    const rows = await listMasks(ctx);
    expect(rows.map((row) => [row.key, row.revision]).sort()).toEqual([
      ["one", 2],
      ["two", 1],
    ]);
  });

  test("serves one team at a time", async () => {
    const ctx = await makeMember(database, "engineer");
    const other = await makeMember(database, "engineer");
    await add(ctx, [one]);
    await add(other, [one]);
    expect(await listMasks(ctx)).toHaveLength(1);
    expect(await listMasks(other)).toHaveLength(1);
  });
});

describe("readShippedMasks", () => {
  test.each([
    ["no JSON", "broken.json", "{"],
    ["crossing segments", "crossing.json", maskToJson({ ...CROSSING, key: "crossing" })],
    ["another key", "other.json", maskToJson(one)],
    ["a team's key", "team-x.json", maskToJson({ ...MASK, key: "team-x" })],
  ])("names the file that holds %s", async (_, file, text) => {
    const folder = await mkdtemp(join(tmpdir(), "neap-masks-"));
    try {
      await writeFile(join(folder, file), text);
      await expect(readShippedMasks(folder)).rejects.toThrow(file);
    } finally {
      await rm(folder, { recursive: true });
    }
  });
});
