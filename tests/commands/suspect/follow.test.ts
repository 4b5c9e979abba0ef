import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { archiveProgram } from "@/lib/commands/program/archive-program";
import { followAllNear } from "@/lib/commands/suspect/follow-all-near";
import { followSuspect } from "@/lib/commands/suspect/follow-suspect";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { importPeaks, readingOf } from "./arrange";
import { makePlace } from "../../support/sweeps";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

async function arrange(margins: Record<number, number>) {
  const ctx = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  const sweepId = await importPeaks(ctx, place, margins);
  return { ctx, place, sweepId, ...(await readingOf(database, sweepId)) };
}

async function followedIn(programId: string) {
  const found = await database.owner.query(
    `select number, frequency_hz, tolerance_hz, state from followed_suspects
      where program_id = $1 order by number`,
    [programId],
  );
  return found.rows;
}

describe("followSuspect", () => {
  test("counts up in the program and takes frequency and tolerance from the sweep", async () => {
    const { ctx, place, readingId, numberAt } = await arrange({ 80: 1, 150: 5 });
    const first = await followSuspect(ctx, { readingId, number: numberAt(150) });
    const second = await followSuspect(ctx, { readingId, number: numberAt(80) });
    expect([first.number, second.number]).toEqual([1, 2]);
    const rows = await followedIn(place.programId);
    // Two steps of 10 MHz are more than two RBW.
    expect(rows.map((row) => row.tolerance_hz)).toEqual([20e6, 20e6]);
    expect(Math.abs(rows[0].frequency_hz - 150e6)).toBeLessThan(5e6);
    expect(rows.map((row) => row.state)).toEqual(["open", "open"]);
    const notes = await database.owner.query(
      "select author_id, change from suspect_notes where suspect_id = $1",
      [first.suspectId],
    );
    expect(notes.rows).toEqual([
      {
        author_id: ctx.userId,
        change: { state: { from: null, to: "open" }, sweep: { from: null, to: "G1 vertical" } },
      },
    ]);
    const audit = await auditRows(database, ctx.teamId);
    expect(audit.filter((row) => row.action === "suspect.follow")).toEqual([
      { actor_id: ctx.userId, action: "suspect.follow", subject_id: first.suspectId },
      { actor_id: ctx.userId, action: "suspect.follow", subject_id: second.suspectId },
    ]);
  });

  test("refuses a second one within the tolerance and names the first, also when two arrive at once", async () => {
    const { ctx, place, readingId, numberAt } = await arrange({ 80: 1 });
    const both = await Promise.allSettled([
      followSuspect(ctx, { readingId, number: numberAt(80) }),
      followSuspect(ctx, { readingId, number: numberAt(80) }),
    ]);
    expect(both.map((one) => one.status).sort()).toEqual(["fulfilled", "rejected"]);
    await expect(followSuspect(ctx, { readingId, number: numberAt(80) })).rejects.toMatchObject({
      code: "conflict",
      message: expect.stringContaining("follows suspect 1 at"),
    });
    expect(await followedIn(place.programId)).toHaveLength(1);
  });

  test("refuses a liaison, a manager, another team and a number that the reading does not have", async () => {
    const { ctx, place, readingId, numberAt } = await arrange({ 80: 1 });
    const number = numberAt(80);
    for (const role of ["liaison", "manager"] as const) {
      const member = await makeMember(database, role, ctx.teamId);
      await expect(followSuspect(member, { readingId, number })).rejects.toMatchObject({
        code: "denied",
      });
    }
    const theirs = await makeMember(database, "engineer");
    await expect(followSuspect(theirs, { readingId, number })).rejects.toMatchObject({
      code: "not-found",
    });
    await expect(followSuspect(ctx, { readingId, number: 99 })).rejects.toMatchObject({
      code: "not-found",
    });
    await expect(followSuspect(ctx, { readingId, number: 0 })).rejects.toMatchObject({
      fieldErrors: { number: "Choose a suspect of the table." },
    });
    expect(await followedIn(place.programId)).toEqual([]);
  });

  test("refuses what is archived", async () => {
    const { ctx, place, sweepId, readingId, numberAt } = await arrange({ 80: 1, 150: 1 });
    await archiveSweep(ctx, { sweepId });
    await expect(followSuspect(ctx, { readingId, number: numberAt(80) })).rejects.toMatchObject({
      message: expect.stringContaining("restore it first"),
    });
    const other = await arrange({ 80: 1 });
    await archiveProgram(other.ctx, { programId: other.place.programId });
    await expect(
      followSuspect(other.ctx, { readingId: other.readingId, number: 1 }),
    ).rejects.toMatchObject({ code: "not-found" });
    expect(await followedIn(place.programId)).toEqual([]);
  });

  test("leaves nothing behind when the audit row cannot be written", async () => {
    const { ctx, place, readingId, numberAt } = await arrange({ 80: 1 });
    await withoutAudit(database, async () => {
      await expect(followSuspect(ctx, { readingId, number: numberAt(80) })).rejects.toThrow();
    });
    expect(await followedIn(place.programId)).toEqual([]);
    const notes = await database.owner.query("select 1 from suspect_notes where team_id = $1", [
      ctx.teamId,
    ]);
    expect(notes.rowCount).toBe(0);
  });
});

describe("followAllNear", () => {
  test("follows what is over or inside guard, worst first, and leaves what is clear", async () => {
    const { ctx, place, readingId } = await arrange({ 60: 1.5, 110: -3, 160: 0.5, 220: 2.5 });
    const { suspectIds } = await followAllNear(ctx, { readingId });
    expect(suspectIds).toHaveLength(3);
    const rows = await followedIn(place.programId);
    const mhz = rows.map((row) => Math.round(row.frequency_hz / 1e7) * 10);
    expect(mhz).toEqual([110, 160, 60]);
    const audit = await auditRows(database, ctx.teamId);
    const ids = audit.filter((row) => row.action === "suspect.follow").map((r) => r.subject_id);
    expect(ids).toEqual(suspectIds);
  });

  test("takes only those that are not followed yet, and says when none is left", async () => {
    const { ctx, place, readingId, numberAt } = await arrange({ 60: 1.5, 110: -3 });
    await followSuspect(ctx, { readingId, number: numberAt(60) });
    expect((await followAllNear(ctx, { readingId })).suspectIds).toHaveLength(1);
    expect((await followedIn(place.programId)).map((row) => row.number)).toEqual([1, 2]);
    await expect(followAllNear(ctx, { readingId })).rejects.toMatchObject({
      code: "conflict",
      message: "Every suspect over or inside guard is followed already.",
    });
  });

  test("says when nothing lies near the mask", async () => {
    const { ctx, readingId } = await arrange({ 110: 9 });
    await expect(followAllNear(ctx, { readingId })).rejects.toMatchObject({
      code: "conflict",
      message: "No suspect of this reading lies over or inside guard.",
    });
  });

  test("refuses a manager and another team, and leaves nothing half followed", async () => {
    const { ctx, place, readingId } = await arrange({ 60: 1.5, 110: -3 });
    const manager = await makeMember(database, "manager", ctx.teamId);
    await expect(followAllNear(manager, { readingId })).rejects.toMatchObject({ code: "denied" });
    const theirs = await makeMember(database, "engineer");
    await expect(followAllNear(theirs, { readingId })).rejects.toMatchObject({ code: "not-found" });
    await withoutAudit(database, async () => {
      await expect(followAllNear(ctx, { readingId })).rejects.toThrow();
    });
    expect(await followedIn(place.programId)).toEqual([]);
  });
});
