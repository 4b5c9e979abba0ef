import type { Context } from "@/lib/auth/context";
import { formatFrequency } from "@/lib/core/units/format";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { followSuspectSchema } from "./schemas";
import { followedNear, nameFollowed, openReading, storeFollowed } from "./store-followed";

/** Follows one suspect of a reading over the builds of its program from here on. */
export async function followSuspect(
  ctx: Context,
  input: unknown,
): Promise<{ suspectId: string; number: number }> {
  requirePermission(ctx, "sweep.write");
  const values = parseInput(followSuspectSchema, input);
  return change(ctx, async (tx, audit) => {
    const { reading, followed } = await openReading(ctx, tx, values.readingId);
    const suspect = reading.suspects.find(({ number }) => number === values.number);
    if (!suspect) {
      throw new CommandError("not-found", "This reading has no suspect of this number.");
    }
    const near = followedNear(followed, suspect.frequencyHz);
    if (near) {
      throw new CommandError(
        "conflict",
        `The program follows suspect ${near.number} at ${formatFrequency(near.frequencyHz)} already, ` +
          `and takes anything within ${formatFrequency(near.toleranceHz)} for it.`,
        { number: "Narrow the tolerance of the other one first when they are two." },
      );
    }
    const stored = await storeFollowed(ctx, tx, reading, suspect);
    await audit({
      action: "suspect.follow",
      subjectType: "suspect",
      subjectId: stored.id,
      detail: {
        name: nameFollowed(stored),
        frequencyHz: stored.frequencyHz,
        toleranceHz: stored.toleranceHz,
        programId: reading.programId,
        sweepId: reading.sweepId,
      },
    });
    return { suspectId: stored.id, number: stored.number };
  });
}
