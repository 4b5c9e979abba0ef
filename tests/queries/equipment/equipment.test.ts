import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { editBench } from "@/lib/commands/bench/edit-bench";
import { reviseSignalPath } from "@/lib/commands/bench/revise-signal-path";
import { archiveEquipment } from "@/lib/commands/equipment/archive-equipment";
import { withdrawCalibration } from "@/lib/commands/equipment/withdraw-calibration";
import { readBench } from "@/lib/queries/bench/read-bench";
import { readBenchQuality } from "@/lib/queries/bench/read-bench-quality";
import { listEquipment } from "@/lib/queries/equipment/list-equipment";
import { listEquipmentChoices } from "@/lib/queries/equipment/list-equipment-choices";
import { readCertificate } from "@/lib/queries/equipment/read-certificate";
import { readEquipment } from "@/lib/queries/equipment/read-equipment";
import { ANTENNA, BENCH, benchOf } from "../../commands/bench/arrange";
import { CABLE, calibrationOf, CERTIFICATE, equipmentOf } from "../../commands/equipment/arrange";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

describe("listEquipment", () => {
  test("puts what is due first, by the newest calibration that was not withdrawn", async () => {
    const ctx = await makeMember(database, "engineer");
    const due = async (name: string, dueOn: string | null) => {
      const equipmentId = await equipmentOf(ctx, { name });
      await calibrationOf(ctx, equipmentId, { calibratedOn: "2025-01-01", dueOn });
      return equipmentId;
    };
    await equipmentOf(ctx, { name: "Never" });
    await due("Undated", null);
    await due("Good", "2027-06-01");
    await due("Late", "2026-11-30");
    await due("Later", "2026-06-01");
    await due("Soon", "2026-12-01");
    const mended = await due("Mended", "2026-01-01");
    const mistake = await calibrationOf(ctx, mended, { calibratedOn: "2026-02-01" });
    const states = async () =>
      (await listEquipment(ctx, "2026-12-01")).map((e) => [e.name, e.state]);
    expect((await states()).find(([name]) => name === "Mended")?.[1]).toBe("in-date");
    await withdrawCalibration(ctx, { equipmentId: mended, calibrationId: mistake });
    expect(await states()).toEqual([
      ["Mended", "overdue"],
      ["Later", "overdue"],
      ["Late", "overdue"],
      ["Soon", "due-soon"],
      ["Never", "uncalibrated"],
      ["Undated", "undated"],
      ["Good", "in-date"],
    ]);
    const foreign = await makeMember(database, "engineer");
    expect(await listEquipment(foreign, "2026-12-01")).toEqual([]);
  });

  test("names the benches that rely on a piece, by their current signal path", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    const antennaId = await equipmentOf(ctx, { kind: "antenna", name: "Mast antenna" });
    const instrumentId = await equipmentOf(ctx);
    await editBench(ctx, { ...BENCH, benchId, instrumentId });
    const path = (...transducers: object[]) => ({ benchId, impedanceOhm: 50, transducers });
    await reviseSignalPath(ctx, path({ ...ANTENNA, equipmentId: antennaId }));
    const uses = async () =>
      (await listEquipment(ctx, "2026-12-01")).map((e) => [e.name, e.uses.map((u) => u.as)]);
    expect(await uses()).toEqual([
      ["Analyzer", ["instrument"]],
      ["Mast antenna", ["signal path"]],
    ]);
    await reviseSignalPath(ctx, path());
    expect(await uses()).toEqual([
      ["Analyzer", ["instrument"]],
      ["Mast antenna", []],
    ]);
  });
});

describe("listEquipmentChoices", () => {
  test("offers what is not archived, with its newest calibration", async () => {
    const ctx = await makeMember(database, "engineer");
    const cable = await equipmentOf(ctx, CABLE);
    const table = { text: "30\t0.5\n1000\t2", frequencyUnitHz: 1e6 };
    await calibrationOf(ctx, cable, { calibratedOn: "2026-05-01", dueOn: null, table });
    await calibrationOf(ctx, cable, { calibratedOn: "2025-05-01" });
    await equipmentOf(ctx, { name: "Bare" });
    await archiveEquipment(ctx, { equipmentId: await equipmentOf(ctx, { name: "Gone" }) });
    expect(await listEquipmentChoices(ctx)).toMatchObject([
      { name: "Bare", calibratedOn: null, factors: null },
      { name: "Reed cable", calibratedOn: "2026-05-01", dueOn: null, factors: [{}, {}] },
    ]);
  });
});

describe("readEquipment and readCertificate", () => {
  test("stay in their team and find nothing under an address that is no id", async () => {
    const ctx = await makeMember(database, "engineer");
    const equipmentId = await equipmentOf(ctx);
    const with_ = await calibrationOf(ctx, equipmentId, { certificate: CERTIFICATE });
    const without = await calibrationOf(ctx, equipmentId);
    const liaison = { ...(await makeMember(database, "liaison", ctx.teamId)), files: ctx.files };
    expect(await readCertificate(liaison, equipmentId, with_)).not.toBeNull();
    expect(await readCertificate(ctx, equipmentId, without)).toBeNull();
    const other = await equipmentOf(ctx, { name: "Other" });
    expect(await readCertificate(ctx, other, with_)).toBeNull();
    const foreign = { ...(await makeMember(database, "engineer")), files: ctx.files };
    expect(await readCertificate(foreign, equipmentId, with_)).toBeNull();
    expect(await readEquipment(foreign, equipmentId)).toBeNull();
    expect(await readEquipment(ctx, "' or 1")).toBeNull();
    expect(await readCertificate(ctx, equipmentId, "x")).toBeNull();
  });

  test("refuse to hand over a certificate that storage lost or changed", async () => {
    const ctx = await makeMember(database, "engineer");
    const equipmentId = await equipmentOf(ctx);
    const calibrationId = await calibrationOf(ctx, equipmentId, { certificate: CERTIFICATE });
    const files = (bytes: Uint8Array | null) => ({ put: ctx.files.put, get: async () => bytes });
    for (const bytes of [null, new Uint8Array([1])]) {
      await expect(
        readCertificate({ ...ctx, files: files(bytes) }, equipmentId, calibrationId),
      ).rejects.toThrow(/storage/);
    }
  });
});

describe("readBenchQuality", () => {
  test("tells where the path lags behind the calibrations on record", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    const equipmentId = await equipmentOf(ctx, { kind: "antenna", name: "Mast antenna" });
    await calibrationOf(ctx, equipmentId, { calibratedOn: ANTENNA.calibratedOn });
    await reviseSignalPath(ctx, {
      benchId,
      impedanceOhm: 50,
      transducers: [{ ...ANTENNA, equipmentId }],
    });
    const path = (await readBench(ctx, benchId))?.revisions[0]?.content;
    if (!path) throw new Error("no path");
    const gaps = async () => (await readBenchQuality(ctx, benchId, path))?.gaps;
    expect(await gaps()).toEqual([]);
    await calibrationOf(ctx, equipmentId, { calibratedOn: "2026-11-01", dueOn: null });
    expect(await gaps()).toMatchObject([{ place: 0, reason: "newer", newestOn: "2026-11-01" }]);
    const foreign = await makeMember(database, "engineer");
    expect(await readBenchQuality(foreign, benchId, path)).toBeNull();
  });
});
