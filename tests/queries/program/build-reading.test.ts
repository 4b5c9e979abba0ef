import { afterAll, beforeAll, describe, expect, test } from "vitest";
import type { Context } from "@/lib/auth/context";
import { createMask } from "@/lib/commands/mask/create-mask";
import { setProgramMasks } from "@/lib/commands/program/set-program-masks";
import { remeasureRows } from "@/lib/core/reading/remeasure-rows";
import { readBuildReading } from "@/lib/queries/program/read-build-reading";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import type { Place } from "../../support/sweeps";
import { flatMask, importLevels, levelsOf, makePlace, SETTINGS } from "../../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

/** A corrected sweep of the whole mask, 30 dBµV/m with one peak. */
async function swept(
  ctx: Context,
  place: Place,
  polarization: "horizontal" | "vertical" | null,
  peaks: Record<number, number> = {},
  change: object = {},
): Promise<string> {
  const settings = { ...SETTINGS, polarization };
  const made = await importLevels(
    ctx,
    place,
    levelsOf(30, peaks),
    { name: polarization ?? "unstated", corrected: true, settings, ...change },
    { unit: "dBuV/m" },
  );
  return made.sweepId;
}

async function only(ctx: Context, { buildId }: Place) {
  const all = await readBuildReading(ctx, buildId);
  expect(all).toHaveLength(1);
  const [one] = all;
  if (!one) throw new Error("There is no combined reading.");
  return one;
}

describe("readBuildReading", () => {
  test("names the sweep that decided each line", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    await swept(ctx, place, "vertical", { 7: 45 });
    const deciding = await swept(ctx, place, "horizontal", { 9: 47 });
    const { reading, sweeps, mask } = await only(ctx, place);
    const worst = reading.lines[0]?.worst;
    expect(worst).toMatchObject({ frequencyHz: 120e6, levelDb: 47, marginDb: 3 });
    expect(sweeps[worst?.partIndex ?? -1]?.id).toBe(deciding);
    expect(sweeps.map(({ name }) => name)).toEqual(["vertical", "horizontal"]);
    expect(mask.title).toBe("Loft limit");
    expect(reading).toMatchObject({ standing: "clear", coverage: { fraction: 1, gaps: [] } });
  });

  test("says which polarization is missing, until it is there", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const missing = async () =>
      (await only(ctx, place)).reading.doubts.filter((d) => d.code === "polarization-missing");
    await swept(ctx, place, "vertical");
    expect((await missing()).map(({ text }) => text)).toEqual([
      expect.stringContaining("Only the vertical polarization was swept"),
    ]);
    await swept(ctx, place, "vertical", { 7: 40 });
    expect(await missing()).toHaveLength(1);
    await swept(ctx, place, "horizontal");
    expect(await missing()).toEqual([]);
  });

  test("lists the spots to measure again in the position of the bound", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx, flatMask(50, { detector: "quasi-peak" }));
    await swept(ctx, place, "vertical", { 7: 53 });
    await swept(ctx, place, "horizontal", { 12: 56 });
    const { reading, sweeps } = await only(ctx, place);
    const rows = remeasureRows(reading, sweeps);
    expect(rows.map((row) => [row.frequencyHz, row.polarization, row.boundDb])).toEqual(
      expect.arrayContaining([
        [100e6, "vertical", 53],
        [150e6, "horizontal", 56],
      ]),
    );
    expect(rows).toHaveLength(2);
  });

  test("counts the line of record alone, and product sweeps alone", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const onRecord = await swept(ctx, place, "vertical");
    await swept(ctx, place, "horizontal", { 7: 60 }, { onRecord: false });
    await swept(ctx, place, "horizontal", { 7: 60 }, { purpose: "ambient" });
    const { reading, sweeps } = await only(ctx, place);
    expect(sweeps.map(({ id }) => id)).toEqual([onRecord]);
    expect(reading.standing).toBe("clear");
  });

  test("holds the same sweeps against each mask that they reach", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const strict = await createMask(ctx, { mask: flatMask(43, { title: "A strict limit" }) });
    const above = flatMask(54, { title: "Above", startHz: 1e9, stopHz: 6e9 });
    const far = await createMask(ctx, { mask: above });
    const maskIds = [place.maskId, strict.maskId, far.maskId];
    await setProgramMasks(ctx, { programId: place.programId, maskIds });
    await swept(ctx, place, "vertical", { 7: 45 });
    await swept(ctx, place, "horizontal");
    const found = await readBuildReading(ctx, place.buildId);
    expect(found.map(({ mask, reading }) => [mask.title, reading.standing])).toEqual([
      ["A strict limit", "over"],
      ["Loft limit", "clear"],
    ]);
  });

  test("is empty for another team, for a build without sweeps and for what is no id", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    expect(await readBuildReading(ctx, place.buildId)).toEqual([]);
    expect(await readBuildReading(ctx, "nothing")).toEqual([]);
    await swept(ctx, place, "vertical");
    const theirs = await makeMember(database, "engineer");
    expect(await readBuildReading(theirs, place.buildId)).toEqual([]);
    const liaison = await makeMember(database, "liaison", ctx.teamId);
    expect(await readBuildReading(liaison, place.buildId)).toHaveLength(1);
  });
});
