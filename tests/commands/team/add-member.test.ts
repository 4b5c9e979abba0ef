import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { signIn } from "@/lib/auth/sign-in";
import { addMember } from "@/lib/commands/team/add-member";
import { listMembers } from "@/lib/queries/team/list-members";
import { auditRows, withoutAudit } from "../../support/audit";
import type { TestDatabase } from "../../support/database";
import { makeMember, openTestDatabase } from "../../support/database";

const person = (email: string) => ({
  name: "Ines Tideway",
  email,
  role: "manager",
  password: "handed over on paper",
});

let database: TestDatabase;
beforeAll(async () => {
  database = await openTestDatabase();
});
afterAll(() => database.close());

describe("addMember", () => {
  test("makes an account that can sign in with the first password, and one audit row", async () => {
    const ctx = await makeMember(database, "admin");
    const input = person("Ines@Saltmarsh.example");
    const added = await addMember(ctx, input);
    expect(added).toMatchObject({ name: "Ines Tideway", hadAccount: false });
    const found = await signIn(database.app, "ines@saltmarsh.example", input.password);
    expect(found).toMatchObject({ userId: added.userId, teamId: ctx.teamId });
    const rows = await listMembers(ctx);
    expect(rows.find((row) => row.userId === added.userId)).toMatchObject({
      role: "manager",
      email: "ines@saltmarsh.example",
      deactivatedAt: null,
    });
    expect(await auditRows(database, ctx.teamId)).toEqual([
      { actor_id: ctx.userId, action: "member.add", subject_id: added.userId },
    ]);
    const stored = await database.owner.query("select detail::text from audit_events");
    expect(JSON.stringify(stored.rows)).not.toContain(input.password);
  });

  test("refuses everybody but an admin", async () => {
    const admin = await makeMember(database, "admin");
    for (const role of ["engineer", "manager", "liaison"] as const) {
      const ctx = await makeMember(database, role, admin.teamId);
      const tried = addMember(ctx, person(`by-${role}@saltmarsh.example`));
      await expect(tried).rejects.toMatchObject({ code: "denied" });
    }
    expect(await listMembers(admin)).toHaveLength(4);
  });

  test("a person of another team keeps name and password, and that team sees nothing of it", async () => {
    const theirs = await makeMember(database, "admin");
    const input = person("shared@saltmarsh.example");
    await addMember(theirs, { ...input, name: "First Name", password: "their own password" });
    const ours = await makeMember(database, "admin");
    const added = await addMember(ours, { ...input, role: "liaison" });
    expect(added).toMatchObject({ name: "First Name", hadAccount: true });
    expect(await signIn(database.app, input.email, input.password)).toBeNull();
    const found = await signIn(database.app, input.email, "their own password");
    expect(found?.userId).toBe(added.userId);
    expect(await listMembers(ours)).toHaveLength(2);
    expect(await listMembers(theirs)).toHaveLength(2);
    expect(await auditRows(database, theirs.teamId)).toHaveLength(1);
  });

  test("leaves nothing behind when the audit row cannot be written", async () => {
    const ctx = await makeMember(database, "admin");
    await withoutAudit(database, async () => {
      await expect(addMember(ctx, person("nobody@saltmarsh.example"))).rejects.toThrow();
    });
    expect(await listMembers(ctx)).toHaveLength(1);
    const left = await database.owner.query(
      "select 1 from users where email = 'nobody@saltmarsh.example'",
    );
    expect(left.rowCount).toBe(0);
  });

  test("says at the field what is wrong", async () => {
    const ctx = await makeMember(database, "admin");
    const bad = { name: "", email: "ines", role: "owner", password: "elevenchars" };
    await expect(addMember(ctx, bad)).rejects.toMatchObject({
      code: "invalid",
      fieldErrors: {
        name: "Write the person's name.",
        email: expect.stringContaining("e-mail address"),
        role: "Choose a role.",
        password: "Use at least 12 characters.",
      },
    });
    const input = person("twice@saltmarsh.example");
    await addMember(ctx, input);
    const again = addMember(ctx, { ...input, email: "TWICE@saltmarsh.example" });
    await expect(again).rejects.toMatchObject({
      code: "conflict",
      fieldErrors: { email: "This person is a member already." },
    });
  });
});
