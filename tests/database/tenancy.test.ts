import { sql } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { inTeam } from "@/db/client";
import { createProgram } from "@/lib/commands/program/create-program";
import type { TestDatabase } from "../support/database";
import { makeMember, openTestDatabase } from "../support/database";

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

const INPUT = { name: "Tern", description: "", targetMarginDb: 3 };

describe("row-level security", () => {
  test("guards every table of the schema, and the app's role owns none and bypasses nothing", async () => {
    const open = await database.owner.query(
      `select c.relname from pg_class c join pg_namespace n on n.oid = c.relnamespace
       where n.nspname = 'public' and c.relkind = 'r'
         and (not c.relrowsecurity or pg_get_userbyid(c.relowner) = 'neap_app')`,
    );
    expect(open.rows).toEqual([]);
    const role = await database.owner.query(
      "select rolsuper, rolbypassrls from pg_roles where rolname = 'neap_app'",
    );
    expect(role.rows).toEqual([{ rolsuper: false, rolbypassrls: false }]);
  });

  test("every table but teams, users and the tries to sign in carries the team", async () => {
    const without = await database.owner.query(
      `select t.table_name from information_schema.tables t
       where t.table_schema = 'public' and not exists (
         select 1 from information_schema.columns c
         where c.table_name = t.table_name and c.table_schema = 'public'
           and c.column_name = 'team_id')
       order by 1`,
    );
    expect(without.rows.map((row) => row.table_name)).toEqual([
      "sign_in_attempts",
      "teams",
      "users",
    ]);
  });

  test("the tries to sign in, which belong to no team, are out of the app's reach", async () => {
    for (const statement of [
      sql`select 1 from sign_in_attempts`,
      sql`insert into sign_in_attempts (address_digest, origin_digest) values ('a', 'b')`,
      sql`delete from sign_in_attempts`,
    ]) {
      const tried = database.app.execute(statement);
      await expect(tried).rejects.toMatchObject({ cause: { code: "42501" } });
    }
  });

  test("a query that forgets its team, or sets none, returns nothing of another team", async () => {
    const ours = await makeMember(database, "engineer");
    const theirs = await makeMember(database, "engineer");
    await createProgram(ours, INPUT);
    const everything = sql`select id from programs`;
    const seen = await inTeam(database.app, theirs.teamId, (tx) => tx.execute(everything));
    expect(seen.rows).toEqual([]);
    expect((await database.app.execute(everything)).rows).toEqual([]);
    expect((await database.app.execute(sql`select id from users`)).rows).toEqual([]);
    const own = await inTeam(database.app, ours.teamId, (tx) => tx.execute(everything));
    expect(own.rows).toHaveLength(1);
  });

  test("a row for another team is refused by the policy", async () => {
    const ours = await makeMember(database, "engineer");
    const theirs = await makeMember(database, "engineer");
    const smuggled = inTeam(database.app, ours.teamId, (tx) =>
      tx.execute(
        sql`insert into programs (team_id, name, target_margin_db) values (${theirs.teamId}, 'x', 1)`,
      ),
    );
    await expect(smuggled).rejects.toMatchObject({ cause: { code: "42501" } });
  });

  test("the audit trail can be added to, never changed or cut", async () => {
    const ctx = await makeMember(database, "engineer");
    await createProgram(ctx, INPUT);
    for (const statement of [
      sql`update audit_events set action = 'x'`,
      sql`delete from audit_events`,
    ]) {
      const tried = inTeam(database.app, ctx.teamId, (tx) => tx.execute(statement));
      await expect(tried).rejects.toMatchObject({ cause: { code: "42501" } });
    }
  });
});
