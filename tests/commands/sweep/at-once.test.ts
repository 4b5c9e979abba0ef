import { afterAll, beforeAll, expect, test } from "vitest";
import { createMask } from "@/lib/commands/mask/create-mask";
import { reviseMask } from "@/lib/commands/mask/revise-mask";
import { archiveBuild } from "@/lib/commands/program/archive-build";
import { setProgramMasks } from "@/lib/commands/program/set-program-masks";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import { importSweep } from "@/lib/commands/sweep/import-sweep";
import { recordStep } from "@/lib/commands/sweep/record-step";
import { restoreSweep } from "@/lib/commands/sweep/restore-sweep";
import { addStep } from "@/lib/commands/ladder/add-step";
import { removeStep } from "@/lib/commands/ladder/remove-step";
import { readLadder } from "@/lib/queries/ladder/read-ladder";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { runJobs } from "../../support/jobs";
import {
  csvOf,
  flatMask,
  importInput,
  importLevels,
  levelsOf,
  makeLadder,
  makePlace,
} from "../../support/sweeps";
import { countRows, heldTogether, readingRows } from "./rows";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const file = () => csvOf(levelsOf(20, { 7: 40 }));
const outcomes = (results: PromiseSettledResult<unknown>[]) =>
  results.map((result) => (result.status === "fulfilled" ? "done" : result.reason.code));

test("two imports of the same file: one is stored, the other refused as here already", async () => {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const once = () => importSweep(ctx, importInput(place, file()));
  expect(outcomes(await heldTogether(database, [once, once]))).toEqual(["done", "conflict"]);
  expect(await countRows(database, ctx.teamId)).toMatchObject({ sweeps: 1, readings: 1 });
});

test("a mask revised while a sweep is stored: the sweep is held against both revisions", async () => {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const { maskId } = place;
  const importing = (): Promise<unknown> => importSweep(ctx, importInput(place, file()));
  const revising = () => reviseMask(ctx, { maskId, mask: flatMask(40) });
  expect(outcomes(await heldTogether(database, [importing, revising]))).toEqual(["done", "done"]);
  await runJobs(database);
  const margins = (await readingRows(database, ctx.teamId)).map((row) => row.margin_db ?? 0);
  expect(margins).toHaveLength(2);
  expect((margins[0] ?? 0) - (margins[1] ?? 0)).toBeCloseTo(10, 9);
});

test("a sweep stored while its mask is revised is held against the new revision", async () => {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const { maskId } = place;
  const importing = (): Promise<unknown> => importSweep(ctx, importInput(place, file()));
  const revising = () => reviseMask(ctx, { maskId, mask: flatMask(40) });
  expect(outcomes(await heldTogether(database, [revising, importing]))).toEqual(["done", "done"]);
  await runJobs(database);
  const revisions = (await readingRows(database, ctx.teamId)).map((row) => row.revision);
  expect(revisions).toEqual([2]);
});

test("a mask chosen for the program while a sweep is stored gets its reading", async () => {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const second = await createMask(ctx, { mask: flatMask(60, { title: "Second" }) });
  const maskIds = [place.maskId, second.maskId];
  const importing = (): Promise<unknown> => importSweep(ctx, importInput(place, file()));
  const choosing = () => setProgramMasks(ctx, { programId: place.programId, maskIds });
  expect(outcomes(await heldTogether(database, [importing, choosing]))).toEqual(["done", "done"]);
  const held = (await readingRows(database, ctx.teamId)).map((row) => row.mask_id);
  expect(held.sort()).toEqual([...maskIds].sort());
});

test("a mask revised while a sweep is fetched back: the sweep is held against the new revision", async () => {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const { maskId } = place;
  const { sweepId } = await importSweep(ctx, importInput(place, file()));
  await archiveSweep(ctx, { sweepId });
  const restoring = (): Promise<unknown> => restoreSweep(ctx, { sweepId });
  const revising = () => reviseMask(ctx, { maskId, mask: flatMask(40) });
  expect(outcomes(await heldTogether(database, [restoring, revising]))).toEqual(["done", "done"]);
  await runJobs(database);
  const revisions = (await readingRows(database, ctx.teamId)).map((row) => row.revision);
  expect(revisions).toEqual([1, 2]);
});

test("a build archived first takes no sweep that was on its way", async () => {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const archiving = (): Promise<unknown> => archiveBuild(ctx, { buildId: place.buildId });
  const importing = () => importSweep(ctx, importInput(place, file()));
  expect(outcomes(await heldTogether(database, [archiving, importing]))).toEqual([
    "done",
    "not-found",
  ]);
});

test("a step taken away first takes no sweep, and one that got a sweep first is not taken away", async () => {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const ladderId = await makeLadder(ctx, place.buildId);
  for (const isRemovedFirst of [true, false]) {
    const { stepId } = await addStep(ctx, { ladderId, name: "Ferrite", description: "" });
    const removing = (): Promise<unknown> => removeStep(ctx, { stepId });
    const importing = () => importLevels(ctx, place, levelsOf(20), { stepId });
    const works = isRemovedFirst ? [removing, importing] : [importing, removing];
    expect(outcomes(await heldTogether(database, works))).toEqual([
      "done",
      isRemovedFirst ? "not-found" : "conflict",
    ]);
  }
});

test("steps added and recorded at once keep their order and leave one on record", async () => {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const ladderId = await makeLadder(ctx, place.buildId);
  const adding = (name: string) => () => addStep(ctx, { ladderId, name, description: "" });
  const added = await heldTogether(database, ["A", "B", "C"].map(adding));
  expect(outcomes(added)).toEqual(["done", "done", "done"]);
  const steps = (await readLadder(ctx, ladderId))?.steps ?? [];
  expect(steps.map((step) => [step.position, step.name])).toEqual([
    [0, "As built"],
    [1, "A"],
    [2, "B"],
    [3, "C"],
  ]);
  for (const step of steps.slice(1, 3)) {
    await importLevels(ctx, place, levelsOf(20), { stepId: step.id, onRecord: false });
  }
  const recording = steps.slice(1, 3).map((step) => () => recordStep(ctx, { stepId: step.id }));
  expect(outcomes(await heldTogether(database, recording))).toEqual(["done", "done"]);
  const after = (await readLadder(ctx, ladderId))?.steps ?? [];
  expect(after.map((step) => step.onRecord)).toEqual([false, false, true, false]);
});
