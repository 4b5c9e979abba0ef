import { randomUUID } from "node:crypto";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { inTeam } from "@/db/client";
import { archiveBench } from "@/lib/commands/bench/archive-bench";
import { archiveLadder } from "@/lib/commands/ladder/archive-ladder";
import { archiveBuild } from "@/lib/commands/program/archive-build";
import { archiveProgram } from "@/lib/commands/program/archive-program";
import { createBuild } from "@/lib/commands/program/create-build";
import { CommandError } from "@/lib/commands/result";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import { importSweep } from "@/lib/commands/sweep/import-sweep";
import { readLadder } from "@/lib/queries/ladder/read-ladder";
import { loadTraces } from "@/lib/queries/sweep/load-trace";
import { readSweepDetail } from "@/lib/queries/sweep/read-sweep";
import type { Context } from "@/lib/auth/context";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import {
  csvOf,
  importInput,
  levelsOf,
  LINK,
  makeLadder,
  makePlace,
  SETTINGS,
  text,
} from "../../support/sweeps";
import { countRows, NOTHING } from "./rows";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const file = () => csvOf(levelsOf(20, { 7: 40 }));
const stepOf = async (ctx: Context, ladderId: string) =>
  (await readLadder(ctx, ladderId))?.steps[0]?.id ?? "";

describe("importSweep refuses", () => {
  test.each(["manager", "liaison"] as const)("a %s", async (role) => {
    const engineer = await makeMember(database, "engineer");
    const place = await makePlace(engineer);
    const other = await makeMember(database, role, engineer.teamId);
    await expect(importSweep(other, importInput(place, file()))).rejects.toMatchObject({
      code: "denied",
    });
    expect(await countRows(database, engineer.teamId)).toEqual(NOTHING);
  });

  test("another team's build, bench and step, and a step of another build", async () => {
    const theirs = await makeMember(database, "engineer");
    const foreign = await makePlace(theirs);
    const foreignStep = await stepOf(theirs, await makeLadder(theirs, foreign.buildId));
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const second = await createBuild(ctx, {
      programId: place.programId,
      name: "G2",
      builtOn: null,
      notes: "",
    });
    const otherStep = await stepOf(ctx, await makeLadder(ctx, second.buildId));
    const tries = [
      importInput({ ...place, buildId: foreign.buildId }, file()),
      importInput({ ...place, benchId: foreign.benchId }, file()),
      importInput(place, file(), { stepId: foreignStep }),
      importInput(place, file(), { stepId: otherStep }),
      importInput(place, file(), { stepId: randomUUID() }),
    ];
    for (const input of tries) {
      await expect(importSweep(ctx, input)).rejects.toMatchObject({ code: "not-found" });
    }
    expect(await countRows(database, ctx.teamId)).toEqual(NOTHING);
    expect(await countRows(database, theirs.teamId)).toEqual(NOTHING);
  });

  test("an archived ladder, bench, build and program", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const ladderId = await makeLadder(ctx, place.buildId);
    const stepId = await stepOf(ctx, ladderId);
    const refused = async (change = {}) =>
      expect(importSweep(ctx, importInput(place, file(), change))).rejects.toMatchObject({
        code: "not-found",
      });
    await archiveLadder(ctx, { ladderId });
    await refused({ stepId });
    const spare = await makePlace(ctx);
    await archiveBench(ctx, { benchId: spare.benchId });
    await refused({ benchId: spare.benchId });
    await archiveProgram(ctx, { programId: spare.programId });
    await refused({ buildId: spare.buildId });
    await archiveBuild(ctx, { buildId: place.buildId });
    await refused();
    expect(await countRows(database, ctx.teamId)).toEqual(NOTHING);
  });

  test("everything together when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    await withoutAudit(database, async () => {
      await expect(importSweep(ctx, importInput(place, file()))).rejects.toThrow();
    });
    expect(await countRows(database, ctx.teamId)).toEqual(NOTHING);
    await importSweep(ctx, importInput(place, file()));
    expect(await countRows(database, ctx.teamId)).toMatchObject({ sweeps: 1, readings: 1 });
  });

  test("the same bytes again, unless asked for or the first sweep is archived", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const { sweepId } = await importSweep(ctx, importInput(place, file()));
    const twin = { fileName: "copy.csv", name: "Copy" };
    const again = importSweep(ctx, importInput(place, file(), twin));
    await expect(again).rejects.toMatchObject({
      code: "conflict",
      fieldErrors: { file: expect.stringContaining("G1 vertical") },
    });
    expect((await countRows(database, ctx.teamId)).sweeps).toBe(1);
    await importSweep(ctx, importInput(place, file(), { ...twin, again: true }));
    expect(await countRows(database, ctx.teamId)).toMatchObject({ sweeps: 2, stored_files: 1 });
    const rows = await database.owner.query("select id from sweeps where team_id = $1", [
      ctx.teamId,
    ]);
    for (const row of rows.rows) await archiveSweep(ctx, { sweepId: row.id });
    const third = await importSweep(ctx, importInput(place, file()));
    expect(third.sweepId).not.toBe(sweepId);
  });

  test("nothing because another team has the same bytes", async () => {
    for (let i = 0; i < 2; i += 1) {
      const ctx = await makeMember(database, "engineer");
      const place = await makePlace(ctx);
      await importSweep(ctx, importInput(place, file()));
      expect(await countRows(database, ctx.teamId)).toMatchObject({ sweeps: 1, stored_files: 1 });
    }
  });
});

