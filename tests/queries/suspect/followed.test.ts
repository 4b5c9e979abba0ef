import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { inTeam } from "@/db/client";
import type { Context } from "@/lib/auth/context";
import { assignSuspect } from "@/lib/commands/suspect/assign-suspect";
import { editSuspect } from "@/lib/commands/suspect/edit-suspect";
import { followAllNear } from "@/lib/commands/suspect/follow-all-near";
import { setSuspectState } from "@/lib/commands/suspect/set-suspect-state";
import { archiveSweep } from "@/lib/commands/sweep/archive-sweep";
import { followedOf, readFollowedMarks } from "@/lib/queries/suspect/followed-of";
import type { SuspectFilter } from "@/lib/queries/suspect/list-suspects";
import { listOpenSuspects, listSuspects } from "@/lib/queries/suspect/list-suspects";
import { readSuspect } from "@/lib/queries/suspect/read-suspect";
import { addBuild, importPeaks, readingOf } from "../../commands/suspect/arrange";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import type { Place } from "../../support/sweeps";
import { makePlace, SETTINGS } from "../../support/sweeps";

const ALL: SuspectFilter = { state: null, owner: null, fromHz: null, toHz: null };

let database: TestDatabase;
let ctx: Context;
let g1: Place;
/** Followed from G1, the worst margin first: 110, 220 and 60 MHz. */
let ids: string[];

/**
 * G1 sees all three; G2 was swept to 170 MHz and sees 110 MHz alone; G3 has no sweep on record;
 * G4 sees 220 and 60 MHz, the former in two sweeps.
 */
beforeAll(async () => {
  database = await openTestDatabase();
  ctx = await makeMember(database, "engineer");
  g1 = await makePlace(ctx);
  const first = await importPeaks(ctx, g1, { 60: 1.5, 110: -3, 220: 1 });
  const { readingId } = await readingOf(database, first);
  ids = (await followAllNear(ctx, { readingId })).suspectIds;
  const g2 = await addBuild(ctx, g1, "G2");
  await importPeaks(ctx, g2, { 110: 2 }, { name: "G2 low" });
  const half = await readingOf(database, await shortSweep(g2));
  expect(half.readingId).not.toBe("");
  const g3 = await addBuild(ctx, g1, "G3");
  await importPeaks(ctx, g3, { 110: -9 }, { onRecord: false });
  const g4 = await addBuild(ctx, g1, "G4");
  await importPeaks(ctx, g4, { 60: 4, 220: -1 }, { name: "G4 vertical" });
  const horizontal = { ...SETTINGS, polarization: "horizontal" };
  await importPeaks(ctx, g4, { 220: -2 }, { name: "G4 horizontal", settings: horizontal });
  const gone = await importPeaks(ctx, g4, { 220: -20 }, { name: "G4 archived" });
  await archiveSweep(ctx, { sweepId: gone });
});
afterAll(() => database.close());

/** A sweep of G2 that ends at 90 MHz: it says nothing of 110 MHz and above. */
const shortSweep = (place: Place) =>
  importPeaks(ctx, place, {}, { name: "G2 short" }, { stepMhz: 60 / 27 });

const kinds = (builds: { buildName: string; kind: string }[]) =>
  builds.map((build) => `${build.buildName} ${build.kind}`);

describe("readSuspect", () => {
  test("tells for each build what the sweeps on record say", async () => {
    const over = await readSuspect(ctx, ids[0]!);
    expect(over).toMatchObject({ number: 1, state: "open", ownerName: null });
    expect(kinds(over!.builds)).toEqual(["G1 seen", "G2 seen", "G3 not-swept", "G4 not-seen"]);
    expect(over!.builds.map((b) => b.best?.marginDb?.toFixed(1) ?? null)).toEqual([
      "-3.0",
      "2.0",
      null,
      null,
    ]);
    expect(over!.builds[0]!.best).toMatchObject({
      standing: "over",
      lineName: "Peak",
      detector: "peak",
      basis: "like-for-like",
      sweepName: "G1 vertical",
      unit: "dBuV/m",
    });
    expect(over!.builds[3]!.sweptBy.map((sweep) => sweep.sweepName)).toEqual([
      "G4 vertical",
      "G4 horizontal",
    ]);
    expect(over!.newest).toMatchObject({ buildName: "G4", kind: "not-seen" });
    expect(over!.change).toMatchObject({ fromBuild: "G1", toBuild: "G2" });
    expect(over!.change!.marginDb).toBeCloseTo(5, 3);
    expect(over!.change!.levelDb).toBeCloseTo(-5, 3);
  });

  test("takes the worst of a build's sweeps, archived ones left out", async () => {
    const twice = await readSuspect(ctx, ids[1]!);
    expect(kinds(twice!.builds)).toEqual(["G1 seen", "G2 not-seen", "G3 not-swept", "G4 seen"]);
    const newest = twice!.builds[3]!;
    expect(newest.sightings.map((s) => s.sweepName)).toEqual(["G4 horizontal", "G4 vertical"]);
    expect(newest.best!.marginDb).toBeCloseTo(-2, 3);
    expect(twice!.change!.cautions).toEqual(["Polarization vertical, then horizontal."]);
  });

  test("gives the notes in order, and members only to whom may assign", async () => {
    await setSuspectState(ctx, { suspectId: ids[2]!, state: "treated", note: "Gasket." });
    const detail = await readSuspect(ctx, ids[2]!);
    expect(detail!.notes.map((note) => [note.author, note.text])).toEqual([
      ["A engineer", ""],
      ["A engineer", "Gasket."],
    ]);
    expect(detail!.owners.map((owner) => owner.id)).toContain(ctx.userId);
    const liaison = await makeMember(database, "liaison", ctx.teamId);
    const read = await readSuspect(liaison, ids[2]!);
    expect(read!.notes).toHaveLength(2);
    expect(read!.owners).toEqual([]);
  });

  test("finds nothing of another team and nothing under what is no id", async () => {
    const theirs = await makeMember(database, "engineer");
    expect(await readSuspect(theirs, ids[0]!)).toBeNull();
    expect(await readSuspect(ctx, "1; drop")).toBeNull();
  });
});

