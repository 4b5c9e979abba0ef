import { randomUUID } from "node:crypto";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { acceptMismatch } from "@/lib/commands/delta/accept-mismatch";
import { withdrawAcceptance } from "@/lib/commands/delta/withdraw-acceptance";
import { addStep } from "@/lib/commands/ladder/add-step";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import { readLadder } from "@/lib/queries/ladder/read-ladder";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { importLevels, levelsOf, makeLadder, makePlace, SETTINGS } from "../../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const REASON = "Same antenna factor, only the mast was rebuilt.";

/** Step 0 at 3 m with a peak of 45 dBµV/m, step 1 with one of 40 and whatever differs. */
async function arrange(change: object = { settings: { ...SETTINGS, heightM: 2 } }, table = {}) {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const ladderId = await makeLadder(ctx, place.buildId);
  const { stepId } = await addStep(ctx, { ladderId, name: "Scrambler on", description: "" });
  const startId = (await readLadder(ctx, ladderId))?.steps[0]?.id;
  const at = async (step: string | undefined, peak: number, own: object = {}, form = {}) =>
    (
      await importLevels(
        ctx,
        place,
        levelsOf(20, { 7: peak }),
        { stepId: step, corrected: true, ...own },
        { unit: "dBuV/m", ...form },
      )
    ).sweepId;
  const beforeSweepId = await at(startId, 45);
  const afterSweepId = await at(stepId, 40, change, table);
  const delta = async () => (await readLadder(ctx, ladderId))?.steps[1]?.againstPrevious[0];
  const input = { beforeSweepId, afterSweepId, fields: ["position"], reason: REASON };
  return { ctx, place, ladderId, startId, stepId, at, delta, input };
}

async function rowsOf(teamId: string) {
  const { rows } = await database.owner.query(
    "select * from accepted_mismatches where team_id = $1 order by created_at",
    [teamId],
  );
  return rows;
}

describe("acceptMismatch", () => {
  test("gives the delta with the reason, who and when, and the mismatch stays listed", async () => {
    const { ctx, delta, input } = await arrange();
    expect(await delta()).toMatchObject({ changes: null, accepted: null });
    await acceptMismatch(ctx, input);
    const accepted = await delta();
    expect(accepted).toMatchObject({
      mismatches: [{ field: "position" }],
      accepted: { fields: ["position"], reason: REASON, by: expect.any(String) },
      changes: { peakDb: expect.closeTo(-5, 5), margins: [{ changeDb: expect.closeTo(5, 5) }] },
    });
    expect(Number.isNaN(Date.parse(accepted?.accepted?.at ?? ""))).toBe(false);
    const told = (await auditRows(database, ctx.teamId)).filter(
      (row) => row.action === "sweep.accept-mismatch",
    );
    expect(told).toHaveLength(1);
  });

  test("holds for the pair in either order", async () => {
    const { ctx, delta, input } = await arrange();
    const { beforeSweepId: afterSweepId, afterSweepId: beforeSweepId } = input;
    await acceptMismatch(ctx, { ...input, beforeSweepId, afterSweepId });
    expect((await delta())?.changes?.peakDb).toBeCloseTo(-5, 5);
  });

  test("accepts only what it names: a mismatch that shows up later forbids again", async () => {
    const { ctx, delta, input } = await arrange();
    await acceptMismatch(ctx, input);
    await database.owner.query(
      `update sweeps set settings = settings || '{"distanceM": 10}' where id = $1`,
      [input.afterSweepId],
    );
    expect(await delta()).toMatchObject({
      changes: null,
      accepted: null,
      mismatches: [{ field: "distance" }, { field: "position" }],
    });
    const stale = acceptMismatch(ctx, input);
    await expect(stale).rejects.toMatchObject({ code: "conflict" });
    await acceptMismatch(ctx, { ...input, fields: ["distance", "position"] });
    expect((await delta())?.accepted?.fields).toEqual(["distance", "position"]);
    // The earlier one was replaced, not deleted.
    expect((await rowsOf(ctx.teamId)).map((row) => row.withdrawn_at === null)).toEqual([
      false,
      true,
    ]);
  });

  test("never accepts a detector that differs, and says why", async () => {
    const { ctx, input } = await arrange({}, { detector: "QP" });
    await expect(acceptMismatch(ctx, { ...input, fields: ["detector"] })).rejects.toMatchObject({
      code: "conflict",
      message: expect.stringMatching(/No reason makes these comparable.*peak before, quasi-peak/),
      fieldErrors: { reason: expect.any(String) },
    });
    expect(await rowsOf(ctx.teamId)).toEqual([]);
  });

  test("never accepts a unit that differs, not even one that was named before", async () => {
    const { ctx, delta, input } = await arrange();
    await acceptMismatch(ctx, input);
    const { owner } = database;
    await owner.query("update traces set unit = 'dBuV' where sweep_id = $1", [input.afterSweepId]);
    await owner.query("update accepted_mismatches set fields = $2 where team_id = $1", [
      ctx.teamId,
      JSON.stringify(["position", "unit"]),
    ]);
    expect(await delta()).toMatchObject({
      changes: null,
      accepted: null,
      mismatches: [{ field: "position" }, { field: "unit" }],
    });
    const tried = acceptMismatch(ctx, { ...input, fields: ["position", "unit"] });
    await expect(tried).rejects.toMatchObject({ code: "conflict" });
  });

  test("wants a written reason", async () => {
    const { ctx, input } = await arrange();
    for (const reason of ["", "   too short  ".slice(0, 9), "nul\u0000 in a long reason", 3]) {
      await expect(acceptMismatch(ctx, { ...input, reason })).rejects.toMatchObject({
        code: "invalid",
        fieldErrors: { reason: expect.any(String) },
      });
    }
    expect(await rowsOf(ctx.teamId)).toEqual([]);
  });

  test("refuses what differs in nothing, an ambient sweep, an archived one and itself", async () => {
    const { ctx, startId, at, input } = await arrange();
    const same = await at(startId, 44);
    const ambient = await at(startId, 10, { purpose: "ambient" });
    const aside = await at(startId, 44);
    await archiveSweep(ctx, { sweepId: aside });
    const codes = [
      [same, "conflict"],
      [ambient, "conflict"],
      [aside, "not-found"],
      [input.beforeSweepId, "conflict"],
      [randomUUID(), "not-found"],
    ] as const;
    for (const [afterSweepId, code] of codes) {
      await expect(acceptMismatch(ctx, { ...input, afterSweepId })).rejects.toMatchObject({ code });
    }
    expect(await rowsOf(ctx.teamId)).toEqual([]);
  });

  test("refuses sweeps of two programs", async () => {
    const { ctx, input } = await arrange();
    const elsewhere = await makePlace(ctx);
    const { sweepId } = await importLevels(
      ctx,
      elsewhere,
      levelsOf(20),
      { corrected: true },
      {
        unit: "dBuV/m",
      },
    );
    const tried = acceptMismatch(ctx, { ...input, afterSweepId: sweepId, fields: ["bench"] });
    await expect(tried).rejects.toMatchObject({ code: "conflict" });
  });

  test.each(["manager", "liaison"] as const)("refuses a %s", async (role) => {
    const { ctx, input } = await arrange();
    const other = await makeMember(database, role, ctx.teamId);
    await expect(acceptMismatch(other, input)).rejects.toMatchObject({ code: "denied" });
    expect(await rowsOf(ctx.teamId)).toEqual([]);
  });

  test("does not reach another team's sweeps", async () => {
    const { ctx, input } = await arrange();
    const theirs = await makeMember(database, "engineer");
    await expect(acceptMismatch(theirs, input)).rejects.toMatchObject({ code: "not-found" });
    expect(await rowsOf(ctx.teamId)).toEqual([]);
  });

  test("stores nothing when the audit row cannot be written", async () => {
    const { ctx, input } = await arrange();
    await withoutAudit(database, async () => {
      await expect(acceptMismatch(ctx, input)).rejects.toThrow();
    });
    expect(await rowsOf(ctx.teamId)).toEqual([]);
  });
});

