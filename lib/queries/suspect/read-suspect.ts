import { and, asc, eq, isNull } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { followedSuspects, members, programs, suspectNotes, users } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { isAllowed } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";
import { isId } from "../is-id";
import { changeSinceFirst } from "./change-since-first";
import { loadFollowed, newestSwept } from "./load-followed";

/** One followed suspect with its notes in order and what each build says; null without one. */
export async function readSuspect(ctx: Context, suspectId: string) {
  requirePermission(ctx, "sweep.read");
  if (!isId(suspectId)) return null;
  return inTeam(ctx.db, ctx.teamId, async (tx) => {
    const [program] = await tx
      .select({ id: programs.id, name: programs.name, archivedAt: programs.archivedAt })
      .from(followedSuspects)
      .innerJoin(
        programs,
        and(
          eq(programs.teamId, followedSuspects.teamId),
          eq(programs.id, followedSuspects.programId),
        ),
      )
      .where(and(eq(followedSuspects.teamId, ctx.teamId), eq(followedSuspects.id, suspectId)));
    if (!program) return null;
    const all = await loadFollowed(tx, ctx.teamId, program.id);
    const suspect = all.find((one) => one.id === suspectId);
    if (!suspect) return null;
    const notes = await tx
      .select({
        id: suspectNotes.id,
        author: users.name,
        text: suspectNotes.text,
        change: suspectNotes.change,
        at: suspectNotes.createdAt,
      })
      .from(suspectNotes)
      .innerJoin(users, eq(users.id, suspectNotes.authorId))
      .where(and(eq(suspectNotes.teamId, ctx.teamId), eq(suspectNotes.suspectId, suspectId)))
      .orderBy(asc(suspectNotes.createdAt), asc(suspectNotes.id));
    // Only who may assign a suspect needs to know whom to.
    const owners = isAllowed(ctx, "suspect.assign")
      ? await tx
          .select({ id: users.id, name: users.name })
          .from(members)
          .innerJoin(users, eq(users.id, members.userId))
          .where(and(eq(members.teamId, ctx.teamId), isNull(members.deactivatedAt)))
          .orderBy(asc(users.name))
      : [];
    return {
      ...suspect,
      program,
      notes,
      owners,
      newest: newestSwept(suspect),
      change: changeSinceFirst(suspect.builds),
      readAt: new Date(),
    };
  });
}

export type SuspectDetail = NonNullable<Awaited<ReturnType<typeof readSuspect>>>;
