import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { setMilestones } from "@/lib/commands/program/set-milestones";
import { listMilestones } from "@/lib/queries/program/list-milestones";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { makeProgram } from "./arrange";

const LAB = { name: "Lab visit", dueOn: "2027-03-01", requiredMarginDb: 3 };
const SAMPLES = { name: "B samples", dueOn: "2027-01-15", requiredMarginDb: null };

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

describe("setMilestones", () => {
  test("replaces the whole list, which is read by day, and audits it", async () => {
    const ctx = await makeMember(database, "manager");
    const { programId } = await makeProgram(ctx);
    await setMilestones(ctx, { programId, milestones: [LAB, SAMPLES] });
    expect(await listMilestones(ctx, programId)).toEqual([SAMPLES, LAB]);
    const later = { ...LAB, dueOn: "2027-04-01" };
    await setMilestones(ctx, { programId, milestones: [later] });
    expect(await listMilestones(ctx, programId)).toEqual([later]);
    await setMilestones(ctx, { programId, milestones: [] });
    expect(await listMilestones(ctx, programId)).toEqual([]);
    expect((await auditRows(database, ctx.teamId)).slice(-3)).toEqual(
      Array(3).fill({
        actor_id: ctx.userId,
        action: "program.set-milestones",
        subject_id: programId,
      }),
    );
  });

  test("refuses a liaison", async () => {
    const ctx = await makeMember(database, "engineer");
    const { programId } = await makeProgram(ctx);
    const liaison = await makeMember(database, "liaison", ctx.teamId);
    const tried = setMilestones(liaison, { programId, milestones: [LAB] });
    await expect(tried).rejects.toMatchObject({ code: "denied" });
    expect(await listMilestones(liaison, programId)).toEqual([]);
  });

  test("does not reach another team's program", async () => {
    const ours = await makeMember(database, "engineer");
    const { programId } = await makeProgram(ours);
    await setMilestones(ours, { programId, milestones: [LAB] });
    const theirs = await makeMember(database, "engineer");
    const tried = setMilestones(theirs, { programId, milestones: [] });
    await expect(tried).rejects.toMatchObject({ code: "not-found" });
    expect(await listMilestones(theirs, programId)).toEqual([]);
    expect(await listMilestones(ours, programId)).toEqual([LAB]);
  });

  test("keeps the old list when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    const { programId } = await makeProgram(ctx);
    await setMilestones(ctx, { programId, milestones: [LAB] });
    await withoutAudit(database, async () => {
      await expect(setMilestones(ctx, { programId, milestones: [SAMPLES] })).rejects.toThrow();
    });
    expect(await listMilestones(ctx, programId)).toEqual([LAB]);
  });

  test("says at the row and field what is wrong, and at the second of two names", async () => {
    const ctx = await makeMember(database, "engineer");
    const { programId } = await makeProgram(ctx);
    const rows = [LAB, { name: " ", dueOn: "next spring", requiredMarginDb: Number.NaN }];
    await expect(setMilestones(ctx, { programId, milestones: rows })).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: {
        "milestones.1.name": "Give it a name.",
        "milestones.1.dueOn": expect.stringContaining("year-month-day"),
        "milestones.1.requiredMarginDb": "State the required margin in dB, or leave it empty.",
      },
    });
    const twins = [LAB, { ...SAMPLES, name: "lab visit" }];
    await expect(setMilestones(ctx, { programId, milestones: twins })).rejects.toMatchObject({
      fieldErrors: { "milestones.1.name": "Another row has this name." },
    });
    expect(await listMilestones(ctx, programId)).toEqual([]);
  });
});
