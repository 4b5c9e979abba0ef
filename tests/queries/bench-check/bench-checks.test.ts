import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { inTeam } from "@/db/client";
import type { Context } from "@/lib/auth/context";
import { archiveBenchCheck } from "@/lib/commands/bench-check/archive-bench-check";
import { recordBenchCheck } from "@/lib/commands/bench-check/record-bench-check";
import { checkOfDay } from "@/lib/queries/bench-check/check-of-day";
import { listBenchChecks } from "@/lib/queries/bench-check/list-bench-checks";
import { readCheckFile } from "@/lib/queries/bench-check/read-check-file";
import { readBenchCheck } from "@/lib/queries/bench-check/read-bench-check";
import { checkInput, combOf, referenceInput } from "../../commands/bench-check/arrange";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { csvOf, makeBench } from "../../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

async function makeChecks() {
  const ctx = await makeMember(database, "engineer");
  const benchId = await makeBench(ctx, "Loft");
  const reference = await recordBenchCheck(ctx, referenceInput(benchId));
  const record = (change: Record<number, number>, measuredOn: string) =>
    recordBenchCheck(ctx, checkInput(benchId, combOf(change), { measuredOn }));
  return { ctx, benchId, reference, record };
}

const ofDay = (ctx: Context, benchId: string, day: string) =>
  inTeam(ctx.db, ctx.teamId, (tx) => checkOfDay(tx, ctx.teamId, benchId, day));

describe("listBenchChecks", () => {
  test("lists checks by day, newest first, with reference, drift and counts", async () => {
    const { ctx, benchId, reference, record } = await makeChecks();
    const late = await record({ 3: 61 }, "2026-06-04");
    const early = await record({ 3: 59 }, "2026-06-02");
    // The lines at 60 MHz and, outside the sweep, at 260 MHz are gone; one at 90 MHz is new.
    const levels = Array.from(
      { length: 20 },
      (_, i) => ({ 6: 60, 8: 58, 13: 56, 18: 54 })[i] ?? 20,
    );
    const poor = await recordBenchCheck(
      ctx,
      checkInput(benchId, csvOf(levels), { measuredOn: "2026-06-04" }),
    );
    const found = await listBenchChecks(ctx, benchId);
    expect(found?.bench).toEqual({ id: benchId, name: "Loft", archived: false, toleranceDb: 2 });
    expect(found?.checks.map((check) => check.id)).toEqual([
      poor.checkId,
      late.checkId,
      early.checkId,
      reference.checkId,
    ]);
    expect(found?.checks[0]).toMatchObject({ lines: 4, sunk: 1, missing: 1 });
    expect(found?.checks[1]).toMatchObject({
      measuredOn: "2026-06-04",
      source: "Comb 50 MHz",
      reference: { id: reference.checkId, measuredOn: "2026-06-01", archived: false },
      driftWorstDb: expect.closeTo(1, 4),
      driftMeanDb: expect.closeTo(0.2, 4),
      lines: 5,
      sunk: 0,
      missing: 0,
      checkedBy: "A engineer",
      archived: false,
    });
    expect(found?.checks[3]).toMatchObject({ isReference: true, reference: null, lines: 5 });
    const { rows } = await database.owner.query("select current_date::text as today");
    expect(found?.today).toBe(rows[0].today);
  });

  test("shows what was archived as archived, also as a reference", async () => {
    const { ctx, benchId, reference, record } = await makeChecks();
    await record({ 3: 61 }, "2026-06-02");
    await archiveBenchCheck(ctx, { checkId: reference.checkId });
    const checks = (await listBenchChecks(ctx, benchId))?.checks;
    expect(checks?.map((check) => [check.archived, check.reference?.archived])).toEqual([
      [false, true],
      [true, undefined],
    ]);
  });

  test("shows a liaison the checks, and another team neither list nor check", async () => {
    const { ctx, benchId, reference } = await makeChecks();
    const liaison = await makeMember(database, "liaison", ctx.teamId);
    expect((await listBenchChecks(liaison, benchId))?.checks).toHaveLength(1);
    const foreign = await makeMember(database, "engineer");
    expect(await listBenchChecks(foreign, benchId)).toBeNull();
    expect(await readBenchCheck(foreign, benchId, reference.checkId)).toBeNull();
    expect(await listBenchChecks(ctx, "none")).toBeNull();
    const other = await makeBench(ctx, "Attic");
    expect(await readBenchCheck(ctx, other, reference.checkId)).toBeNull();
    expect(await readBenchCheck(ctx, benchId, "none")).toBeNull();
  });
});

