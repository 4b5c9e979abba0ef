import { randomUUID } from "node:crypto";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { createReport } from "@/lib/commands/report/create-report";
import { discardDraft } from "@/lib/commands/report/discard-draft";
import { editReport } from "@/lib/commands/report/edit-report";
import { issueReport } from "@/lib/commands/report/issue-report";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import { listReports } from "@/lib/queries/report/list-reports";
import { readReport } from "@/lib/queries/report/read-report";
import { readReportChoices } from "@/lib/queries/report/read-report-choices";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { makeDraft, reportInput } from "../../support/reports";
import { importLevels, levelsOf, makeLadder, makePlace } from "../../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const change = (reportId: string, sweepIds: string[]) => {
  const { buildId: _build, ...input } = reportInput("", sweepIds);
  return { reportId, ...input };
};

describe("createReport", () => {
  test("makes a draft without a number, seen by those who may see drafts, and one audit row", async () => {
    const ctx = await makeMember(database, "engineer");
    const { reportId } = await makeDraft(ctx);
    const [row, ...rest] = await listReports(ctx, null);
    expect(rest).toEqual([]);
    expect(row).toMatchObject({ id: reportId, state: "draft", number: null });
    const manager = await makeMember(database, "manager", ctx.teamId);
    expect(await readReport(manager, reportId)).toMatchObject({ state: "draft" });
    const liaison = await makeMember(database, "liaison", ctx.teamId);
    expect(await listReports(liaison, null)).toEqual([]);
    expect(await readReport(liaison, reportId)).toBeNull();
    expect((await auditRows(database, ctx.teamId)).at(-1)).toEqual({
      actor_id: ctx.userId,
      action: "report.create",
      subject_id: reportId,
    });
  });

  test("refuses a manager, another team's build and what belongs to another build", async () => {
    const ctx = await makeMember(database, "engineer");
    const { sweepId, place } = await makeDraft(ctx);
    const input = reportInput(place.buildId, [sweepId]);
    const manager = await makeMember(database, "manager", ctx.teamId);
    await expect(createReport(manager, input)).rejects.toMatchObject({ code: "denied" });
    const theirs = await makeMember(database, "engineer");
    await expect(createReport(theirs, input)).rejects.toMatchObject({ code: "not-found" });
    const elsewhere = await makePlace(ctx);
    const wrong = [
      [{ ...input, buildId: elsewhere.buildId }, "sweepIds"],
      [{ ...input, sweepIds: [] }, "sweepIds"],
      [{ ...input, sweepIds: [sweepId, sweepId] }, "sweepIds"],
      [{ ...input, sweepIds: [randomUUID()] }, "sweepIds"],
      [{ ...input, ladderId: await makeLadder(ctx, elsewhere.buildId) }, "ladderId"],
      [{ ...input, replacesId: randomUUID() }, "replacesId"],
      [{ ...input, title: " " }, "title"],
    ] as const;
    for (const [bad, field] of wrong)
      await expect(createReport(ctx, bad)).rejects.toMatchObject({
        code: "invalid",
        fieldErrors: { [field]: expect.any(String) },
      });
    await archiveSweep(ctx, { sweepId });
    await expect(createReport(ctx, input)).rejects.toMatchObject({
      fieldErrors: { sweepIds: "A chosen sweep is archived or belongs to another build." },
    });
  });

  test("leaves nothing behind when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "engineer");
    const { sweepId, place } = await makeDraft(ctx);
    await withoutAudit(database, async () => {
      const made = createReport(ctx, reportInput(place.buildId, [sweepId]));
      await expect(made).rejects.toThrow();
    });
    expect(await listReports(ctx, null)).toHaveLength(1);
  });
});

describe("editReport and discardDraft", () => {
  test("change or throw away a draft, and never what was issued", async () => {
    const ctx = await makeMember(database, "engineer");
    const { reportId, sweepId, place } = await makeDraft(ctx);
    const second = await importLevels(ctx, place, levelsOf(25));
    await editReport(ctx, change(reportId, [second.sweepId, sweepId]));
    const edited = await readReport(ctx, reportId);
    expect(edited?.sweeps.map((sweep) => sweep.id)).toEqual([second.sweepId, sweepId]);
    const theirs = await makeMember(database, "engineer");
    await expect(editReport(theirs, change(reportId, [sweepId]))).rejects.toMatchObject({
      code: "not-found",
    });
    await expect(discardDraft(theirs, { reportId })).rejects.toMatchObject({ code: "not-found" });
    await issueReport(ctx, { reportId });
    await expect(editReport(ctx, change(reportId, [sweepId]))).rejects.toMatchObject({
      code: "conflict",
    });
    await expect(discardDraft(ctx, { reportId })).rejects.toMatchObject({ code: "conflict" });
    const { buildId } = place;
    const draft = await createReport(ctx, reportInput(buildId, [sweepId]));
    await discardDraft(ctx, draft);
    expect(await readReport(ctx, draft.reportId)).toBeNull();
    const actions = (await auditRows(database, ctx.teamId)).map((row) => row.action);
    expect(actions.slice(-4)).toEqual([
      "report.edit",
      "report.issue",
      "report.create",
      "report.discard",
    ]);
  });

  test("the database itself keeps what was issued, whatever asks", async () => {
    const ctx = await makeMember(database, "engineer");
    const { reportId } = await makeDraft(ctx);
    await issueReport(ctx, { reportId });
    for (const statement of [
      "update reports set title = 'x' where id = $1",
      "update reports set snapshot = '{}' where id = $1",
      "update reports set number = 9 where id = $1",
      "update reports set state = 'draft' where id = $1",
      "delete from reports where id = $1",
    ])
      await expect(database.owner.query(statement, [reportId])).rejects.toThrow(
        /an issued report is never/,
      );
  });
});

describe("readReportChoices", () => {
  test("offers the build's sweeps and ladders and the program's issued reports", async () => {
    const ctx = await makeMember(database, "engineer");
    const { reportId, sweepId, place } = await makeDraft(ctx);
    const ladderId = await makeLadder(ctx, place.buildId);
    expect((await readReportChoices(ctx, place.buildId))?.issued).toEqual([]);
    await issueReport(ctx, { reportId });
    const choices = await readReportChoices(ctx, place.buildId);
    expect(choices?.issued.map((report) => report.id)).toEqual([reportId]);
    expect(choices?.ladders.map((ladder) => ladder.id)).toEqual([ladderId]);
    expect(choices?.sweeps.map((sweep) => sweep.id)).toEqual([sweepId]);
    const theirs = await makeMember(database, "engineer");
    expect(await readReportChoices(theirs, place.buildId)).toBeNull();
    expect(await readReportChoices(ctx, "no-id")).toBeNull();
  });
});