describe("withdrawAcceptance", () => {
  test("forbids the delta again and stays on record", async () => {
    const { ctx, delta, input } = await arrange();
    const { acceptanceId } = await acceptMismatch(ctx, input);
    await withdrawAcceptance(ctx, { acceptanceId });
    expect(await delta()).toMatchObject({ changes: null, accepted: null });
    expect(await rowsOf(ctx.teamId)).toMatchObject([{ withdrawn_by: ctx.userId, reason: REASON }]);
    const again = withdrawAcceptance(ctx, { acceptanceId });
    await expect(again).rejects.toMatchObject({ code: "conflict" });
    const told = (await auditRows(database, ctx.teamId)).filter(
      (row) => row.action === "sweep.withdraw-acceptance",
    );
    expect(told).toHaveLength(1);
  });

  test("refuses other roles, other teams, what is not there and what cannot be audited", async () => {
    const { ctx, delta, input } = await arrange();
    const { acceptanceId } = await acceptMismatch(ctx, input);
    for (const role of ["manager", "liaison"] as const) {
      const other = await makeMember(database, role, ctx.teamId);
      const tried = withdrawAcceptance(other, { acceptanceId });
      await expect(tried).rejects.toMatchObject({ code: "denied" });
    }
    const theirs = await makeMember(database, "engineer");
    const foreign = withdrawAcceptance(theirs, { acceptanceId });
    await expect(foreign).rejects.toMatchObject({ code: "not-found" });
    const none = withdrawAcceptance(ctx, { acceptanceId: randomUUID() });
    await expect(none).rejects.toMatchObject({ code: "not-found" });
    const odd = withdrawAcceptance(ctx, { acceptanceId: "1" });
    await expect(odd).rejects.toMatchObject({ code: "invalid" });
    await withoutAudit(database, async () => {
      await expect(withdrawAcceptance(ctx, { acceptanceId })).rejects.toThrow();
    });
    expect((await delta())?.accepted?.id).toBe(acceptanceId);
  });
});
