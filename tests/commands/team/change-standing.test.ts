import { afterAll, beforeAll, describe, expect, test } from "vitest";
import type { Context } from "@/lib/auth/context";
import { hashPassword } from "@/lib/auth/password";
import { readMember } from "@/lib/auth/read-member";
import { signIn } from "@/lib/auth/sign-in";
import { changeRole } from "@/lib/commands/team/change-role";
import { deactivateMember } from "@/lib/commands/team/deactivate-member";
import { reactivateMember } from "@/lib/commands/team/reactivate-member";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";

const LAST_ADMIN = {
  code: "conflict",
  message: "This is the team's last active admin. Make somebody else admin first.",
};

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

/** As every request reads it; null: not let in. */
const roleOf = async (ctx: Context) =>
  (await readMember(database.app, ctx.teamId, ctx.userId))?.role ?? null;

async function makeTwo(role: "admin" | "engineer" = "engineer") {
  const admin = await makeMember(database, "admin");
  return { admin, other: await makeMember(database, role, admin.teamId) };
}

const CHANGES = [
  {
    name: "changeRole",
    run: (ctx: Context, userId: string) => changeRole(ctx, { userId, role: "manager" }),
    arrange: async () => {},
    action: "member.change-role",
    before: "engineer",
    after: "manager",
  },
  {
    name: "deactivateMember",
    run: (ctx: Context, userId: string) => deactivateMember(ctx, { userId }),
    arrange: async () => {},
    action: "member.deactivate",
    before: "engineer",
    after: null,
  },
  {
    name: "reactivateMember",
    run: (ctx: Context, userId: string) => reactivateMember(ctx, { userId }),
    arrange: async (userId: string) => {
      await database.owner.query("update members set deactivated_at = now() where user_id = $1", [
        userId,
      ]);
    },
    action: "member.reactivate",
    before: null,
    after: "engineer",
  },
];

describe.each(CHANGES)("$name", ({ run, arrange, action, before, after }) => {
  test("counts from the next request on and writes one audit row", async () => {
    const { admin, other } = await makeTwo();
    await arrange(other.userId);
    expect(await roleOf(other)).toBe(before);
    await run(admin, other.userId);
    expect(await roleOf(other)).toBe(after);
    expect(await auditRows(database, admin.teamId)).toEqual([
      { actor_id: admin.userId, action, subject_id: other.userId },
    ]);
  });

  test("refuses everybody but an admin", async () => {
    const { admin, other } = await makeTwo();
    await arrange(other.userId);
    for (const role of ["engineer", "manager", "liaison"] as const) {
      const ctx = await makeMember(database, role, admin.teamId);
      await expect(run(ctx, other.userId)).rejects.toMatchObject({ code: "denied" });
    }
    expect(await roleOf(other)).toBe(before);
  });

  test("does not reach another team", async () => {
    const { other } = await makeTwo();
    await arrange(other.userId);
    const theirs = await makeMember(database, "admin");
    await expect(run(theirs, other.userId)).rejects.toMatchObject({ code: "not-found" });
    expect(await roleOf(other)).toBe(before);
    expect(await auditRows(database, theirs.teamId)).toEqual([]);
  });

  test("leaves nothing behind when the audit row cannot be written", async () => {
    const { admin, other } = await makeTwo();
    await arrange(other.userId);
    await withoutAudit(database, async () => {
      await expect(run(admin, other.userId)).rejects.toThrow();
    });
    expect(await roleOf(other)).toBe(before);
  });

  test("asks for a member that is one", async () => {
    const { admin } = await makeTwo();
    await expect(run(admin, "somebody")).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: { userId: "Choose a member." },
    });
  });
});

describe("the last active admin", () => {
  test("keeps the role, also when the other admin is deactivated", async () => {
    const { admin, other } = await makeTwo("admin");
    await deactivateMember(admin, { userId: other.userId });
    const tried = changeRole(admin, { userId: admin.userId, role: "engineer" });
    await expect(tried).rejects.toMatchObject(LAST_ADMIN);
    expect(await roleOf(admin)).toBe("admin");
  });

  test("of two admins who take each other's role at once, one stays admin", async () => {
    const { admin, other } = await makeTwo("admin");
    const outcomes = await Promise.allSettled([
      changeRole(admin, { userId: other.userId, role: "engineer" }),
      changeRole(other, { userId: admin.userId, role: "engineer" }),
    ]);
    expect(outcomes.filter((o) => o.status === "fulfilled")).toHaveLength(1);
    expect([await roleOf(admin), await roleOf(other)].sort()).toEqual(["admin", "engineer"]);
  });

  test("of two admins who deactivate each other at once, one stays", async () => {
    const { admin, other } = await makeTwo("admin");
    const outcomes = await Promise.allSettled([
      deactivateMember(admin, { userId: other.userId }),
      deactivateMember(other, { userId: admin.userId }),
    ]);
    expect(outcomes.filter((o) => o.status === "fulfilled")).toHaveLength(1);
    expect([await roleOf(admin), await roleOf(other)].filter(Boolean)).toEqual(["admin"]);
  });
});

describe("deactivating", () => {
  test("oneself is refused though another admin is there", async () => {
    const { admin } = await makeTwo("admin");
    const tried = deactivateMember(admin, { userId: admin.userId });
    await expect(tried).rejects.toMatchObject({
      code: "conflict",
      message: "Nobody deactivates themselves: ask another admin.",
    });
    expect(await roleOf(admin)).toBe("admin");
  });

  test("ends signing in, and reactivating brings back role and password", async () => {
    const { admin, other } = await makeTwo();
    const { rows } = await database.owner.query(
      "update users set password_hash = $1 where id = $2 returning email",
      [await hashPassword("the old password"), other.userId],
    );
    const tryIt = () => signIn(database.app, rows[0].email, "the old password");
    expect(await tryIt()).toMatchObject({ userId: other.userId });
    await deactivateMember(admin, { userId: other.userId });
    expect(await tryIt()).toBeNull();
    await expect(deactivateMember(admin, { userId: other.userId })).rejects.toThrow(/already/);
    await reactivateMember(admin, { userId: other.userId });
    expect(await tryIt()).toMatchObject({ userId: other.userId });
    await expect(reactivateMember(admin, { userId: other.userId })).rejects.toThrow(/already/);
  });
});

describe("changing a role to the same", () => {
  test("changes nothing and writes no audit row", async () => {
    const { admin, other } = await makeTwo();
    await changeRole(admin, { userId: other.userId, role: "engineer" });
    expect(await auditRows(database, admin.teamId)).toEqual([]);
  });
});
