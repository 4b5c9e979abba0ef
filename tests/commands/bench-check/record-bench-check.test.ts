import { createHash } from "node:crypto";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { archiveBenchCheck } from "@/lib/commands/bench-check/archive-bench-check";
import { recordBenchCheck } from "@/lib/commands/bench-check/record-bench-check";
import { fileKey } from "@/lib/commands/file/store-file";
import type { CommandError } from "@/lib/commands/result";
import { readBenchCheck } from "@/lib/queries/bench-check/read-bench-check";
import { auditRows } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { addedDb, csvOf, makeBench, text } from "../../support/sweeps";
import { checkInput, combOf, referenceInput } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

async function makeLoft(role: "engineer" | "admin" = "engineer") {
  const ctx = await makeMember(database, role);
  return { ctx, benchId: await makeBench(ctx, "Loft") };
}

async function counts(teamId: string) {
  const count = async (table: string) =>
    Number(
      (await database.owner.query(`select count(*) from ${table} where team_id = $1`, [teamId]))
        .rows[0].count,
    );
  return { checks: await count("bench_checks"), files: await count("stored_files") };
}

/** The refusal of a check that should not have been stored. */
async function refusalOf(work: Promise<unknown>): Promise<CommandError> {
  return work.then(
    () => {
      throw new Error("It was stored.");
    },
    (error: CommandError) => error,
  );
}

