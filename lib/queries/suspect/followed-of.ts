import { and, asc, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { inTeam } from "@/db/client";
import { followedSuspects } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";
import type { FoundFrequency, Resolution } from "@/lib/core/reading/recognise-suspects";
import { recogniseSuspects } from "@/lib/core/reading/recognise-suspects";
import type { SuspectState } from "@/lib/core/reading/suspect-state";
import { isId } from "../is-id";
import { loadReadingSuspects } from "./load-reading-suspects";

/** A suspect of a reading that the program follows, or one that lies beside a followed one. */
export interface FollowedMark {
  /** Of the suspect in its reading. */
  number: number;
  suspectId: string;
  followedNumber: number;
  state: SuspectState;
  /** false: only within the tolerance of a followed one, which is another suspect of this reading. */
  isSame: boolean;
}

/** Which suspects of one reading the program follows; those that it does not are left out. */
export async function followedOf(
  tx: Transaction,
  teamId: string,
  programId: string,
  found: readonly FoundFrequency[],
  seenBy: Resolution,
): Promise<FollowedMark[]> {
  const followed = await tx
    .select({
      id: followedSuspects.id,
      number: followedSuspects.number,
      frequencyHz: followedSuspects.frequencyHz,
      toleranceHz: followedSuspects.toleranceHz,
      state: followedSuspects.state,
    })
    .from(followedSuspects)
    .where(and(eq(followedSuspects.teamId, teamId), eq(followedSuspects.programId, programId)))
    .orderBy(asc(followedSuspects.number));
  const matched = recogniseSuspects(followed, found, seenBy);
  return found.flatMap((suspect): FollowedMark[] => {
    const away = (one: { frequencyHz: number }) => Math.abs(one.frequencyHz - suspect.frequencyHz);
    const same = followed.find((one) => matched.get(one.id) === suspect.number);
    const near = followed
      .filter((one) => away(one) <= one.toleranceHz)
      .sort((a, b) => away(a) - away(b))[0];
    const one = same ?? near;
    if (!one) return [];
    return [
      {
        number: suspect.number,
        suspectId: one.id,
        followedNumber: one.number,
        state: one.state,
        isSame: same !== undefined,
      },
    ];
  });
}

/** The same for a screen, by the reading alone. */
export async function readFollowedMarks(ctx: Context, readingId: string): Promise<FollowedMark[]> {
  requirePermission(ctx, "sweep.read");
  if (!isId(readingId)) return [];
  return inTeam(ctx.db, ctx.teamId, async (tx) => {
    const reading = await loadReadingSuspects(tx, ctx.teamId, readingId);
    if (!reading) return [];
    const { programId, suspects, resolution } = reading;
    return followedOf(tx, ctx.teamId, programId, suspects, resolution);
  });
}
