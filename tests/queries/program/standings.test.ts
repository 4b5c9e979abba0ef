import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { createMask } from "@/lib/commands/mask/create-mask";
import { archiveBuild } from "@/lib/commands/program/archive-build";
import { createBuild } from "@/lib/commands/program/create-build";
import { editProgram } from "@/lib/commands/program/edit-program";
import { setMilestones } from "@/lib/commands/program/set-milestones";
import { setProgramMasks } from "@/lib/commands/program/set-program-masks";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import { listPrograms } from "@/lib/queries/program/list-programs";
import { newestStanding } from "@/lib/queries/program/load-standings";
import { readProgram } from "@/lib/queries/program/read-program";
import type { Context } from "@/lib/auth/context";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import type { Place } from "../../support/sweeps";
import { flatMask, importLevels, levelsOf, makePlace } from "../../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const TODAY = "2026-06-10";

/** A corrected sweep of the whole mask, whose highest level leaves this margin under 50 dBµV/m. */
const withMargin = (ctx: Context, place: Place, marginDb: number, change = {}, table = {}) =>
  importLevels(
    ctx,
    place,
    levelsOf(10, { 7: 50 - marginDb }),
    { corrected: true, ...change },
    { unit: "dBuV/m", ...table },
  );

async function standings(ctx: Context, { programId }: Place) {
  const program = await readProgram(ctx, programId);
  return program?.trend.builds.map((build) =>
    build.standings.map((s) => [s.maskTitle, s.standing, s.marginDb]),
  );
}

describe("listPrograms", () => {
  test("puts what is over first, then what is not known, then what is short, then what is met", async () => {
    const ctx = await makeMember(database, "engineer");
    const name = async (place: Place, title: string, targetMarginDb: number) => {
      const { programId } = place;
      await editProgram(ctx, { programId, name: title, description: "", targetMarginDb });
    };
    const made: [string, number | null, number][] = [
      ["met", 20, 4],
      ["far short", 3, 20],
      ["short", 3, 6],
      ["unknown", null, 4],
      ["over, low aim", -3, -20],
      ["over", -3, 4],
    ];
    for (const [title, marginDb, targetDb] of made) {
      const place = await makePlace(ctx);
      await name(place, title, targetDb);
      if (marginDb !== null) await withMargin(ctx, place, marginDb);
    }
    const milestone = await makePlace(ctx);
    await name(milestone, "short of a milestone", 4);
    await withMargin(ctx, milestone, 8);
    await setMilestones(ctx, {
      programId: milestone.programId,
      milestones: [
        { name: "Past", dueOn: "2026-06-09", requiredMarginDb: 40 },
        { name: "Chamber", dueOn: TODAY, requiredMarginDb: 12 },
        { name: "Later", dueOn: "2026-09-01", requiredMarginDb: 40 },
      ],
    });
    const rows = await listPrograms(ctx, TODAY);
    expect(rows.map((row) => row.name)).toEqual([
      "over",
      "over, low aim",
      "unknown",
      "far short",
      "short of a milestone",
      "short",
      "met",
    ]);
    expect(rows[0]?.now).toMatchObject({ standing: "over", marginDb: expect.closeTo(-3, 5) });
    expect(rows[2]?.now).toBeNull();
    expect(rows[4]?.nextMilestone).toEqual({
      name: "Chamber",
      dueOn: TODAY,
      requiredMarginDb: 12,
    });
    const theirs = await makeMember(database, "engineer");
    expect(await listPrograms(theirs, TODAY)).toEqual([]);
  });

  test("goes by the newest build that stands anywhere, and keeps the way there", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { programId } = place;
    await withMargin(ctx, place, -2);
    const builds: Place[] = [];
    for (const name of ["G2", "G3"]) {
      const made = await createBuild(ctx, { programId, name, builtOn: null, notes: "" });
      builds.push({ ...place, ...made });
    }
    await withMargin(ctx, builds[0] ?? place, 6);
    const [row] = await listPrograms(ctx, TODAY);
    expect(row?.builds).toBe(3);
    expect(row?.now).toMatchObject({ buildName: "G2", marginDb: expect.closeTo(6, 5) });
    expect(row?.trend).toEqual([
      { buildName: "G1", standing: "over", marginDb: expect.closeTo(-2, 5) },
      { buildName: "G2", standing: "clear", marginDb: expect.closeTo(6, 5) },
    ]);
    await archiveBuild(ctx, { buildId: builds[0]?.buildId });
    expect((await listPrograms(ctx, TODAY))[0]?.now?.buildName).toBe("G1");
  });
});

