import { and, eq, isNull, sql } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { members, users } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { hashPassword, verifyPassword } from "@/lib/auth/password";
import { TooManyTriesError, bookTry } from "@/lib/auth/throttle";
import { CommandError } from "../result";
import { change, parseInput } from "../run";
import { changeOwnPasswordSchema } from "./schemas";

/**
 * The one command that every role may run, so it names no permission: it can only ever reach the
 * password of whoever runs it, and asks for the current one.
 */
export async function changeOwnPassword(ctx: Context, input: unknown): Promise<{ userId: string }> {
  const values = parseInput(changeOwnPasswordSchema, input);
  const [person] = await inTeam(ctx.db, ctx.teamId, (tx) =>
    tx
      .select({ email: users.email, hash: users.passwordHash })
      .from(users)
      .innerJoin(members, eq(members.userId, users.id))
      .where(
        and(
          eq(members.teamId, ctx.teamId),
          eq(members.userId, ctx.userId),
          isNull(members.deactivatedAt),
        ),
      ),
  );
  if (!person) throw new CommandError("denied", "You are no longer an active member of this team.");
  const proveRight = await bookTry(ctx.db, person.email, "account page").catch((error: unknown) => {
    if (!(error instanceof TooManyTriesError)) throw error;
    throw new CommandError("conflict", "Too many tries. Wait some minutes and try again.");
  });
  if (!(await verifyPassword(person.hash, values.currentPassword))) {
    const message = "This is not your current password.";
    throw new CommandError("invalid", message, { currentPassword: message });
  }
  const hash = await hashPassword(values.newPassword);
  await change(ctx, async (tx, audit) => {
    const done = await tx.execute<{ done: boolean }>(
      sql`select change_own_password(${ctx.userId}, ${hash}) as done`,
    );
    if (!done.rows[0]?.done) {
      throw new CommandError("denied", "You are no longer an active member of this team.");
    }
    await audit({
      action: "member.change-password",
      subjectType: "member",
      subjectId: ctx.userId,
    });
  });
  await proveRight();
  return { userId: ctx.userId };
}
