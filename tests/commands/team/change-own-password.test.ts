import { sql } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { inTeam } from "@/db/client";
import type { Context } from "@/lib/auth/context";
import { hashPassword } from "@/lib/auth/password";
import { ROLES } from "@/lib/auth/permissions";
import type { Role } from "@/lib/auth/permissions";
import { signIn } from "@/lib/auth/sign-in";
import { changeOwnPassword } from "@/lib/commands/team/change-own-password";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";

const OLD = "handed over on paper";
const NEW = "known to me alone";
const INPUT = { currentPassword: OLD, newPassword: NEW, repeated: NEW };

let database: TestDatabase;
let oldHash: string;
beforeAll(async () => {
  database = await openTestDatabase();
  oldHash = await hashPassword(OLD);
});
afterAll(() => database.close());

async function makePerson(role: Role = "engineer"): Promise<Context & { email: string }> {
  const ctx = await makeMember(database, role);
  const { rows } = await database.owner.query(
    "update users set password_hash = $1 where id = $2 returning email",
    [oldHash, ctx.userId],
  );
  return { ...ctx, email: rows[0].email };
}

const opens = async (email: string, password: string) =>
  (await signIn(database.app, email, password)) !== null;

describe("changeOwnPassword", () => {
  test.each(ROLES)("lets a member who is %s in by the new password only, audited", async (role) => {
    const ctx = await makePerson(role);
    await changeOwnPassword(ctx, INPUT);
    expect(await opens(ctx.email, NEW)).toBe(true);
    expect(await opens(ctx.email, OLD)).toBe(false);
    expect(await auditRows(database, ctx.teamId)).toEqual([
      { actor_id: ctx.userId, action: "member.change-password", subject_id: ctx.userId },
    ]);
  });

  test("refuses a member who is deactivated, and somebody who belongs to another team", async () => {
    const ctx = await makePerson();
    const theirs = await makePerson();
    const intruder = { ...ctx, userId: theirs.userId };
    await expect(changeOwnPassword(intruder, INPUT)).rejects.toMatchObject({ code: "denied" });
    await database.owner.query("update members set deactivated_at = now() where user_id = $1", [
      ctx.userId,
    ]);
    await expect(changeOwnPassword(ctx, INPUT)).rejects.toMatchObject({ code: "denied" });
    expect(await opens(theirs.email, OLD)).toBe(true);
  });

  test("the database itself changes no password outside the team, and none without a team", async () => {
    const ours = await makePerson("admin");
    const theirs = await makePerson();
    const statement = sql`select change_own_password(${theirs.userId}, 'x') as done`;
    const reached = await inTeam(database.app, ours.teamId, (tx) => tx.execute(statement));
    expect(reached.rows).toEqual([{ done: false }]);
    await expect(database.app.execute(statement)).rejects.toThrow();
    expect(await opens(theirs.email, OLD)).toBe(true);
  });

  test("keeps the old password when the audit row cannot be written", async () => {
    const ctx = await makePerson();
    await withoutAudit(database, async () => {
      await expect(changeOwnPassword(ctx, INPUT)).rejects.toThrow();
    });
    expect(await opens(ctx.email, OLD)).toBe(true);
  });

  test("says at the field what is wrong", async () => {
    const ctx = await makePerson();
    const refused = (input: Partial<typeof INPUT>, fieldErrors: Record<string, string>) =>
      expect(changeOwnPassword(ctx, { ...INPUT, ...input })).rejects.toMatchObject({
        code: "invalid",
        fieldErrors,
      });
    await refused(
      { currentPassword: "not my password" },
      { currentPassword: "This is not your current password." },
    );
    await refused({ newPassword: "short" }, { newPassword: "Use at least 12 characters." });
    await refused({ repeated: "other" }, { repeated: "This is not the same as the new password." });
    await refused(
      { newPassword: OLD, repeated: OLD },
      { newPassword: "This is your current password." },
    );
    expect(await opens(ctx.email, OLD)).toBe(true);
  });

  test("stops guessing at the current password after ten tries", async () => {
    const ctx = await makePerson();
    const guess = { ...INPUT, currentPassword: "a guess" };
    for (let i = 0; i < 10; i++) {
      await expect(changeOwnPassword(ctx, guess)).rejects.toMatchObject({ code: "invalid" });
    }
    await expect(changeOwnPassword(ctx, INPUT)).rejects.toMatchObject({
      code: "conflict",
      message: "Too many tries. Wait some minutes and try again.",
    });
    expect(await opens(ctx.email, OLD)).toBe(true);
  });
});
