import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { archiveEquipment } from "@/lib/commands/equipment/archive-equipment";
import { recordCalibration } from "@/lib/commands/equipment/record-calibration";
import { withdrawCalibration } from "@/lib/commands/equipment/withdraw-calibration";
import { readCertificate } from "@/lib/queries/equipment/read-certificate";
import { readEquipment } from "@/lib/queries/equipment/read-equipment";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { CABLE, CALIBRATION, calibrationOf, CERTIFICATE, equipmentOf } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const table = (text: string, frequencyUnitHz: number | null = 1e6) => ({ text, frequencyUnitHz });
const inDays = (days: number) =>
  new Date(Date.now() + days * 86_400_000).toISOString().slice(0, 10);

describe("recordCalibration", () => {
  test("keeps dates, certificate byte for byte and factors, and says who did it", async () => {
    const ctx = await makeMember(database, "engineer");
    const equipmentId = await equipmentOf(ctx, CABLE);
    const { calibrationId } = await recordCalibration(ctx, {
      ...CALIBRATION,
      equipmentId,
      certificate: CERTIFICATE,
      table: table("30\t0.5\n1000\t2.25"),
    });
    const { certificate: _, table: __, ...said } = CALIBRATION;
    expect((await readEquipment(ctx, equipmentId))?.calibrations).toMatchObject([
      {
        ...said,
        id: calibrationId,
        fileName: "certificate 14.pdf",
        factors: [
          { frequencyHz: 30e6, factorDb: 0.5 },
          { frequencyHz: 1e9, factorDb: 2.25 },
        ],
        recordedBy: "A engineer",
        withdrawnAt: null,
      },
    ]);
    const kept = await readCertificate(ctx, equipmentId, calibrationId);
    expect(kept).toMatchObject({ fileName: "certificate 14.pdf", mediaType: "application/pdf" });
    expect([...(kept?.bytes ?? [])]).toEqual([...CERTIFICATE.bytes]);
    expect((await auditRows(database, ctx.teamId)).at(-1)).toEqual({
      actor_id: ctx.userId,
      action: "equipment.record-calibration",
      subject_id: equipmentId,
    });
  });

  test("takes a calibration of today, without certificate, factors or due date", async () => {
    const ctx = await makeMember(database, "engineer");
    const equipmentId = await equipmentOf(ctx);
    await calibrationOf(ctx, equipmentId, { calibratedOn: inDays(0), dueOn: null });
    expect((await readEquipment(ctx, equipmentId))?.calibrations).toMatchObject([
      { calibratedOn: inDays(0), dueOn: null, fileName: null, factors: null },
    ]);
  });

  test.each<[string, object, string]>([
    ["a date in the future", { calibratedOn: inDays(2), dueOn: null }, "calibratedOn"],
    ["a date that does not exist", { calibratedOn: "2026-02-30" }, "calibratedOn"],
    ["no date", { calibratedOn: "" }, "calibratedOn"],
    ["a due date before the calibration", { dueOn: "2026-01-31" }, "dueOn"],
    [
      "an empty certificate",
      { certificate: { ...CERTIFICATE, bytes: new Uint8Array() } },
      "certificate.bytes",
    ],
    [
      "a certificate that is no file",
      { certificate: { ...CERTIFICATE, bytes: "x" } },
      "certificate.bytes",
    ],
    ["a repeated frequency", { table: table("30\t1\n30\t2\n1000\t3") }, "table"],
    ["one row", { table: table("30\t1") }, "table"],
    ["a table without a unit", { table: table("30\t1\n1000\t2", null) }, "table"],
    ["a negative loss", { table: table("30\t-1\n1000\t2") }, "table"],
    ["a factor out of reach", { table: table("30\t1\n1000\t201") }, "table"],
  ])("refuses %s at its field, and stores nothing", async (_, change, field) => {
    const ctx = await makeMember(database, "engineer");
    const equipmentId = await equipmentOf(ctx, CABLE);
    await expect(
      recordCalibration(ctx, { ...CALIBRATION, equipmentId, ...change }),
    ).rejects.toMatchObject({ code: "invalid", fieldErrors: { [field]: expect.any(String) } });
    expect((await readEquipment(ctx, equipmentId))?.calibrations).toEqual([]);
  });

  test("takes no factor table for an instrument", async () => {
    const ctx = await makeMember(database, "engineer");
    const equipmentId = await equipmentOf(ctx);
    await expect(
      recordCalibration(ctx, { ...CALIBRATION, equipmentId, table: table("30\t1\n1000\t2") }),
    ).rejects.toMatchObject({ fieldErrors: { table: expect.stringContaining("instrument") } });
  });

  test("refuses a manager, another team and what is archived", async () => {
    const ctx = await makeMember(database, "engineer");
    const equipmentId = await equipmentOf(ctx);
    const input = { ...CALIBRATION, equipmentId };
    const manager = await makeMember(database, "manager", ctx.teamId);
    await expect(recordCalibration(manager, input)).rejects.toMatchObject({ code: "denied" });
    const foreign = await makeMember(database, "engineer");
    await expect(recordCalibration(foreign, input)).rejects.toMatchObject({ code: "not-found" });
    await archiveEquipment(ctx, { equipmentId });
    await expect(recordCalibration(ctx, input)).rejects.toMatchObject({ code: "conflict" });
    expect((await readEquipment(ctx, equipmentId))?.calibrations).toEqual([]);
  });

  test("leaves nothing behind when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    const equipmentId = await equipmentOf(ctx);
    await withoutAudit(database, async () => {
      await expect(
        recordCalibration(ctx, { ...CALIBRATION, equipmentId, certificate: CERTIFICATE }),
      ).rejects.toThrow();
    });
    expect((await readEquipment(ctx, equipmentId))?.calibrations).toEqual([]);
    const files = await database.owner.query("select 1 from stored_files where team_id = $1", [
      ctx.teamId,
    ]);
    expect(files.rows).toEqual([]);
  });
});

