import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { draftTransducer, transducerInput } from "@/components/benches/transducer-draft";
import { archiveBench } from "@/lib/commands/bench/archive-bench";
import { reviseSignalPath } from "@/lib/commands/bench/revise-signal-path";
import { readBench } from "@/lib/queries/bench/read-bench";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { ANTENNA, benchOf } from "./arrange";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const revise = (benchId: string, change: object = {}) => ({
  benchId,
  impedanceOhm: 50,
  transducers: [ANTENNA],
  ...change,
});
const tabled = (text: string, frequencyUnitHz: number | null = 1e6) => {
  const { factors: _, ...rest } = ANTENNA;
  return { ...rest, table: { text, frequencyUnitHz } };
};

describe("reviseSignalPath", () => {
  test("adds revisions and leaves the earlier ones as they were, also when two arrive at once", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    const named = (name: string) => revise(benchId, { transducers: [{ ...ANTENNA, name }] });
    const made = await Promise.all([
      reviseSignalPath(ctx, named("Port antenna")),
      reviseSignalPath(ctx, named("Starboard antenna")),
    ]);
    expect(made.map((m) => m.revision).sort()).toEqual([2, 3]);
    const revisions = (await readBench(ctx, benchId))?.revisions ?? [];
    expect(revisions.map((r) => r.revision)).toEqual([3, 2, 1]);
    expect(revisions.at(-1)?.content.transducers).toEqual([]);
    expect(revisions.map((r) => r.id)).toEqual(
      expect.arrayContaining(made.map((m) => m.revisionId)),
    );
    const actions = (await auditRows(database, ctx.teamId)).map((row) => row.action);
    expect(actions.filter((a) => a === "bench.revise-signal-path")).toHaveLength(2);
  });

  test("reads a pasted table as it was typed, in the unit that was chosen", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    await reviseSignalPath(ctx, revise(benchId, { transducers: [tabled("30\t18.5\n1000\t24.1")] }));
    const content = (await readBench(ctx, benchId))?.revisions[0]?.content;
    expect(content?.transducers).toEqual([ANTENNA]);
  });

  test("takes what the editor shows of a stored path back without losing a digit", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    const factors = [
      { frequencyHz: 30_000_000.5, factorDb: 18.4999975 },
      { frequencyHz: 1_234_567_891, factorDb: -0.0625 },
    ];
    await reviseSignalPath(ctx, revise(benchId, { transducers: [{ ...ANTENNA, factors }] }));
    const stored = (await readBench(ctx, benchId))?.revisions[0]?.content.transducers ?? [];
    const shown = stored.map((t, i) => transducerInput(draftTransducer(i, t)));
    await expect(
      reviseSignalPath(ctx, revise(benchId, { transducers: shown })),
    ).rejects.toMatchObject({ message: "Nothing differs from the current revision." });
  });

  test("refuses a table with one row at its transducer, and stores nothing", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    const one = { ...tabled("30\t18.5"), name: "Cable" };
    await expect(
      reviseSignalPath(ctx, revise(benchId, { transducers: [ANTENNA, one] })),
    ).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { "transducers.1.factors": expect.stringMatching(/two|one row/i) },
    });
    expect((await readBench(ctx, benchId))?.revisions).toHaveLength(1);
  });

  test("names the line of a table that cannot be read", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    const torn = tabled("30\t18.5\n100\tlow\n1000\t24.1");
    await expect(
      reviseSignalPath(ctx, revise(benchId, { transducers: [torn] })),
    ).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { "transducers.0.factors": expect.stringContaining("Line 2") },
    });
    expect((await readBench(ctx, benchId))?.revisions).toHaveLength(1);
  });

  test.each([
    ["no unit stated", [tabled("30\t18.5\n1000\t24.1", null)], "transducers.0.factors"],
    [
      "more rows than a certificate has",
      [tabled(Array.from({ length: 10_001 }, (_, i) => `${i + 1}\t1`).join("\n"))],
      "transducers.0.factors",
    ],
    ["no kind", [{ ...ANTENNA, kind: "" }], "transducers.0.kind"],
    ["two of one name", [ANTENNA, ANTENNA], "transducers.1.name"],
    ["a due date before", [{ ...ANTENNA, dueOn: "2025-01-01" }], "transducers.0.dueOn"],
    ["a name that cannot be stored", [{ ...ANTENNA, name: "a\u0000" }], "transducers.0.name"],
    [
      "both numbers and a table",
      [{ ...ANTENNA, ...tabled("1\t1\n2\t2"), factors: [] }],
      "transducers.0.factors",
    ],
    ["neither", [{ ...ANTENNA, factors: undefined }], "transducers.0.factors"],
  ])("refuses %s", async (_, transducers, field) => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    await expect(reviseSignalPath(ctx, revise(benchId, { transducers }))).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { [field]: expect.any(String) },
    });
    expect((await readBench(ctx, benchId))?.revisions).toHaveLength(1);
  });

  test("does not write over a revision that somebody saved meanwhile", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    await reviseSignalPath(ctx, revise(benchId, { basedOnRevision: 1 }));
    await expect(
      reviseSignalPath(ctx, revise(benchId, { basedOnRevision: 1, impedanceOhm: 75 })),
    ).rejects.toMatchObject({ code: "conflict", message: expect.stringContaining("Revision 2") });
    expect((await readBench(ctx, benchId))?.revisions).toHaveLength(2);
  });

  test("refuses a manager, another team and an archived bench", async () => {
    const engineer = await makeMember(database, "engineer");
    const benchId = await benchOf(engineer);
    const manager = await makeMember(database, "manager", engineer.teamId);
    await expect(reviseSignalPath(manager, revise(benchId))).rejects.toMatchObject({
      code: "denied",
    });
    const foreign = await makeMember(database, "engineer");
    await expect(reviseSignalPath(foreign, revise(benchId))).rejects.toMatchObject({
      code: "not-found",
    });
    await archiveBench(engineer, { benchId });
    await expect(reviseSignalPath(engineer, revise(benchId))).rejects.toMatchObject({
      code: "conflict",
    });
    expect((await readBench(engineer, benchId))?.revisions).toHaveLength(1);
  });

  test("leaves nothing behind when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    const benchId = await benchOf(ctx);
    await withoutAudit(database, async () => {
      await expect(reviseSignalPath(ctx, revise(benchId))).rejects.toThrow();
    });
    expect((await readBench(ctx, benchId))?.revisions).toHaveLength(1);
  });

  test("the app may add revisions, never change or remove one", async () => {
    const ctx = await makeMember(database, "engineer");
    await benchOf(ctx);
    const grants = await database.owner.query(
      "select privilege_type from information_schema.role_table_grants where grantee = 'neap_app' and table_name = 'signal_path_revisions' order by 1",
    );
    expect(grants.rows.map((row) => row.privilege_type)).toEqual(["INSERT", "SELECT"]);
  });
});
