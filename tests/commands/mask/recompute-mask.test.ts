import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { openDatabase } from "@/db/client";
import { bossQueue } from "@/lib/adapters/jobs/boss-queue";
import type { Context } from "@/lib/auth/context";
import { recomputeMask } from "@/lib/commands/mask/recompute-mask";
import { recomputeMaskAgain } from "@/lib/commands/mask/recompute-mask-again";
import { reviseMask } from "@/lib/commands/mask/revise-mask";
import { setProgramMasks } from "@/lib/commands/program/set-program-masks";
import { readRecomputation } from "@/lib/queries/mask/read-recomputation";
import { readMask } from "@/lib/queries/mask/read-mask";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { runJobs, waitingJobs } from "../../support/jobs";
import { flatMask, importLevels, levelsOf, makePlace } from "../../support/sweeps";
import { readingRows } from "../sweep/rows";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

/** A mask over `count` sweeps, revised to 44 dBµV/m: the data of the job that waits for it. */
async function revised(ctx: Context, count: number) {
  const place = await makePlace(ctx);
  for (let i = 0; i < count; i += 1) {
    await importLevels(ctx, place, levelsOf(20, { 7: 40 - i }), { name: `Sweep ${i}` });
  }
  const { maskRevisionId } = await reviseMask(ctx, { maskId: place.maskId, mask: flatMask(44) });
  return { place, maskId: place.maskId, job: { teamId: ctx.teamId, maskRevisionId } };
}

const tools = (mayGoOn: () => boolean = () => true) => ({
  db: database.app,
  jobs: bossQueue,
  mayGoOn,
});

/** Says yes so many times. */
function turns(count: number) {
  let left = count;
  return () => (left -= 1) >= 0;
}

/** Revisions by number under which a team's sweeps are read, one entry per reading. */
const readUnder = async (ctx: Context) =>
  (await readingRows(database, ctx.teamId)).map((row) => row.revision);

async function inForce(ctx: Context, maskId: string): Promise<number | undefined> {
  return (await readMask(ctx, maskId))?.current.revision;
}

describe("a revision of a mask", () => {
  test("with no sweep to read is in force at once and leaves no job", async () => {
    const ctx = await makeMember(database, "engineer");
    const { maskId } = await revised(ctx, 0);
    expect(await readRecomputation(ctx, maskId)).toEqual({
      revision: 2,
      isInForce: true,
      total: 0,
      done: 0,
      problem: null,
    });
    expect(await waitingJobs(database, ctx.teamId)).toEqual([]);
  });

  test("with sweeps waits for its job, and is in force when every sweep is read", async () => {
    const ctx = await makeMember(database, "engineer");
    const { maskId, job } = await revised(ctx, 3);
    expect(await waitingJobs(database, ctx.teamId)).toEqual([job]);
    expect(await readRecomputation(ctx, maskId)).toMatchObject({
      revision: 2,
      isInForce: false,
      total: 3,
      done: 0,
    });
    expect(await inForce(ctx, maskId)).toBe(1);
    await runJobs(database);
    expect(await readRecomputation(ctx, maskId)).toMatchObject({
      isInForce: true,
      total: 3,
      done: 3,
      problem: null,
    });
    expect(await readUnder(ctx)).toEqual([1, 1, 1, 2, 2, 2]);
  });

  test("that is rolled back leaves neither a job nor a recomputation", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    await importLevels(ctx, place, levelsOf(20));
    await withoutAudit(database, async () => {
      const revising = reviseMask(ctx, { maskId: place.maskId, mask: flatMask(44) });
      await expect(revising).rejects.toThrow();
    });
    expect(await waitingJobs(database, ctx.teamId)).toEqual([]);
    const kept = await database.owner.query(
      "select 1 from mask_recomputations where team_id = $1",
      [ctx.teamId],
    );
    expect(kept.rows).toEqual([]);
  });
});

