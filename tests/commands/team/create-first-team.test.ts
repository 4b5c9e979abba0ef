import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { readMember } from "@/lib/auth/read-member";
import { signIn } from "@/lib/auth/sign-in";
import { createFirstTeam } from "@/lib/commands/team/create-first-team";
import { auditRows } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { openTestDatabase } from "../../support/database";

const INPUT = {
  teamName: "Saltmarsh Optics",
  name: "Ada Reed",
  email: "Admin@Saltmarsh.example",
  password: "a long enough one",
};

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

describe("first run and signing in", () => {
  test("a short password is refused at its field and nothing is made", async () => {
    await expect(
      createFirstTeam({ ...INPUT, password: "short" }, database.app),
    ).rejects.toMatchObject({ fieldErrors: { password: "Use at least 12 characters." } });
    expect((await database.owner.query("select 1 from teams")).rowCount).toBe(0);
  });

  test("of two first runs at once only one makes a team, with an admin who can sign in", async () => {
    const outcomes = await Promise.allSettled([
      createFirstTeam(INPUT, database.app),
      createFirstTeam({ ...INPUT, email: "other@saltmarsh.example" }, database.app),
    ]);
    expect(outcomes.filter((o) => o.status === "fulfilled")).toHaveLength(1);
    const people = await database.owner.query<{ email: string }>("select email from users");
    const email = people.rows[0]?.email ?? "";
    const found = await signIn(database.app, email.toUpperCase(), INPUT.password);
    expect(found?.email).toBe(email);
    if (!found) return;
    const member = await readMember(database.app, found.teamId, found.userId);
    expect(member).toMatchObject({ role: "admin", teamName: "Saltmarsh Optics" });
    const rows = await auditRows(database, found.teamId);
    expect(rows.map((row) => row.action)).toEqual(["team.create"]);
    await expect(createFirstTeam(INPUT, database.app)).rejects.toMatchObject({ code: "conflict" });
  });

  test("a wrong password, an unknown address and a deactivated member get nothing", async () => {
    const [person] = (await database.owner.query("select id, email from users")).rows;
    expect(await signIn(database.app, person.email, "another password")).toBeNull();
    expect(await signIn(database.app, "nobody@saltmarsh.example", INPUT.password)).toBeNull();
    const hash = await database.owner.query("select password_hash from users");
    expect(hash.rows[0].password_hash).toMatch(/^\$argon2id\$/);
    const [member] = (await database.owner.query("select team_id from members")).rows;
    await database.owner.query("update members set deactivated_at = now()");
    expect(await signIn(database.app, person.email, INPUT.password)).toBeNull();
    expect(await readMember(database.app, member.team_id, person.id)).toBeNull();
  });
});
