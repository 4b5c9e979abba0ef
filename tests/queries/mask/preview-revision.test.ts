import { afterAll, beforeAll, expect, test } from "vitest";
import { archiveMask } from "@/lib/commands/mask/archive-mask";
import { reviseMask } from "@/lib/commands/mask/revise-mask";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import { previewRevision } from "@/lib/queries/mask/preview-revision";
import { readMask } from "@/lib/queries/mask/read-mask";
import { CROSSING } from "../../commands/mask/arrange";
import { countRows, readingRows } from "../../commands/sweep/rows";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { runJobs } from "../../support/jobs";
import { flatMask, importLevels, levelsOf, makePlace } from "../../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

/**
 * 100 MHz stands 5.2745 dB higher after the path, so a peak of 40 lies 4.7255 dB under 50 and one
 * of 37 lies 7.7255 dB under it; the floor of 20 lies 19 dB under it at 300 MHz. The guard is 2 dB.
 */
async function arrange() {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const high = await importLevels(ctx, place, levelsOf(20, { 7: 40 }), { name: "High" });
  const middle = await importLevels(ctx, place, levelsOf(20, { 7: 37 }), {
    name: "Middle",
    onRecord: false,
  });
  const low = await importLevels(ctx, place, levelsOf(20), { name: "Low" });
  return { ctx, place, maskId: place.maskId, high, middle, low };
}

test("tells per sweep how its standing and margin change, and counts them", async () => {
  const { ctx, maskId, high, middle, low } = await arrange();
  const preview = await previewRevision(ctx, { maskId, basedOnRevision: 1, mask: flatMask(44) });
  expect(preview).toMatchObject({ revision: 2, inForceRevision: 1, looked: 3, more: 0 });
  expect(preview.summary).toEqual({
    standings: 2,
    onRecord: 1,
    becomeOver: 1,
    becomeUndecided: 0,
    becomeUnheld: 0,
    becomeHeld: 0,
    largestChangeDb: expect.closeTo(-6, 9),
  });
  expect(preview.changed.map((sweep) => sweep.sweepId)).toEqual([
    high.sweepId,
    middle.sweepId,
    low.sweepId,
  ]);
  expect(preview.changed[0]).toMatchObject({
    name: "High",
    onRecord: true,
    before: { standing: "clear", marginDb: expect.closeTo(4.7255, 3) },
    after: { standing: "over", marginDb: expect.closeTo(-1.2745, 3) },
    changeDb: expect.closeTo(-6, 9),
  });
  expect(preview.changed[1]).toMatchObject({
    before: { standing: "clear" },
    after: { standing: "inside-guard", marginDb: expect.closeTo(1.7255, 3) },
  });
  expect(preview.changed[2]).toMatchObject({
    before: { standing: "clear" },
    after: { standing: "clear" },
  });
});

test("says what is stored when the revision is saved after it, to the last digit", async () => {
  const { ctx, maskId } = await arrange();
  const mask = flatMask(44);
  const { changed } = await previewRevision(ctx, { maskId, mask });
  await reviseMask(ctx, { maskId, mask });
  await runJobs(database);
  const stored = (await readingRows(database, ctx.teamId)).filter((row) => row.revision === 2);
  expect(stored).toHaveLength(3);
  for (const row of stored) {
    expect(changed.find((sweep) => sweep.sweepId === row.sweep_id)?.after).toEqual({
      standing: row.standing,
      marginDb: row.margin_db,
    });
  }
});

test("stores nothing, and names no sweep that stays as it is", async () => {
  const { ctx, maskId } = await arrange();
  const before = await countRows(database, ctx.teamId);
  const { changed, summary, looked } = await previewRevision(ctx, {
    maskId,
    mask: { ...flatMask(50), note: "Only a note" },
  });
  expect({ changed, looked }).toEqual({ changed: [], looked: 3 });
  expect(summary).toMatchObject({ standings: 0, largestChangeDb: null });
  expect(await countRows(database, ctx.teamId)).toEqual(before);
  expect((await readMask(ctx, maskId))?.revisions).toHaveLength(1);
});

test("a mask that a sweep no longer reaches leaves it without a standing", async () => {
  const { ctx, maskId } = await arrange();
  const mask = flatMask(50, { startHz: 400e6, stopHz: 900e6 });
  const { summary, changed } = await previewRevision(ctx, { maskId, mask });
  expect(summary).toMatchObject({ standings: 3, becomeUnheld: 3, largestChangeDb: null });
  expect(changed.map((sweep) => [sweep.after, sweep.changeDb])).toEqual([
    [null, null],
    [null, null],
    [null, null],
  ]);
});

test("compares with the revision in force while a newer one is still being read", async () => {
  const { ctx, maskId } = await arrange();
  await reviseMask(ctx, { maskId, mask: flatMask(44) });
  const preview = await previewRevision(ctx, { maskId, mask: flatMask(49) });
  expect(preview).toMatchObject({ revision: 3, inForceRevision: 1 });
  expect(preview.summary.largestChangeDb).toBeCloseTo(-1, 9);
});

test("looks at product sweeps of programs that name the mask, and at none that is archived", async () => {
  const { ctx, place, maskId, low } = await arrange();
  await importLevels(ctx, place, levelsOf(20), { purpose: "ambient" });
  const other = await makePlace(ctx);
  await importLevels(ctx, other, levelsOf(20));
  await archiveSweep(ctx, { sweepId: low.sweepId });
  expect(await previewRevision(ctx, { maskId, mask: flatMask(44) })).toMatchObject({ looked: 2 });
});

test("looks at the newest 200 and says how many more there are", async () => {
  const { ctx, maskId } = await arrange();
  await database.owner.query(
    `insert into sweeps select (jsonb_populate_record(s, jsonb_build_object(
       'id', gen_random_uuid(), 'created_at', s.created_at - n * interval '1 minute'))).*
     from sweeps s, generate_series(1, 205) n where s.team_id = $1 and s.name = 'Low'`,
    [ctx.teamId],
  );
  const preview = await previewRevision(ctx, { maskId, mask: flatMask(44) });
  expect(preview).toMatchObject({ looked: 200, more: 8 });
  expect(preview.changed).toHaveLength(3);
});

test("refuses what saving would refuse: a role, another team, no change, a broken mask", async () => {
  const { ctx, maskId } = await arrange();
  const mask = flatMask(44);
  const manager = await makeMember(database, "manager", ctx.teamId);
  await expect(previewRevision(manager, { maskId, mask })).rejects.toMatchObject({
    code: "denied",
  });
  const foreign = await makeMember(database, "engineer");
  await expect(previewRevision(foreign, { maskId, mask })).rejects.toMatchObject({
    code: "not-found",
  });
  const same = await readMask(ctx, maskId);
  await expect(previewRevision(ctx, { maskId, mask: same?.current.content })).rejects.toMatchObject(
    { message: "Nothing differs from the current revision." },
  );
  await expect(previewRevision(ctx, { maskId, basedOnRevision: 7, mask })).rejects.toMatchObject({
    code: "conflict",
  });
  await expect(previewRevision(ctx, { maskId, mask: CROSSING })).rejects.toMatchObject({
    fieldErrors: { "lines.0.segments.1": expect.stringContaining("cross") },
  });
  await archiveMask(ctx, { maskId });
  await expect(previewRevision(ctx, { maskId, mask })).rejects.toMatchObject({ code: "conflict" });
});
