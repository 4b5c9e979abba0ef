import { afterAll, beforeAll, describe, expect, test } from "vitest";
import type { Context } from "@/lib/auth/context";
import { approveReport } from "@/lib/commands/report/approve-report";
import { createReport } from "@/lib/commands/report/create-report";
import { issueReport } from "@/lib/commands/report/issue-report";
import { withdrawReport } from "@/lib/commands/report/withdraw-report";
import { hashSnapshot } from "@/lib/reports/snapshot-hash";
import { readReport } from "@/lib/queries/report/read-report";
import { readReportPdf } from "@/lib/queries/report/read-report-pdf";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { readPdfText } from "../../support/pdf-text";
import { makeDraft, reportInput } from "../../support/reports";
import { importLevels, levelsOf } from "../../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const DEFERRAL = "Only an accredited test lab and the applicable edition of the standard decide.";

/** Somebody else of the same team. */
const colleague = async (ctx: Context, role: "manager" | "admin" | "liaison" | "engineer") => ({
  ...(await makeMember(database, role, ctx.teamId)),
  files: ctx.files,
});

async function pdfPages(ctx: Context, reportId: string): Promise<string[]> {
  const pdf = await readReportPdf(ctx, reportId);
  if (!pdf) throw new Error("There is no PDF.");
  return readPdfText(pdf.bytes);
}

describe("issueReport", () => {
  test("gives the next number, freezes what is said with its hash, and draws the PDF", async () => {
    const ctx = await makeMember(database, "engineer");
    const { reportId, sweepId } = await makeDraft(ctx);
    expect(await readReportPdf(ctx, reportId)).toBeNull();
    expect(await issueReport(ctx, { reportId })).toEqual({ reportId, number: "R-0001" });
    const report = await readReport(ctx, reportId);
    expect(report).toMatchObject({ state: "issued", number: 1, issuedById: ctx.userId });
    expect(report?.sha256).toBe(hashSnapshot(report!.snapshot!));
    const line = report?.snapshot?.sweeps[0]?.readings[0]?.reading.lines[0];
    expect(report?.snapshot?.sweeps.map((sweep) => sweep.sweepId)).toEqual([sweepId]);
    // 40 dBµV at 100 MHz and 5.2745 dB of path, under 50 dBµV/m.
    expect(line?.worst?.marginDb).toBeCloseTo(4.7255, 3);
    const pages = await pdfPages(ctx, reportId);
    expect(pages[0]).toContain("R-0001");
    expect(pages[0]).toContain("+4.7 dB");
    expect(pages[0]).toContain("not yet approved");
    for (const page of pages) {
      expect(page).toContain(DEFERRAL);
      expect(page).toContain(report!.sha256!);
    }
    expect((await auditRows(database, ctx.teamId)).at(-1)).toEqual({
      actor_id: ctx.userId,
      action: "report.issue",
      subject_id: reportId,
    });
  });

  test("numbers reports of a team one by one, also when two are issued at once", async () => {
    const ctx = await makeMember(database, "engineer");
    const first = await makeDraft(ctx);
    const input = reportInput(first.place.buildId, [first.sweepId]);
    const second = await createReport(ctx, input);
    const issued = await Promise.all([
      issueReport(ctx, { reportId: first.reportId }),
      issueReport(ctx, { reportId: second.reportId }),
    ]);
    expect(issued.map((report) => report.number).sort()).toEqual(["R-0001", "R-0002"]);
  });

  test("issues a report once", async () => {
    const ctx = await makeMember(database, "engineer");
    const { reportId } = await makeDraft(ctx);
    const both = await Promise.allSettled([
      issueReport(ctx, { reportId }),
      issueReport(ctx, { reportId }),
    ]);
    expect(both.map((one) => one.status).sort()).toEqual(["fulfilled", "rejected"]);
  });

  test("withdraws the report that it replaces, and the new PDF names it", async () => {
    const ctx = await makeMember(database, "engineer");
    const old = await makeDraft(ctx);
    await issueReport(ctx, { reportId: old.reportId });
    const next = await createReport(ctx, {
      ...reportInput(old.place.buildId, [old.sweepId]),
      replacesId: old.reportId,
    });
    await issueReport(ctx, next);
    expect(await readReport(ctx, old.reportId)).toMatchObject({
      state: "withdrawn",
      withdrawnReason: "Replaced by R-0002.",
    });
    for (const page of await pdfPages(ctx, old.reportId))
      expect(page.toUpperCase()).toContain("WITHDRAWN");
    expect((await pdfPages(ctx, next.reportId)).join("\n")).toContain("R-0001");
  });

  test("is not moved by what happens to its sweeps afterwards", async () => {
    const ctx = await makeMember(database, "engineer");
    const { reportId, place } = await makeDraft(ctx);
    await issueReport(ctx, { reportId });
    const before = await readReport(ctx, reportId);
    await importLevels(ctx, place, levelsOf(30, { 7: 80 }));
    await database.owner.query("update programs set name = 'Renamed' where team_id = $1", [
      ctx.teamId,
    ]);
    expect((await readReport(ctx, reportId))?.snapshot).toEqual(before?.snapshot);
  });

  test("refuses managers, liaisons and other teams, and changes nothing without its audit row", async () => {
    const ctx = await makeMember(database, "engineer");
    const { reportId } = await makeDraft(ctx);
    for (const role of ["manager", "liaison"] as const)
      await expect(issueReport(await colleague(ctx, role), { reportId })).rejects.toMatchObject({
        code: "denied",
      });
    const theirs = await makeMember(database, "engineer");
    await expect(issueReport(theirs, { reportId })).rejects.toMatchObject({ code: "not-found" });
    await withoutAudit(database, async () => {
      await expect(issueReport(ctx, { reportId })).rejects.toThrow();
    });
    expect(await readReport(ctx, reportId)).toMatchObject({ state: "draft", number: null });
  });
});

