import { and, eq, max } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { followedSuspects, suspectNotes } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { recognitionToleranceHz } from "@/lib/core/reading/recognise-suspects";
import { formatFrequency } from "@/lib/core/units/format";
import type { ReadingSuspects } from "@/lib/queries/suspect/load-reading-suspects";
import { loadReadingSuspects } from "@/lib/queries/suspect/load-reading-suspects";
import { lockOpenProgram } from "../program/find-open";
import { CommandError } from "../result";

const followedIn = (ctx: Context, programId: string) =>
  and(eq(followedSuspects.teamId, ctx.teamId), eq(followedSuspects.programId, programId));

/** What the audit trail calls a followed suspect. */
export const nameFollowed = ({ number, frequencyHz }: { number: number; frequencyHz: number }) =>
  `suspect ${number} at ${formatFrequency(frequencyHz)}`;

export interface Followed {
  id: string;
  number: number;
  frequencyHz: number;
  toleranceHz: number;
}

/** The reading with what its program follows already; the program is locked, so numbers hold. */
export async function openReading(ctx: Context, tx: Transaction, readingId: string) {
  const reading = await loadReadingSuspects(tx, ctx.teamId, readingId);
  if (!reading) throw new CommandError("not-found", "This reading does not exist.");
  if (reading.archivedAt) {
    throw new CommandError("conflict", "This sweep is archived: restore it first.");
  }
  await lockOpenProgram(ctx, tx, reading.programId);
  const followed: Followed[] = await tx
    .select({
      id: followedSuspects.id,
      number: followedSuspects.number,
      frequencyHz: followedSuspects.frequencyHz,
      toleranceHz: followedSuspects.toleranceHz,
    })
    .from(followedSuspects)
    .where(followedIn(ctx, reading.programId));
  return { reading, followed };
}

/** The followed suspect whose tolerance a frequency falls into, the nearest of several. */
export function followedNear(followed: readonly Followed[], frequencyHz: number): Followed | null {
  const away = (one: Followed) => Math.abs(one.frequencyHz - frequencyHz);
  const near = followed.filter((one) => away(one) <= one.toleranceHz);
  return near.sort((a, b) => away(a) - away(b) || a.number - b.number)[0] ?? null;
}

/** Stores one suspect of a reading as followed, with the note it begins with. */
export async function storeFollowed(
  ctx: Context,
  tx: Transaction,
  reading: ReadingSuspects,
  suspect: { number: number; frequencyHz: number },
): Promise<Followed> {
  const { frequencyHz } = suspect;
  const toleranceHz = recognitionToleranceHz(frequencyHz, reading.resolution);
  const [last] = await tx
    .select({ number: max(followedSuspects.number) })
    .from(followedSuspects)
    .where(followedIn(ctx, reading.programId));
  const number = (last?.number ?? 0) + 1;
  const { teamId, userId } = ctx;
  const [row] = await tx
    .insert(followedSuspects)
    .values({
      teamId,
      programId: reading.programId,
      number,
      frequencyHz,
      toleranceHz,
      createdBy: userId,
    })
    .returning({ id: followedSuspects.id });
  if (!row) throw new Error("The followed suspect was not stored.");
  await tx.insert(suspectNotes).values({
    teamId,
    suspectId: row.id,
    authorId: userId,
    change: {
      state: { from: null, to: "open" },
      sweep: { from: null, to: reading.sweepName },
    },
  });
  return { id: row.id, number, frequencyHz, toleranceHz };
}
