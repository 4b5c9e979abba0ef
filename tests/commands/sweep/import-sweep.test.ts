import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { inTeam } from "@/db/client";
import { reviseSignalPath } from "@/lib/commands/bench/revise-signal-path";
import { createMask } from "@/lib/commands/mask/create-mask";
import { setProgramMasks } from "@/lib/commands/program/set-program-masks";
import { importSweep } from "@/lib/commands/sweep/import-sweep";
import { readSweep } from "@/lib/core/reading/read-sweep";
import { frequencyAt } from "@/lib/core/sweep/axis";
import { loadTraces } from "@/lib/queries/sweep/load-trace";
import { readOriginalFile } from "@/lib/queries/sweep/read-original-file";
import { readSweepDetail } from "@/lib/queries/sweep/read-sweep";
import { auditRows } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import {
  addedDb,
  csvOf,
  flatMask,
  importInput,
  importLevels,
  levelsOf,
  makePlace,
  SETTINGS,
  TRANSDUCERS,
} from "../../support/sweeps";
import { countRows, readingRows } from "./rows";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

/** 20 to 320 MHz: the first point and the last two lie outside the factor tables. */
const WIDE = Array.from({ length: 31 }, (_, i) => (i === 8 ? 41.25 : 20 + (i % 5) / 10));
const wide = () => csvOf(WIDE, { startMhz: 20 });

