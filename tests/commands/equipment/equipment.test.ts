import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { editBench } from "@/lib/commands/bench/edit-bench";
import { reviseSignalPath } from "@/lib/commands/bench/revise-signal-path";
import { archiveEquipment } from "@/lib/commands/equipment/archive-equipment";
import { createEquipment } from "@/lib/commands/equipment/create-equipment";
import { editEquipment } from "@/lib/commands/equipment/edit-equipment";
import { restoreEquipment } from "@/lib/commands/equipment/restore-equipment";
import { listEquipment } from "@/lib/queries/equipment/list-equipment";
import { readEquipment } from "@/lib/queries/equipment/read-equipment";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { ANTENNA, BENCH, benchOf } from "../bench/arrange";
import { ANALYZER, calibrationOf, equipmentOf } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

describe("createEquipment", () => {
  test("stores it without a calibration, and says who did it", async () => {
    const ctx = await makeMember(database, "engineer");
    const { equipmentId } = await createEquipment(ctx, ANALYZER);
    expect(await readEquipment(ctx, equipmentId)).toMatchObject({
      ...ANALYZER,
      archivedAt: null,
      calibrations: [],
      uses: [],
    });
    expect(await auditRows(database, ctx.teamId)).toEqual([
      { actor_id: ctx.userId, action: "equipment.create", subject_id: equipmentId },
    ]);
  });

  test.each(["manager", "liaison"] as const)("refuses a %s", async (role) => {
    const ctx = await makeMember(database, role);
    await expect(createEquipment(ctx, ANALYZER)).rejects.toMatchObject({ code: "denied" });
    expect(await listEquipment(ctx, "2026-12-01")).toEqual([]);
  });

  test("stays in its team, where another may use the same name", async () => {
    const ours = await makeMember(database, "engineer");
    const theirs = await makeMember(database, "engineer");
    const equipmentId = await equipmentOf(ours);
    await equipmentOf(theirs);
    expect(await readEquipment(theirs, equipmentId)).toBeNull();
    await expect(createEquipment(ours, ANALYZER)).rejects.toMatchObject({
      code: "conflict",
      fieldErrors: { name: expect.any(String) },
    });
  });

  test("leaves nothing behind when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    await withoutAudit(database, async () => {
      await expect(createEquipment(ctx, ANALYZER)).rejects.toThrow();
    });
    expect(await listEquipment(ctx, "2026-12-01")).toEqual([]);
  });

  test.each([
    ["kind", "oscillograph"],
    ["name", " "],
    ["inventoryNumber", "x".repeat(81)],
    ["notes", "a\u0000"],
  ])("refuses %s of %j at its field", async (field, value) => {
    const ctx = await makeMember(database, "engineer");
    await expect(createEquipment(ctx, { ...ANALYZER, [field]: value })).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { [field]: expect.any(String) },
    });
  });
});

describe("editEquipment", () => {
  test("changes it and keeps what stood before", async () => {
    const ctx = await makeMember(database, "engineer");
    const equipmentId = await equipmentOf(ctx);
    await editEquipment(ctx, { ...ANALYZER, equipmentId, kind: "cable", name: "Tow line" });
    expect(await readEquipment(ctx, equipmentId)).toMatchObject({
      kind: "cable",
      name: "Tow line",
    });
    const { rows } = await database.owner.query(
      "select detail from audit_events where team_id = $1 and action = 'equipment.edit'",
      [ctx.teamId],
    );
    expect(rows[0].detail).toMatchObject({ from: { name: "Analyzer" }, to: { name: "Tow line" } });
  });

  test("refuses another kind once there is a calibration, or a bench that names it", async () => {
    const ctx = await makeMember(database, "engineer");
    const calibrated = await equipmentOf(ctx);
    await calibrationOf(ctx, calibrated);
    const refusal = { code: "conflict", fieldErrors: { kind: expect.any(String) } };
    await expect(
      editEquipment(ctx, { ...ANALYZER, equipmentId: calibrated, kind: "cable" }),
    ).rejects.toMatchObject(refusal);
    const used = await equipmentOf(ctx, { name: "Second" });
    const benchId = await benchOf(ctx);
    await editBench(ctx, { ...BENCH, benchId, instrumentId: used });
    await expect(
      editEquipment(ctx, { ...ANALYZER, equipmentId: used, name: "Second", kind: "cable" }),
    ).rejects.toMatchObject(refusal);
  });

  test("refuses a manager, another team, a taken name and what is archived", async () => {
    const ctx = await makeMember(database, "engineer");
    const equipmentId = await equipmentOf(ctx);
    const edit = { ...ANALYZER, equipmentId, name: "Renamed" };
    const manager = await makeMember(database, "manager", ctx.teamId);
    await expect(editEquipment(manager, edit)).rejects.toMatchObject({ code: "denied" });
    const foreign = await makeMember(database, "engineer");
    await expect(editEquipment(foreign, edit)).rejects.toMatchObject({ code: "not-found" });
    await equipmentOf(ctx, { name: "Taken" });
    await expect(editEquipment(ctx, { ...edit, name: "Taken" })).rejects.toMatchObject({
      code: "conflict",
      fieldErrors: { name: expect.any(String) },
    });
    await archiveEquipment(ctx, { equipmentId });
    await expect(editEquipment(ctx, edit)).rejects.toMatchObject({ code: "conflict" });
    expect((await readEquipment(ctx, equipmentId))?.name).toBe("Analyzer");
  });

  test("undoes the change when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    const equipmentId = await equipmentOf(ctx);
    await withoutAudit(database, async () => {
      await expect(
        editEquipment(ctx, { ...ANALYZER, equipmentId, name: "Renamed" }),
      ).rejects.toThrow();
    });
    expect((await readEquipment(ctx, equipmentId))?.name).toBe("Analyzer");
  });
});

