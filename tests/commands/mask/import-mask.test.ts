import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { importMask } from "@/lib/commands/mask/import-mask";
import { maskToJson } from "@/lib/core/mask/mask-json";
import { maskToCsv } from "@/lib/formats/mask-csv";
import { listMasks } from "@/lib/queries/mask/list-masks";
import { readMask } from "@/lib/queries/mask/read-mask";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { CROSSING, MASK } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const text = maskToJson({ ...MASK, key: "from-elsewhere" });

describe("importMask", () => {
  test("takes what was exported, byte order mark and all, as a mask of the team's own", async () => {
    const ctx = await makeMember(database, "engineer");
    const { maskId } = await importMask(ctx, { text: `\uFEFF${text}` });
    const mask = await readMask(ctx, maskId);
    expect(mask?.origin).toBe("team");
    expect(mask?.revisions[0]?.content).toEqual({ ...MASK, key: "team-wheelhouse-limit" });
    expect((await auditRows(database, ctx.teamId)).map((row) => row.action)).toEqual([
      "mask.import",
    ]);
  });

  test("names every problem of a file with its path, and stores nothing", async () => {
    const ctx = await makeMember(database, "engineer");
    const broken = {
      ...MASK,
      unit: "furlong",
      lines: [{ ...MASK.lines[0], rbwHz: "wide", segments: [{ startHz: "30 MHz" }] }],
    };
    await expect(importMask(ctx, { text: JSON.stringify(broken) })).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: {
        unit: expect.any(String),
        "lines.0.rbwHz": expect.any(String),
        "lines.0.segments.0.startHz": expect.any(String),
        "lines.0.segments.0.stopHz": expect.any(String),
        "lines.0.segments.0.interpolation": expect.any(String),
      },
    });
    await expect(importMask(ctx, { text: maskToJson(CROSSING) })).rejects.toMatchObject({
      fieldErrors: { "lines.0.segments.1": expect.stringContaining("crosses") },
    });
    expect(await listMasks(ctx)).toEqual([]);
  });

  test.each([
    ["no text", undefined, "text"],
    ["blank text", " \n", "text"],
    ["a text that is neither JSON nor a table", "a mask, please", "text"],
    ["no JSON", "{ not json", "text"],
    ["a cut file", text.slice(0, -20), "text"],
    ["more than 1 MB", `"${"x".repeat(1_000_000)}"`, "text"],
    ["more than 1 MB once it is bytes", `"${"µ".repeat(600_000)}"`, "text"],
    ["JSON nested without end", "[".repeat(400_000) + "]".repeat(400_000), "format"],
    ["a list", "[]", "format"],
    ["null", "null", "format"],
    ["an unknown version", JSON.stringify({ ...MASK, version: 2 }), "version"],
    ["lines that are no list", JSON.stringify({ ...MASK, lines: { length: 3 } }), "lines"],
    ["lines of null", JSON.stringify({ ...MASK, lines: [null] }), "lines"],
  ])("refuses %s with a message", async (_, given, field) => {
    const ctx = await makeMember(database, "engineer");
    await expect(importMask(ctx, { text: given })).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { [field]: expect.any(String) },
    });
    expect(await listMasks(ctx)).toEqual([]);
  });

  test("takes a CSV by its content, as it was exported and as a table with answers", async () => {
    const ctx = await makeMember(database, "engineer");
    const exported = await importMask(ctx, { text: `\uFEFF${maskToCsv(MASK)}`, answers: {} });
    expect((await readMask(ctx, exported.maskId))?.current.content).toEqual({
      ...MASK,
      key: "team-wheelhouse-limit",
    });
    const typed = await importMask(ctx, {
      text: "detector;start;stop;level\nQP;30;230;40,5\n",
      answers: {
        title: "Hull limit",
        port: "radiated",
        unit: "dBuV/m",
        provenance: "from memory",
        frequencyUnit: "MHz",
      },
    });
    expect((await readMask(ctx, typed.maskId))?.current.content).toMatchObject({
      title: "Hull limit",
      provenance: "from memory",
      lines: [{ detector: "quasi-peak", segments: [{ startHz: 30e6, startDb: 40.5 }] }],
    });
  });

  test("names each problem of a CSV with its line, and each open question at its answer", async () => {
    const ctx = await makeMember(database, "engineer");
    const csv = [
      "detector,start (MHz),stop (MHz),level start (dBuV/m),level stop (dBuV/m)",
      "peak,30,1000,40,50",
      "peak,30,1000,50,40",
      "average,230,30,40,",
      "average,1000,2000000,900,",
    ].join("\n");
    const answers = { title: "T", port: "radiated", provenance: "team" };
    await expect(importMask(ctx, { text: csv, answers })).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: {
        "line.3": expect.stringMatching(/^Line 3: This segment crosses segment 1 at 173\.2 MHz/),
        "line.4": expect.stringMatching(/^Line 4: The segment is reversed/),
      },
    });
    const high = csv.split("\n").filter((_, i) => i !== 2 && i !== 3);
    await expect(importMask(ctx, { text: high.join("\n"), answers })).rejects.toMatchObject({
      fieldErrors: { "line.3": expect.stringMatching(/^Line 3: A limit beyond 400 dB.*1 THz/) },
    });
    const unanswered = { title: "", port: "", unit: "", provenance: "", frequencyUnit: "" };
    await expect(importMask(ctx, { text: csv, answers: unanswered })).rejects.toMatchObject({
      fieldErrors: {
        title: expect.any(String),
        port: expect.any(String),
        provenance: expect.any(String),
      },
    });
    const long = Array.from({ length: 1200 }, (_, i) => `peak,${i + 1},${i + 2},40,40`);
    const text = [csv.split("\n")[0], ...long].join("\n");
    await expect(importMask(ctx, { text, answers })).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { "line.2": expect.stringContaining("at most 300 segments") },
    });
    expect(await listMasks(ctx)).toEqual([]);
  });

  test("refuses a liaison, stays in its team, and needs its audit row", async () => {
    const engineer = await makeMember(database, "engineer");
    const liaison = await makeMember(database, "liaison", engineer.teamId);
    await expect(importMask(liaison, { text })).rejects.toMatchObject({ code: "denied" });
    await withoutAudit(database, async () => {
      await expect(importMask(engineer, { text })).rejects.toThrow();
    });
    expect(await listMasks(engineer)).toEqual([]);
    const { maskId } = await importMask(engineer, { text });
    const foreign = await makeMember(database, "engineer");
    expect(await readMask(foreign, maskId)).toBeNull();
  });
});
