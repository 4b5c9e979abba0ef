import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { reviseBudget } from "@/lib/commands/bench/revise-budget";
import { setGuardRule } from "@/lib/commands/bench/set-guard-rule";
import { createMask } from "@/lib/commands/mask/create-mask";
import { confirmMask } from "@/lib/commands/mask/confirm-mask";
import { setProgramMasks } from "@/lib/commands/program/set-program-masks";
import { createReport } from "@/lib/commands/report/create-report";
import { issueReport } from "@/lib/commands/report/issue-report";
import { readProgram } from "@/lib/queries/program/read-program";
import { readReport } from "@/lib/queries/report/read-report";
import { readReportPdf } from "@/lib/queries/report/read-report-pdf";
import { upgradeSnapshot } from "@/lib/reports/upgrade-snapshot";
import type { Context } from "@/lib/auth/context";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { readPdfText } from "../../support/pdf-text";
import { reportInput } from "../../support/reports";
import type { Place } from "../../support/sweeps";
import { flatMask, importLevels, levelsOf, makePlace } from "../../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

async function issue(ctx: Context, place: Place, sweepIds: string[]) {
  const { reportId } = await createReport(ctx, reportInput(place.buildId, sweepIds));
  await issueReport(ctx, { reportId });
  const report = await readReport(ctx, reportId);
  if (!report?.snapshot) throw new Error("The report has no snapshot.");
  return { report, content: upgradeSnapshot(report.snapshot) };
}

const FIELD = { corrected: true };
const scan = (detector: string) => ({ unit: "dBuV/m", detector });

/** A peak scan over the line of 50 dBµV/m by 3 dB, and a quasi-peak scan 4 dB under it. */
async function peakAndQuasiPeak(ctx: Context) {
  const place = await makePlace(ctx, flatMask(50, { detector: "quasi-peak" }));
  const peak = await importLevels(ctx, place, levelsOf(10, { 7: 53 }), FIELD, scan("peak"));
  const quasi = { ...FIELD, name: "G1 vertical, final" };
  const final = await importLevels(ctx, place, levelsOf(8, { 7: 46 }), quasi, scan("quasi-peak"));
  return { place, sweepIds: [peak.sweepId, final.sweepId] };
}

describe("an issued report over several sweeps", () => {
  test("lets the tighter detector decide, as the build's standing does", async () => {
    const ctx = await makeMember(database, "engineer");
    const { place, sweepIds } = await peakAndQuasiPeak(ctx);
    const { report, content } = await issue(ctx, place, sweepIds);
    const [combined] = content.combined;
    expect(combined?.sweepIds).toEqual(sweepIds);
    expect(combined?.reading.lines[0]).toMatchObject({ standing: "clear", basis: "like-for-like" });
    expect(combined?.reading.remeasure).toEqual([]);
    const program = await readProgram(ctx, place.programId);
    const standing = program?.trend.builds[0]?.standings[0];
    expect(report.said?.lines).toEqual([
      expect.objectContaining({
        standing: standing?.standing,
        marginDb: standing?.marginDb,
        coverage: standing?.coverage,
        sweep: { id: standing?.sweepId, name: "G1 vertical, final" },
      }),
    ]);
    expect(standing?.marginDb).toBeCloseTo(4, 4);
    const codes = combined?.reading.doubts.map(({ code }) => code);
    expect(codes).toContain("polarization-missing");
    expect(codes).toContain("ambient-not-taken");
  });

  test("stays undecided with the bound alone, and prints what to measure again", async () => {
    const ctx = await makeMember(database, "engineer");
    const { place, sweepIds } = await peakAndQuasiPeak(ctx);
    const { report, content } = await issue(ctx, place, sweepIds.slice(0, 1));
    expect(content.combined[0]?.reading).toMatchObject({ standing: "undecided" });
    expect(content.combined[0]?.reading.remeasure).toMatchObject([
      { frequencyHz: 100e6, detector: "quasi-peak", limitDb: 50 },
    ]);
    const pdf = await readReportPdf(ctx, report.id);
    const text = readPdfText(pdf!.bytes).join("\n");
    expect(text).toContain("Measure again");
    expect(text).toContain("53.0 / 50.0 dBµV/m");
  });
});

describe("what a report records beside the readings", () => {
  test("the masks of the program that no sweep of it reaches", async () => {
    const ctx = await makeMember(database, "engineer");
    const { place, sweepIds } = await peakAndQuasiPeak(ctx);
    const above = flatMask(60, { title: "High limit", startHz: 1e9, stopHz: 2e9 });
    const { maskId } = await createMask(ctx, { mask: above });
    await setProgramMasks(ctx, { programId: place.programId, maskIds: [place.maskId, maskId] });
    const { content } = await issue(ctx, place, sweepIds);
    expect(content.notHeld).toEqual([
      expect.objectContaining({
        title: "High limit",
        reasons: ["No product sweep of this report reaches it."],
      }),
    ]);
  });

  test("who confirmed a mask from memory, when and against which copy", async () => {
    const ctx = await makeMember(database, "engineer");
    const memory = { ...flatMask(50), provenance: "from memory" as const };
    const place = await makePlace(ctx, memory);
    await confirmMask(ctx, {
      maskId: place.maskId,
      basedOnRevision: 1,
      copy: "House rule 7, shelf 4",
      edition: "B",
      isCompared: true,
    });
    await database.owner.query(
      "update mask_revisions set in_force_at = now() where mask_id = $1 and in_force_at is null",
      [place.maskId],
    );
    const { sweepId } = await importLevels(ctx, place, levelsOf(20), FIELD, scan("peak"));
    const { report, content } = await issue(ctx, place, [sweepId]);
    expect(content.combined[0]?.confirmation).toMatchObject({ copy: "House rule 7, shelf 4" });
    expect(content.sweeps[0]?.readings[0]?.confirmation).toEqual(content.combined[0]?.confirmation);
    expect(report.said?.lines[0]?.mark).toContain("against House rule 7, shelf 4");
  });

  test("the budget and the guard that were in force at the import, not today's", async () => {
    const ctx = await makeMember(database, "engineer");
    const place = await makePlace(ctx);
    const line = { distribution: "normal", sensitivity: 1, degreesOfFreedom: null };
    const budget = (value: number, change: object = {}) => ({
      benchId: place.benchId,
      title: "Loft",
      reference: null,
      lines: [{ ...line, name: "Antenna factor", value, observations: null }],
      ...change,
    });
    await reviseBudget(ctx, budget(3.5));
    await setGuardRule(ctx, { benchId: place.benchId, guardRule: "expanded", guardDb: null });
    const { sweepId } = await importLevels(ctx, place, levelsOf(20), FIELD, scan("peak"));
    await reviseBudget(ctx, budget(5, { basedOnRevision: 1 }));
    const { content } = await issue(ctx, place, [sweepId]);
    expect(content.sweeps[0]?.bench).toMatchObject({
      guardDb: 3.5,
      budget: { revision: 1, expandedDb: 3.5, combinedDb: 1.75, reference: null },
    });
    expect(content.sweeps[0]?.onRecord).toBe(true);
  });
});
