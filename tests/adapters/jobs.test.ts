import { afterAll, afterEach, beforeAll, expect, test, vi } from "vitest";
import { sql } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { bossQueue } from "@/lib/adapters/jobs/boss-queue";
import { prepareQueues } from "@/lib/adapters/jobs/prepare-queues";
import { keepWorker, startWorker } from "@/lib/adapters/jobs/worker";
import type { Context } from "@/lib/auth/context";
import { reviseMask } from "@/lib/commands/mask/revise-mask";
import { readRecomputation } from "@/lib/queries/mask/read-recomputation";
import type { TestDatabase } from "../support/database";
import { makeMember, openTestDatabase } from "../support/database";
import { flatMask, importLevels, levelsOf, makePlace } from "../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());
afterEach(() => vi.restoreAllMocks());

async function reviseMasks(ctx: Context, count: number): Promise<string[]> {
  const maskIds: string[] = [];
  for (let i = 0; i < count; i += 1) {
    const place = await makePlace(ctx);
    await importLevels(ctx, place, levelsOf(20), { name: "Sweep" });
    await reviseMask(ctx, { maskId: place.maskId, mask: flatMask(44) });
    maskIds.push(place.maskId);
  }
  return maskIds;
}

async function jobRows(teamId: string) {
  const found = await database.owner.query<{ state: string; retry_limit: number }>(
    "select state, retry_limit from pgboss.job where data->>'teamId' = $1 order by created_on",
    [teamId],
  );
  return found.rows;
}

/** Waits, as long as the test may last, until something is so. */
const until = (look: () => Promise<void>) => vi.waitFor(look, { timeout: 50_000, interval: 200 });

const expectInForce = (ctx: Context, maskIds: string[]) =>
  until(async () => {
    for (const maskId of maskIds) {
      expect(await readRecomputation(ctx, maskId)).toMatchObject({ isInForce: true, done: 1 });
    }
    expect(new Set((await jobRows(ctx.teamId)).map((row) => row.state))).toEqual(
      new Set(["completed"]),
    );
  });

test("a worker takes up what was sent before it started", async () => {
  const ctx = await makeMember(database, "engineer");
  const maskIds = await reviseMasks(ctx, 1);
  expect(await jobRows(ctx.teamId)).toEqual([{ state: "created", retry_limit: 5 }]);
  const worker = await startWorker(database.appUrl);
  try {
    await expectInForce(ctx, maskIds);
  } finally {
    await worker.stop();
  }
});

test("two workers on one database share the jobs", async () => {
  const ctx = await makeMember(database, "engineer");
  const workers = await Promise.all([startWorker(database.appUrl), startWorker(database.appUrl)]);
  try {
    const maskIds = await reviseMasks(ctx, 4);
    await expectInForce(ctx, maskIds);
    expect(await jobRows(ctx.teamId)).toHaveLength(4);
  } finally {
    await Promise.all(workers.map((worker) => worker.stop()));
  }
});

test("a job that fails is logged, told at the mask and kept for another try", async () => {
  const logged = vi.spyOn(console, "error").mockImplementation(() => undefined);
  const ctx = await makeMember(database, "engineer");
  const [maskId = ""] = await reviseMasks(ctx, 1);
  await database.owner.query("update trace_blocks set crc32 = crc32 + 1 where team_id = $1", [
    ctx.teamId,
  ]);
  const worker = await startWorker(database.appUrl);
  try {
    await until(async () => {
      expect(await jobRows(ctx.teamId)).toMatchObject([{ state: "retry" }]);
    });
    expect(await readRecomputation(ctx, maskId)).toMatchObject({
      isInForce: false,
      problem: 'The sweep "Sweep" could not be read; the log of the worker says why.',
    });
    expect(logged).toHaveBeenCalled();
    await database.owner.query("update trace_blocks set crc32 = crc32 - 1 where team_id = $1", [
      ctx.teamId,
    ]);
    await expectInForce(ctx, [maskId]);
  } finally {
    await worker.stop();
  }
});

test("a worker waits for a database that is not ready yet", async () => {
  const logged = vi.spyOn(console, "error").mockImplementation(() => undefined);
  const ctx = await makeMember(database, "engineer");
  const maskIds = await reviseMasks(ctx, 1);
  await database.owner.query("alter schema pgboss rename to away");
  const worker = keepWorker(database.appUrl);
  try {
    await until(() => Promise.resolve(expect(logged).toHaveBeenCalled()));
    await database.owner.query("alter schema away rename to pgboss");
    await expectInForce(ctx, maskIds);
  } finally {
    await worker.stop();
  }
});

test("a worker that is stopped before it could start stays stopped", async () => {
  vi.spyOn(console, "error").mockImplementation(() => undefined);
  const nowhere = new URL(database.appUrl);
  nowhere.pathname = "/neap_nowhere";
  await expect(startWorker(nowhere.toString())).rejects.toThrow();
  await keepWorker(nowhere.toString()).stop();
});

test("a job for a queue that does not exist is refused, not lost", async () => {
  const ctx = await makeMember(database, "engineer");
  const sending = inTeam(ctx.db, ctx.teamId, (tx) => bossQueue.send(tx, "no-such-queue", {}));
  await expect(sending).rejects.toThrow('There is no job queue "no-such-queue".');
});

test("the app uses the queues and cannot make them; preparing them twice changes nothing", async () => {
  const making = database.app.execute(sql`select pgboss.create_queue('own', '{}')`);
  await expect(making).rejects.toMatchObject({ cause: { code: "42501" } });
  const queues = async () =>
    (await database.owner.query("select name, retry_limit, expire_seconds from pgboss.queue")).rows;
  const before = await queues();
  expect(before).toEqual([{ name: "recompute-mask", retry_limit: 5, expire_seconds: 120 }]);
  await prepareQueues(database.ownerUrl);
  expect(await queues()).toEqual(before);
});