describe("readBenchCheck", () => {
  test("warns of a step that is coarser than half the RBW", async () => {
    const { ctx, benchId, record } = await makeChecks();
    const { checkId } = await record({ 3: 61 }, "2026-06-02");
    const check = await readBenchCheck(ctx, benchId, checkId);
    expect(check?.cautions).toHaveLength(2);
    expect(check?.cautions[0]).toContain("The step of the check, 10.00 MHz");
  });
});

describe("readCheckFile", () => {
  test("hands out the file byte for byte, to the team alone, and never one that has changed", async () => {
    const { ctx, reference } = await makeChecks();
    const { checkId } = reference;
    const file = await readCheckFile(ctx, checkId);
    expect(file?.fileName).toBe("comb.csv");
    expect(Buffer.from(file?.bytes ?? []).equals(Buffer.from(combOf()))).toBe(true);
    const foreign = { ...(await makeMember(database, "engineer")), files: ctx.files };
    expect(await readCheckFile(foreign, checkId)).toBeNull();
    expect(await readCheckFile(ctx, "none")).toBeNull();
    const rotten = { ...ctx, files: { ...ctx.files, get: async () => new Uint8Array([1]) } };
    await expect(readCheckFile(rotten, checkId)).rejects.toThrow("has changed in storage");
  });
});

describe("checkOfDay", () => {
  test("is the newest open check of the bench and day, with the bench's tolerance", async () => {
    const { ctx, benchId, record } = await makeChecks();
    expect(await ofDay(ctx, benchId, "2026-06-02")).toBeNull();
    const first = await record({ 3: 65 }, "2026-06-02");
    const second = await record({ 3: 60.5 }, "2026-06-02");
    await record({ 3: 66 }, "2026-06-03");
    expect(await ofDay(ctx, benchId, "2026-06-02")).toEqual({
      checkId: second.checkId,
      source: "Comb 50 MHz",
      driftWorstDb: expect.closeTo(0.5, 4),
      toleranceDb: 2,
      missing: 0,
    });
    await archiveBenchCheck(ctx, { checkId: second.checkId });
    expect(await ofDay(ctx, benchId, "2026-06-02")).toMatchObject({
      checkId: first.checkId,
      driftWorstDb: expect.closeTo(5, 4),
    });
  });

  test("is, of two sources, the one that drifted farthest", async () => {
    const { ctx, benchId, record } = await makeChecks();
    const off = await record({ 3: 57 }, "2026-06-02");
    const other = { source: "Comb B", measuredOn: "2026-06-02" };
    await recordBenchCheck(ctx, referenceInput(benchId, combOf({ 3: 70 }), other));
    await recordBenchCheck(ctx, checkInput(benchId, combOf({ 3: 70.5 }), other));
    expect(await ofDay(ctx, benchId, "2026-06-02")).toMatchObject({
      checkId: off.checkId,
      driftWorstDb: expect.closeTo(-3, 4),
    });
  });

  test("is not a reference, not of another bench, and not of another team", async () => {
    const { ctx, benchId, record } = await makeChecks();
    expect(await ofDay(ctx, benchId, "2026-06-01")).toBeNull();
    await record({ 3: 65 }, "2026-06-02");
    expect(await ofDay(ctx, await makeBench(ctx, "Attic"), "2026-06-02")).toBeNull();
    const foreign = await makeMember(database, "engineer");
    expect(await ofDay(foreign, benchId, "2026-06-02")).toBeNull();
  });
});
