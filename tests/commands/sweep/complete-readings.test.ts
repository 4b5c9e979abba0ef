import { afterAll, beforeAll, expect, test } from "vitest";
import { createMask } from "@/lib/commands/mask/create-mask";
import { reviseMask } from "@/lib/commands/mask/revise-mask";
import { setProgramMasks } from "@/lib/commands/program/set-program-masks";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import { restoreSweep } from "@/lib/commands/sweep/restore-sweep";
import { readProgram } from "@/lib/queries/program/read-program";
import { listBuildSweeps } from "@/lib/queries/sweep/list-sweeps";
import { readSweepDetail } from "@/lib/queries/sweep/read-sweep";
import type { Context } from "@/lib/auth/context";
import { withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { runJobs } from "../../support/jobs";
import type { Place } from "../../support/sweeps";
import { flatMask, importLevels, levelsOf, makePlace } from "../../support/sweeps";
import { readingRows } from "./rows";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

/** 100 MHz stands 5.2745 dB higher after the path: 45.2745 dBµV/m, 4.7255 dB under 50. */
const LEVELS = levelsOf(20, { 7: 40 });
const UNDER_50 = 4.7255;

/** The margin of the only sweep and build, as list, trend and detail say it. */
async function shown(ctx: Context, place: Place, sweepId: string) {
  const [row] = await listBuildSweeps(ctx, place.buildId);
  const program = await readProgram(ctx, place.programId);
  const detail = await readSweepDetail(ctx, sweepId);
  return {
    list: row?.marginDb ?? null,
    trend: program?.trend.builds[0]?.standings.map((s) => s.marginDb),
    detail: detail?.readings.map((r) => r.reading.lines[0]?.worst?.marginDb ?? null),
  };
}
const all = (marginDb: number) => ({
  list: expect.closeTo(marginDb, 3),
  trend: [expect.closeTo(marginDb, 3)],
  detail: [expect.closeTo(marginDb, 3)],
});

test("a mask chosen later is held against the sweeps that are here, as if it had been there", async () => {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const { programId, maskId } = place;
  await setProgramMasks(ctx, { programId, maskIds: [] });
  const { sweepId, readings } = await importLevels(ctx, place, LEVELS);
  await importLevels(ctx, place, LEVELS, { purpose: "ambient" });
  expect(readings).toEqual([]);
  await setProgramMasks(ctx, { programId, maskIds: [maskId] });
  expect(await shown(ctx, place, sweepId)).toEqual(all(UNDER_50));
  const twin = await importLevels(ctx, place, LEVELS, { measuredOn: "2027-05-05" });
  const [late, early] = [
    await readSweepDetail(ctx, twin.sweepId),
    await readSweepDetail(ctx, sweepId),
  ];
  expect(late?.readings[0]?.reading.lines).toEqual(early?.readings[0]?.reading.lines);
  expect(await readingRows(database, ctx.teamId)).toHaveLength(2);
});

test("overdue calibration counts on the day of the sweep, also when the mask comes later", async () => {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const { programId, maskId } = place;
  await setProgramMasks(ctx, { programId, maskIds: [] });
  const { sweepId } = await importLevels(ctx, place, LEVELS, { measuredOn: "2027-02-02" });
  await setProgramMasks(ctx, { programId, maskIds: [maskId] });
  const detail = await readSweepDetail(ctx, sweepId);
  expect(detail?.readings[0]?.reading.doubts.map((d) => d.code)).toContain("calibration-overdue");
});

test("a revised mask is read anew; the old reading stays, and only the newest is shown", async () => {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const { maskId } = place;
  const { sweepId } = await importLevels(ctx, place, LEVELS);
  expect(await shown(ctx, place, sweepId)).toEqual(all(UNDER_50));
  await reviseMask(ctx, { maskId, mask: flatMask(44) });
  // Until every sweep is read, the revision before counts.
  expect(await shown(ctx, place, sweepId)).toEqual(all(UNDER_50));
  expect(await runJobs(database)).toBe(1);
  expect(await shown(ctx, place, sweepId)).toEqual(all(UNDER_50 - 6));
  expect((await readSweepDetail(ctx, sweepId))?.readings[0]?.maskRevision).toBe(2);
  expect(await readingRows(database, ctx.teamId)).toMatchObject([
    { revision: 1, standing: "clear", margin_db: expect.closeTo(UNDER_50, 3) },
    { revision: 2, standing: "over", margin_db: expect.closeTo(UNDER_50 - 6, 3) },
  ]);
});

test("a revision that cannot be audited makes no reading", async () => {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const { sweepId } = await importLevels(ctx, place, LEVELS);
  await withoutAudit(database, async () => {
    const revising = reviseMask(ctx, { maskId: place.maskId, mask: flatMask(44) });
    await expect(revising).rejects.toThrow();
  });
  expect(await shown(ctx, place, sweepId)).toEqual(all(UNDER_50));
  expect(await readingRows(database, ctx.teamId)).toHaveLength(1);
});

test("a sweep fetched back is held against what changed while it lay aside", async () => {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const { sweepId } = await importLevels(ctx, place, LEVELS);
  await archiveSweep(ctx, { sweepId });
  await reviseMask(ctx, { maskId: place.maskId, mask: flatMask(44) });
  expect(await readingRows(database, ctx.teamId)).toHaveLength(1);
  await restoreSweep(ctx, { sweepId });
  const [row] = await listBuildSweeps(ctx, place.buildId);
  expect(row).toMatchObject({ standing: "over", marginDb: expect.closeTo(UNDER_50 - 6, 3) });
  expect(row?.onRecord).toBe(false);
});

test("a mask taken off the program is not shown any more, and comes back as it is now", async () => {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const { programId, maskId } = place;
  const { sweepId } = await importLevels(ctx, place, LEVELS);
  await setProgramMasks(ctx, { programId, maskIds: [] });
  expect(await shown(ctx, place, sweepId)).toEqual({ list: null, trend: [], detail: [] });
  await reviseMask(ctx, { maskId, mask: flatMask(44) });
  expect(await readingRows(database, ctx.teamId)).toHaveLength(1);
  await setProgramMasks(ctx, { programId, maskIds: [maskId] });
  expect(await shown(ctx, place, sweepId)).toEqual(all(UNDER_50 - 6));
});

test("a mask of one program leaves the sweeps of another alone", async () => {
  const ctx = await makeMember(database, "engineer");
  const [ours, other] = [await makePlace(ctx), await makePlace(ctx)];
  await importLevels(ctx, ours, LEVELS);
  await importLevels(ctx, other, LEVELS);
  const second = await createMask(ctx, { mask: flatMask(60, { title: "Second" }) });
  const maskIds = [ours.maskId, second.maskId];
  await setProgramMasks(ctx, { programId: ours.programId, maskIds });
  const held = (await readingRows(database, ctx.teamId)).map((row) => row.mask_id);
  expect(held.sort()).toEqual([...maskIds, other.maskId].sort());
});