describe("where a build stands", () => {
  test("is its worst sweep on record, with the point and the sweep it comes from", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    await withMargin(ctx, place, 9);
    const worst = await withMargin(ctx, place, 5);
    await withMargin(ctx, place, -7, { onRecord: false });
    const aside = await withMargin(ctx, place, -9);
    await archiveSweep(ctx, { sweepId: aside.sweepId });
    await withMargin(ctx, place, -9, { purpose: "ambient" });
    const program = await readProgram(ctx, place.programId);
    expect(program?.trend.builds[0]?.standings).toEqual([
      {
        maskId: place.maskId,
        maskTitle: "Loft limit",
        standing: "clear",
        marginDb: expect.closeTo(5, 5),
        marginAtHz: 100e6,
        lineName: "Peak",
        provenance: "team",
        sweepId: worst.sweepId,
        coverage: 1,
      },
    ]);
  });

  test("is not disturbed by a sweep that does not reach the mask", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    await withMargin(ctx, place, 5);
    await withMargin(ctx, place, -20, {}, { startMhz: 1000, stepMhz: 185 });
    expect(await standings(ctx, place)).toEqual([[["Loft limit", "clear", expect.closeTo(5, 5)]]]);
  });

  test("keeps the lowest margin beside a narrow sweep with more room", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const narrow = { startMhz: 90, stepMhz: 1 };
    await withMargin(ctx, place, 15, {}, narrow);
    expect(await standings(ctx, place)).toEqual([
      [["Loft limit", "undecided", expect.closeTo(15, 5)]],
    ]);
    const { sweepId } = await withMargin(ctx, place, 3);
    await withMargin(ctx, place, 12, {}, narrow);
    const program = await readProgram(ctx, place.programId);
    expect(program?.trend.builds[0]?.standings[0]).toMatchObject({
      marginDb: expect.closeTo(3, 5),
      sweepId,
    });
  });

  test("is told apart by mask, and a sweep over one says nothing of the other", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const strict = await createMask(ctx, { mask: flatMask(43, { title: "A strict limit" }) });
    const maskIds = [place.maskId, strict.maskId];
    await setProgramMasks(ctx, { programId: place.programId, maskIds });
    await withMargin(ctx, place, 5);
    expect(await standings(ctx, place)).toEqual([
      [
        ["A strict limit", "over", expect.closeTo(-2, 5)],
        ["Loft limit", "clear", expect.closeTo(5, 5)],
      ],
    ]);
    const program = await readProgram(ctx, place.programId);
    const newest = program ? newestStanding(program.trend) : null;
    expect(newest?.worst).toMatchObject({ maskTitle: "A strict limit", standing: "over" });
  });

  test("peak over a quasi-peak line is undecided and quasi-peak decides it", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx, flatMask(50, { detector: "quasi-peak" }));
    const peak = await withMargin(ctx, place, -4);
    expect(await standings(ctx, place)).toEqual([
      [["Loft limit", "undecided", expect.closeTo(-4, 5)]],
    ]);
    await archiveSweep(ctx, { sweepId: peak.sweepId });
    await withMargin(ctx, place, 3, {}, { detector: "QP" });
    expect(await standings(ctx, place)).toEqual([[["Loft limit", "clear", expect.closeTo(3, 5)]]]);
  });

  test("another team finds no such program, nor does what is no id", async () => {
    const ctx = await makeMember(database, "engineer");
    const { programId } = await makePlace(ctx);
    const theirs = await makeMember(database, "engineer");
    expect(await readProgram(theirs, programId)).toBeNull();
    expect(await readProgram(ctx, "nothing")).toBeNull();
  });
});
