import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { createBench } from "@/lib/commands/bench/create-bench";
import { reviseSignalPath } from "@/lib/commands/bench/revise-signal-path";
import { listBenches } from "@/lib/queries/bench/list-benches";
import { readBench } from "@/lib/queries/bench/read-bench";
import { readFactorTable } from "@/lib/queries/bench/read-factor-table";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { ANTENNA, BENCH } from "../../commands/bench/arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

describe("listBenches", () => {
  test("counts the current revision's calibrations as of the date, which itself is not overdue", async () => {
    const ctx = await makeMember(database, "engineer");
    const { benchId } = await createBench(ctx, BENCH);
    await createBench(ctx, { ...BENCH, name: "Attic" });
    const due = (name: string, dueOn: string | null) => ({
      ...ANTENNA,
      kind: "cable",
      name,
      dueOn,
    });
    await reviseSignalPath(ctx, {
      benchId,
      impedanceOhm: 50,
      transducers: [due("Old", "2026-03-01")],
    });
    await reviseSignalPath(ctx, {
      benchId,
      impedanceOhm: 50,
      transducers: [due("A", "2026-06-30"), due("B", "2026-07-01"), due("C", null)],
    });
    const on = async (date: string) =>
      (await listBenches(ctx, date)).map((b) => [
        b.name,
        b.revision,
        b.transducers,
        b.overdue,
        b.undated,
      ]);
    expect(await on("2026-06-30")).toEqual([
      ["Attic", 1, 0, 0, 0],
      ["Loft", 3, 3, 0, 1],
    ]);
    expect(await on("2026-07-01")).toEqual([
      ["Attic", 1, 0, 0, 0],
      ["Loft", 3, 3, 1, 1],
    ]);
    const liaison = await makeMember(database, "liaison", ctx.teamId);
    expect(await listBenches(liaison, "2026-07-01")).toHaveLength(2);
    const foreign = await makeMember(database, "engineer");
    expect(await listBenches(foreign, "2026-07-01")).toEqual([]);
  });
});

describe("readBench", () => {
  test("finds nothing under an address that is no id", async () => {
    const ctx = await makeMember(database, "engineer");
    for (const id of ["new", "' or 1", "-".repeat(36)]) expect(await readBench(ctx, id)).toBeNull();
  });
});

describe("readFactorTable", () => {
  test("reads a table with its header's unit and refuses one that is far too long", async () => {
    const ctx = await makeMember(database, "engineer");
    const text = "Frequency (MHz),Factor (dB/m)\n30,18.5\n1000,24.1\n";
    expect(await readFactorTable(ctx, { text, frequencyUnitHz: null })).toEqual({
      ok: true,
      factors: ANTENNA.factors,
    });
    const long = { text: "1\t1\n".repeat(200_000), frequencyUnitHz: 1 };
    await expect(readFactorTable(ctx, long)).rejects.toMatchObject({ code: "invalid" });
  });
});
