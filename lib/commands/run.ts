import { sql } from "drizzle-orm";
import type { ZodType } from "zod";
import { auditEvents } from "@/db/schema";
import type { Transaction } from "@/db/client";
import { inTeam } from "@/db/client";
import type { Context } from "@/lib/auth/context";
import { isAllowed } from "@/lib/auth/context";
import type { Permission } from "@/lib/auth/permissions";
import { CommandError } from "./result";
import type { FieldErrors } from "./result";

export interface AuditEntry {
  action: string;
  subjectType: string;
  subjectId: string;
  detail?: Record<string, unknown>;
}

/** First line of every command: refuses when the member's role lacks the permission. */
export function requirePermission(ctx: Context, permission: Permission): void {
  if (!isAllowed(ctx, permission)) {
    throw new CommandError("denied", "Your role in this team does not allow this.");
  }
}

/** Second line: the input as its schema says, or one message per field. */
export function parseInput<T>(schema: ZodType<T>, input: unknown): T {
  const parsed = schema.safeParse(input);
  if (parsed.success) return parsed.data;
  const fieldErrors: FieldErrors = {};
  for (const issue of parsed.error.issues) {
    fieldErrors[issue.path.join(".")] ??= issue.message;
  }
  throw new CommandError("invalid", "Some fields need another look.", fieldErrors);
}

/** Third: one transaction that holds the change and its audit row, or neither. */
export function change<T>(
  ctx: Context,
  work: (tx: Transaction, audit: (entry: AuditEntry) => Promise<void>) => Promise<T>,
): Promise<T> {
  return inTeam(ctx.db, ctx.teamId, (tx) =>
    work(tx, async (entry) => {
      await tx.insert(auditEvents).values({
        teamId: ctx.teamId,
        actorId: ctx.userId,
        // The moment of the row itself: several rows of one transaction keep their order.
        at: sql`clock_timestamp()`,
        action: entry.action,
        subjectType: entry.subjectType,
        subjectId: entry.subjectId,
        detail: entry.detail ?? {},
      });
    }),
  );
}

/** PostgreSQL's code for a broken unique constraint, which Drizzle keeps in the cause. */
export function isDuplicate(error: unknown, constraint: string): boolean {
  const cause = error instanceof Error ? error.cause : undefined;
  if (typeof cause !== "object" || cause === null) return false;
  return (
    "code" in cause &&
    cause.code === "23505" &&
    "constraint" in cause &&
    cause.constraint === constraint
  );
}
