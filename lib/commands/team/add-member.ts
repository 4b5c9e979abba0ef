import { and, eq, sql } from "drizzle-orm";
import { members, users } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { hashPassword } from "@/lib/auth/password";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { addMemberSchema } from "./schemas";

export interface AddedMember {
  userId: string;
  name: string;
  /** True when the person had an account already: then name and password stayed as they were. */
  hadAccount: boolean;
}

/** Makes somebody a member of the team, with a first password that the admin hands over. */
export async function addMember(ctx: Context, input: unknown): Promise<AddedMember> {
  requirePermission(ctx, "people.write");
  const values = parseInput(addMemberSchema, input);
  const email = values.email.trim().toLowerCase();
  const hash = await hashPassword(values.password);
  return change(ctx, async (tx, audit) => {
    const [present] = await tx
      .select({ deactivatedAt: members.deactivatedAt })
      .from(members)
      .innerJoin(users, eq(users.id, members.userId))
      .where(and(eq(members.teamId, ctx.teamId), eq(users.email, email)));
    if (present) {
      const message = present.deactivatedAt
        ? "This person is a deactivated member: reactivate them in the list."
        : "This person is a member already.";
      throw new CommandError("conflict", message, { email: message });
    }
    const made = await tx.execute<{ id: string }>(
      sql`select add_member(${values.name}, ${email}, ${hash}, ${values.role}) as id`,
    );
    const userId = made.rows[0]?.id;
    if (!userId) throw new Error("The member was not stored.");
    const [person] = await tx
      .select({ name: users.name, hash: users.passwordHash })
      .from(users)
      .where(eq(users.id, userId));
    if (!person) throw new Error("The member cannot be read back.");
    await audit({
      action: "member.add",
      subjectType: "member",
      subjectId: userId,
      detail: { name: person.name, email, role: values.role },
    });
    return { userId, name: person.name, hadAccount: person.hash !== hash };
  });
}
