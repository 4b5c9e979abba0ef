import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { archiveBench } from "@/lib/commands/bench/archive-bench";
import { editBench } from "@/lib/commands/bench/edit-bench";
import { reviseBudget } from "@/lib/commands/bench/revise-budget";
import { setGuardRule } from "@/lib/commands/bench/set-guard-rule";
import { readBenchQuality } from "@/lib/queries/bench/read-bench-quality";
import type { Context } from "@/lib/auth/context";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { BENCH, benchOf } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const LINE = {
  name: "Antenna factor",
  value: 7,
  distribution: "normal",
  sensitivity: 1,
  degreesOfFreedom: null,
  observations: null,
};
const budget = (benchId: string, change: object = {}) => ({
  benchId,
  title: "Loft, 30 MHz to 1 GHz",
  lines: [LINE],
  reference: "oats-sac-30m-1g",
  ...change,
});
const PATH = { version: 1, impedanceOhm: 50, transducers: [] } as const;
const quality = (ctx: Context, benchId: string) =>
  readBenchQuality(ctx, benchId, { ...PATH, transducers: [] });
const rule = (benchId: string, guardRule: string, guardDb: number | null = null) => ({
  benchId,
  guardRule,
  guardDb,
});

describe("reviseBudget", () => {
  test("adds revisions and leaves the guard of a stated rule alone", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    expect(await reviseBudget(ctx, budget(benchId))).toEqual({
      benchId,
      revision: 1,
      guardDb: 2.5,
    });
    await reviseBudget(ctx, budget(benchId, { basedOnRevision: 1, lines: [LINE, LINE] }));
    const found = await quality(ctx, benchId);
    expect(found?.budgets.map((b) => [b.revision, b.content.lines.length])).toEqual([
      [2, 2],
      [1, 1],
    ]);
    expect(found).toMatchObject({ guardRule: "stated", guardDb: 2.5 });
    expect((await auditRows(database, ctx.teamId)).at(-1)).toEqual({
      actor_id: ctx.userId,
      action: "bench.revise-budget",
      subject_id: benchId,
    });
  });

  test("puts the guard that the rule computes in force", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    await reviseBudget(ctx, budget(benchId));
    await setGuardRule(ctx, rule(benchId, "excess"));
    expect(await quality(ctx, benchId)).toMatchObject({ guardRule: "excess", guardDb: 0.7 });
    await reviseBudget(ctx, budget(benchId, { lines: [{ ...LINE, value: 8 }] }));
    expect(await quality(ctx, benchId)).toMatchObject({ guardDb: 1.7 });
    await setGuardRule(ctx, rule(benchId, "expanded"));
    expect(await quality(ctx, benchId)).toMatchObject({ guardRule: "expanded", guardDb: 8 });
    await expect(reviseBudget(ctx, budget(benchId, { lines: [] }))).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { lines: expect.any(String) },
    });
    await setGuardRule(ctx, rule(benchId, "none"));
    expect(await quality(ctx, benchId)).toMatchObject({ guardRule: "none", guardDb: 0 });
    await expect(reviseBudget(ctx, budget(benchId, { lines: [] }))).resolves.toBeDefined();
  });

  test.each<[string, object, string]>([
    ["no distribution", { distribution: null }, "distribution"],
    ["a distribution that is none", { distribution: "flat" }, "distribution"],
    ["no value", { value: null }, "value"],
    ["a value that is no number", { value: Number.NaN }, "value"],
    ["a negative value", { value: -1 }, "value"],
    ["an endless sensitivity", { sensitivity: Infinity }, "sensitivity"],
    ["type A of one observation", { distribution: "type-a", observations: 1 }, "observations"],
    ["no name", { name: " " }, "name"],
  ])("refuses %s at its line, and stores nothing", async (_, change, field) => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    await expect(
      reviseBudget(ctx, budget(benchId, { lines: [LINE, { ...LINE, ...change }] })),
    ).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { [`lines.1.${field}`]: expect.any(String) },
    });
    expect((await quality(ctx, benchId))?.budgets).toEqual([]);
  });

  test("does not take a guard that leaves no margin", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    await reviseBudget(ctx, budget(benchId));
    await setGuardRule(ctx, rule(benchId, "expanded"));
    await expect(
      reviseBudget(ctx, budget(benchId, { lines: [{ ...LINE, value: 70 }] })),
    ).rejects.toMatchObject({ fieldErrors: { lines: expect.stringContaining("40 dB") } });
    expect(await quality(ctx, benchId)).toMatchObject({ guardDb: 7 });
  });

  test("gives two that arrive at once a number each, and refuses one that came too late", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    const made = await Promise.all([
      reviseBudget(ctx, budget(benchId, { title: "Port" })),
      reviseBudget(ctx, budget(benchId, { title: "Starboard" })),
    ]);
    expect(made.map((m) => m.revision).sort()).toEqual([1, 2]);
    await expect(reviseBudget(ctx, budget(benchId, { basedOnRevision: 1 }))).rejects.toMatchObject({
      code: "conflict",
      message: expect.stringContaining("Revision 2"),
    });
    const now = (await quality(ctx, benchId))?.budgets[0]?.content;
    await expect(reviseBudget(ctx, { benchId, ...now })).rejects.toMatchObject({
      message: "Nothing differs from the current revision.",
    });
  });

  test("refuses a manager, another team and an archived bench, and needs its audit row", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    const manager = await makeMember(database, "manager", ctx.teamId);
    await expect(reviseBudget(manager, budget(benchId))).rejects.toMatchObject({ code: "denied" });
    const foreign = await makeMember(database, "engineer");
    await expect(reviseBudget(foreign, budget(benchId))).rejects.toMatchObject({
      code: "not-found",
    });
    await withoutAudit(database, async () => {
      await expect(reviseBudget(ctx, budget(benchId))).rejects.toThrow();
    });
    await archiveBench(ctx, { benchId });
    await expect(reviseBudget(ctx, budget(benchId))).rejects.toMatchObject({ code: "conflict" });
    expect((await quality(ctx, benchId))?.budgets).toEqual([]);
  });
});

