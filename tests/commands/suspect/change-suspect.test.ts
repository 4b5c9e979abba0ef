import { afterAll, beforeAll, describe, expect, test } from "vitest";
import type { Context } from "@/lib/auth/context";
import { archiveProgram } from "@/lib/commands/program/archive-program";
import { addNote } from "@/lib/commands/suspect/add-note";
import { assignSuspect } from "@/lib/commands/suspect/assign-suspect";
import { editSuspect } from "@/lib/commands/suspect/edit-suspect";
import { followSuspect } from "@/lib/commands/suspect/follow-suspect";
import { setSuspectState } from "@/lib/commands/suspect/set-suspect-state";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";
import { importPeaks, readingOf } from "./arrange";
import { makePlace } from "../../support/sweeps";

let database: TestDatabase;
let ctx: Context;
let programId: string;
let suspectId: string;
let manager: Context;
let liaison: Context;
let stranger: Context;

beforeAll(async () => {
  database = await openTestDatabase();
  ctx = await makeMember(database, "engineer");
  manager = await makeMember(database, "manager", ctx.teamId);
  liaison = await makeMember(database, "liaison", ctx.teamId);
  stranger = await makeMember(database, "engineer");
  const place = await makePlace(ctx);
  programId = place.programId;
  const sweepId = await importPeaks(ctx, place, { 80: 1 });
  const { readingId, numberAt } = await readingOf(database, sweepId);
  suspectId = (await followSuspect(ctx, { readingId, number: numberAt(80) })).suspectId;
});
afterAll(() => database.close());

async function stored() {
  const rows = await database.owner.query(
    "select source, tolerance_hz, owner_id, state from followed_suspects where id = $1",
    [suspectId],
  );
  return rows.rows[0];
}

async function notes() {
  const rows = await database.owner.query(
    "select author_id, text, change from suspect_notes where suspect_id = $1 order by created_at",
    [suspectId],
  );
  return rows.rows;
}

async function audited(action: string) {
  const rows = await auditRows(database, ctx.teamId);
  return rows.filter((row) => row.action === action && row.subject_id === suspectId);
}

/** What every command of a suspect owes: refusals, and nothing left of a change without its audit. */
async function refuses(
  command: (who: Context, input: unknown) => Promise<unknown>,
  input: Record<string, unknown>,
  denied: Context[],
) {
  const before = [await stored(), await notes()];
  for (const who of denied) {
    await expect(command(who, { suspectId, ...input })).rejects.toMatchObject({ code: "denied" });
  }
  await expect(command(stranger, { suspectId, ...input })).rejects.toMatchObject({
    code: "not-found",
  });
  await withoutAudit(database, async () => {
    await expect(command(ctx, { suspectId, ...input })).rejects.toThrow();
  });
  expect([await stored(), await notes()]).toEqual(before);
}

describe("editSuspect", () => {
  test("refuses manager, liaison and another team", () =>
    refuses(editSuspect, { source: "Panel link", toleranceHz: 3e5 }, [manager, liaison]));

  test("keeps source and tolerance with a note and an audit row; no change leaves no trace", async () => {
    const input = { suspectId, source: "Panel link", toleranceHz: 300e3 };
    await editSuspect(ctx, input);
    await editSuspect(ctx, input);
    expect(await stored()).toMatchObject({ source: "Panel link", tolerance_hz: 300e3 });
    expect((await notes()).at(-1)).toEqual({
      author_id: ctx.userId,
      text: "",
      change: {
        source: { from: null, to: "Panel link" },
        toleranceHz: { from: "20000000", to: "300000" },
      },
    });
    expect(await audited("suspect.edit")).toHaveLength(1);
  });

  test("puts a tolerance that is none at its field", async () => {
    for (const toleranceHz of [0, -1, Number.NaN, 2e9]) {
      await expect(editSuspect(ctx, { suspectId, source: "", toleranceHz })).rejects.toMatchObject({
        code: "invalid",
        fieldErrors: { toleranceHz: expect.any(String) },
      });
    }
  });
});