describe("listSuspects", () => {
  const numbers = async (filter: Partial<SuspectFilter>) =>
    (await listSuspects(ctx, g1.programId, { ...ALL, ...filter }))!.suspects.map((s) => s.number);

  test("puts the worst margin of the newest build first and what was not seen last", async () => {
    expect(await numbers({})).toEqual([2, 3, 1]);
  });

  test("filters by state, owner and frequency", async () => {
    await assignSuspect(ctx, { suspectId: ids[1]!, ownerId: ctx.userId });
    expect(await numbers({ state: "treated" })).toEqual([3]);
    expect(await numbers({ owner: ctx.userId })).toEqual([2]);
    expect(await numbers({ owner: "nobody" })).toEqual([3, 1]);
    expect(await numbers({ fromHz: 100e6, toHz: 130e6 })).toEqual([1]);
    const list = await listSuspects(ctx, g1.programId, { ...ALL, state: "accepted" });
    expect(list).toMatchObject({ total: 3, open: 2, suspects: [] });
    expect(list!.owners).toEqual([{ id: ctx.userId, name: "A engineer" }]);
  });

  test("lists what is open for the program", async () => {
    expect((await listOpenSuspects(ctx, g1.programId)).map((s) => s.number)).toEqual([2, 1]);
  });

  test("finds no program of another team", async () => {
    const theirs = await makeMember(database, "engineer");
    expect(await listSuspects(theirs, g1.programId, ALL)).toBeNull();
    expect(await listOpenSuspects(theirs, g1.programId)).toEqual([]);
    expect(await listSuspects(ctx, "none", ALL)).toBeNull();
  });
});

describe("marks for a table of suspects", () => {
  test("name the followed suspect of each row, and the one that a row only lies beside", async () => {
    const found = [
      { number: 1, frequencyHz: 110.2e6 },
      { number: 2, frequencyHz: 118e6 },
      { number: 3, frequencyHz: 170e6 },
    ];
    const seenBy = { rbwHz: 120e3, stepHz: 60e3, spread: null };
    const marks = await inTeam(ctx.db, ctx.teamId, (tx) =>
      followedOf(tx, ctx.teamId, g1.programId, found, seenBy),
    );
    expect(marks).toEqual([
      { number: 1, suspectId: ids[0], followedNumber: 1, state: "open", isSame: true },
      { number: 2, suspectId: ids[0], followedNumber: 1, state: "open", isSame: false },
    ]);
  });

  test("are read by the reading, and not by another team", async () => {
    const sweepId = await importPeaks(ctx, g1, { 110: 3, 160: 3 }, { onRecord: false });
    const { readingId, numberAt } = await readingOf(database, sweepId);
    expect(await readFollowedMarks(ctx, readingId)).toEqual([
      {
        number: numberAt(110),
        suspectId: ids[0],
        followedNumber: 1,
        state: "open",
        isSame: true,
      },
    ]);
    const theirs = await makeMember(database, "engineer");
    expect(await readFollowedMarks(theirs, readingId)).toEqual([]);
  });

  test("a narrowed tolerance lets a neighbour be followed by itself", async () => {
    await editSuspect(ctx, { suspectId: ids[0]!, source: "", toleranceHz: 1e6 });
    const seenBy = { rbwHz: 120e3, stepHz: 60e3, spread: null };
    const marks = await inTeam(ctx.db, ctx.teamId, (tx) =>
      followedOf(tx, ctx.teamId, g1.programId, [{ number: 2, frequencyHz: 118e6 }], seenBy),
    );
    expect(marks).toEqual([]);
  });
});