describe("importSweep", () => {
  test("keeps the file byte for byte, under its own name", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const bytes = wide();
    const { sweepId } = await importSweep(
      ctx,
      importInput(place, bytes, { fileName: "Süd 'A'.csv" }),
    );
    const file = await readOriginalFile(ctx, sweepId);
    expect(file?.fileName).toBe("Süd 'A'.csv");
    expect(Buffer.from(file?.bytes ?? []).equals(Buffer.from(bytes))).toBe(true);
  });

  test("refuses to hand out a file that has changed in storage", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { sweepId } = await importSweep(ctx, importInput(place, wide()));
    const rotten = { ...ctx, files: { ...ctx.files, get: async () => new Uint8Array([1, 2, 3]) } };
    await expect(readOriginalFile(rotten, sweepId)).rejects.toThrow("has changed in storage");
  });

  test("stores the levels of the file plus the factors of the path, and a gap outside a table", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { sweepId } = await importSweep(ctx, importInput(place, wide()));
    const [trace] = await inTeam(ctx.db, ctx.teamId, (tx) => loadTraces(tx, ctx.teamId, sweepId));
    expect(trace?.unit).toBe("dBuV/m");
    expect(trace?.levelsDb).toHaveLength(WIDE.length);
    WIDE.forEach((levelDb, i) => {
      const hz = 20e6 + i * 10e6;
      expect(frequencyAt(trace!.axis, i)).toBeCloseTo(hz, 3);
      const stored = trace?.levelsDb[i] ?? 0;
      if (hz < 30e6 || hz > 300e6) expect(stored, `${hz} Hz`).toBeNaN();
      // Levels are stored as float32, whose step is 4e-6 near 40.
      else expect(stored, `${hz} Hz`).toBeCloseTo(levelDb + addedDb(hz), 5);
    });
    const detail = await readSweepDetail(ctx, sweepId);
    expect(detail?.traces[0]).toMatchObject({
      fileUnit: "dBuV",
      unit: "dBuV/m",
      covered: 28,
      firstHz: 20e6,
      lastHz: 320e6,
    });
  });

  test("restates dBm at the impedance of the path: 107.0 dB up at 50 Ω", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { sweepId } = await importLevels(ctx, place, levelsOf(-80), {}, { unit: "dBm" });
    const [trace] = await inTeam(ctx.db, ctx.teamId, (tx) => loadTraces(tx, ctx.teamId, sweepId));
    // 10 log10(50 Ω · 1 mW / (1 µV)²), computed.
    expect(trace?.levelsDb[7]).toBeCloseTo(-80 + 106.9897 + addedDb(100e6), 3);
  });

  test("holds the sweep against the program's mask: the same as the core and as by hand", async () => {
    const ctx = await makeMember(database, "engineer");
    const mask = flatMask(50);
    const place = await makePlace(ctx, mask);
    const { sweepId, readings } = await importSweep(ctx, importInput(place, wide()));
    // Index 8 is 100 MHz: 41.25 dBµV − 1 dB + 12 dB · log10(100/30) = 46.5245 dBµV/m.
    const marginDb = 50 - 46.5245;
    expect(readings).toEqual([
      { maskTitle: "Loft limit", standing: "clear", marginDb: expect.closeTo(marginDb, 4) },
    ]);
    const [trace] = await inTeam(ctx.db, ctx.teamId, (tx) => loadTraces(tx, ctx.teamId, sweepId));
    const expected = readSweep({
      traces: trace ? [trace] : [],
      settings: SETTINGS,
      mask: { ...mask, key: "loft-limit" },
      guardDb: 2,
      impedanceOhm: 50,
      context: {
        ambientTaken: false,
        calibration: {
          overdue: [],
          unstated: ["the instrument"],
          isDateKnown: true,
          isCorrected: false,
        },
        instrumentLevelsDb: [41.25],
      },
    });
    const detail = await readSweepDetail(ctx, sweepId);
    expect(detail?.readings[0]?.reading).toEqual(
      expect.objectContaining({ ...expected, suspects: expect.anything() }),
    );
    expect(detail?.readings[0]?.reading.lines[0]?.worst).toMatchObject({
      frequencyHz: 100e6,
      marginDb: expect.closeTo(marginDb, 4),
    });
    expect(expected.suspects).toHaveLength(1);
    expect(detail?.readings[0]?.reading.suspects).toMatchObject(expected.suspects);
    const stored = await database.owner.query(
      "select number, sample_hz, level_db, margin_db, trace_position from suspects where team_id = $1",
      [ctx.teamId],
    );
    expect(stored.rows).toEqual([
      {
        number: 1,
        sample_hz: 100e6,
        level_db: expect.closeTo(46.5245, 3),
        margin_db: expect.closeTo(marginDb, 3),
        trace_position: 0,
      },
    ]);
  });

  test("calls a level over the limit over, and one inside the bench's guard inside guard", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const at = async (levelDb: number) =>
      (await importLevels(ctx, place, levelsOf(20, { 7: levelDb }))).readings[0];
    // 5.2745 dB are added at 100 MHz; the guard is 2 dB.
    expect(await at(44.73)).toEqual(expect.objectContaining({ standing: "over" }));
    expect(await at(44.72)).toEqual(expect.objectContaining({ standing: "inside-guard" }));
    expect(await at(42.73)).toEqual(expect.objectContaining({ standing: "inside-guard" }));
    expect(await at(42.72)).toEqual(expect.objectContaining({ standing: "clear" }));
  });

  test("passes a file through unchanged that the instrument had corrected", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const table = { startMhz: 20, unit: "dBuV/m" };
    const { sweepId, readings } = await importLevels(ctx, place, WIDE, { corrected: true }, table);
    const [trace] = await inTeam(ctx.db, ctx.teamId, (tx) => loadTraces(tx, ctx.teamId, sweepId));
    expect(Array.from(trace?.levelsDb ?? [])).toEqual(Array.from(Float32Array.from(WIDE)));
    expect(trace?.unit).toBe("dBuV/m");
    expect(readings[0]?.marginDb).toBe(50 - 41.25);
  });

  test("says at the field that a file in dBµV/m went through a path already, and stores nothing", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const before = await countRows(database, ctx.teamId);
    await expect(importLevels(ctx, place, WIDE, {}, { unit: "dBuV/m" })).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { corrected: expect.stringContaining("dBµV/m") },
    });
    expect(await countRows(database, ctx.teamId)).toEqual(before);
  });

  test("keeps the signal path that was in force, and its levels, after a new revision", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const first = await importLevels(ctx, place, levelsOf(20));
    const revised = TRANSDUCERS.map((t) => ({
      ...t,
      factors: t.factors.map((p) => ({
        ...p,
        factorDb: p.factorDb + (t.kind === "cable" ? 6 : 0),
      })),
    }));
    await reviseSignalPath(ctx, {
      benchId: place.benchId,
      impedanceOhm: 50,
      transducers: revised,
    });
    const second = await importLevels(ctx, place, levelsOf(20));
    const [old, young] = await Promise.all([
      readSweepDetail(ctx, first.sweepId),
      readSweepDetail(ctx, second.sweepId),
    ]);
    expect([old?.pathRevision, young?.pathRevision]).toEqual([2, 3]);
    expect(old?.path.transducers[1]?.factors[0]?.factorDb).toBe(1);
    expect((young?.traces[0]?.maxDb ?? 0) - (old?.traces[0]?.maxDb ?? 0)).toBeCloseTo(6, 4);
    expect(first.readings[0]?.marginDb).toBeCloseTo(50 - 20 - addedDb(300e6), 4);
  });

  test("names a transducer whose calibration was overdue on the day of the sweep", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const codesOn = async (measuredOn: string) => {
      const { sweepId } = await importLevels(ctx, place, levelsOf(20), { measuredOn });
      const detail = await readSweepDetail(ctx, sweepId);
      return detail?.readings[0]?.reading.doubts.map((doubt) => doubt.code);
    };
    expect(await codesOn("2027-02-01")).not.toContain("calibration-overdue");
    expect(await codesOn("2027-02-02")).toContain("calibration-overdue");
  });

  test("writes who imported what into the audit trail", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { sweepId } = await importSweep(ctx, importInput(place, wide()));
    const rows = await auditRows(database, ctx.teamId);
    expect(rows.filter((row) => row.action === "sweep.import")).toEqual([
      { actor_id: ctx.userId, action: "sweep.import", subject_id: sweepId },
    ]);
  });

  test.each(["ambient", "floor"])(
    "never holds a sweep of purpose %s against a mask, nor puts it on record",
    async (purpose) => {
      const ctx = await makeMember(database, "engineer");
      const place = await makePlace(ctx);
      const { sweepId, readings } = await importLevels(ctx, place, WIDE, {
        purpose,
        onRecord: true,
      });
      expect(readings).toEqual([]);
      expect(await readingRows(database, ctx.teamId)).toEqual([]);
      expect((await readSweepDetail(ctx, sweepId))?.onRecord).toBe(false);
    },
  );

  test("says nothing of a mask that the sweep does not reach, and of one for another port why", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { maskId } = place;
    const far = flatMask(54, { title: "Above", startHz: 1e9, stopHz: 6e9 });
    const above = await createMask(ctx, { mask: far });
    const volts = await createMask(ctx, {
      mask: { ...flatMask(60, { title: "Volts" }), unit: "dBuV", port: "mains", distanceM: null },
    });
    const maskIds = [maskId, above.maskId, volts.maskId];
    await setProgramMasks(ctx, { programId: place.programId, maskIds });
    const { sweepId, readings } = await importSweep(ctx, importInput(place, wide()));
    expect(readings.map((reading) => reading.maskTitle)).toEqual(["Loft limit"]);
    const detail = await readSweepDetail(ctx, sweepId);
    const byTitle = Object.fromEntries(
      (detail?.readings ?? []).map(({ mask, reading }) => [mask.title, reading]),
    );
    expect(byTitle.Above).toMatchObject({ standing: "undecided", coverage: { fraction: 0 } });
    expect(byTitle.Volts?.notComparable).toContain('the port "mains"');
  });
});
