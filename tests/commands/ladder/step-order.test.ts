import { randomUUID } from "node:crypto";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { addStep } from "@/lib/commands/ladder/add-step";
import { editStep } from "@/lib/commands/ladder/edit-step";
import { removeStep } from "@/lib/commands/ladder/remove-step";
import { reorderSteps } from "@/lib/commands/ladder/reorder-steps";
import { setStepState } from "@/lib/commands/ladder/set-step-state";
import { readLadder } from "@/lib/queries/ladder/read-ladder";
import type { Context } from "@/lib/auth/context";
import { withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { makeLadder, makePlace } from "../../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const NAMES = ["Start", "Scrambler", "Ferrite", "Spread"];

/** A ladder of four steps, 0 to 3. */
async function arrange() {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const ladderId = await makeLadder(ctx, place.buildId);
  const ids = [(await readLadder(ctx, ladderId))?.steps[0]?.id ?? ""];
  for (const name of NAMES.slice(1))
    ids.push((await addStep(ctx, { ladderId, name, description: "" })).stepId);
  const id = (i: number) => ids[i] ?? "";
  return { ctx, ladderId, buildId: place.buildId, ids, id };
}

const stepsOf = async (ctx: Context, ladderId: string) =>
  (await readLadder(ctx, ladderId))?.steps ?? [];

const placesOf = async (ctx: Context, ladderId: string) =>
  (await stepsOf(ctx, ladderId)).map((step) => [step.position, step.id]);

describe("reorderSteps", () => {
  test("puts the steps into the wanted order, numbered from 0 without a gap, and tells it", async () => {
    const { ctx, ladderId, ids, id } = await arrange();
    await reorderSteps(ctx, { ladderId, stepIds: [id(0), id(3), id(1), id(2)] });
    expect(await placesOf(ctx, ladderId)).toEqual([
      [0, id(0)],
      [1, id(3)],
      [2, id(1)],
      [3, id(2)],
    ]);
    const { rows } = await database.owner.query(
      "select detail from audit_events where team_id = $1 and action = 'ladder.reorder-steps'",
      [ctx.teamId],
    );
    expect(rows).toEqual([
      {
        detail: {
          from: { steps: ["As built", "Scrambler", "Ferrite", "Spread"] },
          to: { steps: ["As built", "Spread", "Scrambler", "Ferrite"] },
        },
      },
    ]);
    await reorderSteps(ctx, { ladderId, stepIds: ids });
    expect(await placesOf(ctx, ladderId)).toEqual(ids.map((one, i) => [i, one]));
  });

  test("step 0 stays the first", async () => {
    const { ctx, ladderId, ids, id } = await arrange();
    const tried = reorderSteps(ctx, { ladderId, stepIds: [id(1), id(0), id(2), id(3)] });
    await expect(tried).rejects.toMatchObject({ code: "conflict" });
    expect(await placesOf(ctx, ladderId)).toEqual(ids.map((one, i) => [i, one]));
  });

  test("refuses an order that leaves out, repeats or adds a step", async () => {
    const { ctx, ladderId, ids, id } = await arrange();
    const orders = [
      ids.slice(0, 3),
      [id(0), id(1), id(1), id(2)],
      [...ids, id(1)],
      [id(0), id(1), id(2), randomUUID()],
    ];
    for (const stepIds of orders) {
      await expect(reorderSteps(ctx, { ladderId, stepIds })).rejects.toMatchObject({
        code: "conflict",
        message: expect.stringContaining("changed"),
      });
    }
    expect(await placesOf(ctx, ladderId)).toEqual(ids.map((one, i) => [i, one]));
  });

  test("keeps a branch behind the step that it starts from", async () => {
    const { ctx, ladderId, id } = await arrange();
    await editStep(ctx, { stepId: id(3), name: "Spread", description: "", branchOfId: id(1) });
    const tried = reorderSteps(ctx, { ladderId, stepIds: [id(0), id(3), id(1), id(2)] });
    await expect(tried).rejects.toMatchObject({
      code: "conflict",
      message: expect.stringContaining("Spread"),
    });
    await reorderSteps(ctx, { ladderId, stepIds: [id(0), id(1), id(3), id(2)] });
    expect((await placesOf(ctx, ladderId))[2]).toEqual([2, id(3)]);
  });

  test.each(["manager", "liaison"] as const)("refuses a %s", async (role) => {
    const { ctx, ladderId, ids, id } = await arrange();
    const other = await makeMember(database, role, ctx.teamId);
    const stepIds = [id(0), id(2), id(1), id(3)];
    await expect(reorderSteps(other, { ladderId, stepIds })).rejects.toMatchObject({
      code: "denied",
    });
    expect(await placesOf(ctx, ladderId)).toEqual(ids.map((one, i) => [i, one]));
  });

  test("does not reach another team's ladder", async () => {
    const { ctx, ladderId, ids, id } = await arrange();
    const theirs = await makeMember(database, "engineer");
    const stepIds = [id(0), id(2), id(1), id(3)];
    await expect(reorderSteps(theirs, { ladderId, stepIds })).rejects.toMatchObject({
      code: "not-found",
    });
    expect(await placesOf(ctx, ladderId)).toEqual(ids.map((one, i) => [i, one]));
  });

  test("leaves the order as it was when the audit row cannot be written", async () => {
    const { ctx, ladderId, ids, id } = await arrange();
    await withoutAudit(database, async () => {
      const stepIds = [id(0), id(2), id(1), id(3)];
      await expect(reorderSteps(ctx, { ladderId, stepIds })).rejects.toThrow();
    });
    expect(await placesOf(ctx, ladderId)).toEqual(ids.map((one, i) => [i, one]));
  });
});

describe("a branch", () => {
  const branches = async (ctx: Context, ladderId: string) =>
    (await stepsOf(ctx, ladderId)).map((step) => [step.base?.position ?? null, step.isOnLine]);

  test("starts from an earlier step and takes the place of what it left out", async () => {
    const { ctx, ladderId, id } = await arrange();
    const name = "Spread without the ferrite";
    await addStep(ctx, { ladderId, name, description: "", branchOfId: id(1) });
    // 4 starts from 1, so 2 and 3 are not in the product any more.
    expect(await branches(ctx, ladderId)).toEqual([
      [null, true],
      [0, true],
      [1, false],
      [2, false],
      [1, true],
    ]);
  });

  test("is not the base of the next step once it is dropped", async () => {
    const { ctx, ladderId, id } = await arrange();
    await editStep(ctx, { stepId: id(2), name: "F", description: "", branchOfId: id(0) });
    expect((await branches(ctx, ladderId))[3]).toEqual([2, true]);
    await setStepState(ctx, { stepId: id(2), state: "dropped" });
    expect(await branches(ctx, ladderId)).toEqual([
      [null, true],
      [0, true],
      [0, false],
      [1, true],
    ]);
  });

  test("cannot start from itself, a later step, another ladder's or none at all", async () => {
    const { ctx, ladderId, buildId, id } = await arrange();
    const otherId = await makeLadder(ctx, buildId, "Other");
    const foreign = (await stepsOf(ctx, otherId))[0]?.id;
    for (const branchOfId of [id(1), id(2), foreign, randomUUID()]) {
      const tried = editStep(ctx, { stepId: id(1), name: "x", description: "", branchOfId });
      await expect(tried).rejects.toMatchObject({
        code: "conflict",
        fieldErrors: { branchOfId: expect.any(String) },
      });
    }
    const added = addStep(ctx, { ladderId, name: "x", description: "", branchOfId: foreign });
    await expect(added).rejects.toMatchObject({ fieldErrors: { branchOfId: expect.any(String) } });
    const start = editStep(ctx, { stepId: id(0), name: "x", description: "", branchOfId: id(1) });
    await expect(start).rejects.toMatchObject({ code: "conflict" });
    expect((await stepsOf(ctx, ladderId)).map((step) => step.branchOfId)).toEqual([
      null,
      null,
      null,
      null,
    ]);
  });

  test("stays when a step's name is edited, and goes when it is taken away", async () => {
    const { ctx, ladderId, id } = await arrange();
    const branch = async () => (await stepsOf(ctx, ladderId))[3]?.branchOfId;
    const edit = { stepId: id(3), name: "Spread", description: "" };
    await editStep(ctx, { ...edit, branchOfId: id(1) });
    await editStep(ctx, edit);
    expect(await branch()).toBe(id(1));
    await editStep(ctx, { ...edit, branchOfId: null });
    expect(await branch()).toBeNull();
  });

  test("keeps the step that it starts from from being taken away", async () => {
    const { ctx, ladderId, id } = await arrange();
    await editStep(ctx, { stepId: id(3), name: "Spread", description: "", branchOfId: id(2) });
    await expect(removeStep(ctx, { stepId: id(2) })).rejects.toMatchObject({
      code: "conflict",
      message: expect.stringContaining("“Spread” starts from this step"),
    });
    expect(await stepsOf(ctx, ladderId)).toHaveLength(4);
  });
});

describe("setStepState", () => {
  test("drops a step and keeps it again", async () => {
    const { ctx, ladderId, id } = await arrange();
    const state = async () => (await stepsOf(ctx, ladderId)).map((step) => step.state);
    await setStepState(ctx, { stepId: id(2), state: "dropped" });
    expect(await state()).toEqual(["kept", "kept", "dropped", "kept"]);
    const again = setStepState(ctx, { stepId: id(2), state: "dropped" });
    await expect(again).rejects.toMatchObject({ code: "conflict" });
    await setStepState(ctx, { stepId: id(2), state: "kept" });
    expect(await state()).toEqual(["kept", "kept", "kept", "kept"]);
  });

  test("never drops step 0, and knows two states only", async () => {
    const { ctx, id } = await arrange();
    const start = setStepState(ctx, { stepId: id(0), state: "dropped" });
    await expect(start).rejects.toMatchObject({ code: "conflict" });
    const unknown = setStepState(ctx, { stepId: id(1), state: "lost" });
    await expect(unknown).rejects.toMatchObject({ fieldErrors: { state: expect.any(String) } });
  });
});