describe("setGuardRule", () => {
  test("states a guard, and editing the bench may then change it but not before", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    await setGuardRule(ctx, rule(benchId, "none"));
    await expect(editBench(ctx, { ...BENCH, benchId, guardDb: 3 })).rejects.toMatchObject({
      code: "conflict",
      fieldErrors: { guardDb: expect.any(String) },
    });
    await editBench(ctx, { ...BENCH, benchId, guardDb: undefined, name: "Renamed" });
    expect(await quality(ctx, benchId)).toMatchObject({ guardRule: "none", guardDb: 0 });
    await setGuardRule(ctx, rule(benchId, "stated", 4));
    await editBench(ctx, { ...BENCH, benchId, guardDb: 3 });
    expect(await quality(ctx, benchId)).toMatchObject({ guardRule: "stated", guardDb: 3 });
    const actions = (await auditRows(database, ctx.teamId)).map((row) => row.action);
    expect(actions.filter((a) => a === "bench.set-guard-rule")).toHaveLength(2);
  });

  test("refuses a computed rule without its budget or its measurement", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    const refusal = { code: "invalid", fieldErrors: { guardRule: expect.any(String) } };
    await expect(setGuardRule(ctx, rule(benchId, "expanded"))).rejects.toMatchObject(refusal);
    await reviseBudget(ctx, budget(benchId, { lines: [], reference: null }));
    await expect(setGuardRule(ctx, rule(benchId, "expanded"))).rejects.toMatchObject(refusal);
    await reviseBudget(ctx, budget(benchId, { reference: null }));
    await expect(setGuardRule(ctx, rule(benchId, "excess"))).rejects.toMatchObject(refusal);
    expect(await quality(ctx, benchId)).toMatchObject({ guardRule: "stated", guardDb: 2.5 });
  });

  test("refuses a stated rule without a number, and what is in force already", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    await expect(setGuardRule(ctx, rule(benchId, "stated"))).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { guardDb: expect.any(String) },
    });
    await expect(setGuardRule(ctx, rule(benchId, "stated", 2.5))).rejects.toMatchObject({
      code: "conflict",
    });
  });

  test("refuses a liaison, another team and an archived bench, and needs its audit row", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    const none = rule(benchId, "none");
    const liaison = await makeMember(database, "liaison", ctx.teamId);
    await expect(setGuardRule(liaison, none)).rejects.toMatchObject({ code: "denied" });
    const foreign = await makeMember(database, "engineer");
    await expect(setGuardRule(foreign, none)).rejects.toMatchObject({ code: "not-found" });
    await withoutAudit(database, async () => {
      await expect(setGuardRule(ctx, none)).rejects.toThrow();
    });
    await archiveBench(ctx, { benchId });
    await expect(setGuardRule(ctx, none)).rejects.toMatchObject({ code: "conflict" });
    expect(await quality(ctx, benchId)).toMatchObject({ guardRule: "stated", guardDb: 2.5 });
  });
});