const HEADER = "Frequency (MHz),Trace 1 (dBuV) peak\n";

describe("a file that cannot be taken stores nothing and says why", () => {
  test.each([
    ["an empty file", text(""), /empty/],
    ["only blanks", text(" \n\n"), /empty/],
    ["a binary file", Uint8Array.from({ length: 4096 }, (_, i) => (i * 37) % 256), /./],
    ["a picture", Uint8Array.from([0x89, 0x50, 0x4e, 0x47, 13, 10, 26, 10, 0, 0, 0, 13]), /./],
    ["only a header", text(HEADER), /./],
    ["no unit and no detector", text("MHz,Trace 1\n30,40\n40,41\n50,42\n"), /./],
    [
      "a level that is no number",
      text(`${HEADER}30,20\n40,21\n50,twenty\n60,22\n70,23\n`),
      /Line 4/,
    ],
    ["frequencies twice", text(`${HEADER}30,20\n40,21\n40,25\n50,22\n`), /Line 4|twice|repeat/i],
    ["frequencies to and fro", text(`${HEADER}30,20\n50,21\n40,25\n60,22\n`), /./],
    ["no level at all", text(`${HEADER}30,nan\n40,nan\n50,nan\n`), /./],
    ["more than 60 MB", new Uint8Array(60 * 1024 * 1024 + 1), /60 MB/],
  ])("%s", async (_what, bytes, said) => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const audited = (await auditRows(database, ctx.teamId)).length;
    const error: unknown = await importSweep(ctx, importInput(place, bytes)).catch(
      (thrown: unknown) => thrown,
    );
    if (!(error instanceof CommandError)) throw new Error(`No refusal: ${String(error)}`);
    expect(error.code).toBe("invalid");
    expect(Object.values(error.fieldErrors).join(" ")).toMatch(said);
    expect(Object.keys(error.fieldErrors)).toHaveLength(1);
    expect(await countRows(database, ctx.teamId)).toEqual(NOTHING);
    expect(await auditRows(database, ctx.teamId)).toHaveLength(audited);
  });

  test("a level that is missing is a gap, and a falling table is turned round", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const falling = text(`${HEADER}300,20\n290,\n280,22\n270,23\n`);
    const { sweepId } = await importSweep(ctx, importInput(place, falling));
    const [trace] = await inTeam(ctx.db, ctx.teamId, (tx) => loadTraces(tx, ctx.teamId, sweepId));
    expect(Array.from(trace?.levelsDb ?? [], Number.isNaN)).toEqual([false, false, true, false]);
    const detail = await readSweepDetail(ctx, sweepId);
    expect(detail?.traces[0]).toMatchObject({ firstHz: 270e6, lastHz: 300e6, covered: 3 });
    expect(detail?.readings[0]?.reading.standing).toBe("undecided");
  });
});

describe("settings that cannot be are refused at their field", () => {
  const broken = "half a \ud83d pair";
  test.each<[string, Record<string, unknown>]>([
    ["settings.rbwHz", { settings: { ...SETTINGS, rbwHz: 0 } }],
    ["settings.rbwHz", { settings: { ...SETTINGS, rbwHz: Number.NaN } }],
    ["settings.vbwHz", { settings: { ...SETTINGS, vbwHz: Number.POSITIVE_INFINITY } }],
    ["settings.port", { settings: { ...SETTINGS, port: "sea" } }],
    ["settings.heightM", { settings: { ...SETTINGS, heightM: -1 } }],
    ["settings.distanceM", { settings: { ...SETTINGS, distanceM: "3" } }],
    ["link.patternBits", { link: { ...LINK, patternBits: 1.5 } }],
    ["link.cable", { link: { ...LINK, cable: broken } }],
    [
      "link.spread.modulationHz",
      {
        link: {
          ...LINK,
          spread: { depthPercent: 0.5, direction: "down", modulationHz: 0, profile: "triangular" },
        },
      },
    ],
    ["name", { name: "  " }],
    ["name", { name: broken }],
    ["name", { name: "nul\u0000" }],
    ["fileName", { fileName: broken }],
    ["notes", { notes: "nul\u0000" }],
    ["measuredOn", { measuredOn: "2026-02-30" }],
    ["measuredOn", { measuredOn: "0000-01-01" }],
    ["purpose", { purpose: "other" }],
    ["buildId", { buildId: "1" }],
    ["bytes", { bytes: "30,20" }],
  ])("%s %#", async (field, change) => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const tried = importSweep(ctx, importInput(place, file(), change));
    await expect(tried).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { [field]: expect.any(String) },
    });
    expect(await countRows(database, ctx.teamId)).toEqual(NOTHING);
  });

  test("an enormous bandwidth is no reason to break", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const settings = { ...SETTINGS, rbwHz: 1e18 };
    const { sweepId } = await importSweep(ctx, importInput(place, file(), { settings }));
    const detail = await readSweepDetail(ctx, sweepId);
    expect(detail?.readings[0]?.reading.lines[0]?.worst).not.toBeNull();
  });
});
