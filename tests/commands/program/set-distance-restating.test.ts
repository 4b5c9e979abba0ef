import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { createMask } from "@/lib/commands/mask/create-mask";
import { archiveProgram } from "@/lib/commands/program/archive-program";
import { setDistanceRestating } from "@/lib/commands/program/set-distance-restating";
import { setProgramMasks } from "@/lib/commands/program/set-program-masks";
import type { Context } from "@/lib/auth/context";
import { listBuildSweeps } from "@/lib/queries/sweep/list-sweeps";
import { readSweepDetail } from "@/lib/queries/sweep/read-sweep";
import { readBuildReading } from "@/lib/queries/program/read-build-reading";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import type { Place } from "../../support/sweeps";
import { flatMask, importLevels, levelsOf, makePlace } from "../../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

/** 20 log10(3/10), worked out by hand. */
const RESTATED_DB = -10.457574905606752;

const AT_TEN = { ...flatMask(40), distanceM: 10 };

/** A place whose mask holds at 10 m, and a corrected sweep at 3 m: 45 dBµV/m at 100 MHz. */
async function sweptAtThree(ctx: Context) {
  const place = await makePlace(ctx, AT_TEN);
  return { place, sweepId: await sweep(ctx, place) };
}

async function sweep(ctx: Context, place: Place): Promise<string> {
  const table = { unit: "dBuV/m" };
  const levels = levelsOf(20, { 7: 45 });
  return (await importLevels(ctx, place, levels, { corrected: true }, table)).sweepId;
}

async function readingOf(ctx: Context, sweepId: string, maskId: string) {
  const detail = await readSweepDetail(ctx, sweepId);
  const found = detail?.readings.find((reading) => reading.maskId === maskId);
  if (!found) throw new Error("There is no reading.");
  return found.reading;
}

const codesOf = (reading: Awaited<ReturnType<typeof readingOf>>) =>
  reading.doubts.map(({ code }) => code);

async function restatingRows(teamId: string) {
  const found = await database.owner.query(
    `select p.program_id, p.mask_id, p.restate_distance from program_masks p
     where p.team_id = $1 order by p.program_id, p.mask_id`,
    [teamId],
  );
  return found.rows;
}

