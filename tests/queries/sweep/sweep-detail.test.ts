import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { addStep } from "@/lib/commands/ladder/add-step";
import { archiveLadder } from "@/lib/commands/ladder/archive-ladder";
import { createBuild } from "@/lib/commands/program/create-build";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import { listBuildSweeps } from "@/lib/queries/sweep/list-sweeps";
import { readImportPlace } from "@/lib/queries/sweep/read-import-place";
import { readOriginalFile } from "@/lib/queries/sweep/read-original-file";
import { readSweepDetail } from "@/lib/queries/sweep/read-sweep";
import type { Context } from "@/lib/auth/context";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import {
  importLevels,
  levelsOf,
  LINK,
  makeBench,
  makeLadder,
  makePlace,
  SETTINGS,
} from "../../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const doubts = async (ctx: Context, sweepId: string) =>
  (await readSweepDetail(ctx, sweepId))?.readings.flatMap((r) =>
    r.reading.doubts.map((d) => d.code),
  );

describe("readSweepDetail", () => {
  test("says everything that was imported", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { sweepId } = await importLevels(ctx, place, levelsOf(20), { notes: "Lid off" });
    expect(await readSweepDetail(ctx, sweepId)).toMatchObject({
      id: sweepId,
      name: "G1 vertical",
      fileName: "g1_vertical.csv",
      measuredOn: "2026-06-01",
      settings: SETTINGS,
      link: LINK,
      guardDb: 2,
      notes: "Lid off",
      onRecord: true,
      importedBy: "A engineer",
      buildId: place.buildId,
      programId: place.programId,
      stepId: null,
      ambient: [],
    });
  });

  test("liaisons and managers may read it; another team finds nothing, nor does a wrong id", async () => {
    const ctx = await makeMember(database, "engineer");
    const { sweepId } = await importLevels(ctx, await makePlace(ctx), levelsOf(20));
    for (const role of ["liaison", "manager"] as const) {
      const reader = await makeMember(database, role, ctx.teamId);
      expect((await readSweepDetail(reader, sweepId))?.id).toBe(sweepId);
    }
    const theirs = await makeMember(database, "admin");
    expect(await readSweepDetail(theirs, sweepId)).toBeNull();
    expect(await readOriginalFile(theirs, sweepId)).toBeNull();
    expect(await readSweepDetail(ctx, "1' or true --")).toBeNull();
    expect(await readOriginalFile(ctx, "nothing")).toBeNull();
  });

  test("an ambient sweep of the same bench and day takes the doubt away, and no other does", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { sweepId } = await importLevels(ctx, place, levelsOf(20));
    const undated = await importLevels(ctx, place, levelsOf(20), { measuredOn: null });
    const ambient = { purpose: "ambient" };
    const elsewhere = await makeBench(ctx, "Another");
    await importLevels(ctx, place, levelsOf(5), { ...ambient, measuredOn: "2026-06-02" });
    await importLevels(ctx, place, levelsOf(5), { ...ambient, benchId: elsewhere });
    await importLevels(ctx, place, levelsOf(5), { ...ambient, measuredOn: null });
    await importLevels(ctx, place, levelsOf(5), { purpose: "floor" });
    expect(await doubts(ctx, sweepId)).toContain("ambient-not-taken");
    const taken = await importLevels(ctx, place, levelsOf(5), ambient);
    expect(await doubts(ctx, sweepId)).not.toContain("ambient-not-taken");
    expect((await readSweepDetail(ctx, sweepId))?.ambient.map((a) => a.id)).toEqual([
      taken.sweepId,
    ]);
    expect(await doubts(ctx, undated.sweepId)).toContain("ambient-not-taken");
    await archiveSweep(ctx, { sweepId: taken.sweepId });
    expect(await doubts(ctx, sweepId)).toContain("ambient-not-taken");
  });
});

