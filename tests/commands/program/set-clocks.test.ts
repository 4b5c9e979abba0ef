import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { archiveBuild } from "@/lib/commands/program/archive-build";
import { setClocks } from "@/lib/commands/program/set-clocks";
import { listClocks } from "@/lib/queries/program/list-clocks";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { makeProgram } from "./arrange";

const PIXEL = { name: "Pixel clock", frequencyHz: 148_500_000, tolerancePpm: 50 };
const CRYSTAL = { name: "Crystal", frequencyHz: 27_000_000, tolerancePpm: null };

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

describe("setClocks", () => {
  test("replaces the build's clocks, which are read by frequency, and audits it", async () => {
    const ctx = await makeMember(database, "engineer");
    const { buildId } = await makeProgram(ctx);
    await setClocks(ctx, { buildId, clocks: [PIXEL, CRYSTAL] });
    expect(await listClocks(ctx, buildId)).toEqual([CRYSTAL, PIXEL]);
    await setClocks(ctx, { buildId, clocks: [{ ...PIXEL, tolerancePpm: 0 }] });
    expect(await listClocks(ctx, buildId)).toEqual([{ ...PIXEL, tolerancePpm: 0 }]);
    const row = { actor_id: ctx.userId, action: "build.set-clocks", subject_id: buildId };
    expect((await auditRows(database, ctx.teamId)).slice(-2)).toEqual([row, row]);
  });

  test("refuses a liaison", async () => {
    const ctx = await makeMember(database, "engineer");
    const { buildId } = await makeProgram(ctx);
    const liaison = await makeMember(database, "liaison", ctx.teamId);
    const tried = setClocks(liaison, { buildId, clocks: [PIXEL] });
    await expect(tried).rejects.toMatchObject({ code: "denied" });
    expect(await listClocks(liaison, buildId)).toEqual([]);
  });

  test("does not reach another team's build", async () => {
    const ours = await makeMember(database, "engineer");
    const { buildId } = await makeProgram(ours);
    await setClocks(ours, { buildId, clocks: [PIXEL] });
    const theirs = await makeMember(database, "engineer");
    const tried = setClocks(theirs, { buildId, clocks: [] });
    await expect(tried).rejects.toMatchObject({ code: "not-found" });
    expect(await listClocks(theirs, buildId)).toEqual([]);
    expect(await listClocks(ours, buildId)).toEqual([PIXEL]);
  });

  test("keeps the old clocks when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    const { buildId } = await makeProgram(ctx);
    await setClocks(ctx, { buildId, clocks: [PIXEL] });
    await withoutAudit(database, async () => {
      await expect(setClocks(ctx, { buildId, clocks: [CRYSTAL] })).rejects.toThrow();
    });
    expect(await listClocks(ctx, buildId)).toEqual([PIXEL]);
  });

  test("says at the row and field what is wrong", async () => {
    const ctx = await makeMember(database, "engineer");
    const { buildId } = await makeProgram(ctx);
    const rows = [
      { name: "A", frequencyHz: 0, tolerancePpm: -1 },
      { name: "B", frequencyHz: Number.NaN, tolerancePpm: Number.NaN },
      { name: "a", frequencyHz: 1, tolerancePpm: null },
    ];
    const tried = setClocks(ctx, { buildId, clocks: rows });
    await expect(tried).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: {
        "clocks.0.frequencyHz": "A clock has a frequency above 0 Hz.",
        "clocks.0.tolerancePpm": "A tolerance is 0 ppm or more.",
        "clocks.1.frequencyHz": "State the frequency with its unit, for example 27 MHz.",
        "clocks.1.tolerancePpm": "State the tolerance in ppm, or leave it empty.",
      },
    });
    const twins = setClocks(ctx, { buildId, clocks: [PIXEL, { ...CRYSTAL, name: "pixel clock" }] });
    await expect(twins).rejects.toMatchObject({
      fieldErrors: { "clocks.1.name": "Another row has this name." },
    });
  });

  test("leaves an archived build alone", async () => {
    const ctx = await makeMember(database, "engineer");
    const ids = await makeProgram(ctx);
    await archiveBuild(ctx, ids);
    const tried = setClocks(ctx, { buildId: ids.buildId, clocks: [PIXEL] });
    await expect(tried).rejects.toMatchObject({ code: "conflict" });
    expect(await listClocks(ctx, ids.buildId)).toEqual([]);
  });
});