describe("withdrawCalibration", () => {
  test("takes it out of force, leaves it in the history, and says who did it", async () => {
    const ctx = await makeMember(database, "engineer");
    const equipmentId = await equipmentOf(ctx);
    const calibrationId = await calibrationOf(ctx, equipmentId);
    await withdrawCalibration(ctx, { equipmentId, calibrationId });
    expect((await readEquipment(ctx, equipmentId))?.calibrations).toMatchObject([
      { id: calibrationId, withdrawnAt: expect.any(Date) },
    ]);
    expect((await auditRows(database, ctx.teamId)).at(-1)).toEqual({
      actor_id: ctx.userId,
      action: "equipment.withdraw-calibration",
      subject_id: equipmentId,
    });
    await expect(withdrawCalibration(ctx, { equipmentId, calibrationId })).rejects.toMatchObject({
      code: "conflict",
    });
  });

  test("refuses a liaison, another team, another's calibration, and needs its audit row", async () => {
    const ctx = await makeMember(database, "engineer");
    const equipmentId = await equipmentOf(ctx);
    const calibrationId = await calibrationOf(ctx, equipmentId);
    const input = { equipmentId, calibrationId };
    const liaison = await makeMember(database, "liaison", ctx.teamId);
    await expect(withdrawCalibration(liaison, input)).rejects.toMatchObject({ code: "denied" });
    const foreign = await makeMember(database, "engineer");
    await expect(withdrawCalibration(foreign, input)).rejects.toMatchObject({ code: "not-found" });
    const other = await equipmentOf(ctx, { name: "Other" });
    await expect(
      withdrawCalibration(ctx, { equipmentId: other, calibrationId }),
    ).rejects.toMatchObject({ code: "not-found" });
    await withoutAudit(database, async () => {
      await expect(withdrawCalibration(ctx, input)).rejects.toThrow();
    });
    const kept = (await readEquipment(ctx, equipmentId))?.calibrations[0];
    expect(kept?.withdrawnAt).toBeNull();
  });
});
