import { randomUUID } from "node:crypto";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { addStep } from "@/lib/commands/ladder/add-step";
import { archiveLadder } from "@/lib/commands/ladder/archive-ladder";
import { createLadder } from "@/lib/commands/ladder/create-ladder";
import { editLadder } from "@/lib/commands/ladder/edit-ladder";
import { editStep } from "@/lib/commands/ladder/edit-step";
import { removeStep } from "@/lib/commands/ladder/remove-step";
import { reorderSteps } from "@/lib/commands/ladder/reorder-steps";
import { restoreLadder } from "@/lib/commands/ladder/restore-ladder";
import { setStepState } from "@/lib/commands/ladder/set-step-state";
import { archiveBuild } from "@/lib/commands/program/archive-build";
import { createBuild } from "@/lib/commands/program/create-build";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import { readLadder } from "@/lib/queries/ladder/read-ladder";
import { readBuild } from "@/lib/queries/program/read-build";
import type { Context } from "@/lib/auth/context";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { importLevels, levelsOf, makeLadder, makePlace } from "../../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

/** A ladder of two steps, and an archived one. */
async function arrange() {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const ladderId = await makeLadder(ctx, place.buildId);
  const { stepId } = await addStep(ctx, { ladderId, name: "Scrambler on", description: "" });
  const startId = (await readLadder(ctx, ladderId))?.steps[0]?.id ?? "";
  const asideId = await makeLadder(ctx, place.buildId, "Aside");
  await archiveLadder(ctx, { ladderId: asideId });
  return { ctx, place, ladderId, startId, stepId, asideId };
}
type Arranged = Awaited<ReturnType<typeof arrange>>;

async function stateOf(ctx: Context) {
  const { owner } = database;
  const [ladders, steps] = [
    await owner.query("select * from ladders where team_id = $1 order by id", [ctx.teamId]),
    await owner.query("select * from ladder_steps where team_id = $1 order by id", [ctx.teamId]),
  ];
  return [...ladders.rows, ...steps.rows];
}

type Command = (ctx: Context, input: unknown) => Promise<unknown>;
const own = { name: "Coding", notes: "", startName: "As built", startDescription: "" };
const CASES: [string, Command, (m: Arranged) => Record<string, unknown>, string][] = [
  ["createLadder", createLadder, (m) => ({ buildId: m.place.buildId, ...own }), "ladder.create"],
  [
    "editLadder",
    editLadder,
    (m) => ({ ladderId: m.ladderId, name: "B", notes: "n" }),
    "ladder.edit",
  ],
  ["archiveLadder", archiveLadder, (m) => ({ ladderId: m.ladderId }), "ladder.archive"],
  ["restoreLadder", restoreLadder, (m) => ({ ladderId: m.asideId }), "ladder.restore"],
  ["addStep", addStep, (m) => ({ ladderId: m.ladderId, name: "C", description: "d" }), "step.add"],
  ["editStep", editStep, (m) => ({ stepId: m.stepId, name: "C", description: "d" }), "step.edit"],
  ["setStepState", setStepState, (m) => ({ stepId: m.stepId, state: "dropped" }), "step.set-state"],
  ["removeStep", removeStep, (m) => ({ stepId: m.stepId }), "step.remove"],
];

describe.each(CASES)("%s", (_name, command, inputOf, action) => {
  test("changes the ladder and is written into the audit trail", async () => {
    const made = await arrange();
    const before = await stateOf(made.ctx);
    const count = async () =>
      (await auditRows(database, made.ctx.teamId)).filter((row) => row.action === action).length;
    const audited = await count();
    await command(made.ctx, inputOf(made));
    expect(await stateOf(made.ctx)).not.toEqual(before);
    expect((await count()) - audited).toBe(1);
  });

  test.each(["manager", "liaison"] as const)("refuses a %s", async (role) => {
    const made = await arrange();
    const before = await stateOf(made.ctx);
    const other = await makeMember(database, role, made.ctx.teamId);
    await expect(command(other, inputOf(made))).rejects.toMatchObject({ code: "denied" });
    expect(await stateOf(made.ctx)).toEqual(before);
  });

  test("does not reach another team's", async () => {
    const made = await arrange();
    const before = await stateOf(made.ctx);
    const theirs = await makeMember(database, "engineer");
    await expect(command(theirs, inputOf(made))).rejects.toMatchObject({ code: "not-found" });
    expect(await stateOf(made.ctx)).toEqual(before);
    expect(await stateOf(theirs)).toEqual([]);
  });

  test("leaves everything as it was when the audit row cannot be written", async () => {
    const made = await arrange();
    const before = await stateOf(made.ctx);
    await withoutAudit(database, async () => {
      await expect(command(made.ctx, inputOf(made))).rejects.toThrow();
    });
    expect(await stateOf(made.ctx)).toEqual(before);
  });

  test("refuses what is no id and what is not there", async () => {
    const made = await arrange();
    const at = (id: string) => ({ ...inputOf(made), buildId: id, ladderId: id, stepId: id });
    await expect(command(made.ctx, at("1"))).rejects.toMatchObject({ code: "invalid" });
    await expect(command(made.ctx, at(randomUUID()))).rejects.toMatchObject({ code: "not-found" });
  });
});

