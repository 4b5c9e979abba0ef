import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { inTeam } from "@/db/client";
import { CommandError } from "@/lib/commands/result";
import { importSweep } from "@/lib/commands/sweep/import-sweep";
import { loadTraces } from "@/lib/queries/sweep/load-trace";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import {
  addedDb,
  flatMask,
  importInput,
  importLevels,
  levelsOf,
  makePlace,
  SETTINGS,
  text,
} from "../../support/sweeps";
import { countRows } from "./rows";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

describe("importSweep, of files that are out of the ordinary,", () => {
  test("stores several traces at uneven frequencies in their order, each with its detector", async () => {
    const ctx = await makeMember(database, "engineer");
    const mask = flatMask(50, { detector: "quasi-peak" });
    const place = await makePlace(ctx, mask);
    const hz = Array.from({ length: 40 }, (_, i) => Math.round(30e6 * 1.06 ** i));
    const rows = hz.map((f, i) => `${f},${i === 20 ? 58 : 30},${i === 20 ? 41 : 25}`);
    const bytes = text(`Frequency (Hz),A (dBuV) peak,B (dBuV) QP\n${rows.join("\n")}\n`);
    const { sweepId, readings } = await importSweep(ctx, importInput(place, bytes));
    const stored = await inTeam(ctx.db, ctx.teamId, (tx) => loadTraces(tx, ctx.teamId, sweepId));
    expect(stored.map((trace) => trace.detector)).toEqual(["peak", "quasi-peak"]);
    for (const [k, levels] of [
      [0, [30, 58]],
      [1, [25, 41]],
    ] as const) {
      expect(stored[k]?.axis).toEqual({ kind: "listed", frequenciesHz: Float64Array.from(hz) });
      const at = hz[20] ?? 0;
      expect(stored[k]?.levelsDb[20]).toBeCloseTo(levels[1] + addedDb(at), 4);
      expect(stored[k]?.levelsDb[5]).toBeCloseTo(levels[0] + addedDb(hz[5] ?? 0), 4);
    }
    // Quasi-peak decides where it was swept; the peak far over the limit is not heard.
    expect(readings[0]?.marginDb).toBeCloseTo(50 - 41 - addedDb(hz[20] ?? 0), 4);
  });

  test("never calls a level that no number can hold a level under the mask", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const outcome = await importLevels(ctx, place, levelsOf(20, { 7: 1e39 })).then(
      ({ readings }) => readings[0]?.standing,
      (error: unknown) => (error instanceof CommandError ? error.code : error),
    );
    expect(["invalid", "over", "undecided"]).toContain(outcome);
  });

  test("stores a sweep with more suspects than one statement takes", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const peaks = 6000;
    const rows = Array.from({ length: 2 * peaks + 1 }, (_, i) => (i % 2 === 1 ? 38 : 25));
    const settings = { ...SETTINGS, rbwHz: 1000 };
    await importLevels(ctx, place, rows, { settings }, { stepMhz: 0.02 });
    expect((await countRows(database, ctx.teamId)).suspects).toBe(peaks);
  });
});
