import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { createProgram } from "@/lib/commands/program/create-program";
import { listPrograms } from "@/lib/queries/program/list-programs";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";

const INPUT = { name: "Gannet", description: "Docking camera head", targetMarginDb: 6 };

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

describe("createProgram", () => {
  test("stores the program and one audit row naming who did it", async () => {
    const ctx = await makeMember(database, "manager");
    const { programId } = await createProgram(ctx, INPUT);
    const [row, ...rest] = await listPrograms(ctx, "2026-12-01");
    expect(rest).toEqual([]);
    expect(row).toEqual({
      id: programId,
      builds: 0,
      now: null,
      trend: [],
      nextMilestone: null,
      week: { sweeps: 0, reports: [] },
      ...INPUT,
    });
    expect(await auditRows(database, ctx.teamId)).toEqual([
      { actor_id: ctx.userId, action: "program.create", subject_id: programId },
    ]);
  });

  test("refuses a liaison and stores nothing", async () => {
    const ctx = await makeMember(database, "liaison");
    await expect(createProgram(ctx, INPUT)).rejects.toMatchObject({ code: "denied" });
    expect(await listPrograms(ctx, "2026-12-01")).toEqual([]);
    expect(await auditRows(database, ctx.teamId)).toEqual([]);
  });

  test("is not seen by another team, which may use the same name", async () => {
    const ours = await makeMember(database, "engineer");
    const theirs = await makeMember(database, "engineer");
    await createProgram(ours, INPUT);
    expect(await listPrograms(theirs, "2026-12-01")).toEqual([]);
    await createProgram(theirs, INPUT);
    expect(await listPrograms(theirs, "2026-12-01")).toHaveLength(1);
  });

  test("leaves nothing behind when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    await withoutAudit(database, async () => {
      await expect(createProgram(ctx, INPUT)).rejects.toThrow();
    });
    expect(await listPrograms(ctx, "2026-12-01")).toEqual([]);
  });

  test("says at the field what is wrong", async () => {
    const ctx = await makeMember(database, "engineer");
    const bad = createProgram(ctx, { name: " ", description: "", targetMarginDb: Number.NaN });
    await expect(bad).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: {
        name: "Give it a name.",
        targetMarginDb: "State the target margin in dB.",
      },
    });
  });

  test("refuses a second program of the same name at the name", async () => {
    const ctx = await makeMember(database, "engineer");
    await createProgram(ctx, INPUT);
    await expect(createProgram(ctx, INPUT)).rejects.toMatchObject({
      code: "conflict",
      fieldErrors: { name: "Choose another name." },
    });
    expect(await listPrograms(ctx, "2026-12-01")).toHaveLength(1);
  });
});
