import { afterAll, beforeAll, describe, expect, test } from "vitest";
import type { Context } from "@/lib/auth/context";
import { createProgram } from "@/lib/commands/program/create-program";
import { editProgram } from "@/lib/commands/program/edit-program";
import { listAuditChoices, listAuditEvents } from "@/lib/queries/team/list-audit-events";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const program = (name: string) => ({ name, description: "", targetMarginDb: 3 });

/** Many events of one instant, as a big import would leave them. */
async function makeEvents(ctx: Context, count: number) {
  await database.owner.query(
    `insert into audit_events (team_id, actor_id, at, action, subject_type, subject_id)
     select $1, $2, timestamptz '2026-10-01 08:00:00.123456Z', 'sweep.import', 'sweep', n::text
     from generate_series(1, $3::int) n`,
    [ctx.teamId, ctx.userId, count],
  );
}

describe("listAuditEvents", () => {
  test("shows the newest first, with who did it and what the subject is called today", async () => {
    const ctx = await makeMember(database, "admin");
    const { programId } = await createProgram(ctx, program("Gannet"));
    await editProgram(ctx, { programId, ...program("Gannet II") });
    const { events, nextBefore } = await listAuditEvents(ctx, {});
    expect(nextBefore).toBeNull();
    expect(events.map((event) => event.action)).toEqual(["program.edit", "program.create"]);
    expect(events[1]).toMatchObject({
      actor: "A admin",
      subjectType: "program",
      subjectId: programId,
      subjectName: "Gannet II",
      detail: program("Gannet"),
    });
  });

  test("pages without losing or repeating an event, also among events of one instant", async () => {
    const ctx = await makeMember(database, "admin");
    await makeEvents(ctx, 120);
    const seen: string[] = [];
    const sizes: number[] = [];
    let before: string | undefined;
    do {
      const page = await listAuditEvents(ctx, { before });
      sizes.push(page.events.length);
      seen.push(...page.events.map((event) => event.subjectId));
      before = page.nextBefore ?? undefined;
    } while (before);
    expect(sizes).toEqual([50, 50, 20]);
    expect(new Set(seen).size).toBe(120);
  });

  test("filters by action and by person, and offers what occurs", async () => {
    const admin = await makeMember(database, "admin");
    const engineer = await makeMember(database, "engineer", admin.teamId);
    await createProgram(admin, program("Tern"));
    await createProgram(engineer, program("Plover"));
    await makeEvents(engineer, 2);
    const imports = await listAuditEvents(admin, { action: "sweep.import" });
    expect(imports.events).toHaveLength(2);
    const both = await listAuditEvents(admin, {
      action: "program.create",
      actorId: engineer.userId,
    });
    expect(both.events.map((event) => event.subjectName)).toEqual(["Plover"]);
    expect(await listAuditChoices(admin)).toEqual({
      actions: ["program.create", "sweep.import"],
      people: [
        { id: admin.userId, name: "A admin" },
        { id: engineer.userId, name: "A engineer" },
      ],
    });
  });

  test("is for admins alone", async () => {
    const ctx = await makeMember(database, "manager");
    await expect(listAuditEvents(ctx, {})).rejects.toMatchObject({ code: "denied" });
    await expect(listAuditChoices(ctx)).rejects.toMatchObject({ code: "denied" });
  });

  test("shows nothing of another team, not even from a mark of theirs, and no error for nonsense", async () => {
    const ours = await makeMember(database, "admin");
    const theirs = await makeMember(database, "admin");
    await createProgram(theirs, program("Sluice"));
    const [mark] = (await listAuditEvents(theirs, {})).events;
    await createProgram(ours, program("Gannet"));
    const nothing = { events: [], nextBefore: null };
    expect(await listAuditEvents(ours, { before: mark?.id })).toMatchObject(nothing);
    expect(await listAuditEvents(ours, { actorId: theirs.userId })).toMatchObject(nothing);
    expect(await listAuditEvents(ours, { before: "yesterday" })).toMatchObject(nothing);
    expect((await listAuditEvents(ours, {})).events).toHaveLength(1);
  });
});
