import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { inTeam } from "@/db/client";
import { createBench } from "@/lib/commands/bench/create-bench";
import { editBench } from "@/lib/commands/bench/edit-bench";
import { loadBenchQuality } from "@/lib/commands/bench/load-bench-quality";
import { reviseBudget } from "@/lib/commands/bench/revise-budget";
import { reviseSignalPath } from "@/lib/commands/bench/revise-signal-path";
import { archiveEquipment } from "@/lib/commands/equipment/archive-equipment";
import { withdrawCalibration } from "@/lib/commands/equipment/withdraw-calibration";
import { readBench } from "@/lib/queries/bench/read-bench";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { CABLE, calibrationOf, equipmentOf } from "../equipment/arrange";
import { ANTENNA, BENCH, benchOf } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

describe("a bench's instrument", () => {
  test("is named when the bench is made or edited, and stays when an edit leaves it out", async () => {
    const ctx = await makeMember(database, "engineer");
    const instrumentId = await equipmentOf(ctx);
    const { benchId } = await createBench(ctx, { ...BENCH, instrumentId });
    const { impedanceOhm: _, ...edit } = { ...BENCH, benchId };
    await editBench(ctx, edit);
    expect(await readBench(ctx, benchId)).toMatchObject({ instrumentId, checkToleranceDb: 2 });
    await editBench(ctx, { ...edit, instrumentId: null, checkToleranceDb: 1.5 });
    expect(await readBench(ctx, benchId)).toMatchObject({
      instrumentId: null,
      checkToleranceDb: 1.5,
    });
  });

  test("must be an instrument of the team that is not archived", async () => {
    const ctx = await makeMember(database, "engineer");
    const foreign = await makeMember(database, "engineer");
    const archived = await equipmentOf(ctx, { name: "Old analyzer" });
    await archiveEquipment(ctx, { equipmentId: archived });
    const wrong = [archived, await equipmentOf(ctx, CABLE), await equipmentOf(foreign)];
    for (const instrumentId of wrong) {
      await expect(createBench(ctx, { ...BENCH, instrumentId })).rejects.toMatchObject({
        code: "invalid",
        fieldErrors: { instrumentId: expect.any(String) },
      });
    }
  });

  test.each([0, -1, 21, Number.NaN])("refuses a drift allowed of %d dB", async (db) => {
    const ctx = await makeMember(database, "engineer");
    await expect(createBench(ctx, { ...BENCH, checkToleranceDb: db })).rejects.toMatchObject({
      fieldErrors: { checkToleranceDb: expect.any(String) },
    });
  });
});

describe("equipment in a signal path", () => {
  const path = (benchId: string, ...transducers: object[]) => ({
    benchId,
    impedanceOhm: 50,
    transducers,
  });

  test("is kept with the transducer; one without keeps no such key", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    const equipmentId = await equipmentOf(ctx, { kind: "antenna", name: "Mast antenna" });
    await reviseSignalPath(ctx, path(benchId, { ...ANTENNA, equipmentId }));
    await reviseSignalPath(ctx, path(benchId, { ...ANTENNA, equipmentId: null }));
    const revisions = (await readBench(ctx, benchId))?.revisions;
    expect(revisions?.map((r) => r.content.transducers[0])).toEqual([
      ANTENNA,
      { ...ANTENNA, equipmentId },
      undefined,
    ]);
  });

  test("must be the team's, of the same kind, not archived, and in one place", async () => {
    const ctx = await makeMember(database, "engineer");
    const foreign = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    const antenna = { kind: "antenna", name: "Mast antenna" };
    const archived = await equipmentOf(ctx, { kind: "antenna", name: "Old" });
    await archiveEquipment(ctx, { equipmentId: archived });
    const wrong = [await equipmentOf(ctx), await equipmentOf(foreign, antenna), archived];
    for (const equipmentId of wrong) {
      await expect(
        reviseSignalPath(ctx, path(benchId, { ...ANTENNA, equipmentId })),
      ).rejects.toMatchObject({
        code: "invalid",
        fieldErrors: { "transducers.0.equipmentId": expect.any(String) },
      });
    }
    const equipmentId = await equipmentOf(ctx, CABLE);
    const cable = { ...ANTENNA, kind: "cable", equipmentId };
    await expect(
      reviseSignalPath(ctx, path(benchId, cable, { ...cable, name: "Again" })),
    ).rejects.toMatchObject({ fieldErrors: { "transducers.1.equipmentId": expect.any(String) } });
    expect((await readBench(ctx, benchId))?.revisions).toHaveLength(1);
  });

  test("a calibration in the future and a second pick-up are refused at their fields", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    const future = new Date(Date.now() + 2 * 86_400_000).toISOString().slice(0, 10);
    await expect(
      reviseSignalPath(
        ctx,
        path(
          benchId,
          { ...ANTENNA, calibratedOn: future, dueOn: null },
          { ...ANTENNA, name: "Second", kind: "lisn" },
        ),
      ),
    ).rejects.toMatchObject({
      fieldErrors: {
        "transducers.0.calibratedOn": expect.any(String),
        "transducers.1.kind": expect.any(String),
      },
    });
  });
});

describe("loadBenchQuality", () => {
  test("gives the instrument with its newest calibration in force, and the newest budget", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    const load = (onDay?: string) =>
      inTeam(ctx.db, ctx.teamId, (tx) => loadBenchQuality(tx, ctx.teamId, benchId, onDay));
    expect(await load()).toEqual({ instrument: null, budgetId: null });
    const instrumentId = await equipmentOf(ctx);
    await editBench(ctx, { ...BENCH, benchId, instrumentId });
    const bare = { equipmentId: instrumentId, name: "Analyzer", calibratedOn: null, dueOn: null };
    expect(await load()).toEqual({ instrument: bare, budgetId: null });

    await calibrationOf(ctx, instrumentId, { calibratedOn: "2026-06-01", dueOn: null });
    await calibrationOf(ctx, instrumentId, { calibratedOn: "2025-06-01", dueOn: "2026-05-31" });
    const newest = await calibrationOf(ctx, instrumentId, { calibratedOn: "2026-11-01" });
    expect((await load())?.instrument).toMatchObject({ calibratedOn: "2026-11-01" });
    expect((await load("2026-10-31"))?.instrument).toMatchObject({ calibratedOn: "2026-06-01" });
    expect((await load("2026-05-31"))?.instrument).toMatchObject({
      calibratedOn: "2025-06-01",
      dueOn: "2026-05-31",
    });
    expect((await load("2024-01-01"))?.instrument).toEqual(bare);
    await withdrawCalibration(ctx, { equipmentId: instrumentId, calibrationId: newest });
    expect((await load())?.instrument).toEqual({
      ...bare,
      calibratedOn: "2026-06-01",
      dueOn: null,
    });

    const budget = { benchId, title: "", lines: [], reference: null };
    await reviseBudget(ctx, budget);
    await reviseBudget(ctx, { ...budget, title: "Second" });
    const { rows } = await database.owner.query(
      "select id from uncertainty_budgets where bench_id = $1 and revision = 2",
      [benchId],
    );
    expect((await load()).budgetId).toBe(rows[0].id);
  });
});
