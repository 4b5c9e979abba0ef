import { randomUUID } from "node:crypto";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { addStep } from "@/lib/commands/ladder/add-step";
import { archiveLadder } from "@/lib/commands/ladder/archive-ladder";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import { recordStep } from "@/lib/commands/sweep/record-step";
import { restoreSweep } from "@/lib/commands/sweep/restore-sweep";
import { setOnRecord } from "@/lib/commands/sweep/set-on-record";
import { readLadder } from "@/lib/queries/ladder/read-ladder";
import { listBuildSweeps } from "@/lib/queries/sweep/list-sweeps";
import { readSweepDetail } from "@/lib/queries/sweep/read-sweep";
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

type Command = (ctx: Context, input: unknown) => Promise<unknown>;

/** A sweep on record at a step of a ladder, and one beside it that is archived. */
async function arrange() {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const ladderId = await makeLadder(ctx, place.buildId);
  const stepId = (await readLadder(ctx, ladderId))?.steps[0]?.id ?? "";
  const { sweepId } = await importLevels(ctx, place, levelsOf(20), { stepId });
  const aside = await importLevels(ctx, place, levelsOf(20), { stepId });
  await archiveSweep(ctx, { sweepId: aside.sweepId });
  return { ctx, place, ladderId, stepId, sweepId, asideId: aside.sweepId };
}
type Arranged = Awaited<ReturnType<typeof arrange>>;

/** What any of the commands here may change of a team's sweeps. */
async function stateOf({ ctx }: Pick<Arranged, "ctx">) {
  const found = await database.owner.query(
    "select id, on_record, archived_at from sweeps where team_id = $1 order by id",
    [ctx.teamId],
  );
  return found.rows;
}

const CASES: [string, Command, (made: Arranged) => [unknown, string], string][] = [
  [
    "setOnRecord",
    setOnRecord,
    (m) => [{ sweepId: m.sweepId, onRecord: false }, m.sweepId],
    "sweep.take-off-record",
  ],
  ["archiveSweep", archiveSweep, (m) => [{ sweepId: m.sweepId }, m.sweepId], "sweep.archive"],
  ["restoreSweep", restoreSweep, (m) => [{ sweepId: m.asideId }, m.asideId], "sweep.restore"],
  ["recordStep", recordStep, (m) => [{ stepId: m.stepId }, m.stepId], "step.put-on-record"],
];

describe.each(CASES)("%s", (_name, command, inputOf, action) => {
  test("is written into the audit trail once", async () => {
    const made = await arrange();
    const [input, subjectId] = inputOf(made);
    await command(made.ctx, input);
    const rows = await auditRows(database, made.ctx.teamId);
    expect(rows.filter((row) => row.action === action)).toContainEqual({
      actor_id: made.ctx.userId,
      action,
      subject_id: subjectId,
    });
  });

  test.each(["manager", "liaison"] as const)("refuses a %s", async (role) => {
    const made = await arrange();
    const before = await stateOf(made);
    const other = await makeMember(database, role, made.ctx.teamId);
    await expect(command(other, inputOf(made)[0])).rejects.toMatchObject({ code: "denied" });
    expect(await stateOf(made)).toEqual(before);
  });

  test("does not reach another team's", async () => {
    const made = await arrange();
    const before = await stateOf(made);
    const theirs = await makeMember(database, "engineer");
    await expect(command(theirs, inputOf(made)[0])).rejects.toMatchObject({ code: "not-found" });
    expect(await stateOf(made)).toEqual(before);
  });

  test("leaves everything as it was when the audit row cannot be written", async () => {
    const made = await arrange();
    const before = await stateOf(made);
    await withoutAudit(database, async () => {
      await expect(command(made.ctx, inputOf(made)[0])).rejects.toThrow();
    });
    expect(await stateOf(made)).toEqual(before);
  });

  test("refuses what is no id, and finds nothing under one that is not there", async () => {
    const { ctx } = await arrange();
    const id = randomUUID();
    const bad = { sweepId: "1", stepId: "1", onRecord: true };
    await expect(command(ctx, bad)).rejects.toMatchObject({ code: "invalid" });
    const none = { sweepId: id, stepId: id, onRecord: true };
    await expect(command(ctx, none)).rejects.toMatchObject({ code: "not-found" });
  });
});

const onRecord = async ({ ctx, place }: Pick<Arranged, "ctx" | "place">) =>
  (await listBuildSweeps(ctx, place.buildId)).map((row) => row.onRecord);

test("a sweep goes out of the line of record and into it again", async () => {
  const made = await arrange();
  const { ctx, sweepId } = made;
  expect(await onRecord(made)).toEqual([true]);
  await setOnRecord(ctx, { sweepId, onRecord: false });
  expect(await onRecord(made)).toEqual([false]);
  await setOnRecord(ctx, { sweepId, onRecord: true });
  expect(await onRecord(made)).toEqual([true]);
});

test("only a product sweep that is not archived comes into the line of record", async () => {
  const { ctx, place, asideId } = await arrange();
  const ambient = await importLevels(ctx, place, levelsOf(10), { purpose: "ambient" });
  for (const sweepId of [asideId, ambient.sweepId]) {
    const tried = setOnRecord(ctx, { sweepId, onRecord: true });
    await expect(tried).rejects.toMatchObject({ code: "not-found" });
    expect((await readSweepDetail(ctx, sweepId))?.onRecord).toBe(false);
  }
});

test("an archived sweep leaves list and line of record, can still be read, and comes back off record", async () => {
  const made = await arrange();
  const { ctx, sweepId } = made;
  await archiveSweep(ctx, { sweepId });
  expect(await onRecord(made)).toEqual([]);
  expect((await readSweepDetail(ctx, sweepId))?.archivedAt).toBeInstanceOf(Date);
  await expect(archiveSweep(ctx, { sweepId })).rejects.toMatchObject({ code: "conflict" });
  await restoreSweep(ctx, { sweepId });
  expect(await onRecord(made)).toEqual([false]);
  await expect(restoreSweep(ctx, { sweepId })).rejects.toMatchObject({ code: "conflict" });
});

test("a step put on record takes the other steps of its ladder off, and nothing else", async () => {
  const made = await arrange();
  const { ctx, place, ladderId, sweepId, asideId } = made;
  const { stepId } = await addStep(ctx, { ladderId, name: "Ferrite", description: "" });
  const later = await importLevels(ctx, place, levelsOf(18), { stepId, onRecord: false });
  const ambient = await importLevels(ctx, place, levelsOf(5), { stepId, purpose: "ambient" });
  const loose = await importLevels(ctx, place, levelsOf(19));
  expect(await recordStep(ctx, { stepId })).toEqual({ sweeps: 1 });
  const rows = new Map((await stateOf(made)).map((row) => [row.id, row.on_record]));
  const ids = [sweepId, asideId, later.sweepId, ambient.sweepId, loose.sweepId];
  expect(ids.map((id) => rows.get(id))).toEqual([false, false, true, false, true]);
});

test("a step without a product sweep, or of an archived ladder, is not put on record", async () => {
  const made = await arrange();
  const { ctx, place, ladderId } = made;
  const { stepId } = await addStep(ctx, { ladderId, name: "Ferrite", description: "" });
  await importLevels(ctx, place, levelsOf(5), { stepId, purpose: "ambient" });
  await expect(recordStep(ctx, { stepId })).rejects.toMatchObject({ code: "conflict" });
  expect(await onRecord(made)).toContain(true);
  await archiveLadder(ctx, { ladderId });
  const tried = recordStep(ctx, { stepId: made.stepId });
  await expect(tried).rejects.toMatchObject({ code: "conflict" });
});
