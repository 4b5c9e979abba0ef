import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { followedSuspects, suspectNotes } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { lockOpenProgram } from "../program/find-open";
import { CommandError } from "../result";
import { nameFollowed } from "./store-followed";

/** The followed suspect, locked together with its program, which must not be archived. */
export async function lockFollowed(ctx: Context, tx: Transaction, suspectId: string) {
  const own = and(eq(followedSuspects.teamId, ctx.teamId), eq(followedSuspects.id, suspectId));
  const [found] = await tx
    .select({ programId: followedSuspects.programId })
    .from(followedSuspects)
    .where(own);
  if (!found) throw new CommandError("not-found", "This suspect is not followed.");
  await lockOpenProgram(ctx, tx, found.programId);
  const [suspect] = await tx.select().from(followedSuspects).where(own).for("update");
  if (!suspect) throw new CommandError("not-found", "This suspect is not followed.");
  return { ...suspect, name: nameFollowed(suspect) };
}

type Change = Record<string, { from: string | null; to: string | null }>;

/** Adds to what was said about a suspect; a change is kept beside the words. */
export async function storeNote(
  ctx: Context,
  tx: Transaction,
  suspectId: string,
  note: { text: string; change: Change | null },
): Promise<void> {
  await tx
    .insert(suspectNotes)
    .values({ teamId: ctx.teamId, suspectId, authorId: ctx.userId, ...note });
}