describe("setDistanceRestating", () => {
  test("holds a sweep at 3 m under a mask at 10 m, 20 log10(3/10) = −10.4576 dB, with its doubts", async () => {
    const ctx = await makeMember(database, "engineer");
    const { place, sweepId } = await sweptAtThree(ctx);
    const { programId, maskId } = place;
    const before = await readingOf(ctx, sweepId, maskId);
    expect(before.notComparable).toContain("never restated silently");
    expect(await readBuildReading(ctx, place.buildId)).toEqual([]);

    const done = await setDistanceRestating(ctx, { programId, maskId, restate: true });
    expect(done).toEqual({ programId, maskId, restate: true });
    const reading = await readingOf(ctx, sweepId, maskId);
    expect(reading.notComparable).toBeNull();
    const worst = reading.lines[0]?.worst;
    expect(worst?.frequencyHz).toBe(100e6);
    expect(worst?.levelDb).toBeCloseTo(45 + RESTATED_DB, 9);
    expect(worst?.marginDb).toBeCloseTo(40 - 45 - RESTATED_DB, 9);
    expect(codesOf(reading)).toEqual(expect.arrayContaining(["distance-restated", "near-field"]));
    const restated = reading.doubts.find(({ code }) => code === "distance-restated");
    expect(restated?.valueDb).toBeCloseTo(RESTATED_DB, 4);
    const [row] = await listBuildSweeps(ctx, place.buildId);
    expect(row).toMatchObject({ standing: "clear", marginDb: expect.closeTo(5.4576, 4) });
    expect(row?.doubts).toContain("distance-restated");
    const [combined] = await readBuildReading(ctx, place.buildId);
    expect(combined?.reading.lines[0]?.worst?.marginDb).toBeCloseTo(5.4576, 4);
  });

  test("is taken back: the sweep is not comparable again, whatever was read before", async () => {
    const ctx = await makeMember(database, "engineer");
    const { place, sweepId } = await sweptAtThree(ctx);
    const { programId, maskId } = place;
    const untouched = await readingOf(ctx, sweepId, maskId);
    for (const restate of [true, false, true, false])
      await setDistanceRestating(ctx, { programId, maskId, restate });
    expect(await readingOf(ctx, sweepId, maskId)).toEqual(untouched);
    expect(await readBuildReading(ctx, place.buildId)).toEqual([]);
    const [row] = await listBuildSweeps(ctx, place.buildId);
    expect(row?.marginDb).toBeNull();
    // One reading each way, made once.
    const kept = await database.owner.query(
      "select restated from readings where sweep_id = $1 order by restated",
      [sweepId],
    );
    expect(kept.rows).toEqual([{ restated: false }, { restated: true }]);
  });

  test("holds for what is imported later, and for nothing after it is taken back", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx, AT_TEN);
    const { programId, maskId } = place;
    await setDistanceRestating(ctx, { programId, maskId, restate: true });
    const later = await readingOf(ctx, await sweep(ctx, place), maskId);
    expect(later.lines[0]?.worst?.marginDb).toBeCloseTo(40 - 45 - RESTATED_DB, 9);
    expect(codesOf(later)).toContain("distance-restated");
    await setDistanceRestating(ctx, { programId, maskId, restate: false });
    const last = await readingOf(ctx, await sweep(ctx, place), maskId);
    expect(last.notComparable).not.toBeNull();
    expect(codesOf(last)).not.toContain("distance-restated");
  });

  test("leaves a sweep at the mask's own distance as it is, without a doubt", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { programId, maskId } = place;
    const sweepId = await sweep(ctx, place);
    const before = await readingOf(ctx, sweepId, maskId);
    await setDistanceRestating(ctx, { programId, maskId, restate: true });
    expect(await readingOf(ctx, sweepId, maskId)).toEqual(before);
  });

  test("changes nothing of the program's other mask, nor of another program with the same mask", async () => {
    const ctx = await makeMember(database, "engineer");
    const { place, sweepId } = await sweptAtThree(ctx);
    const { programId, maskId } = place;
    const second = await createMask(ctx, { mask: { ...AT_TEN, title: "Second" } });
    await setProgramMasks(ctx, { programId, maskIds: [maskId, second.maskId] });
    const other = await makePlace(ctx);
    await setProgramMasks(ctx, { programId: other.programId, maskIds: [maskId] });
    const otherId = await sweep(ctx, other);
    const before = await database.owner.query("select * from programs where team_id = $1", [
      ctx.teamId,
    ]);
    await setDistanceRestating(ctx, { programId, maskId, restate: true });
    expect((await readingOf(ctx, sweepId, maskId)).notComparable).toBeNull();
    expect((await readingOf(ctx, sweepId, second.maskId)).notComparable).not.toBeNull();
    expect((await readingOf(ctx, otherId, maskId)).notComparable).not.toBeNull();
    const after = await database.owner.query("select * from programs where team_id = $1", [
      ctx.teamId,
    ]);
    expect(after.rows).toEqual(before.rows);
    const asked = (await restatingRows(ctx.teamId)).filter((row) => row.restate_distance);
    expect(asked).toEqual([{ program_id: programId, mask_id: maskId, restate_distance: true }]);
  });

  test("is written into the audit trail, each way by its own name", async () => {
    const ctx = await makeMember(database, "engineer");
    const { programId, maskId } = await makePlace(ctx, AT_TEN);
    for (const restate of [true, false])
      await setDistanceRestating(ctx, { programId, maskId, restate });
    const row = { actor_id: ctx.userId, subject_id: programId };
    expect((await auditRows(database, ctx.teamId)).slice(-2)).toEqual([
      { ...row, action: "program.restate-distance" },
      { ...row, action: "program.hold-as-taken" },
    ]);
  });

  test.each(["liaison", "manager"] as const)("refuses a %s", async (role) => {
    const ctx = await makeMember(database, "engineer");
    const { place, sweepId } = await sweptAtThree(ctx);
    const { programId, maskId } = place;
    const reader = await makeMember(database, role, ctx.teamId);
    const tried = setDistanceRestating(reader, { programId, maskId, restate: true });
    await expect(tried).rejects.toMatchObject({ code: "denied" });
    expect((await readingOf(reader, sweepId, maskId)).notComparable).not.toBeNull();
  });

  test("does not reach another team's program", async () => {
    const ctx = await makeMember(database, "engineer");
    const { place, sweepId } = await sweptAtThree(ctx);
    const { programId, maskId } = place;
    const before = await restatingRows(ctx.teamId);
    const theirs = await makeMember(database, "engineer");
    const tried = setDistanceRestating(theirs, { programId, maskId, restate: true });
    await expect(tried).rejects.toMatchObject({ code: "not-found" });
    expect(await restatingRows(ctx.teamId)).toEqual(before);
    expect((await readingOf(ctx, sweepId, maskId)).notComparable).not.toBeNull();
  });

  test("finds no mask that the program does not name, nor another team's", async () => {
    const ctx = await makeMember(database, "engineer");
    const { programId } = await makePlace(ctx, AT_TEN);
    const unnamed = await createMask(ctx, { mask: { ...AT_TEN, title: "Unnamed" } });
    const theirs = await makePlace(await makeMember(database, "engineer"), AT_TEN);
    for (const { maskId } of [unnamed, theirs]) {
      const tried = setDistanceRestating(ctx, { programId, maskId, restate: true });
      await expect(tried).rejects.toMatchObject({ code: "not-found" });
    }
  });

  test("refuses what is so already, an archived program and what is no id", async () => {
    const ctx = await makeMember(database, "engineer");
    const { programId, maskId } = await makePlace(ctx, AT_TEN);
    const set = (restate: boolean) => setDistanceRestating(ctx, { programId, maskId, restate });
    await expect(set(false)).rejects.toMatchObject({ code: "conflict" });
    await set(true);
    await expect(set(true)).rejects.toMatchObject({ code: "conflict" });
    await archiveProgram(ctx, { programId });
    await expect(set(false)).rejects.toMatchObject({ code: "not-found" });
    const wrong = setDistanceRestating(ctx, { programId: "x", maskId, restate: true });
    await expect(wrong).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { programId: expect.any(String) },
    });
    const silent = setDistanceRestating(ctx, { programId, maskId });
    await expect(silent).rejects.toMatchObject({ code: "invalid" });
    const asked = (await restatingRows(ctx.teamId)).map((row) => row.restate_distance);
    expect(asked).toEqual([true]);
  });

  test("keeps everything as it was when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    const { place, sweepId } = await sweptAtThree(ctx);
    const { programId, maskId } = place;
    await withoutAudit(database, async () => {
      const tried = setDistanceRestating(ctx, { programId, maskId, restate: true });
      await expect(tried).rejects.toThrow();
    });
    expect((await readingOf(ctx, sweepId, maskId)).notComparable).not.toBeNull();
    const kept = await database.owner.query("select 1 from readings where sweep_id = $1", [
      sweepId,
    ]);
    expect(kept.rows).toHaveLength(1);
  });
});
