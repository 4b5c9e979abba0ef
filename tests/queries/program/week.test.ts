import { afterAll, beforeAll, expect, test } from "vitest";
import { createReport } from "@/lib/commands/report/create-report";
import { issueReport } from "@/lib/commands/report/issue-report";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import { listPrograms } from "@/lib/queries/program/list-programs";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { importLevels, levelsOf, makePlace } from "../../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const dayFrom = (days: number) =>
  new Date(Date.now() + days * 86_400_000).toISOString().slice(0, 10);

test("the week of a program counts what was imported and issued in it, and no longer", async () => {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const kept = await importLevels(ctx, place, levelsOf(20));
  const aside = await importLevels(ctx, place, levelsOf(21));
  await archiveSweep(ctx, { sweepId: aside.sweepId });
  const { reportId } = await createReport(ctx, {
    buildId: place.buildId,
    title: "Reed, bench summary",
    summary: "",
    paper: "a4",
    sweepIds: [kept.sweepId],
    ladderId: null,
    replacesId: null,
  });
  await issueReport(ctx, { reportId });
  const weekOn = async (day: string) => (await listPrograms(ctx, day))[0]?.week;
  expect(await weekOn(dayFrom(0))).toEqual({ sweeps: 1, reports: [1] });
  expect(await weekOn(dayFrom(6))).toEqual({ sweeps: 1, reports: [1] });
  expect(await weekOn(dayFrom(9))).toEqual({ sweeps: 0, reports: [] });
});