describe("approveReport", () => {
  test("is for a manager who did not issue it, once it is issued", async () => {
    const ctx = await makeMember(database, "engineer");
    const { reportId } = await makeDraft(ctx);
    const manager = await colleague(ctx, "manager");
    const early = approveReport(manager, { reportId });
    await expect(early).rejects.toMatchObject({ code: "conflict" });
    await issueReport(ctx, { reportId });
    for (const role of ["engineer", "admin", "liaison"] as const)
      await expect(approveReport(await colleague(ctx, role), { reportId })).rejects.toMatchObject({
        code: "denied",
      });
    // The same person, made a manager since: still the one who issued it.
    const own = approveReport({ ...ctx, role: "manager" }, { reportId });
    await expect(own).rejects.toMatchObject({
      message: "Nobody approves a report that they issued themselves.",
    });
    const stranger = await makeMember(database, "manager");
    await expect(approveReport(stranger, { reportId })).rejects.toMatchObject({
      code: "not-found",
    });
    await approveReport(manager, { reportId });
    expect(await readReport(ctx, reportId)).toMatchObject({ state: "approved" });
    expect((await pdfPages(ctx, reportId))[0]).toContain("Approved by A manager");
    expect((await auditRows(database, ctx.teamId)).at(-1)).toMatchObject({
      actor_id: manager.userId,
      action: "report.approve",
    });
  });
});

describe("withdrawReport", () => {
  test("asks for a reason, prints it on every page and cannot be undone", async () => {
    const ctx = await makeMember(database, "engineer");
    const { reportId } = await makeDraft(ctx);
    const early = withdrawReport(ctx, { reportId, reason: "wrong cable" });
    await expect(early).rejects.toMatchObject({ code: "conflict" });
    await issueReport(ctx, { reportId });
    await expect(withdrawReport(ctx, { reportId, reason: " " })).rejects.toMatchObject({
      fieldErrors: { reason: "Say why: whoever holds the PDF will ask." },
    });
    const manager = await colleague(ctx, "manager");
    await expect(withdrawReport(manager, { reportId, reason: "no" })).rejects.toMatchObject({
      code: "denied",
    });
    await withdrawReport(ctx, { reportId, reason: "wrong cable" });
    for (const page of await pdfPages(ctx, reportId)) expect(page).toContain("wrong cable");
    const again = approveReport(manager, { reportId });
    await expect(again).rejects.toMatchObject({ code: "conflict" });
    const twice = withdrawReport(ctx, { reportId, reason: "once more" });
    await expect(twice).rejects.toMatchObject({ code: "conflict" });
  });
});
