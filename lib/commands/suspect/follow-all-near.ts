import type { Context } from "@/lib/auth/context";
import { standingOfSuspect } from "@/lib/core/reading/suspect-state";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { followAllNearSchema } from "./schemas";
import type { Followed } from "./store-followed";
import { followedNear, nameFollowed, openReading, storeFollowed } from "./store-followed";

/**
 * Follows, in one act, every suspect of a reading that is inside guard, over, or undecided by an
 * upper bound and not followed yet. Worst margin first: it gets the tolerance and the number, and
 * another that lies within that tolerance counts as the same.
 */
export async function followAllNear(
  ctx: Context,
  input: unknown,
): Promise<{ suspectIds: string[] }> {
  requirePermission(ctx, "sweep.write");
  const values = parseInput(followAllNearSchema, input);
  return change(ctx, async (tx, audit) => {
    const { reading, followed } = await openReading(ctx, tx, values.readingId);
    const near = reading.suspects
      .filter((suspect) => {
        const standing = standingOfSuspect(suspect, reading.guardDb);
        return standing !== null && standing !== "clear" && suspect.basis !== "cannot-decide";
      })
      .sort((a, b) => (a.marginDb ?? 0) - (b.marginDb ?? 0) || a.number - b.number);
    if (near.length === 0) {
      throw new CommandError("conflict", "No suspect of this reading lies over or inside guard.");
    }
    const stored: Followed[] = [];
    for (const suspect of near) {
      if (followedNear([...followed, ...stored], suspect.frequencyHz)) continue;
      stored.push(await storeFollowed(ctx, tx, reading, suspect));
    }
    if (stored.length === 0) {
      throw new CommandError("conflict", "Every suspect over or inside guard is followed already.");
    }
    for (const one of stored) {
      await audit({
        action: "suspect.follow",
        subjectType: "suspect",
        subjectId: one.id,
        detail: {
          name: nameFollowed(one),
          frequencyHz: one.frequencyHz,
          toleranceHz: one.toleranceHz,
          programId: reading.programId,
          sweepId: reading.sweepId,
          followedTogether: stored.length,
        },
      });
    }
    return { suspectIds: stored.map((one) => one.id) };
  });
}