describe("assignSuspect", () => {
  test("refuses a liaison and another team", () =>
    refuses(assignSuspect, { ownerId: ctx.userId }, [liaison]));

  test("a manager gives it to an engineer and takes it back", async () => {
    await assignSuspect(manager, { suspectId, ownerId: ctx.userId });
    expect(await stored()).toMatchObject({ owner_id: ctx.userId });
    expect((await notes()).at(-1)).toEqual({
      author_id: manager.userId,
      text: "",
      change: { owner: { from: null, to: "A engineer" } },
    });
    await assignSuspect(manager, { suspectId, ownerId: null });
    expect(await stored()).toMatchObject({ owner_id: null });
    expect((await notes()).at(-1).change).toEqual({ owner: { from: "A engineer", to: null } });
    const rows = await audited("suspect.assign");
    expect(rows.map((row) => row.actor_id)).toEqual([manager.userId, manager.userId]);
  });

  test("refuses whoever is not an active member of the team", async () => {
    const gone = await makeMember(database, "engineer", ctx.teamId);
    await database.owner.query("update members set deactivated_at = now() where user_id = $1", [
      gone.userId,
    ]);
    for (const ownerId of [gone.userId, stranger.userId]) {
      await expect(assignSuspect(ctx, { suspectId, ownerId })).rejects.toMatchObject({
        code: "invalid",
        fieldErrors: { ownerId: "Choose an active member of your team." },
      });
    }
    expect(await stored()).toMatchObject({ owner_id: null });
  });
});

describe("setSuspectState", () => {
  test("refuses manager, liaison and another team", () =>
    refuses(setSuspectState, { state: "treated", note: "" }, [manager, liaison]));

  test("asks for a reason before explained or accepted", async () => {
    for (const state of ["explained", "accepted"]) {
      await expect(setSuspectState(ctx, { suspectId, state, note: "  " })).rejects.toMatchObject({
        code: "invalid",
        fieldErrors: { note: `Say in a note why it is ${state}.` },
      });
    }
    expect(await stored()).toMatchObject({ state: "open" });
  });

  test("keeps the state with its note and an audit row, and refuses the one it has", async () => {
    await setSuspectState(ctx, { suspectId, state: "treated", note: "" });
    const note = "Third harmonic of the panel's clock.";
    await setSuspectState(ctx, { suspectId, state: "explained", note });
    expect(await stored()).toMatchObject({ state: "explained" });
    expect((await notes()).at(-1)).toEqual({
      author_id: ctx.userId,
      text: note,
      change: { state: { from: "treated", to: "explained" } },
    });
    expect(await audited("suspect.set-state")).toHaveLength(2);
    await expect(
      setSuspectState(ctx, { suspectId, state: "explained", note }),
    ).rejects.toMatchObject({ code: "conflict", fieldErrors: { state: expect.any(String) } });
  });
});

describe("addNote", () => {
  test("refuses a liaison and another team", () => refuses(addNote, { text: "Hm." }, [liaison]));

  test("a manager may remark; an empty remark is refused at its field", async () => {
    await addNote(manager, { suspectId, text: " Is the gasket in? " });
    expect((await notes()).at(-1)).toEqual({
      author_id: manager.userId,
      text: "Is the gasket in?",
      change: null,
    });
    expect(await audited("suspect.add-note")).toHaveLength(1);
    await expect(addNote(ctx, { suspectId, text: " " })).rejects.toMatchObject({
      fieldErrors: { text: "Write the note first." },
    });
  });

  test("nothing changes in an archived program", async () => {
    await archiveProgram(ctx, { programId });
    await expect(addNote(ctx, { suspectId, text: "Late." })).rejects.toMatchObject({
      code: "not-found",
    });
  });
});