const stepsOf = async (ctx: Context, ladderId: string) =>
  (await readLadder(ctx, ladderId))?.steps.map((step) => [step.position, step.name]);

describe("a ladder", () => {
  test("starts with step 0, and later steps follow in their order", async () => {
    const { ctx, ladderId } = await arrange();
    await addStep(ctx, { ladderId, name: "  Spread 0.5 %  ", description: "" });
    expect(await stepsOf(ctx, ladderId)).toEqual([
      [0, "As built"],
      [1, "Scrambler on"],
      [2, "Spread 0.5 %"],
    ]);
  });

  test("has a name of its own on its build, and may share it with another build's", async () => {
    const { ctx, place, ladderId } = await arrange();
    const taken = { code: "conflict", fieldErrors: { name: "Choose another name." } };
    await expect(makeLadder(ctx, place.buildId)).rejects.toMatchObject(taken);
    const renaming = editLadder(ctx, { ladderId, name: "Aside", notes: "" });
    await expect(renaming).rejects.toMatchObject(taken);
    const { programId } = place;
    const second = await createBuild(ctx, { programId, name: "G2", builtOn: null, notes: "" });
    expect(await makeLadder(ctx, second.buildId)).toEqual(expect.any(String));
  });

  test("refuses texts that are empty, too long or not storable, at their field", async () => {
    const { ctx, place, ladderId, stepId } = await arrange();
    const tries: [() => Promise<unknown>, string][] = [
      [() => createLadder(ctx, { ...own, buildId: place.buildId, startName: " " }), "startName"],
      [() => createLadder(ctx, { ...own, buildId: place.buildId, name: "nul\u0000" }), "name"],
      [() => editLadder(ctx, { ladderId, name: "x".repeat(81), notes: "" }), "name"],
      [() => editLadder(ctx, { ladderId, name: "x", notes: "half a \ud83d" }), "notes"],
      [() => addStep(ctx, { ladderId, name: "x", description: "y".repeat(1001) }), "description"],
      [() => editStep(ctx, { stepId, name: "", description: "" }), "name"],
    ];
    for (const [tried, field] of tries) {
      await expect(tried()).rejects.toMatchObject({
        code: "invalid",
        fieldErrors: { [field]: expect.any(String) },
      });
    }
  });

  test("is not started on an archived build", async () => {
    const { ctx, place } = await arrange();
    await archiveBuild(ctx, { buildId: place.buildId });
    const tried = createLadder(ctx, { buildId: place.buildId, ...own });
    await expect(tried).rejects.toMatchObject({ code: "not-found" });
  });

  test("leaves the build's list when archived, stays as it is, and comes back", async () => {
    const { ctx, place, ladderId, startId, stepId } = await arrange();
    const listed = async () =>
      (await readBuild(ctx, place.buildId))?.ladders.map((ladder) => [ladder.name, ladder.steps]);
    expect(await listed()).toEqual([["Link", 2]]);
    await archiveLadder(ctx, { ladderId });
    expect(await listed()).toEqual([]);
    for (const tried of [
      () => archiveLadder(ctx, { ladderId }),
      () => editLadder(ctx, { ladderId, name: "x", notes: "" }),
      () => addStep(ctx, { ladderId, name: "x", description: "" }),
      () => editStep(ctx, { stepId, name: "x", description: "" }),
      () => setStepState(ctx, { stepId, state: "dropped" }),
      () => reorderSteps(ctx, { ladderId, stepIds: [startId, stepId] }),
      () => removeStep(ctx, { stepId }),
    ]) {
      await expect(tried()).rejects.toMatchObject({ code: "conflict" });
    }
    expect(await stepsOf(ctx, ladderId)).toHaveLength(2);
    await restoreLadder(ctx, { ladderId });
    expect(await listed()).toEqual([["Link", 2]]);
    await expect(restoreLadder(ctx, { ladderId })).rejects.toMatchObject({ code: "conflict" });
  });
});

describe("removeStep", () => {
  test("takes away only the last step, and never step 0", async () => {
    const { ctx, ladderId, stepId } = await arrange();
    await addStep(ctx, { ladderId, name: "Spread", description: "" });
    await expect(removeStep(ctx, { stepId })).rejects.toMatchObject({ code: "conflict" });
    const steps = (await readLadder(ctx, ladderId))?.steps ?? [];
    await removeStep(ctx, { stepId: steps[2]?.id });
    await removeStep(ctx, { stepId });
    const tried = removeStep(ctx, { stepId: steps[0]?.id });
    await expect(tried).rejects.toMatchObject({ code: "conflict" });
    expect(await stepsOf(ctx, ladderId)).toEqual([[0, "As built"]]);
  });

  test("keeps a step that has sweeps, archived ones as well", async () => {
    const { ctx, place, ladderId, stepId } = await arrange();
    const { sweepId } = await importLevels(ctx, place, levelsOf(20), { stepId });
    await archiveSweep(ctx, { sweepId });
    await expect(removeStep(ctx, { stepId })).rejects.toMatchObject({ code: "conflict" });
    expect(await stepsOf(ctx, ladderId)).toHaveLength(2);
  });
});