describe("archiveEquipment and restoreEquipment", () => {
  test("put it away and bring it back, each with its audit row", async () => {
    const ctx = await makeMember(database, "engineer");
    const equipmentId = await equipmentOf(ctx);
    await archiveEquipment(ctx, { equipmentId });
    expect((await readEquipment(ctx, equipmentId))?.archivedAt).toBeInstanceOf(Date);
    await expect(archiveEquipment(ctx, { equipmentId })).rejects.toMatchObject({
      code: "conflict",
    });
    await restoreEquipment(ctx, { equipmentId });
    expect((await readEquipment(ctx, equipmentId))?.archivedAt).toBeNull();
    await expect(restoreEquipment(ctx, { equipmentId })).rejects.toMatchObject({
      code: "conflict",
    });
    expect((await auditRows(database, ctx.teamId)).map((row) => row.action)).toEqual([
      "equipment.create",
      "equipment.archive",
      "equipment.restore",
    ]);
  });

  test("do not put away what stands on a bench, and name the bench", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    const instrumentId = await equipmentOf(ctx);
    const antennaId = await equipmentOf(ctx, { kind: "antenna", name: "Mast antenna" });
    await editBench(ctx, { ...BENCH, benchId, instrumentId });
    await reviseSignalPath(ctx, {
      benchId,
      impedanceOhm: 50,
      transducers: [{ ...ANTENNA, equipmentId: antennaId }],
    });
    for (const equipmentId of [instrumentId, antennaId]) {
      await expect(archiveEquipment(ctx, { equipmentId })).rejects.toMatchObject({
        code: "conflict",
        message: expect.stringContaining("Loft"),
      });
    }
    await reviseSignalPath(ctx, { benchId, impedanceOhm: 50, transducers: [ANTENNA] });
    await expect(archiveEquipment(ctx, { equipmentId: antennaId })).resolves.toBeDefined();
  });

  test.each([
    ["archiveEquipment", archiveEquipment],
    ["restoreEquipment", restoreEquipment],
  ])("%s refuses a liaison and another team, and needs its audit row", async (_, command) => {
    const ctx = await makeMember(database, "engineer");
    const equipmentId = await equipmentOf(ctx);
    if (command === restoreEquipment) await archiveEquipment(ctx, { equipmentId });
    const before = (await readEquipment(ctx, equipmentId))?.archivedAt;
    const liaison = await makeMember(database, "liaison", ctx.teamId);
    await expect(command(liaison, { equipmentId })).rejects.toMatchObject({ code: "denied" });
    const foreign = await makeMember(database, "engineer");
    await expect(command(foreign, { equipmentId })).rejects.toMatchObject({ code: "not-found" });
    await withoutAudit(database, async () => {
      await expect(command(ctx, { equipmentId })).rejects.toThrow();
    });
    expect((await readEquipment(ctx, equipmentId))?.archivedAt).toEqual(before);
  });
});