describe("recordBenchCheck", () => {
  test("stores a reference with its lines after the signal path, and its bytes", async () => {
    const { ctx, benchId } = await makeLoft();
    const { checkId, ...drift } = await recordBenchCheck(ctx, referenceInput(benchId));
    expect(drift).toEqual({ driftMeanDb: null, driftWorstDb: null });
    const check = await readBenchCheck(ctx, benchId, checkId);
    expect(check).toMatchObject({ isReference: true, reference: null, cautions: [] });
    expect(check?.content).toMatchObject({
      unit: "dBuV/m",
      detector: "peak",
      rbwHz: 120e3,
      stepHz: 10e6,
      missingHz: [],
    });
    const lines = check?.content.lines ?? [];
    expect(lines.map((line) => line.frequencyHz / 1e6)).toEqual([60, 110, 160, 210, 260]);
    [60, 58, 56, 54, 52].forEach((level, i) => {
      const line = lines[i];
      expect(line?.levelDb).toBeCloseTo(level + addedDb(line?.frequencyHz ?? 0), 5);
    });
    const sha256 = createHash("sha256").update(combOf()).digest("hex");
    const kept = await ctx.files.get(fileKey(ctx.teamId, sha256));
    expect(Buffer.from(kept ?? []).equals(Buffer.from(combOf()))).toBe(true);
  });

  test("gives a check its drift from the reference, line by line, with an audit row", async () => {
    const { ctx, benchId } = await makeLoft();
    const reference = await recordBenchCheck(ctx, referenceInput(benchId));
    const bytes = combOf({ 3: 60.5, 8: 58, 13: 53.5, 18: 54, 23: 53 });
    const found = await recordBenchCheck(ctx, checkInput(benchId, bytes));
    // +0.5, 0, −2.5, 0, +1: mean −0.2.
    expect(found.driftWorstDb).toBeCloseTo(-2.5, 4);
    expect(found.driftMeanDb).toBeCloseTo(-0.2, 4);
    const check = await readBenchCheck(ctx, benchId, found.checkId);
    expect(check?.reference).toEqual({
      id: reference.checkId,
      measuredOn: "2026-06-01",
      archived: false,
    });
    const drifts = check?.content.lines.map((line) => line.driftDb) ?? [];
    expect(drifts).toHaveLength(5);
    [0.5, 0, -2.5, 0, 1].forEach((drift, i) => expect(drifts[i]).toBeCloseTo(drift, 4));
    const rows = (await auditRows(database, ctx.teamId)).slice(-2);
    expect(rows).toEqual([
      { actor_id: ctx.userId, action: "bench-check.record", subject_id: reference.checkId },
      { actor_id: ctx.userId, action: "bench-check.record", subject_id: found.checkId },
    ]);
  });

  test("compares with the newest open reference of the source on the bench, whatever its case", async () => {
    const { ctx, benchId } = await makeLoft();
    const other = await makeBench(ctx, "Attic");
    await recordBenchCheck(ctx, referenceInput(benchId));
    const newer = await recordBenchCheck(
      ctx,
      referenceInput(benchId, combOf({ 3: 61 }), { measuredOn: "2026-06-03" }),
    );
    await recordBenchCheck(
      ctx,
      referenceInput(benchId, combOf({ 3: 40 }), { source: "Noise", measuredOn: "2026-06-04" }),
    );
    await recordBenchCheck(
      ctx,
      referenceInput(other, combOf({ 3: 40 }), { measuredOn: "2026-06-04" }),
    );
    const check = (level: number) =>
      recordBenchCheck(
        ctx,
        checkInput(benchId, combOf({ 3: level }), {
          source: "comb 50 mhz",
          measuredOn: "2026-06-05",
        }),
      );
    expect((await check(62)).driftWorstDb).toBeCloseTo(1, 4);
    await archiveBenchCheck(ctx, { checkId: newer.checkId });
    expect((await check(62.5)).driftWorstDb).toBeCloseTo(2.5, 4);
  });

  test("refuses a check of a source without a reference, and names those that have one", async () => {
    const { ctx, benchId } = await makeLoft();
    const first = await refusalOf(recordBenchCheck(ctx, checkInput(benchId, combOf())));
    expect(first.fieldErrors.source).toContain('no reference of "Comb 50 MHz"');
    await recordBenchCheck(ctx, referenceInput(benchId, combOf(), { source: "Comb 100 MHz" }));
    const before = await counts(ctx.teamId);
    const error = await refusalOf(recordBenchCheck(ctx, checkInput(benchId, combOf({ 3: 61 }))));
    expect(error.fieldErrors.source).toContain('only of "Comb 100 MHz"');
    expect(await counts(ctx.teamId)).toEqual(before);
  });

  test.each([
    ["another RBW", { rbwHz: 9e3 }, {}, "rbwHz", "RBW of 120.0 kHz, not 9.000 kHz"],
    ["another detector", {}, { detector: "average" }, "file", "detector is average"],
    [
      "another unit",
      { corrected: true },
      {},
      "file",
      "levels are in dBµV, those of the reference in dBµV/m",
    ],
  ])("refuses %s than the reference's, and says which", async (_, change, table, field, words) => {
    const { ctx, benchId } = await makeLoft();
    await recordBenchCheck(ctx, referenceInput(benchId));
    const before = await counts(ctx.teamId);
    const error = await refusalOf(
      recordBenchCheck(ctx, checkInput(benchId, combOf({ 3: 61 }, table), change)),
    );
    expect(error.code).toBe("conflict");
    expect(error.fieldErrors[field]).toContain(words);
    expect(Object.keys(error.fieldErrors)).toEqual([field]);
    expect(await counts(ctx.teamId)).toEqual(before);
  });

  test("refuses the same bytes again: their drift would be zero whatever the bench does", async () => {
    const { ctx, benchId } = await makeLoft();
    const { checkId } = await recordBenchCheck(ctx, referenceInput(benchId));
    const again = () => recordBenchCheck(ctx, referenceInput(benchId));
    const error = await refusalOf(recordBenchCheck(ctx, checkInput(benchId, combOf())));
    expect(error.fieldErrors.file).toContain("Comb 50 MHz of 2026-06-01");
    await archiveBenchCheck(ctx, { checkId });
    await expect(again()).resolves.toMatchObject({ driftWorstDb: null });
  });

  test("refuses a day that is still to come, by the database's calendar", async () => {
    const { ctx, benchId } = await makeLoft();
    const { rows } = await database.owner.query(
      "select current_date::text as today, (current_date + 1)::text as tomorrow",
    );
    const { today, tomorrow } = rows[0];
    const on = (measuredOn: string) =>
      recordBenchCheck(ctx, referenceInput(benchId, combOf(), { measuredOn }));
    expect((await refusalOf(on(tomorrow))).fieldErrors).toEqual({
      measuredOn: "This day is still to come.",
    });
    expect(await counts(ctx.teamId)).toEqual({ checks: 0, files: 0 });
    await expect(on(today)).resolves.toMatchObject({ driftWorstDb: null });
  });

  test("puts what the file leaves open at the file, and takes it once it is answered", async () => {
    const { ctx, benchId } = await makeLoft();
    const open = text(
      `Frequency (MHz),Level\n${Array.from({ length: 28 }, (_, i) => `${30 + i * 10},${i === 9 ? 60 : 20}`).join("\n")}\n`,
    );
    const error = await refusalOf(recordBenchCheck(ctx, referenceInput(benchId, open)));
    expect(error.code).toBe("invalid");
    expect(error.fieldErrors.file).toMatch(/unit/i);
    expect(await counts(ctx.teamId)).toEqual({ checks: 0, files: 0 });
    const answers = { unit: "dBuV", detector: "peak" };
    const { checkId } = await recordBenchCheck(ctx, referenceInput(benchId, open, { answers }));
    const check = await readBenchCheck(ctx, benchId, checkId);
    expect(check?.content.lines.map((line) => line.frequencyHz)).toEqual([120e6]);
  });

  test("refuses an RBW that the file itself contradicts, and takes one that it rounds", async () => {
    const { ctx, benchId } = await makeLoft();
    const stating = (rbw: string) => text(`RBW,${rbw}\n${new TextDecoder().decode(combOf())}`);
    const error = await refusalOf(recordBenchCheck(ctx, referenceInput(benchId, stating("9 kHz"))));
    expect(error.fieldErrors).toEqual({ rbwHz: "The file itself states an RBW of 9.000 kHz." });
    expect(await counts(ctx.teamId)).toEqual({ checks: 0, files: 0 });
    const rounded = recordBenchCheck(ctx, referenceInput(benchId, stating("119.9 kHz")));
    await expect(rounded).resolves.toMatchObject({ driftWorstDb: null });
  });

  test("asks which trace it is when the file has several", async () => {
    const { ctx, benchId } = await makeLoft();
    const rows = Array.from(
      { length: 28 },
      (_, i) => `${30 + i * 10},20,${i === 9 ? 60 : 20}`,
    ).join("\n");
    const two = text(`Frequency (MHz),Floor (dBuV) peak,Comb (dBuV) peak\n${rows}\n`);
    const error = await refusalOf(recordBenchCheck(ctx, referenceInput(benchId, two)));
    expect(error.fieldErrors.traceIndex).toContain("2 traces");
    const gone = await refusalOf(
      recordBenchCheck(ctx, referenceInput(benchId, two, { traceIndex: 2 })),
    );
    expect(gone.fieldErrors.traceIndex).toContain("no such trace");
    const { checkId } = await recordBenchCheck(
      ctx,
      referenceInput(benchId, two, { traceIndex: 1 }),
    );
    expect((await readBenchCheck(ctx, benchId, checkId))?.content.lines).toHaveLength(1);
  });

  test("refuses a sweep without a line as a reference, and one of another span as a check", async () => {
    const { ctx, benchId } = await makeLoft();
    const flat = csvOf(Array.from({ length: 28 }, () => 20));
    const none = await refusalOf(recordBenchCheck(ctx, referenceInput(benchId, flat)));
    expect(none.fieldErrors.file).toContain("No line stands 10 dB out");
    await recordBenchCheck(ctx, referenceInput(benchId));
    const elsewhere = combOf({}, { startMhz: 400 });
    const span = await refusalOf(recordBenchCheck(ctx, checkInput(benchId, elsewhere)));
    expect(span.fieldErrors.file).toContain("None of the 5 lines");
    expect((await counts(ctx.teamId)).checks).toBe(1);
  });

  test("says how much of a reference without a line lies inside the factor tables", async () => {
    const { ctx, benchId } = await makeLoft();
    const refuseAt = async (startMhz: number) =>
      (await refusalOf(recordBenchCheck(ctx, referenceInput(benchId, combOf({}, { startMhz })))))
        .fieldErrors.file;
    expect(await refuseAt(2000)).toContain("All of this sweep lies outside");
    expect(await refuseAt(300)).toContain("Of this sweep only 300.0 MHz lies inside");
    expect((await counts(ctx.teamId)).checks).toBe(0);
  });

  test("a line outside the factor tables is missing and named, not zero", async () => {
    const { ctx, benchId } = await makeLoft();
    await recordBenchCheck(ctx, referenceInput(benchId));
    // 30 to 210 MHz: the line at 260 MHz is not swept.
    const short = csvOf(
      Array.from({ length: 20 }, (_, i) => ({ 3: 60, 8: 58, 13: 56, 18: 54 })[i] ?? 20),
    );
    const { checkId, driftWorstDb } = await recordBenchCheck(ctx, checkInput(benchId, short));
    expect(driftWorstDb).toBeCloseTo(0, 6);
    const check = await readBenchCheck(ctx, benchId, checkId);
    expect(check?.content.missingHz).toEqual([260e6]);
    expect(check?.content.lines).toHaveLength(4);
  });

  test("refuses noise in which thousands of maxima stand out", async () => {
    const { ctx, benchId } = await makeLoft();
    const noise = csvOf(
      Array.from({ length: 5001 }, (_, i) => (i % 2 === 0 ? 20 : 40)),
      { stepMhz: 0.05 },
    );
    const error = await refusalOf(
      recordBenchCheck(ctx, referenceInput(benchId, noise, { rbwHz: 9e3 })),
    );
    expect(error.fieldErrors.file).toContain("2500 maxima");
  });

  test("refuses fields that say nothing", async () => {
    const { ctx, benchId } = await makeLoft();
    const error = await refusalOf(
      recordBenchCheck(
        ctx,
        checkInput(benchId, combOf(), { source: " ", rbwHz: Number.NaN, measuredOn: "" }),
      ),
    );
    expect(error.code).toBe("invalid");
    expect(Object.keys(error.fieldErrors).sort()).toEqual(["measuredOn", "rbwHz", "source"]);
  });
});