describe("listBuildSweeps", () => {
  test("lists a build's sweeps by step and day, with span, detectors and worst reading", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const ladderId = await makeLadder(ctx, place.buildId);
    const { stepId } = await addStep(ctx, { ladderId, name: "Ferrite", description: "" });
    await importLevels(ctx, place, levelsOf(20), { name: "Loose" });
    await importLevels(ctx, place, levelsOf(20), {
      name: "Late",
      stepId,
      measuredOn: "2026-07-01",
    });
    await importLevels(ctx, place, levelsOf(20, { 7: 50 }), { name: "Early", stepId });
    await importLevels(ctx, place, levelsOf(5), { name: "Ambient", purpose: "ambient" });
    const rows = await listBuildSweeps(ctx, place.buildId);
    expect(rows.map((row) => row.name)).toEqual(["Early", "Late", "Loose", "Ambient"]);
    expect(rows[0]).toMatchObject({
      standing: "over",
      // 50 dBµV at 100 MHz are 55.2745 dBµV/m under a limit of 50.
      marginDb: expect.closeTo(-5.2745, 3),
      fromHz: 30e6,
      toHz: 300e6,
      detectors: ["peak"],
      stepName: "Ferrite",
      stepPosition: 1,
      ladderName: "Link",
      polarization: "vertical",
    });
    expect(rows[3]).toMatchObject({ standing: null, marginDb: null, onRecord: false });
    const theirs = await makeMember(database, "engineer");
    expect(await listBuildSweeps(theirs, place.buildId)).toEqual([]);
    expect(await listBuildSweeps(ctx, "nothing")).toEqual([]);
  });
});

describe("readImportPlace", () => {
  test("starts from the last product sweep of the step, or else of the build", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const ladderId = await makeLadder(ctx, place.buildId);
    const { stepId } = await addStep(ctx, { ladderId, name: "Ferrite", description: "" });
    const { stepId: emptyId } = await addStep(ctx, { ladderId, name: "Spread", description: "" });
    const last = async (step: string | null) => {
      const found = await readImportPlace(ctx, place.buildId, step);
      return found?.last ? [found.last.from, found.last.name] : null;
    };
    expect(await last(stepId)).toBeNull();
    await importLevels(ctx, place, levelsOf(20), { name: "First", stepId });
    await importLevels(ctx, place, levelsOf(20), {
      name: "Second",
      stepId,
      settings: { ...SETTINGS, polarization: "horizontal" },
    });
    await importLevels(ctx, place, levelsOf(20), { name: "Loose" });
    await importLevels(ctx, place, levelsOf(5), { name: "Ambient", purpose: "ambient", stepId });
    expect(await last(stepId)).toEqual(["step", "Second"]);
    expect(await last(emptyId)).toEqual(["build", "Loose"]);
    expect(await last(null)).toEqual(["build", "Loose"]);
    const found = await readImportPlace(ctx, place.buildId, stepId);
    expect(found?.last?.settings.polarization).toBe("horizontal");
    expect(found?.steps.map((step) => step.name)).toEqual(["As built", "Ferrite", "Spread"]);
  });

  test("does not start from what was put aside, nor from a step of another build", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const ladderId = await makeLadder(ctx, place.buildId);
    const { stepId } = await addStep(ctx, { ladderId, name: "Ferrite", description: "" });
    await importLevels(ctx, place, levelsOf(20), { name: "Right", stepId });
    const wrong = await importLevels(ctx, place, levelsOf(20), { name: "Wrong", stepId });
    await archiveSweep(ctx, { sweepId: wrong.sweepId });
    expect((await readImportPlace(ctx, place.buildId, stepId))?.last?.name).toBe("Right");
    const { programId } = place;
    const other = await createBuild(ctx, { programId, name: "G2", builtOn: null, notes: "" });
    expect((await readImportPlace(ctx, other.buildId, stepId))?.last).toBeNull();
    await archiveLadder(ctx, { ladderId });
    expect((await readImportPlace(ctx, place.buildId, null))?.steps).toEqual([]);
  });

  test("finds nothing for another team and for what is no id", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const theirs = await makeMember(database, "engineer");
    expect(await readImportPlace(theirs, place.buildId, null)).toBeNull();
    expect(await readImportPlace(ctx, "nothing", null)).toBeNull();
    expect(await readImportPlace(ctx, place.buildId, "nothing")).toBeNull();
  });
});
