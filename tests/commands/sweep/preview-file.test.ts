import { afterAll, beforeAll, expect, test } from "vitest";
import { importSweep } from "@/lib/commands/sweep/import-sweep";
import { previewFile } from "@/lib/commands/sweep/preview-file";
import { auditRows } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { csvOf, importInput, levelsOf, makePlace, text } from "../../support/sweeps";
import { countRows, NOTHING } from "./rows";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const preview = (bytes: Uint8Array) => ({ fileName: "g1.csv", bytes, answers: {} });

test("a preview shows what an import would store, and stores nothing, not even bytes", async () => {
  const member = await makeMember(database, "engineer");
  let puts = 0;
  const files = { get: member.files.get, put: async () => void (puts += 1) };
  const ctx = { ...member, files };
  const shown = await previewFile(ctx, preview(csvOf(levelsOf(20, { 7: 40 }))));
  expect(shown).toMatchObject({
    outcome: "ready",
    same: [],
    traces: [{ points: 28, firstHz: 30e6, lastHz: 300e6, maxLevel: 40, maxAtHz: 100e6 }],
  });
  expect(puts).toBe(0);
  expect(await countRows(database, ctx.teamId)).toEqual(NOTHING);
  expect(await auditRows(database, ctx.teamId)).toEqual([]);
});

test("a preview says that the same bytes are here, to their own team alone", async () => {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const bytes = csvOf(levelsOf(20));
  const { sweepId } = await importSweep(ctx, importInput(place, bytes));
  const other = await makeMember(database, "engineer");
  expect((await previewFile(ctx, preview(bytes))).same).toMatchObject([
    { sweepId, buildName: "G1" },
  ]);
  expect((await previewFile(other, preview(bytes))).same).toEqual([]);
  expect((await previewFile(ctx, preview(csvOf(levelsOf(21))))).same).toEqual([]);
});

test("a preview is for those who may import, and refuses an empty file", async () => {
  const liaison = await makeMember(database, "liaison");
  const denied = previewFile(liaison, preview(csvOf(levelsOf(20))));
  await expect(denied).rejects.toMatchObject({ code: "denied" });
  const ctx = await makeMember(database, "engineer");
  await expect(previewFile(ctx, preview(text("")))).rejects.toMatchObject({
    code: "invalid",
    fieldErrors: { bytes: "The file is empty." },
  });
});