describe("the job", () => {
  test("goes on where it was cut off when its process lost the database", async () => {
    const ctx = await makeMember(database, "engineer");
    const { maskId, job } = await revised(ctx, 3);
    const own = openDatabase(database.appUrl);
    const twice = turns(2);
    const cutOff = () => {
      if (!twice()) void own.pool.end();
      return true;
    };
    const cut = recomputeMask({ db: own.db, jobs: bossQueue, mayGoOn: cutOff }, job);
    await expect(cut).rejects.toThrow();
    expect(await readRecomputation(ctx, maskId)).toMatchObject({ isInForce: false, done: 2 });
    expect(await inForce(ctx, maskId)).toBe(1);
    await recomputeMask(tools(), job);
    expect(await readRecomputation(ctx, maskId)).toMatchObject({ isInForce: true, done: 3 });
    expect(await readUnder(ctx)).toEqual([1, 1, 1, 2, 2, 2]);
  });

  test("hands over to a next one when its turn is up", async () => {
    const ctx = await makeMember(database, "engineer");
    const { maskId, job } = await revised(ctx, 3);
    await database.owner.query("delete from pgboss.job where data->>'teamId' = $1", [ctx.teamId]);
    await recomputeMask(tools(turns(1)), job);
    expect(await readRecomputation(ctx, maskId)).toMatchObject({ isInForce: false, done: 1 });
    expect(await waitingJobs(database, ctx.teamId)).toEqual([job]);
    await runJobs(database);
    expect(await readRecomputation(ctx, maskId)).toMatchObject({ isInForce: true, done: 3 });
  });

  test("names the sweep that it cannot read, and can be tried again once that is mended", async () => {
    const ctx = await makeMember(database, "engineer");
    const { maskId } = await revised(ctx, 3);
    const damage = (by: number) =>
      database.owner.query(
        `update trace_blocks set crc32 = crc32 + $2 where kind = 'level' and trace_id in (
           select t.id from traces t join sweeps s on s.id = t.sweep_id
           where s.team_id = $1 and s.name = 'Sweep 1')`,
        [ctx.teamId, by],
      );
    await damage(1);
    await expect(runJobs(database)).rejects.toThrow();
    // The newest is read first.
    expect(await readRecomputation(ctx, maskId)).toEqual({
      revision: 2,
      isInForce: false,
      total: 3,
      done: 1,
      problem: 'The sweep "Sweep 1" could not be read; the log of the worker says why.',
    });
    await damage(-1);
    await recomputeMaskAgain(ctx, { maskId });
    expect(await readRecomputation(ctx, maskId)).toMatchObject({ problem: null });
    await runJobs(database);
    expect(await readRecomputation(ctx, maskId)).toMatchObject({ isInForce: true, done: 3 });
  });

  test("run by two workers at once and once more later makes each reading once", async () => {
    const ctx = await makeMember(database, "engineer");
    const { maskId, job } = await revised(ctx, 4);
    await Promise.all([recomputeMask(tools(), job), recomputeMask(tools(), job)]);
    await recomputeMask(tools(), job);
    expect(await readRecomputation(ctx, maskId)).toMatchObject({ isInForce: true, done: 4 });
    expect(await readUnder(ctx)).toEqual([1, 1, 1, 1, 2, 2, 2, 2]);
  });

  test("counts a sweep that came in meanwhile, and one of a program that chose the mask", async () => {
    const ctx = await makeMember(database, "engineer");
    const { maskId, place, job } = await revised(ctx, 2);
    await recomputeMask(tools(turns(1)), job);
    await importLevels(ctx, place, levelsOf(21));
    const other = await makePlace(ctx);
    await importLevels(ctx, other, levelsOf(22));
    await setProgramMasks(ctx, { programId: other.programId, maskIds: [maskId] });
    await runJobs(database);
    expect(await readRecomputation(ctx, maskId)).toMatchObject({
      isInForce: true,
      total: 4,
      done: 4,
    });
  });

  test("never puts a revision in force that a later one took the place of", async () => {
    const ctx = await makeMember(database, "engineer");
    const { maskId, job } = await revised(ctx, 3);
    await recomputeMask(tools(turns(1)), job);
    const later = await reviseMask(ctx, { maskId, mask: flatMask(46) });
    const laterJob = { teamId: ctx.teamId, maskRevisionId: later.maskRevisionId };
    expect(await inForce(ctx, maskId)).toBe(1);
    await recomputeMask(tools(), job);
    expect(await inForce(ctx, maskId)).toBe(1);
    await recomputeMask(tools(), laterJob);
    await recomputeMask(tools(), job);
    await runJobs(database);
    const mask = await readMask(ctx, maskId);
    expect(mask?.revisions.map((r) => [r.revision, r.inForceAt !== null])).toEqual([
      [3, true],
      [2, false],
      [1, true],
    ]);
    expect((await readUnder(ctx)).filter((revision) => revision === 3)).toHaveLength(3);
    const unfinished = await database.owner.query(
      "select 1 from mask_recomputations where team_id = $1 and finished_at is null",
      [ctx.teamId],
    );
    expect(unfinished.rows).toEqual([]);
  });

  test("of one team cannot touch the revision of another", async () => {
    const ours = await makeMember(database, "engineer");
    const theirs = await makeMember(database, "engineer");
    const { maskId, job } = await revised(theirs, 2);
    await recomputeMask(tools(), { ...job, teamId: ours.teamId });
    expect(await readRecomputation(theirs, maskId)).toMatchObject({ isInForce: false, done: 0 });
    expect(await readRecomputation(ours, maskId)).toBeNull();
    expect(await readUnder(theirs)).toEqual([1, 1]);
    await expect(recomputeMask(tools(), { teamId: "x" })).rejects.toThrow();
  });
});

describe("recomputeMaskAgain", () => {
  test("sends the job once more and leaves its row in the audit trail", async () => {
    const ctx = await makeMember(database, "engineer");
    const { maskId, job } = await revised(ctx, 1);
    expect(await recomputeMaskAgain(ctx, { maskId })).toEqual({ maskId, revision: 2 });
    expect(await waitingJobs(database, ctx.teamId)).toEqual([job, job]);
    expect((await auditRows(database, ctx.teamId)).at(-1)).toEqual({
      actor_id: ctx.userId,
      action: "mask.recompute",
      subject_id: maskId,
    });
  });

  test("refuses a manager, another team, and a mask whose revisions are all in force", async () => {
    const ctx = await makeMember(database, "engineer");
    const { maskId } = await revised(ctx, 1);
    const manager = await makeMember(database, "manager", ctx.teamId);
    await expect(recomputeMaskAgain(manager, { maskId })).rejects.toMatchObject({ code: "denied" });
    const foreign = await makeMember(database, "engineer");
    await expect(recomputeMaskAgain(foreign, { maskId })).rejects.toMatchObject({
      code: "not-found",
    });
    await runJobs(database);
    await expect(recomputeMaskAgain(ctx, { maskId })).rejects.toMatchObject({ code: "conflict" });
  });

  test("leaves no job when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    const { maskId, job } = await revised(ctx, 1);
    await withoutAudit(database, async () => {
      await expect(recomputeMaskAgain(ctx, { maskId })).rejects.toThrow();
    });
    expect(await waitingJobs(database, ctx.teamId)).toEqual([job]);
  });
});
